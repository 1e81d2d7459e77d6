import { circuitOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "60 °C terminal on 8 AWG at 45 A", source: "110.14(C): 8 AWG 40 A at 60 °C, 40.6 A required",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.temperatureC = 60; },
    finds: ["cb-i2"],
  },
  {
    name: "75 °C terminals", source: "110.14(C): 50 A",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.temperatureC = 75; },
  },
  {
    name: "terminal of the 45 A breaker not marked", source: "110.14(C)(1)(a): up to 100 A an unmarked terminal counts 60 °C, so the marking is asked for",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.temperatureC = null; },
    asks: ["cb-i2"],
  },
  {
    name: "circuit moved to a breaker with 60 °C terminals", source: "110.14(C): 8 AWG 40 A at 60 °C", moved: true,
    edit: (d) => { d.equipment["cb-g"]!.ports["load"]!.terminal!.temperatureC = 60; delete d.circuits["f5"]; circuitOf(d, "f3").to = { equipment: "cb-g", port: "load", offset: 0 }; },
    finds: ["cb-g"],
  },
];
