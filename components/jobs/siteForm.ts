import { z } from "zod";
import { filledLine, line, paragraph, siteInput, type SiteInput } from "@/lib/api";
import { EDITIONS, OCCUPANCIES, type Site } from "@/lib/diagram/schema";

/** A number as typed; empty means not known. Both signs of minus are read. */
const typedNumber = (least: number, most: number) =>
  z.string().trim().transform((text, context): number | null => {
    if (text === "") return null;
    const value = Number(text.replace("−", "-").replace(/,(?=\d{3}\b)/g, ""));
    if (Number.isFinite(value) && value >= least && value <= most) return value;
    context.addIssue({ code: "custom", message: Number.isFinite(value) ? `must lie between ${least} and ${most}` : "is not a number" });
    return z.NEVER;
  });
const typedText = (max: number) => line(max).transform((text) => text || null);

export const siteForm = z.object({
  edition: z.enum(EDITIONS),
  occupancy: z.union([z.enum(OCCUPANCIES), z.literal("")]).transform((value) => value || null),
  recordLowC: typedNumber(-60, 40),
  designHighC: typedNumber(-10, 60),
  elevationM: typedNumber(-100, 5000),
  temperatureSource: typedText(160),
  utilityName: typedText(80),
  availableFaultCurrentA: typedNumber(0, 200000),
});
export type SiteForm = z.input<typeof siteForm>;
/** What the form yields is what the server takes. */
export const siteOfForm = (form: z.output<typeof siteForm>): SiteInput => siteInput.parse(form);

export const placeForm = z.object({
  number: filledLine(40), name: filledLine(120), addressLines: paragraph(240), parcel: line(60), owner: line(120),
  scope: paragraph(400), permitNumber: line(60), preparer: line(160), contractor: line(160),
});
export type PlaceForm = z.input<typeof placeForm>;

const typed = (value: number | null) => (value === null ? "" : String(value));
/** A site as the form shows it. */
export const siteFormOf = (site: Site): SiteForm => ({
  edition: site.edition, occupancy: site.occupancy ?? "", recordLowC: typed(site.recordLowC), designHighC: typed(site.designHighC),
  elevationM: typed(site.elevationM), temperatureSource: site.temperatureSource ?? "", utilityName: site.utilityName ?? "",
  availableFaultCurrentA: typed(site.availableFaultCurrentA),
});
export const EMPTY_SITE: SiteForm = {
  edition: "2023", occupancy: "", recordLowC: "", designHighC: "", elevationM: "", temperatureSource: "", utilityName: "", availableFaultCurrentA: "",
};
