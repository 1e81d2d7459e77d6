/**
 * Section numbers of raceways, boxes and Chapter 9 by edition.
 * Source: NFPA 70-2017 chapters 3 and 9, NFPA 70-2023 chapter 3, unofficial copies; Chapter 9 of 2020 and 2023 by transcription.
 */
import { moved, same, type SectionEntry } from "./entry";

const CHAPTER_9 = ["read", "agreed", "agreed"] as const;

export const RACEWAY_SECTIONS: Readonly<Record<string, SectionEntry>> = {
  "fill-table": same("Percent of cross section for conductors and cables", "Chapter 9 Table 1", CHAPTER_9),
  "fill-egc": same("Equipment grounding conductors count in the fill", "Chapter 9 note 3", CHAPTER_9),
  "fill-nipple": same("Conduit and tubing nipples of 24 in or less", "Chapter 9 note 4", CHAPTER_9),
  "fill-other-conductors": same("Conductors not in Chapter 9, actual dimensions", "Chapter 9 note 5", CHAPTER_9),
  "fill-rounding": same("Rounding up equal conductors from 0.8", "Chapter 9 note 7", CHAPTER_9),
  "fill-bare": same("Bare conductors by Table 8", "Chapter 9 note 8", CHAPTER_9),
  "fill-cable": same("A cable counts as one conductor, larger diameter", "Chapter 9 note 9", CHAPTER_9),
  "jam-ratio": same("Pulling conductors into raceways, jam ratio", "Chapter 9 Table 1, informational note", CHAPTER_9),
  "raceway-dimensions": same("Dimensions of conduit and tubing", "Chapter 9 Table 4", CHAPTER_9),
  "conductor-dimensions": same("Dimensions of insulated conductors", "Chapter 9 Table 5", CHAPTER_9),
  "compact-dimensions": same("Compact conductors", "Chapter 9 Table 5A", CHAPTER_9),
  "conductor-properties": same("Conductor properties", "Chapter 9 Table 8", CHAPTER_9),
  "ac-impedance": same("AC resistance and reactance", "Chapter 9 Table 9", CHAPTER_9),
  "wireway-fill": same("Metal wireway, cross-sectional areas", "376.22(A)"),
  "wireway-adjustment": same("Metal wireway, adjustment factors above 30 conductors", "376.22(B)"),
  "wireway-splice": same("Metal wireway, splices and taps", "376.56(A)", ["read", "agreed", "agreed"]),
  "wireway-deflected": same("Metal wireway, deflected insulated conductors", "376.23(A)", ["read", "agreed", "read"]),
  "wireway-pull-box": same("Metal wireway used as pull box", "376.23(B)", ["read", "agreed", "read"]),
  "nonmetallic-wireway-fill": same("Nonmetallic wireway, number of conductors", "378.22", ["unconfirmed", "unconfirmed", "unconfirmed"]),
  "pull-box-straight": same("Pull and junction boxes, straight pulls", "314.28(A)(1)", ["read", "agreed", "agreed"]),
  "pull-box-angle": same("Pull and junction boxes, angle or U pulls", "314.28(A)(2)", ["agreed", "agreed", "agreed"]),
  "box-volume": moved("Volume allowance per conductor", ["Table 314.16(B)", "read"], ["Table 314.16(B)(1)", "read"], ["Table 314.16(B)(1)", "read"]),
  "box-fill": same("Box fill calculations", "314.16(B)", ["read", "agreed", "read"]),
};
