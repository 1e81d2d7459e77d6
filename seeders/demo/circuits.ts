import { bare, cable, points, route, wire, type DrawingBuilder } from "./build";

const egc = (size: string) => wire(1, size, "green");
const feeder = (size: string, ground: string) => ({ ungrounded: wire(2, size, "black, red"), grounded: wire(1, size, "white"), equipmentGround: egc(ground) });

/** Ac circuits with their drawn ways. */
export function addAcCircuits(drawing: DrawingBuilder): void {
  const aluminum = { metal: "Al" as const, insulation: "XHHW-2" as const };
  drawing.circuit("SVC", "UTIL.load", "MTR-1.line", [{ lengthFt: 28, ungrounded: wire(2, "250 kcmil", "black, red", aluminum), grounded: wire(1, "250 kcmil", "white", aluminum), route: route("R-0") }],
    { points: points([8, 6], [8, 8]), calloutAt: { x: 5, y: 7 } });
  drawing.circuit("F1a", "CB-F1.load", "DS-1.line", [{ lengthFt: 6, ...feeder("1 AWG", "6 AWG"), route: route("R-1a") }], { callout: "F1", points: points([13, 20], [26, 20]), calloutAt: { x: 23.3, y: 20 } });
  drawing.circuit("F1b", "DS-1.load", "CB-U.line", [{ lengthFt: 40, ...feeder("1 AWG", "6 AWG"), route: route("R-1b") }], { callout: "F1", points: points([29, 20], [36, 20]), calloutAt: { x: 31.4, y: 20 } });
  drawing.circuit("F2", "INV-1.ac", "CB-I1.load", [{ lengthFt: 6.7, ...feeder("8 AWG", "10 AWG"), route: route("N-1", "WW-1", "N-3") }],
    { points: points([93.6, 30], [93.6, 24.5], [54.6, 24.5], [54.6, 26], [50, 26]), calloutAt: { x: 53.5, y: 26 } });
  drawing.circuit("F3", "INV-2.ac", "CB-I2.load", [{ lengthFt: 6.7, ...feeder("8 AWG", "10 AWG"), route: route("N-2", "WW-1", "N-3") }],
    { points: points([62, 30], [62, 26], [55.4, 26], [55.4, 29], [50, 29]), calloutAt: { x: 53.5, y: 29 } });
  drawing.circuit("F4", "CB-L.load", "PNL-C.bus@4.6", [{ lengthFt: 35.8, ...feeder("1 AWG", "6 AWG"), route: route("N-3", "WW-1", "R-4") }],
    { points: points([50, 23], [80, 23], [80, 12.2]), calloutAt: { x: 53.5, y: 23 }, load: { continuousA: 36, otherA: 22.3, basis: "E-602: 58.3 A a leg, vat heater and chiller continuous" } });
  drawing.circuit("F5", "CB-GS.load", "CB-G.load", [{ lengthFt: 90.8, ...feeder("6 AWG", "10 AWG"), route: route("R-5", "WW-1", "N-3") }],
    { points: points([61, 11.6], [61, 21.5], [55.4, 21.5], [55.4, 20], [50, 20]), calloutAt: { x: 54.1, y: 20 } });
  drawing.circuit("N1", "CB-N.load", "CB-NM.line", [{ lengthFt: 110, ...feeder("3 AWG", "6 AWG"), route: route("R-7") }],
    { points: points([13, 24], [26, 24]), calloutAt: { x: 23.3, y: 24 }, load: { continuousA: 0, otherA: 40, basis: "existing load by the owner's record" } });
  const pump = { ungrounded: wire(2, "12 AWG", "black, red"), equipmentGround: egc("12 AWG") };
  drawing.circuit("P1a", "CB-S.load", "DS-2.line", [{ lengthFt: 56, ...pump, route: route("R-8") }], { callout: "P1", points: points([13, 30], [24.4, 30]), calloutAt: { x: 23, y: 30 } });
  drawing.circuit("P1b", "DS-2.load", "P-1.line", [{ lengthFt: 4, ...pump, route: route("R-8") }], { callout: "P1", points: points([27.4, 30], [29.2, 30], [29.2, 34.4]) });
}

