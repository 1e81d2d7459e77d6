import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, set, type RuleCase } from "../support";

function single(d: Drawing, id: string, join: string | null): void { set(d, id, "poles", 1); d.equipment[id]!.props.poleJoin = join; }

export const cases: readonly RuleCase[] = [
  {
    name: "single-pole breakers on a 240 V inverter", source: "240.15(B), 705.20",
    edit: (d) => { single(d, "cb-i2", "each by itself"); },
    finds: ["cb-i2"],
  },
  {
    name: "handle ties on a 240 V inverter", source: "240.15(B): ties serve loads; the source asks for a common trip",
    edit: (d) => { single(d, "cb-i2", "identified handle ties"); },
    finds: ["cb-i2"],
  },
  {
    name: "one 2-pole breaker", source: "240.15(B)",
    edit: (d) => { set(d, "cb-i2", "poles", 2); },
  },
  {
    name: "identified handle ties on a line-to-line load", source: "240.15(B)(2): grounded 120/240 V system",
    edit: (d) => { single(d, "cb-s", "identified handle ties"); },
  },
  {
    name: "single poles without a tie on the pump", source: "240.15(B)(2)",
    edit: (d) => { single(d, "cb-s", "each by itself"); },
    finds: ["cb-s"],
  },
  {
    name: "nobody looked how the poles are joined", source: "a missing fact is asked for",
    edit: (d) => { single(d, "cb-s", null); },
    asks: ["cb-s"],
  },
  {
    name: "poles not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-s", "poles", null); },
    asks: ["cb-s"],
  },
  {
    name: "a fused switch with one pole", source: "240.15(B): all ungrounded conductors",
    edit: (d) => { Object.assign(d.equipment["ds-2"]!.props, { fused: true, fuseA: 15, poles: 1 }); },
    finds: ["ds-2"],
  },
  {
    name: "the inverter moved to a breaker whose poles are tied", source: "240.15(B), 705.20: a source asks for a common trip", moved: true,
    edit: (d) => { single(d, "cb-l", "identified handle ties"); delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["cb-l"],
  },
];
