import type { Drawing } from "@/lib/diagram/schema";
import { cable } from "@/seeders/demo/build";
import { sectionOf, set, type RuleCase } from "../support";

/** The terminal of the inverter breaker, as somebody looked at it. */
function unmarked(d: Drawing, looked: boolean): void {
  Object.assign(d.equipment["cb-i2"]!.ports["load"]!.terminal!, { temperatureC: null, noTemperatureMark: looked });
}
const output = (d: Drawing, amperes: number): void => { set(d, "inv-2", "continuousA", amperes); d.equipment["inv-2"]!.ports["ac"]!.continuousA = amperes; };

export const cases: readonly RuleCase[] = [
  {
    name: "8 AWG at a breaker without a marking", source: "110.14(C)(1)(a): 8 AWG copper 40 A at 60 °C, 1.25 × 32.5 = 40.6 A",
    edit: (d) => { unmarked(d, true); },
    finds: ["cb-i2"],
  },
  {
    name: "the same with 32 A of output and 40 A", source: "110.14(C)(1)(a): 40 A at 60 °C",
    edit: (d) => { unmarked(d, true); output(d, 32); set(d, "cb-i2", "ratingA", 40); },
  },
  {
    name: "32 A of output on a 45 A device", source: "240.4(B): 40 A is a standard rating, no next size up",
    edit: (d) => { unmarked(d, true); output(d, 32); },
    finds: ["cb-i2"],
  },
  {
    name: "75 °C marked", source: "110.14(C)(1)(a)(3): marked for 75 °C",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.temperatureC = 75; },
  },
  {
    name: "nobody looked yet", source: "a missing marking is asked for",
    edit: (d) => { unmarked(d, false); },
    asks: ["cb-i2"],
  },
  {
    name: "a breaker above 100 A without a marking counts as 75 °C", source: "110.14(C)(1)(b): above 100 A 75 °C; 1 AWG 130 A",
    edit: (d) => { Object.assign(d.equipment["cb-l"]!.ports["load"]!.terminal!, { temperatureC: null, noTemperatureMark: true }); },
  },
  {
    name: "NM cable at 75 °C terminals", source: "334.80: ampacity of NM by the 60 °C column",
    edit: (d) => { sectionOf(d, "f3").cable = { ...cable("NM-B", 0.9), class: "power", voltageRatingV: 600 }; },
    finds: ["cb-i2", "inv-2"],
  },
];
