/**
 * Section numbers of grounding and bonding by edition.
 * Source: NFPA 70-2017 and NFPA 70-2023 Article 250, NFPA 70-2017 and 2020 Article 690, unofficial copies.
 */
import { same, type SectionEntry } from "./entry";

export const GROUNDING_SECTIONS: Readonly<Record<string, SectionEntry>> = {
  "egc-table": same("Minimum size of equipment grounding conductors", "Table 250.122"),
  "egc-size": same("Size of equipment grounding conductors", "250.122(A)"),
  "egc-upsize": same("Equipment grounding conductor, increase in size", "250.122(B)", ["read", "agreed", "read"]),
  "egc-multiple-circuits": same("One equipment grounding conductor for several circuits", "250.122(C)"),
  "egc-parallel": same("Equipment grounding conductors in parallel", "250.122(F)"),
  "pv-egc": same("Size of equipment grounding conductors of PV circuits", "690.45", ["read", "read", "agreed"]),
  "gec-table": same("Size of the grounding electrode conductor", "Table 250.66"),
  "gec-rod": same("Connections to a rod, pipe or plate electrode", "250.66(A)", ["agreed", "agreed", "agreed"]),
  "gec-concrete": same("Connections to concrete-encased electrodes", "250.66(B)", ["agreed", "agreed", "agreed"]),
  "gec-ring": same("Connections to ground rings", "250.66(C)", ["agreed", "agreed", "agreed"]),
  "bonding-jumper-table": same("Grounded conductor and bonding jumpers", "Table 250.102(C)(1)"),
};
