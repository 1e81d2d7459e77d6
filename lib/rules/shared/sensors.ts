import type { Sensor } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";

/** Sensors of one purpose on one circuit that one instrument reads, in id order, by each of their ids. */
function groups(context: CheckContext): ReadonlyMap<string, readonly string[]> {
  return context.once("sensors together", () => {
    const byKey = new Map<string, string[]>();
    for (const [id, { circuit, purpose, reads }] of Object.entries(context.drawing.sensors)) {
      const key = JSON.stringify([circuit, purpose, reads]);
      byKey.set(key, [...(byKey.get(key) ?? []), id]);
    }
    return new Map([...byKey.values()].flatMap((group) => { const sorted = group.sort(); return sorted.map((id) => [id, sorted] as const); }));
  });
}
/** Sensors that measure one thing together with this one, itself among them: the first speaks for all. */
export const sensorsTogether = (context: CheckContext, id: string): readonly string[] => groups(context).get(id) ?? [];
/** The first sensor of every group, in id order. */
export const leadingSensors = (context: CheckContext): readonly string[] => Object.keys(context.drawing.sensors).sort().filter((id) => sensorsTogether(context, id)[0] === id);
/** Page of the instruction behind a sensor's place, as printed; null where none is cited. */
export const sensorPage = (sensor: Sensor): string | null => (sensor.instruction ? `${sensor.instruction.document} p. ${sensor.instruction.page}` : null);
