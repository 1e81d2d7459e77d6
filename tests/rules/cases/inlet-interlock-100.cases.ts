import { newEquipment } from "@/lib/diagram/commands";
import type { Drawing } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";
import { second, type RuleCase } from "../support";

/** The generator gives way to an inlet for a portable set. */
function inlet(d: Drawing, props: Record<string, PropertyValue>): void {
  second(d);
  d.equipment["pi"] = { ...newEquipment("power-inlet", "PI-1", { x: 4, y: 60 }), props: { ...newEquipment("power-inlet", "PI-1", { x: 4, y: 60 }).props, ...props } };
  d.circuits["c3"]!.from = { equipment: "pi", port: "load", offset: 0 };
}
export const cases: readonly RuleCase[] = [
  { name: "no inlet", source: "702.7(D)", edit: () => undefined },
  { name: "99 A, plain", source: "702.7(D): from 100 A", edit: (d) => { inlet(d, { ratingA: 99, interlockedSwitch: false }); } },
  { name: "100 A, plain", source: "702.7(D): from 100 A", edit: (d) => { inlet(d, { ratingA: 100, interlockedSwitch: false }); }, finds: ["pi"] },
  { name: "100 A with an interlocked switch", source: "702.7(D)", edit: (d) => { inlet(d, { ratingA: 100, interlockedSwitch: true }); } },
  { name: "switch not known", source: "what is not known is asked for", edit: (d) => { inlet(d, { ratingA: 100 }); }, asks: ["pi"] },
  { name: "rating not known", source: "what is not known is asked for", edit: (d) => { inlet(d, {}); }, asks: ["pi"] },
];
