import { z } from "zod";
import { OFFICE_STATUSES, line, type JobAnswer, type JobChange } from "@/lib/api";

const MOST_CENTS = 100_000_000_00;

/**
 * Cents of an amount in US dollars as people type it: 412.5, $1,234.50; null for nothing typed.
 * @returns the reason, as a form goes on from its label, where it is no amount
 */
export function centsOf(typed: string): { cents: number | null } | { fault: string } {
  const text = typed.trim();
  if (text === "") return { cents: null };
  const match = /^\$?\s*(\d{1,3}(?:,\d{3})+|\d+)?(?:\.(\d{1,2})?)?$/.exec(text);
  if (!match || (match[1] === undefined && match[2] === undefined)) return { fault: "takes dollars and cents, such as 412.50" };
  const cents = Number((match[1] ?? "0").replaceAll(",", "")) * 100 + Number((match[2] ?? "").padEnd(2, "0"));
  return cents <= MOST_CENTS ? { cents } : { fault: "is larger than any fee" };
}

/** An amount in cents as it is typed: 1,234.50. */
export const dollarsOf = (cents: number | null): string =>
  (cents === null ? "" : `${Math.trunc(cents / 100).toLocaleString("en-US")}.${String(cents % 100).padStart(2, "0")}`);

const amount = z.string().transform((text, context): number | null => {
  const read = centsOf(text);
  if ("cents" in read) return read.cents;
  context.addIssue({ code: "custom", message: read.fault });
  return z.NEVER;
});
const day = z.union([z.literal(""), z.iso.date("takes a date")]).transform((text) => text || null);

/** What the office notes about a job, as its form holds it. */
export const officeForm = z.object({ dueOn: day, officeStatus: z.enum(OFFICE_STATUSES), permitFeeCents: amount, permitFeePaidOn: day, permitReceipt: line(60) });
export type OfficeForm = z.input<typeof officeForm>;

export const officeFormOf = (job: Pick<JobAnswer, "dueOn" | "officeStatus" | "permitFeeCents" | "permitFeePaidOn" | "permitReceipt">): OfficeForm => ({
  dueOn: job.dueOn ?? "", officeStatus: job.officeStatus, permitFeeCents: dollarsOf(job.permitFeeCents), permitFeePaidOn: job.permitFeePaidOn ?? "", permitReceipt: job.permitReceipt,
});

/** The fields that were touched, as the server takes them; the others are left to whoever changes them at the same time. */
export const officeChange = (filled: z.output<typeof officeForm>, touched: Readonly<Partial<Record<keyof OfficeForm, unknown>>>): JobChange =>
  Object.fromEntries(Object.entries(filled).filter(([field]) => touched[field as keyof OfficeForm]));