/** Strings, battery leads and inverter leads. */
export function addDcCircuits(drawing: DrawingBuilder): void {
  const pvWire = { insulation: "PV wire" as const, outerDiameterIn: 0.27, voltageRatingV: 2000 };
  const strings = [["S1", "PV-1", "PVS-1.line1", 93.8, 99.4, 50.6, 95.1, "N-4", "INV-1"], ["S2", "PV-2", "PVS-1.line2", 96.9, 100.8, 51.9, 91.1, "N-4", "INV-1"],
    ["S4", "PV-4", "PVS-2.line2", 100, 102.2, 53.2, 64.5, "N-5", "INV-2"], ["S3", "PV-3", "PVS-2.line1", 103.1, 103.6, 54.5, 60.5, "N-5", "INV-2"]] as const;
  for (const [tag, string, port, x, down, lane, end, nipple] of strings) {
    const inside = { ungrounded: wire(2, "10 AWG", "red, black"), route: route("JB-1", "R-S", "WW-2", nipple), lengthFt: 64.5 };
    drawing.circuit(tag, `${string}.dc`, port, [
      { lengthFt: 13.5, ambientC: 60, ungrounded: wire(2, "10 AWG", "red, black", pvWire), sharesGroundOf: "a1" },
      tag === "S1" ? { ...inside, equipmentGround: egc("10 AWG") } : { ...inside, sharesGroundOf: "s1" },
    ], { points: points([x, 10.2], [x, 13], [x, 14.4], [down, 14.4], [down, lane], [end, lane], [end, 41.3]), calloutAt: { x: end, y: 45 } });
  }
  const flexible = { insulation: "RHW-2" as const, strands: "class K" as const };
  for (const [n, x, packNipple, busNipple] of [[1, 83, "N-6", "N-10"], [2, 80, "N-7", "N-11"], [3, 77, "N-8", "N-10"], [4, 74, "N-9", "N-11"]] as const) {
    drawing.circuit(`B${n}`, `BB-${n}.load`, `CB-B${n}.load`, [{ lengthFt: 8, ungrounded: wire(2, "1 AWG", "red, black", { ...flexible, outerDiameterIn: 0.53 }), equipmentGround: egc("6 AWG"), route: route(packNipple, "WW-3", busNipple) }],
      { points: points([x, 43.4], [x, 36.6]), calloutAt: { x, y: 39.2 } });
  }
  for (const [n, x, end, nipple] of [[1, 86, 88, "N-12"], [2, 70, 67.6, "N-13"]] as const) {
    drawing.circuit(`D${n}`, `CB-D${n}.load`, `INV-${n}.battery`, [{ lengthFt: 5, ungrounded: wire(2, "250 kcmil", "red, black", { ...flexible, outerDiameterIn: 0.82 }), equipmentGround: egc("4 AWG"), route: route(nipple) }],
      { points: points([x, 36.6], [x, 37.3], [end, 37.3]), calloutAt: { x, y: 37.3 } });
  }
}

