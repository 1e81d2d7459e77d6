import type { Drawing } from "@/lib/diagram/schema";

/** The drawing without what is to be removed: it stays on the sheet, but nothing is judged by it. */
export function withoutRemoved(drawing: Drawing): Drawing {
  const stays = <T extends { status: string }>(map: Record<string, T>): Record<string, T> =>
    Object.values(map).every((one) => one.status !== "removed") ? map : Object.fromEntries(Object.entries(map).filter(([, one]) => one.status !== "removed"));
  const equipment = stays(drawing.equipment);
  const circuits = stays(drawing.circuits);
  const raceways = stays(drawing.raceways);
  if (equipment === drawing.equipment && circuits === drawing.circuits && raceways === drawing.raceways) return drawing;
  return {
    ...drawing, equipment, circuits, raceways,
    bonds: Object.fromEntries(Object.entries(drawing.bonds).filter(([, bond]) => equipment[bond.equipment])),
    interlocks: Object.fromEntries(Object.entries(drawing.interlocks).map(([id, interlock]) => [id, { ...interlock, switches: Object.fromEntries(Object.entries(interlock.switches).filter(([one]) => equipment[one])) }])),
    sensors: Object.fromEntries(Object.entries(drawing.sensors).filter(([, sensor]) => circuits[sensor.circuit])),
  };
}
