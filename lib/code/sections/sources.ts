/**
 * Section numbers of photovoltaic systems, interconnection, storage and generators by edition.
 * Source: NFPA 70-2017 Articles 690, 705, 706; NFPA 70-2020 Article 690 through the California Electrical Code 2022
 * (unofficial copies); 705 and 706 of 2020 and everything of 2023 from secondary pages.
 */
import { moved, otherBook, same, type SectionEntry } from "./entry";

const READ_690 = ["read", "read", "agreed"] as const;

export const SOURCE_SECTIONS: Readonly<Record<string, SectionEntry>> = {
  "pv-building-voltage": same("Maximum voltage of PV circuits", "690.7", READ_690),
  "pv-voltage": same("Photovoltaic source circuit voltage", "690.7(A)", READ_690),
  "pv-voltage-table": same("Voltage correction factors", "Table 690.7(A)", READ_690),
  "pv-maximum-current": moved("PV source circuit current", ["690.8(A)(1)(1)", "read"], ["690.8(A)(1)(a)(1)", "read"], ["690.8(A)(1)(a)(1)", "agreed"]),
  "pv-converter-output": moved("DC-to-dc converter output current", ["690.8(A)(5)", "read"], ["690.8(A)(1)(c)", "read"], ["690.8(A)(1)(c)", "agreed"]),
  "pv-converter-input": moved("Rated input current of the power converter", null, ["690.8(A)(2)", "read"], ["690.8(A)(2)", "agreed"]),
  "inverter-output-current": moved("Inverter output circuit current", ["690.8(A)(3)", "read"], ["690.8(A)(1)(e)", "read"], ["690.8(A)(1)(e)", "agreed"]),
  "pv-conductor-125": same("Conductor ampacity before correction and adjustment", "690.8(B)(1)", READ_690),
  "pv-conductor-corrected": same("Conductor ampacity after correction and adjustment", "690.8(B)(2)", READ_690),
  "pv-ocpd": same("Overcurrent device ratings of PV circuits", "690.9(B)", READ_690),
  "pv-ocpd-needed": same("Circuits where overcurrent protection is not required", "690.9(A)", READ_690),
  "pv-wire-correction": moved("Correction factors of 105 °C and 125 °C conductors", ["Table 690.31(A)", "unconfirmed"], ["Table 690.31(A)(a)", "read"], ["Table 690.31(A)(a)", "unconfirmed"]),
  "pv-wire-ampacity": moved("Ampacities of 105 °C and 125 °C conductors", ["690.31(A)", "unconfirmed"], ["Table 690.31(A)(b)", "read"], ["Table 690.31(A)(b)", "unconfirmed"]),
  "source-conductor-125": moved("Interconnected source conductors, before correction and adjustment", ["705.60(B)", "read"], ["705.28(B)(1)", "agreed"], ["705.28(B)(1)", "agreed"]),
  "source-conductor-corrected": moved("Interconnected source conductors, after correction and adjustment", ["705.60(B)", "read"], ["705.28(B)(2)", "agreed"], ["705.28(B)(2)", "agreed"]),
  "source-ocpd": moved("Overcurrent device of an interconnected source", ["705.60(B)", "read"], ["705.30(B)", "unconfirmed"], ["705.30(B)", "unconfirmed"]),
  "busbar-sum": moved("Busbar: 125 percent of the sources plus the device protecting the busbar", ["705.12(B)(2)(3)(a)", "read"], ["705.12(B)(3)(1)", "agreed"], ["705.12(B)(1)", "agreed"]),
  "busbar-opposite-ends": moved("Busbar: 120 percent with two sources at opposite ends", ["705.12(B)(2)(3)(b)", "read"], ["705.12(B)(3)(2)", "agreed"], ["705.12(B)(2)", "agreed"]),
  "busbar-all-devices": moved("Busbar: sum of all devices but the one protecting the busbar", ["705.12(B)(2)(3)(c)", "read"], ["705.12(B)(3)(3)", "agreed"], ["705.12(B)(3)", "agreed"]),
  "busbar-center-fed": moved("Busbar: center-fed panelboard in a dwelling", ["705.12(B)(2)(3)(d)", "read"], ["705.12(B)(3)(4)", "agreed"], ["705.12(B)(4)", "agreed"]),
  "busbar-feed-through": moved("Busbar: feed-through conductors", null, ["705.12(B)(3)(5)", "unconfirmed"], ["705.12(B)(5)", "unconfirmed"]),
  "busbar-engineered": moved("Busbar: engineering supervision", ["705.12(B)(2)(3)(e)", "read"], ["705.12(B)(3)(6)", "agreed"], ["705.12(B)(6)", "agreed"]),
  "power-control": moved("Power control system", null, ["705.13", "agreed"], ["705.13", "agreed"], "Article 130"),
  "feeder-with-source": moved("Feeder with a source connection", ["705.12(B)(2)(1)", "read"], ["705.12(B)(1)", "agreed"], ["705.12(A)(2)", "agreed"]),
  "tap-with-source": moved("Feeder tap with a source connection", ["705.12(B)(2)(2)", "read"], ["705.12(B)(2)", "agreed"], ["705.12(A)(3)", "agreed"]),
  "supply-side": moved("Supply-side source connection", ["705.12(A)", "read"], ["705.11", "agreed"], ["705.11", "agreed"]),
  "supply-side-distance": moved("Supply-side overcurrent protection, distance", ["705.31", "read"], ["705.11(C)", "unconfirmed"], null, "705.11(C)"),
  "ess-current": moved("Maximum current of an energy storage system", ["706.20(A)", "read"], ["706.30(A)", "agreed"], ["706.30(A)", "agreed"]),
  "ess-conductor": moved("Conductor ampacity of an energy storage system", ["706.20(B)", "read"], ["706.30(B)", "agreed"], ["706.30(B)", "agreed"]),
  "ess-ocpd": moved("Overcurrent device of an energy storage system", ["706.21(B)", "read"], ["706.31(B)", "agreed"], ["706.31(B)", "agreed"]),
  "ess-limits": otherBook("IRC", "2021", "Energy storage systems, locations and limits", "R328", "unconfirmed"),
  "ess-limits-855": otherBook("NFPA 855", "2023", "One- and two-family dwellings, energy limits", "15.5.2", "unconfirmed"),
};
