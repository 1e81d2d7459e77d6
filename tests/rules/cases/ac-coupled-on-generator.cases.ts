import { newEquipment } from "@/lib/diagram/commands";
import type { Drawing } from "@/lib/diagram/schema";
import { set, second, type RuleCase } from "../support";

/** An interactive inverter on a breaker of the panel. */
function follower(d: Drawing, panel: "hp" | "sp"): void {
  second(d);
  d.equipment["si"] = newEquipment("string-inverter", "SI-1", { x: 90, y: 8 });
  d.equipment["qs"] = { ...structuredClone(d.equipment["ql"]!), tag: "QS", parent: panel, spaces: [13, 15] };
  const joint = Object.values(d.circuits).find((each) => each.to.equipment === "ql")!;
  d.circuits["j-qs"] = { ...structuredClone(joint), from: { equipment: panel, port: "bus", offset: 8 }, to: { equipment: "qs", port: "line", offset: 0 } };
  d.circuits["c-si"] = { ...structuredClone(d.circuits["v1"]!), tag: "VS", from: { equipment: "si", port: "ac", offset: 0 }, to: { equipment: "qs", port: "load", offset: 0 } };
}
export const cases: readonly RuleCase[] = [
  { name: "nothing follows the set", source: "705.30", edit: () => undefined },
  { name: "not listed, on the bus that the set feeds", source: "705.30; maker's instructions", moved: true, edit: (d) => { follower(d, "hp"); set(d, "si", "listedGeneratorMode", false); }, finds: ["si"] },
  { name: "not listed, on the service panel that the set never feeds", source: "705.30; maker's instructions", moved: true, edit: (d) => { follower(d, "sp"); set(d, "si", "listedGeneratorMode", false); } },
  { name: "listed", source: "705.30; maker's instructions", edit: (d) => { follower(d, "hp"); set(d, "si", "listedGeneratorMode", true); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { follower(d, "hp"); }, asks: ["si"] },
];