/** Data and control leads, and the grounding conductors. Only the two links between units are drawn on the one-line. */
export function addDataAndGround(drawing: DrawingBuilder): void {
  const data = (tag: string, from: string, to: string, type: string, diameterIn: number, lengthFt: number, tags: readonly string[], wet: boolean | null = null, drawn: readonly (readonly [number, number])[] = []) =>
    drawing.circuit(tag, from, to, [{ lengthFt, cable: cable(type, diameterIn, 1, wet), route: route(...tags) }], drawn.length ? { points: points(...drawn) } : { offSheet: true });
  data("K-1", "BT-1.data", "INV-1.data", "Cat 6", 0.25, 20, ["C-1a", "JB-2", "C-1b"], null, [[84.5, 44.4], [88.8, 44.4], [88.8, 41.3]]);
  drawing.circuits["k-1"]!.calloutAt = { x: 86.7, y: 44.4 };
  data("K-2", "INV-1.data", "INV-2.data", "Cat 6", 0.25, 9, ["C-1b", "JB-2", "C-6"]);
  for (const [n, from, to] of [["a", 1, 2], ["b", 2, 3], ["c", 3, 4]] as const) data(`K-3${n}`, `BT-${from}.data`, `BT-${to}.data`, "Cat 6", 0.25, 5, [`C-4${n}`]);
  data("K-4", "IC-200.data", "INV-1.data", "shielded 2-pair", 0.25, 16, ["C-2a", "JB-2", "C-2b"]);
  data("K-5", "IC-200.data", "INV-1.data", "shielded 2-pair", 0.25, 16, ["C-2a", "JB-2", "C-2b"]);
  data("K-6", "IC-200.data", "INV-1.data", "3-pair", 0.28, 16, ["C-2a", "JB-2", "C-2b"]);
  data("K-7", "IC-200.data", "INV-2.data", "1-pair", 0.2, 8, ["C-2a", "JB-2", "C-6"]);
  data("K-8", "RSD-1.data", "INV-1.data", "2-pair", 0.25, 42, ["C-5a", "JB-2", "C-5b"], true);
  data("K-9", "ESD-1.data", "INV-1.data", "2-pair", 0.25, 42, ["C-5a", "JB-2", "C-5b"], true);
  data("K-10", "RSD-1.data", "INV-2.data", "1-pair", 0.2, 1, ["JB-2", "C-6"]);
  data("K-11", "INV-1.data", "G-1.data", "1-pair", 0.2, 98, ["C-5b", "JB-2", "C-3"], true);

  drawing.circuit("GEC-A", "MM-225.ground", "GE-A.ground", [{ lengthFt: 12, equipmentGround: bare("4 AWG") }], { callout: "GEC", points: points([3, 25], [3.2, 25], [3.2, 35.2]), calloutAt: { x: 3.2, y: 30.6 } });
  drawing.circuit("GEC-B", "PNL-N.ground", "GE-B.ground", [{ lengthFt: 10, equipmentGround: bare("6 AWG") }], { offSheet: true });
  drawing.circuit("A1", "PV-1.ground", "INV-1.ground", [{ lengthFt: 40, equipmentGround: bare("10 AWG"), route: route("JB-1") }], { offSheet: true });
  drawing.bond("MBJ", { kind: "main bonding jumper", equipment: "mm-225", fitted: true, size: "4 AWG", closes: "always", at: { x: 3.2, y: 22.4 } });
  drawing.bond("NS-1", { kind: "neutral strap", equipment: "g-1", fitted: false, size: null, closes: "always", at: { x: 66.6, y: 9.6 } });
}

/** Current sensors: exchange at the interconnection and at the generator. */
export function addSensors(drawing: DrawingBuilder): void {
  const common = { arrow: "from" as const, reads: "inv-1", covers: "its conductor" as const, leadLimitFt: 33, rotation: 0 as const };
  for (const [n, pole] of [[1, "L1"], [2, "L2"]] as const) {
    drawing.sensor(`CT-${n}`, { ...common, circuit: "f1b", pole, purpose: "interconnect exchange", ratio: "200 A : 0.333 V", ratingA: 200, settingA: 200, lead: "k-4", instruction: { document: "HB-78 data sheet", page: "H22" }, at: { x: 33, y: 20 } });
    drawing.sensor(`CT-${n + 2}`, { ...common, circuit: "f5", pole, purpose: "generator exchange", ratio: "100 A : 0.333 V", ratingA: 100, settingA: 100, lead: "k-5", instruction: { document: "HB-78 data sheet", page: "H23" }, at: { x: 50, y: 20 } });
  }
}
