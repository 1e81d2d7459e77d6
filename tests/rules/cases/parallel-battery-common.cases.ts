import { circuitOf, set, type RuleCase } from "../support";

const asks = (d: Parameters<RuleCase["edit"]>[0], bank: string | null): void => { for (const id of ["inv-1", "inv-2"]) set(d, id, "parallelBank", bank); };
/** The second unit straight on the fourth pack, off the bus. */
const apart = (d: Parameters<RuleCase["edit"]>[0]): void => { circuitOf(d, "b4").to = { equipment: "inv-2", port: "battery", offset: 0 }; delete d.circuits["d2"]; };
export const cases: readonly RuleCase[] = [
  { name: "four packs and both units on one bus", source: "instruction page H30", edit: () => undefined },
  { name: "a pack of its own for the second unit", source: "instruction page H30", moved: true, edit: apart, finds: ["inv-2"] },
  { name: "the second unit without a battery", source: "instruction page H30", moved: true, edit: (d) => { delete d.circuits["d2"]; }, finds: ["inv-2"] },
  { name: "separate banks where the instruction demands them", source: "some makers demand separate banks", edit: (d) => { apart(d); asks(d, "separate banks"); } },
  { name: "one bank where the instruction demands separate ones", source: "some makers demand separate banks", edit: (d) => { asks(d, "separate banks"); }, finds: ["inv-2"] },
  { name: "either is allowed", source: "some makers allow both", edit: (d) => { apart(d); asks(d, "either"); } },
  { name: "what the instruction asks is not known", source: "what is not known is asked for", edit: (d) => { asks(d, null); }, asks: ["inv-1"] },
  { name: "no battery at all", source: "nothing to share", moved: true, edit: (d) => { asks(d, null); for (const id of ["b1", "b2", "b3", "b4"]) delete d.circuits[id]; } },
];
