import { direct, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "a lockable breaker on the set", source: "445.18(A)", edit: () => undefined },
  { name: "it does not lock", source: "445.18(A)", edit: (d) => { set(d, "cb-gs", "lockable", false); }, finds: ["g-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "cb-gs", "lockable", null); }, asks: ["cb-gs"] },
  { name: "wired straight to the transfer switch", source: "445.18(A)", moved: true, edit: (d) => { direct(d); set(d, "qh", "lockable", false); }, finds: ["gen"] },
  { name: "a portable set", source: "445.18: cord and plug", edit: (d) => { set(d, "cb-gs", "lockable", false); set(d, "g-1", "use", "portable"); } },
];
