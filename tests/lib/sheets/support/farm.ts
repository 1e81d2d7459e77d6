import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import { drawingSchema, type Circuit, type Drawing, type Equipment, type Point, type Raceway, type Section } from "@/lib/diagram/schema";
import { emptyDrawing } from "@/lib/diagram/new";
import { kindDefinition } from "@/lib/equipment/registry";

type Part<T> = Partial<T>;
const p = (x: number, y: number): Point => ({ x, y });

export function equipment(kind: string, tag: string, at: Point, extra: Part<Equipment> = {}): Equipment {
  const definition = kindDefinition(kind);
  const unknown = Object.fromEntries(Object.keys(definition.properties).map((name) => [name, null]));
  return {
    kind, tag, status: "new", parent: null, integral: false, at, rotation: 0, mirrored: false, size: null, bus: null, label: null, spaces: null,
    location: { building: null, place: null, exposure: null, ambientC: null }, sources: {}, ports: {}, note: "", ...extra,
    props: { ...unknown, ...(definition.defaults as Equipment["props"]), ...extra.props },
  };
}
const conductor = (count: number, size: string) => ({ count, size, metal: "Cu", insulation: "THWN-2", strands: null, outerDiameterIn: null, voltageRatingV: 600, color: null } as const);
export function section(extra: Part<Section> = {}): Section {
  return { order: 0, lengthFt: 10, parallelSets: 1, ungrounded: conductor(2, "8 AWG"), grounded: null, equipmentGround: conductor(1, "10 AWG"), sharesGroundOf: null, cable: null, route: [], ambientC: null, ...extra };
}
export function circuit(tag: string, from: readonly [string, string, number?], to: readonly [string, string, number?], points: readonly Point[], extra: Part<Circuit> = {}): Circuit {
  const end = ([id, port, offset]: readonly [string, string, number?]) => ({ equipment: id, port, offset: offset ?? 0 });
  return {
    tag, callout: null, wiring: "field", system: "ac", from: end(from), to: end(to), status: "new", load: null, sections: { a: section() },
    points: [...points], bends: [], calloutAt: null, ...extra,
  };
}
export function raceway(kind: Raceway["kind"], tag: string, at: Point, extra: Part<Raceway> = {}): Raceway {
  return {
    kind, tag, status: "new", type: null, tradeSize: null, metal: null, widthIn: null, heightIn: null, depthIn: null, stretches: {}, bendsDegrees: null,
    compartments: {}, from: null, to: null, sealed: null, location: { building: null, place: null, exposure: null, ambientC: null }, at, size: { width: 0, height: 0 },
    vertical: false, label: null, note: "", ...extra,
  };
}
const stretch = (lengthFt: number, burialDepthIn: number | null = null) => ({ order: 0, lengthFt, ambientC: null, exposure: null, aboveRoofIn: null, burialDepthIn });
const factory = { wiring: "factory", sections: {} } as const;

