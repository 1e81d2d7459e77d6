import { reroute, sectionOf, set, type RuleCase } from "../support";

type Edit = Parameters<RuleCase["edit"]>[0];
/** The exchange sensors' lead by way of the inverter's power raceways. */
const byPower = (d: Edit): void => reroute(d, "k-4", ["n-3", "ww-1", "n-1"]);
const cable = (d: Edit, change: object): void => { Object.assign(sectionOf(d, "k-4").cable!, change); };
export const cases: readonly RuleCase[] = [
  { name: "a conduit of its own", source: "725.136, section to be verified", edit: () => undefined },
  { name: "in the feeder's raceways", source: "725.136, section to be verified", moved: true, edit: byPower, finds: ["n-3"] },
  { name: "class 1, 300 V beside 240 V", source: "lead insulated for the highest voltage in the raceway", edit: (d) => { byPower(d); cable(d, { class: "class 1", voltageRatingV: 300 }); } },
  { name: "240 V is the limit", source: "240 V between lines of the service", edit: (d) => { byPower(d); cable(d, { class: "class 1", voltageRatingV: 240 }); } },
  { name: "class 1, 239 V beside 240 V", source: "239 V < 240 V", edit: (d) => { byPower(d); cable(d, { class: "class 1", voltageRatingV: 239 }); }, finds: ["n-3"] },
  { name: "class 1, 300 V beside strings of 522 V", source: "12 × 38.6 V × (1 + .0026 × 49) = 522 V", moved: true, edit: (d) => { reroute(d, "k-4", ["ww-2", "n-4"]); cable(d, { class: "class 1", voltageRatingV: 300 }); }, finds: ["ww-2"] },
  { name: "class 1, 300 V beside the battery's 58 V", source: "largest voltage of the packs 58 V", moved: true, edit: (d) => { reroute(d, "k-4", ["n-12"]); cable(d, { class: "class 1", voltageRatingV: 300 }); } },
  { name: "class not known", source: "what is not known is asked for", edit: (d) => { byPower(d); cable(d, { class: null }); }, asks: ["k-4"] },
  { name: "voltage rating not known", source: "what is not known is asked for", edit: (d) => { byPower(d); cable(d, { class: "class 1", voltageRatingV: null }); }, asks: ["k-4"] },
  { name: "nobody said which cable is the lead", source: "what is not known is asked for", edit: (d) => { d.sensors["ct-1"]!.lead = null; }, asks: ["ct-1"] },
  { name: "the lead stays inside the cabinet", source: "listed accessory inside the enclosure", edit: (d) => { for (const id of ["ct-1", "ct-2"]) Object.assign(d.sensors[id]!, { lead: null, leadLengthFt: 2 }); } },
  { name: "another data cable there is no lead", source: "the rule on Class 2 circuits speaks of it", edit: (d) => { reroute(d, "k-6", ["n-3", "ww-1", "n-1"]); } },
  { name: "in a divided wireway", source: "a fixed divider over the full length", edit: (d) => {
    reroute(d, "k-4", ["ww-1"]);
    d.raceways["ww-1"]!.compartments = { c1: { order: 0, name: "A", widthIn: 4 }, c2: { order: 1, name: "B", widthIn: 2 } };
    sectionOf(d, "k-4").route = [{ raceway: "ww-1", compartment: "c2" }]; set(d, "ds-1", "shortCircuitKA", 10);
  } },
];
