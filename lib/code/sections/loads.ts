/**
 * Section numbers of load calculations by edition. Article 220 was renumbered inside in 2023 and is reported as
 * Article 120 in 2026; none of these texts was read for this table, so every entry is marked.
 */
import { moved, type SectionEntry } from "./entry";

export const LOAD_SECTIONS: Readonly<Record<string, SectionEntry>> = {
  "load-lighting": moved("General lighting load of dwellings", ["Table 220.12", "unconfirmed"], ["220.14(J)", "unconfirmed"], ["220.41", "unconfirmed"], "Article 120"),
  "load-lighting-demand": moved("Lighting load demand factors", ["Table 220.42", "unconfirmed"], ["Table 220.42(A)", "unconfirmed"], ["Table 220.45", "unconfirmed"], "Article 120"),
  "load-small-appliance": moved("Small-appliance and laundry circuits", ["220.52", "unconfirmed"], ["220.52", "unconfirmed"], ["220.52", "unconfirmed"], "Article 120"),
  "load-appliances": moved("Fixed appliances, four or more", ["220.53", "unconfirmed"], ["220.53", "unconfirmed"], ["220.53", "unconfirmed"], "Article 120"),
  "load-dryer": moved("Electric clothes dryers", ["220.54", "unconfirmed"], ["220.54", "unconfirmed"], ["220.54", "unconfirmed"], "Article 120"),
  "load-range": moved("Ranges and cooking appliances", ["Table 220.55", "unconfirmed"], ["Table 220.55", "unconfirmed"], ["Table 220.55", "unconfirmed"], "Article 120"),
  "load-heat-or-cooling": moved("Noncoincident loads", ["220.60", "unconfirmed"], ["220.60", "unconfirmed"], ["220.60", "unconfirmed"], "Article 120"),
  "load-motor": moved("Largest motor", ["220.50", "unconfirmed"], ["220.50", "unconfirmed"], ["220.50", "unconfirmed"], "Article 120"),
  "load-neutral": moved("Feeder or service neutral load", ["220.61", "unconfirmed"], ["220.61", "unconfirmed"], ["220.61", "unconfirmed"], "Article 120"),
  "load-optional": moved("Dwelling unit, optional calculation", ["220.82", "unconfirmed"], ["220.82", "unconfirmed"], ["220.82", "unconfirmed"], "Article 120"),
  "load-existing": moved("Existing dwelling unit, additional loads", ["220.83", "unconfirmed"], ["220.83", "unconfirmed"], ["220.83", "unconfirmed"], "Article 120"),
  "load-measured": moved("Determining existing loads by measurement", ["220.87", "unconfirmed"], ["220.87", "unconfirmed"], ["220.87", "unconfirmed"], "Article 120"),
  "load-service-minimum": moved("Minimum rating of a dwelling service disconnect", ["230.79(C)", "agreed"], ["230.79(C)", "agreed"], ["230.79(C)", "agreed"]),
};
