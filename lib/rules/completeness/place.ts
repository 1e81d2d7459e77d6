import { MUST_FIX_TO_2023, NEVER_MUST_FIX, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { ratingRule } from "@/lib/rules/families/rating";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { acVoltageV } from "@/lib/rules/shared/voltage";
import { powerCircuits } from "@/lib/rules/shared/topology";

const all = (context: CheckContext): readonly string[] => Object.keys(context.drawing.equipment).sort();
const has = (context: CheckContext, id: string, key: string): boolean => Object.hasOwn(context.graph.kind(id).properties, key);
/** Types for places in the open, and of those the ones that stand corrosion: Table 110.28. */
const OUTDOOR = ["3R", "3S", "4", "4X"];
const CORROSIVE = ["4X"];

export const enclosureVsLocation: Rule = {
  meta: {
    id: "enclosure-vs-location", group: "Ratings and completeness", severity: "must-fix", evidence: "rated",
    statement: "The enclosure type suits the place: 3R, 3S, 4 or 4X in the open, 4X where it is corrosive as well.",
    risk: "Water gets in: corrosion, tracking and a shock on the enclosure.",
    citations: sameSection("110.28", ["agreed", "agreed", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.enclosureType", "equipment.location.exposure", "equipment.location.corrosive"], absorbs: [],
  },
  subjects: (context) => all(context).filter((id) => has(context, id, "enclosureType") && context.drawing.equipment[id]?.parent === null && context.drawing.equipment[id]?.integral === false).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const reader = new Reader(context);
    const { exposure, corrosive } = context.drawing.equipment[anchor.id]?.location ?? {};
    // Indoors the table leaves nearly every type; where exactly it drips or is hosed down is for the person on site.
    if (exposure === "indoor dry" || exposure === "indoor damp" || exposure === "underground") return NOT_APPLICABLE;
    if (!exposure) { reader.ask(anchor, "location.exposure", "exposure of the place"); return reader.outcome(); }
    const type = reader.text(anchor.id, "enclosureType");
    if (type === null) return reader.outcome();
    const allowed = corrosive === true ? CORROSIVE : OUTDOOR;
    if (allowed.includes(type)) return PASS;
    return found({
      variant: corrosive === true ? "corrosive" : "in-the-open", anchor, field: "props.enclosureType", related: [],
      message: `${nameOf(context, anchor)} is in a type ${type} enclosure ${exposure === "roof" ? "on a roof" : "outdoors"}${corrosive === true ? " where it is corrosive" : ""}; it must be ${allowed.join(", ")}.`,
      steps: [{ symbol: "Type", expression: "in Table 110.28 for the place", substituted: `${type} in ${allowed.join(", ")}`, result: "fails", unit: "" }],
    });
  },
  suggest: ({ anchor, variant }) => [{ label: `Use a type ${variant === "corrosive" ? "4X" : "3R"} enclosure`, also: "Ratings may differ: take them from the datasheet of that model.", patches: [{ op: "add", path: `/equipment/${anchor.id}/props/enclosureType`, value: variant === "corrosive" ? "4X" : "3R" }] }],
  examples: { violates: "A type 1 enclosure outdoors.", passes: "Type 3R in the same place." },
};

/** Ac circuits that land on a piece, through its own ports. */
const landed = (context: CheckContext, id: string): readonly string[] => {
  const power = context.once("power circuits as a set", () => new Set(powerCircuits(context.graph)));
  return context.graph.circuitsAt(id).filter((circuit) => power.has(circuit) && context.drawing.circuits[circuit]?.system === "ac");
};
export const voltageClass = ratingRule({
  meta: {
    id: "voltage-class", group: "Ratings and completeness", severity: "must-fix", evidence: "rated",
    statement: "Equipment is rated for the voltage of the circuit it stands in.", risk: "Insulation and contacts fail at a voltage they were never tested for.",
    citations: sameSection("110.4"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.voltageV", "site.serviceSystem", "equipment.props.systemVoltage", "circuits.from", "circuits.to"], absorbs: [],
  },
  variant: "below-circuit", unit: "V", bound: "least", name: "Voltage rating",
  subjects: (context) => all(context).filter((id) => has(context, id, "voltageV") && landed(context, id).length > 0).map(equipmentRef),
  demand: (ref, context, reader) => {
    const [circuit] = landed(context, ref.id);
    const volts = circuit === undefined ? null : acVoltageV(context, circuit, reader);
    return volts === null || circuit === undefined ? null : { value: volts, words: "the circuit is", related: [circuitRef(circuit)] };
  },
  rating: (ref, context) => ({ value: numberOf(context, ref.id, "voltageV"), field: "props.voltageV", label: propertyLabel(context, ref.id, "voltageV") }),
  examples: { violates: "A switch marked 120 V on a 240 V circuit.", passes: "A switch marked 240 V." },
});

export const ambientLimit = ratingRule({
  meta: {
    id: "ambient-limit", group: "Ratings and completeness", severity: "should-fix", evidence: "rated",
    statement: "The ambient stays within what the equipment is rated for.", risk: "Inverters reduce their output, batteries age and shut down.",
    citations: sameSection("110.3(B)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.ambientMostC", "equipment.location.ambientC"], absorbs: [],
  },
  variant: "above-rated", unit: "°C", bound: "least", name: "Rated ambient",
  subjects: (context) => all(context).filter((id) => has(context, id, "ambientMostC")).map(equipmentRef),
  demand: (ref, context) => {
    const ambientC = context.drawing.equipment[ref.id]?.location.ambientC ?? null;
    // Without an ambient the derating rules ask for it; here there is nothing to compare yet.
    return ambientC === null ? null : { value: ambientC, words: "the place reaches" };
  },
  rating: (ref, context) => ({ value: numberOf(context, ref.id, "ambientMostC"), field: "props.ambientMostC", label: propertyLabel(context, ref.id, "ambientMostC") }),
  examples: { violates: "An inverter for 45 °C in a shed that reaches 50 °C.", passes: "The same inverter at 40 °C." },
});

export const listingMark: Rule = {
  meta: {
    id: "listing-mark", group: "Ratings and completeness", severity: "should-fix", evidence: "rated",
    statement: "Each new item names the standard it is listed to.", risk: "The inspector cannot approve what carries no listing.",
    citations: sameSection("110.2, 110.3(C)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.listing", "equipment.status"], absorbs: [],
  },
  // Parts inside listed equipment come with its listing.
  subjects: (context) => all(context).filter((id) => has(context, id, "listing") && context.drawing.equipment[id]?.status === "new" && context.drawing.equipment[id]?.parent === null).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const reader = new Reader(context);
    const listing = textOf(context, anchor.id, "listing") ?? reader.text(anchor.id, "listing");
    if (listing === null) return reader.outcome();
    if (/\d/.test(listing)) return PASS;
    return found({ variant: "no-standard", anchor, field: "props.listing", related: [], message: `${nameOf(context, anchor)}: "${listing}" names no standard with its number.`, steps: [] });
  },
  examples: { violates: "\"Combiner box\".", passes: "\"UL 1741\"." },
};

export const meterSocketRating = ratingRule({
  meta: {
    id: "meter-socket-rating", group: "Ratings and completeness", severity: "should-fix", evidence: "rated",
    statement: "The meter socket carries the rating of the service behind it continuously.", risk: "The jaws overheat behind a seal that only the utility may open.",
    citations: sameSection("110.3(B)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: [],
  },
  variant: "below-service", unit: "A", bound: "least", name: "Meter socket",
  subjects: (context) => all(context).filter((id) => context.drawing.equipment[id]?.kind === "meter").map(equipmentRef),
  demand: (ref, context, reader) => {
    const load = context.graph.circuitsAt(ref.id, "load")[0];
    if (load === undefined) return null;
    const next = context.drawing.circuits[load];
    const device = next && (next.from.equipment === ref.id ? next.to.equipment : next.from.equipment);
    if (device === undefined || context.graph.kind(device).capabilities.overcurrent !== true) return null;
    const rating = reader.number(device, "ratingA");
    return rating === null ? null : { value: rating, words: "the main behind it is", related: [equipmentRef(device)] };
  },
  rating: (ref, context) => ({ value: numberOf(context, ref.id, "ratingA"), field: "props.ratingA", label: propertyLabel(context, ref.id, "ratingA") }),
  examples: { violates: "A 200 A socket ahead of a 400 A main.", passes: "A 320 A class socket ahead of a 320 A main." },
});

/** Ratings against the place and the circuit. */
export const placeRules: readonly Rule[] = [enclosureVsLocation, voltageClass, ambientLimit, listingMark, meterSocketRating];
