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
  { name: "no inlet", source: "702.7(C)", edit: () => undefined },
  { name: "marked, as large as the device behind it", source: "702.7(C)", edit: (d) => { inlet(d, { ratingA: 100, neutralMark: "floating neutral" }); } },
  { name: "smaller than the device behind it", source: "110.3(B)", edit: (d) => { inlet(d, { ratingA: 99, neutralMark: "floating neutral" }); }, finds: ["pi"] },
  { name: "not marked", source: "702.7(C)", edit: (d) => { inlet(d, { ratingA: 100 }); }, finds: ["pi"] },
  { name: "rating not known", source: "what is not known is asked for", edit: (d) => { inlet(d, { neutralMark: "bonded neutral" }); }, asks: ["pi"] },
];