/** A small farm system: service, interconnect cabinet, one inverter with one string and one battery, a generator. */
export function farm(): Drawing {
  const drawing: Drawing = {
    ...emptyDrawing({ utilityName: "Orrin Rural Electric", recordLowC: -18, designHighC: 35 }, {
      jobName: "Barley Court Dairy", jobNumber: "26-044", addressLines: "9 Sluice Road\nNettlecombe, Orrin County", parcel: "07-118-003", owner: "A. Thorne",
      designedBy: "Ines Okafor-Lund", checkedBy: "T. Wrenfield, PE", permitNumber: "BP-26-0502", codes: "NEC 2023, IRC 2021",
    }),
    equipment: {
      util: equipment("utility", "UTIL-1", p(8, 2.2), { props: { name: "Orrin Rural Electric", systemVoltage: "120/240 V 1-ph 3-W", service: "overhead", availableFaultCurrentA: 10400 } }),
      mtr: equipment("meter", "MTR-1", p(8, 10), { props: { ratingA: 200 } }),
      mm: equipment("meter-main", "MM-225", p(1.5, 13), {
        size: { width: 20.5, height: 21 }, bus: { x: 6.5, y: 5.5, length: 11.5, vertical: true }, label: { x: 8.8, y: 1.6, anchor: "start" },
        props: { busA: 225, enclosureType: "3R", spacesTotal: 16, busEnds: "top" },
      }),
      cbm: equipment("breaker", "CB-M", p(8, 14), { parent: "mm", rotation: 90, label: { x: -1.6, y: 1.4, anchor: "end" }, spaces: [], props: { ratingA: 200, poles: 2, position: "main", current: "ac" } }),
      cbf: equipment("breaker", "CB-F1", p(10, 20), { parent: "mm", spaces: [1, 3], props: { ratingA: 125, poles: 2, position: "branch", current: "ac" } }),
      ds: equipment("disconnect", "DS-1", p(26, 20), { props: { ratingA: 200, voltageV: 240, lockable: true, current: "ac" } }),
      ic: equipment("interconnect-cabinet", "IC-200", p(31, 10.2), {
        size: { width: 23, height: 23.3 }, bus: { x: 14, y: 8.4, length: 11.8, vertical: true }, props: { busA: 200, enclosureType: "1", shortCircuitKA: 10, busEnds: "top" },
      }),
      cbu: equipment("breaker", "CB-U", p(36.4, 20), { parent: "ic", spaces: [], props: { ratingA: 125, poles: 2, position: "main", current: "ac" } }),
      k1: equipment("contactor", "K1", p(40.2, 20), { parent: "ic", props: { ratingA: 200, poles: 2, interconnectDevice: true } }),
      cbg: equipment("breaker", "CB-G", p(47, 20), { parent: "ic", spaces: [2, 4], props: { ratingA: 60, poles: 2, position: "branch", current: "ac" } }),
      cbi: equipment("breaker", "CB-I1", p(47, 26), { parent: "ic", spaces: [21, 23], props: { ratingA: 45, poles: 2, position: "branch", mount: "plug-on with hold-down", current: "ac" } }),
      gen: equipment("generator", "G-1", p(58, 1), { props: { outputKW: 14, fuel: "propane", outputV: 240, ratedA: 58.3 } }),
      inv: equipment("hybrid-inverter", "INV-1", p(70, 29.9), { props: { model: "HB-78", outputKW: 7.8, continuousA: 32.5, role: "single", firmware: "4.2.1", trackers: 1 } }),
      pvs: equipment("pv-switch", "PVS-1", p(72.5, 38.2), { parent: "inv", integral: true, props: { channels: 1, voltageV: 600, ratingA: 30 } }),
      str: equipment("pv-string", "PV-1", p(101, 6.2), { props: { modules: 12 } }),
      bat: equipment("battery", "BT-1", p(86, 40), { props: { energyKWh: 12.5, nominalV: 51.2 } }),
      rod: equipment("electrode", "GE-1", p(3.2, 36), { props: { type: "two ground rods" } }),
    },
    circuits: {
      svc: circuit("SVC", ["util", "load"], ["mtr", "line"], [p(8, 6.2), p(8, 8)], { calloutAt: p(5, 7.4) }),
      svc2: circuit("SVC2", ["mtr", "load"], ["cbm", "line"], [p(8, 12), p(8, 14)], { callout: "SVC" }),
      main: circuit("BUS", ["cbm", "load"], ["mm", "bus", 0], [], factory),
      f1bus: circuit("BUS-F1", ["mm", "bus", 1.5], ["cbf", "line"], [], factory),
      f1a: circuit("F1a", ["cbf", "load"], ["ds", "line"], [p(13, 20), p(26, 20)], { callout: "F1", calloutAt: p(23.3, 20) }),
      f1b: circuit("F1b", ["ds", "load"], ["cbu", "line"], [p(29, 20), p(36.4, 20)], { callout: "F1" }),
      k: circuit("U-K", ["cbu", "load"], ["k1", "line"], [], factory),
      kb: circuit("K-BUS", ["k1", "load"], ["ic", "bus", 1.4], [], factory),
      gb: circuit("BUS-G", ["ic", "bus", 1.4], ["cbg", "line"], [], factory),
      ib: circuit("BUS-I1", ["ic", "bus", 7.4], ["cbi", "line"], [], factory),
      f5: circuit("F5", ["cbg", "load"], ["gen", "load"], [p(50, 20), p(55.2, 20), p(55.2, 21.4), p(61, 21.4), p(61, 7.6)], { calloutAt: p(54, 20), sections: { a: section({ route: [{ raceway: "n3", compartment: null }, { raceway: "ww", compartment: null }, { raceway: "r5", compartment: null }] }) } }),
      f2: circuit("F2", ["cbi", "load"], ["inv", "ac"], [p(50, 26), p(54.6, 26), p(54.6, 24.4), p(74, 24.4), p(74, 29.9)], { calloutAt: p(52, 26), sections: { a: section({ route: [{ raceway: "n3", compartment: null }, { raceway: "ww", compartment: null }, { raceway: "n1", compartment: null }] }) } }),
      s1: circuit("S1", ["str", "dc"], ["pvs", "line1"], [p(101, 10.2), p(101, 45), p(72.5, 45), p(72.5, 41.2)], { system: "pv-dc", calloutAt: p(101, 14) }),
      s1i: circuit("PVS", ["pvs", "load1"], ["inv", "pv1"], [], { ...factory, system: "pv-dc" }),
      d1: circuit("D1", ["bat", "dc"], ["inv", "battery"], [p(86, 40), p(86, 37.2), p(79.6, 37.2)], { system: "battery-dc" }),
      gec: circuit("GEC", ["mm", "ground"], ["rod", "ground"], [p(2.5, 25), p(2.5, 29), p(3.2, 29), p(3.2, 36)], { system: "ground", calloutAt: p(3.2, 31.5), sections: { a: section({ ungrounded: null, equipmentGround: conductor(1, "4 AWG") }) } }),
      kdat: circuit("K-1", ["bat", "data"], ["inv", "data"], [p(87.5, 41), p(90.5, 41), p(90.5, 47), p(78.8, 47), p(78.8, 41.2)], {
        system: "data", sections: { a: section({ ungrounded: null, equipmentGround: null, cable: { type: "Cat 6", class: "class 2", count: 1, outerDiameterIn: 0.25, voltageRatingV: 300, wetListed: null } }) },
      }),
    },
    raceways: {
      ww: raceway("wireway", "WW-1", p(57, 20), { size: { width: 40, height: 7.6 }, metal: true, widthIn: 6, heightIn: 6, depthIn: 60, label: { x: 7.5, y: -0.7, anchor: "start" } }),
      n3: raceway("nipple", "N-3", p(55.7, 20.6), { size: { width: 1, height: 5.6 }, tradeSize: "2", label: { x: -0.1, y: -1.2, anchor: "start" } }),
      n1: raceway("nipple", "N-1", p(73.2, 28.1), { size: { width: 1.6, height: 1 }, tradeSize: "1", vertical: true }),
      r5: raceway("conduit", "R-5", p(60.1, 15.6), { size: { width: 1.8, height: 0.8 }, type: "PVC 40", tradeSize: "1", vertical: true, stretches: { a: stretch(85, 18) }, label: { x: 2.4, y: 0.2, anchor: "start" } }),
    },
    bonds: {
      mbj: { tag: "MBJ", kind: "main bonding jumper", equipment: "mm", fitted: true, size: null, closes: "always", at: p(3.2, 18) },
      strap: { tag: "NS-1", kind: "neutral strap", equipment: "gen", fitted: false, size: null, closes: "always", at: p(65.5, 9.5) },
    },
    interlocks: { il: { tag: "IL-1", kind: "mechanical slide", listed: true, switches: { cbu: true, cbg: true }, at: p(43, 16.4), note: "" } },
    sensors: {
      ct1: { tag: "CT-1", circuit: "f1b", pole: "L1", purpose: "interconnect exchange", arrow: "from", ratio: null, ratingA: 200, leadLimitFt: null, reads: "inv", instruction: null, at: p(31.4, 20), rotation: 0 },
      ct2: { tag: "CT-2", circuit: "f1b", pole: "L2", purpose: "interconnect exchange", arrow: "from", ratio: null, ratingA: 200, leadLimitFt: null, reads: "inv", instruction: null, at: p(31.4, 20), rotation: 0 },
    },
    texts: {
      t1: { at: p(65.6, 26.7), lines: "AC", style: "compartment", keynote: null, vertical: false },
      k1: { at: p(51.6, 32), lines: "Listed slide. One closed, never both.", style: "note", keynote: "1", vertical: false },
    },
  };
  drawing.sheet.subtitle = "AC, DC AND GENERATOR";
  drawing.sheet.tables = { states: p(1.5, 48), interlocks: p(58, 52) };
  return drawingSchema.parse(drawing);
}
export const farmGraph = (): DrawingGraph => buildGraph(farm());
