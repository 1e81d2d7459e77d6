import { type RuleCase } from "../support";

/** A single-pole branch in a space of the creamery panel, with a 120 V load. */
function branch(d: Parameters<RuleCase["edit"]>[0], space: number, currentA: number): void {
  const breaker = structuredClone(d.equipment["cb-s"]!);
  d.equipment[`b-${space}`] = { ...breaker, tag: `B-${space}`, parent: "pnl-c", spaces: [space], props: { ...breaker.props, poles: 1 } };
  const load = structuredClone(d.equipment["l-1"]!);
  d.equipment[`x-${space}`] = { ...load, tag: `X-${space}`, props: { ...load.props, currentA, phaseV: 120 } };
  const joint = structuredClone(d.circuits["j-pnl-c-bus-l-1-line"]!);
  d.circuits[`jb-${space}`] = { ...joint, to: { equipment: `b-${space}`, port: "line", offset: 0 } };
  d.circuits[`jx-${space}`] = { ...joint, from: { equipment: `b-${space}`, port: "load", offset: 0 }, to: { equipment: `x-${space}`, port: "line", offset: 0 } };
}
export const cases: readonly RuleCase[] = [
  { name: "loads between the legs alone", source: "common practice, no published source", edit: () => undefined },
  { name: "82 A and 31 A", source: "common practice, no published source", edit: (d) => { branch(d, 1, 82); branch(d, 3, 31); }, finds: ["pnl-c"] },
  { name: "58 A and 54 A", source: "common practice, no published source", edit: (d) => { branch(d, 1, 58); branch(d, 3, 54); } },
  { name: "20 % apart", source: "common practice, no published source", edit: (d) => { branch(d, 1, 50); branch(d, 3, 40); } },
  { name: "a little more than 20 % apart", source: "common practice, no published source", edit: (d) => { branch(d, 1, 50); branch(d, 3, 39.9); }, finds: ["pnl-c"] },
  { name: "the heavy one moved to the other leg", source: "common practice, no published source", moved: true, edit: (d) => { branch(d, 1, 30); branch(d, 3, 30); branch(d, 5, 25); branch(d, 2, 25); d.equipment["b-2"]!.spaces = [4]; } },
  { name: "the same two on one leg", source: "common practice, no published source", moved: true, edit: (d) => { branch(d, 1, 30); branch(d, 2, 30); }, finds: ["pnl-c"] },
];
