import { home, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no dwelling", source: "445.19(C): one- and two-family dwellings", edit: () => undefined },
  { name: "no stop outside", source: "445.19(C)", edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", false); }, finds: ["g-1"] },
  { name: "a stop on the enclosure", source: "445.19(C), 2023: the outside of the enclosure", edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", true); } },
  { name: "a switch outside, wired to the set", source: "445.19(C)", moved: true, edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", false); set(d, "esd-1", "purpose", "generator stop"); d.circuits["k-9"]!.to = { equipment: "g-1", port: "data", offset: 0 }; } },
  { name: "the same switch wired to an inverter", source: "445.19(C)", moved: true, edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", false); set(d, "esd-1", "purpose", "generator stop"); }, finds: ["g-1"] },
  { name: "edition 2017", source: "445.18 of 2017 has no dwelling rule", edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", false); d.site.edition = "2017"; } },
  { name: "a portable set", source: "cord and plug", edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", false); set(d, "g-1", "use", "portable"); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { home(d); set(d, "g-1", "stopOnEnclosure", null); }, asks: ["g-1"] },
];
