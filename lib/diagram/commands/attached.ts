import type { Drawing } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { free, nameOf, need } from "./lookup";
import { nextTag } from "./tags";
import { Refusal, type Recipe } from "./types";

export const placeSensor: Recipe<"placeSensor"> = (draft, command) => {
  free(draft, "sensors", command.id);
  if (need(draft, "circuits", command.circuit).system !== "ac") throw new Refusal("A current sensor sits on an ac circuit.", "circuit");
  draft.sensors[command.id] = {
    tag: command.tag ?? nextTag(draft as Drawing, "CT-"), circuit: command.circuit, pole: null, purpose: null, arrow: null, ratio: null, ratingA: null,
    leadLimitFt: null, reads: null, instruction: null, at: command.at, rotation: 0, ...command.change,
  };
  return `place ${draft.sensors[command.id]?.tag ?? "sensor"}`;
};
export const setSensor: Recipe<"setSensor"> = (draft, { id, change }) => {
  const each = need(draft, "sensors", id);
  Object.assign(each, change);
  return `change ${each.tag}`;
};

const BOND_PREFIX: Record<string, string> = {
  "main bonding jumper": "MBJ-", "system bonding jumper": "SBJ-", "supply-side bonding jumper": "SSBJ-", "neutral strap": "NS-", "bonding screw": "BS-", "neutral relay": "NR-",
};
export const addBond: Recipe<"addBond"> = (draft, command) => {
  free(draft, "bonds", command.id);
  const at = need(draft, "equipment", command.equipment);
  if (!kindDefinition(at.kind).capabilities.neutralBar) throw new Refusal(`${at.tag || "This equipment"} has no neutral bar.`, "equipment");
  draft.bonds[command.id] = {
    tag: nextTag(draft as Drawing, BOND_PREFIX[command.kind] ?? "BJ-"), kind: command.kind, equipment: command.equipment, fitted: null, size: null,
    closes: command.kind === "neutral relay" ? "island" : "always", at: { x: at.at.x + 1.5, y: at.at.y + 3 }, ...command.change,
  };
  return `add ${command.kind} in ${nameOf(draft, { collection: "equipment", id: command.equipment })}`;
};
export const setBond: Recipe<"setBond"> = (draft, { id, change }) => {
  const each = need(draft, "bonds", id);
  Object.assign(each, change);
  return `change ${each.tag || each.kind}`;
};

export const addInterlock: Recipe<"addInterlock"> = (draft, command) => {
  free(draft, "interlocks", command.id);
  const members = [...new Set(command.switches)];
  if (members.length < 2) throw new Refusal("An interlock holds at least two switches.", "switches");
  for (const id of members) {
    const each = need(draft, "equipment", id);
    if (!kindDefinition(each.kind).capabilities.switching) throw new Refusal(`${each.tag || "This equipment"} does not switch anything.`, "switches");
  }
  const places = members.map((id) => need(draft, "equipment", id).at);
  const mean = (pick: "x" | "y"): number => Math.round(places.reduce((sum, each) => sum + each[pick], 0) / places.length);
  draft.interlocks[command.id] = {
    tag: nextTag(draft as Drawing, "IL-"), kind: "mechanical slide", listed: null, switches: Object.fromEntries(members.map((id) => [id, true as const])),
    at: { x: mean("x") + 1, y: Math.min(...places.map((each) => each.y)) - 3 }, note: "", ...command.change,
  };
  return `interlock ${members.map((id) => draft.equipment[id]?.tag).join(" and ")}`;
};
export const setInterlock: Recipe<"setInterlock"> = (draft, { id, change }) => {
  const each = need(draft, "interlocks", id);
  Object.assign(each, change);
  return `change ${each.tag}`;
};
