import { circuitOf, resize, sectionOf, set, type RuleCase } from "../support";

// Currents of the farm system: 10,400 A at the service, 9,601 A at the switch, 6,350 A at the cabinet, 4,873 A and 3,074 A at the panels,
// worked out by the point-to-point method with the resistances of Chapter 9 Table 9; two inverters add 60 A each.
export const cases: readonly RuleCase[] = [
  {
    name: "10 kA on the bus at the service", source: "110.9: 10,400 + 120 A",
    edit: (d) => { set(d, "cb-f1", "interruptingKA", 10); },
    finds: ["cb-f1"],
  },
  {
    name: "all devices of one panel are one finding", source: "one fault, one finding",
    edit: (d) => { for (const id of ["cb-f1", "cb-m", "cb-n", "cb-s"]) set(d, id, "interruptingKA", 10); },
    finds: ["cb-f1"],
  },
  {
    name: "10.52 kA is the limit at the service", source: "10,400 A + 2 × 60 A = 10,520 A",
    edit: (d) => { for (const id of ["cb-f1", "cb-m"]) set(d, id, "interruptingKA", 10.52); },
  },
  {
    name: "one ampere below it", source: "10,519 A < 10,520 A",
    edit: (d) => { set(d, "cb-m", "interruptingKA", 10.519); },
    finds: ["cb-m"],
  },
  {
    name: "6.47 kA holds at the cabinet", source: "240 V / (240/10,400 + 2 × 46 ft × .16/1000 Ω) = 6,350 A, + 120 A",
    edit: (d) => { set(d, "cb-l", "interruptingKA", 6.47); },
  },
  {
    name: "6.46 kA does not", source: "6,470 A",
    edit: (d) => { set(d, "cb-l", "interruptingKA", 6.46); },
    finds: ["cb-l"],
  },
  {
    name: "a feeder half as long", source: "240 V / (240/10,400 + 2 × 23 ft × .16/1000 Ω) = 7,886 A, + 120 A", moved: true,
    edit: (d) => { set(d, "cb-l", "interruptingKA", 7.9); sectionOf(d, "f1b").lengthFt = 17; },
    finds: ["cb-l"],
  },
  {
    name: "two sets of conductors bring twice the copper", source: "half the resistance of each stretch: 7,886 A, + 120 A",
    edit: (d) => { set(d, "cb-l", "interruptingKA", 7.9); for (const id of ["f1a", "f1b"]) sectionOf(d, id).parallelSets = 2; },
    finds: ["cb-l"],
  },
  {
    name: "the barn panel moved onto the conductors of the pump", source: "12 AWG weakens more than 3 AWG: 971 A", moved: true,
    edit: (d) => {
      set(d, "cb-nm", "interruptingKA", 2);
      circuitOf(d, "p1b").to = { equipment: "cb-nm", port: "line", offset: 0 }; delete d.circuits["n1"];
    },
  },
  {
    name: "2 kA at the barn", source: "240/10,400 + 2 × 110 ft × .25/1000 Ω: 3,074 A, + 120 A",
    edit: (d) => { set(d, "cb-nm", "interruptingKA", 2); },
    finds: ["cb-nm"],
  },
  {
    name: "the set's breaker stands behind the slide: no utility current reaches it", source: "interlocked sources are never in parallel",
    edit: (d) => { set(d, "cb-gs", "interruptingKA", 1); },
  },
  {
    name: "without the slide its branch still is the set's alone", source: "a joint of sources is a fault of its own",
    edit: (d) => { set(d, "cb-gs", "interruptingKA", 1); delete d.interlocks["il-1"]; },
  },
  {
    name: "what the set gives itself", source: "480 A of the set + 2 × 60 A",
    edit: (d) => { set(d, "cb-gs", "interruptingKA", 0.5); },
    finds: ["cb-gs"],
  },
  {
    name: "a series rating is stated", source: "240.86: judged by its own rule",
    edit: (d) => { set(d, "cb-n", "interruptingKA", 10); Object.assign(d.equipment["cb-n"]!.props, { seriesKA: 22, seriesWith: "LK", seriesMarked: true }); },
  },
  {
    name: "a series rating below the current helps nothing", source: "240.86",
    edit: (d) => { set(d, "cb-n", "interruptingKA", 10); Object.assign(d.equipment["cb-n"]!.props, { seriesKA: 10.4, seriesWith: "LK", seriesMarked: true }); },
    finds: ["cb-n"],
  },
  {
    name: "the rating is not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-l", "interruptingKA", null); },
    asks: ["cb-l"],
  },
  {
    name: "nobody said what the utility gives", source: "the service current is asked for",
    edit: (d) => { set(d, "util", "availableFaultCurrentA", null); d.site.availableFaultCurrentA = null; },
    asks: ["util"],
  },
  {
    name: "stated for the site alone", source: "either place will do",
    edit: (d) => { set(d, "util", "availableFaultCurrentA", null); },
  },
  {
    name: "a length is missing and the rating holds even without the feeder", source: "10,520 A ≤ 22 kA",
    edit: (d) => { sectionOf(d, "f1b").lengthFt = null; for (const id of ["cb-g", "cb-i1", "cb-i2", "cb-l", "cb-u"]) set(d, id, "interruptingKA", 22); },
  },
  {
    name: "a length is missing and matters", source: "10,521 A upper bound, 9,601 A at the switch",
    edit: (d) => { sectionOf(d, "f1b").lengthFt = null; set(d, "cb-l", "interruptingKA", 5); },
    asks: ["f1b"],
  },
  {
    name: "an inverter's share is not stated", source: "110.9: all sources",
    edit: (d) => { set(d, "inv-1", "faultA", null); },
    asks: ["inv-1"],
  },
  {
    name: "the conductors of the service do not weaken what is stated at the service", source: "the letter states it at the meter-main",
    edit: (d) => { set(d, "cb-m", "interruptingKA", 10.5); sectionOf(d, "svc").lengthFt = 400; },
    finds: ["cb-m"],
  },
  {
    name: "two conductors of a three-phase service", source: "120.1 V / (120.1/10,400 + 46 ft × .16/1000) Ω = 6,352 A; between two lines × √3/2 = 5,501 A, + 120 A",
    edit: (d) => { set(d, "util", "systemVoltage", "120/208 V 3-ph 4-W"); for (const id of ["cb-l", "cb-g"]) set(d, id, "interruptingKA", 5.63); },
  },
  {
    name: "below that", source: "5,501 A + 120 A = 5,621 A",
    edit: (d) => { set(d, "util", "systemVoltage", "120/208 V 3-ph 4-W"); set(d, "cb-l", "interruptingKA", 5.62); },
    finds: ["cb-l"],
  },
  {
    name: "a small conductor ahead of the cabinet", source: "6 AWG, .49 Ω/kft in steel: 240 V / (.02308 + 2 × 46 × .49/1000) Ω = 3,522 A",
    edit: (d) => { for (const id of ["f1a", "f1b"]) resize(d, id, "6 AWG"); for (const id of ["cb-l", "cb-g"]) set(d, id, "interruptingKA", 3.65); },
  },
];
