import { choice, defineKind, number } from "../define";
import { lines } from "../shared";

export const electrode = defineKind({
  kind: "electrode", title: "Grounding electrode", tagPrefix: "GE", railGroup: "route and ground",
  properties: {
    type: choice("Electrode", ["ground rod", "two ground rods", "concrete-encased", "metal water pipe", "ground ring", "structural metal"]),
    spacingFt: number("Rod spacing", "ft", 0, 100),
    lengthFt: number("Rod length", "ft", 0, 40),
  },
  defaults: { type: "two ground rods" },
  capabilities: { electrode: true },
  symbol: (p) => (p.type === "ground rod" || p.type === "two ground rods" ? "rod" : "ground"),
  box: { x: -1, y: 0, width: 2, height: 3 },
  ports: () => [{ id: "ground", label: "Clamp", system: "ground", side: "top", x: 0, y: 0, poles: ["G"], many: true }],
  joins: () => [],
  annotation: (p) => lines(p.type === "two ground rods" ? "(2) RODS" : p.type?.toUpperCase() ?? null),
  scheduleFields: ["type", "lengthFt", "spacingFt"],
});
