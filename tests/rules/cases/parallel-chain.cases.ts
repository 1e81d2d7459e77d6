import { circuitOf, set, thirdUnit, type RuleCase } from "../support";

const asks = (d: Parameters<RuleCase["edit"]>[0], link: string | null): void => { for (const id of ["inv-1", "inv-2"]) set(d, id, "parallelLink", link); };
const ring = (d: Parameters<RuleCase["edit"]>[0]): void => {
  thirdUnit(d);
  d.circuits["k-13"] = { ...structuredClone(circuitOf(d, "k-12")), tag: "K-13", from: { equipment: "inv-3", port: "data", offset: 0 }, to: { equipment: "inv-1", port: "data", offset: 0 } };
};
export const cases: readonly RuleCase[] = [
  { name: "two units linked, terminators on", source: "instruction page H30", edit: () => undefined },
  { name: "no link", source: "instruction page H30", moved: true, edit: (d) => { delete d.circuits["k-2"]; }, finds: ["inv-2"] },
  { name: "the link ends at a battery instead", source: "instruction page H30", moved: true, edit: (d) => { circuitOf(d, "k-2").to = { equipment: "bt-2", port: "data", offset: 0 }; }, finds: ["inv-2"] },
  { name: "three units in a chain", source: "instruction page H30", edit: thirdUnit },
  { name: "three units in a ring", source: "instruction page H30", moved: true, edit: ring, finds: ["inv-1"] },
  { name: "a ring where the instruction asks for one", source: "some makers ask for a ring", edit: (d) => { ring(d); asks(d, "ring"); } },
  { name: "no link where the instruction asks for none", source: "some makers use none", edit: (d) => { asks(d, "none"); delete d.circuits["k-2"]; } },
  { name: "the end's terminator is off", source: "instruction page H30", edit: (d) => { set(d, "inv-2", "terminator", false); }, finds: ["inv-2"] },
  { name: "a terminator inside the chain", source: "instruction page H30", edit: (d) => { thirdUnit(d); set(d, "inv-2", "terminator", true); }, finds: ["inv-2"] },
  { name: "a chain without terminators", source: "some makers ask for none", edit: (d) => { asks(d, "chain without terminators"); set(d, "inv-2", "terminator", false); } },
  { name: "what the instruction asks is not known", source: "what is not known is asked for", edit: (d) => { asks(d, null); }, asks: ["inv-1"] },
  { name: "a terminator is not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-2", "terminator", null); }, asks: ["inv-2"] },
  { name: "units on separate buses", source: "not in parallel any more", moved: true, edit: (d) => { delete d.circuits["k-2"]; delete d.circuits["f3"]; } },
];
