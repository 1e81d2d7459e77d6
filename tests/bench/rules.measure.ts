import { COLLECTIONS, type Drawing } from "@/lib/diagram/schema";
import { rules } from "@/lib/rules";
import { check } from "@/lib/rules/engine/run";
import { largeSystem } from "@/tests/fixtures/largeSystem";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

/* Medians, and ratios inside one run: a figure alone says more of the machine than of the rules. */
const now = (): number => performance.now();
function medianMs(work: () => unknown, runs: number): number {
  for (let i = 0; i < Math.min(runs, 20); i += 1) work();
  const times = Array.from({ length: runs }, () => { const start = now(); work(); return now() - start; }).sort((a, b) => a - b);
  return times[runs >> 1] as number;
}
/** Visits every element and reads its fields, and decides nothing. */
function traverse(drawing: Drawing): number {
  let seen = 0;
  for (const collection of COLLECTIONS) {
    for (const element of Object.values(drawing[collection])) for (const value of Object.values(element as Record<string, unknown>)) if (value !== undefined) seen += 1;
  }
  return seen;
}
const ms = (value: number): string => `${value.toFixed(value < 10 ? 2 : 1)} ms`;

function farm(): void {
  const drawing = cleanDrawing();
  const whole = medianMs(() => check(drawing), 200);
  const bare = medianMs(() => traverse(drawing), 200);
  console.log(`${rules.length} rules, farm system: median ${ms(whole)} (target 15 ms); bare traversal ${ms(bare)}; ratio ${(whole / bare).toFixed(0)}`);
  const share = new Map<string, number>();
  for (let i = 0; i < 60; i += 1) for (const [rule, time] of Object.entries(check(drawing, { clock: now }).timing)) share.set(rule, (share.get(rule) ?? 0) + time / 60);
  const total = [...share.values()].reduce((a, b) => a + b, 0);
  for (const [rule, time] of [...share].sort((a, b) => b[1] - a[1]).slice(0, 15)) console.log(`  ${rule.padEnd(28)} ${ms(time).padStart(9)}  ${((100 * time) / total).toFixed(1)} %`);
}
function growth(): void {
  const figures = [50, 100, 200, 500, 1000, 2000].map((pieces) => {
    const drawing = largeSystem(pieces);
    const [equipment, circuits] = [Object.keys(drawing.equipment).length, Object.keys(drawing.circuits).length];
    const time = medianMs(() => check(drawing), pieces > 500 ? 9 : 25);
    const bare = medianMs(() => traverse(drawing), 25);
    console.log(`${equipment} equipment, ${circuits} circuits: median ${ms(time)}${pieces === 500 ? " (target 150 ms)" : ""}; ratio to bare traversal ${(time / bare).toFixed(0)}`);
    return { x: Math.log(equipment), y: Math.log(time) };
  });
  const mean = (key: "x" | "y") => figures.reduce((sum, one) => sum + one[key], 0) / figures.length;
  const [mx, my] = [mean("x"), mean("y")];
  const slope = figures.reduce((sum, one) => sum + (one.x - mx) * (one.y - my), 0) / figures.reduce((sum, one) => sum + (one.x - mx) ** 2, 0);
  console.log(`growth exponent from 50 to 2,000 equipment: ${slope.toFixed(2)} (target 1.2)`);
}

farm();
growth();
