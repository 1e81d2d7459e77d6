import "server-only";
import { EXPORT_ROWS, type RecordLine, type RecordsFilter } from "@/lib/api";
import { guardedCell } from "@/lib/equipment/libraryTable";
import { writeTable } from "@/lib/server/http/table";
import { companyAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { inTransaction } from "./database";
import { readRecords, type RecordPlace } from "./records";

const HEADINGS = [
  "Time (UTC)", "Person", "Mail address", "Action", "What happened", "Job", "Job name", "Subject", "Before", "After", "Details", "From address", "Program", "Request",
];
/** Rows fetched at a time. */
const PAGE = 1000;

const cells = (line: RecordLine): string[] => [
  line.at, line.person?.name ?? "Ferrule itself", line.person?.email ?? "", line.action, line.note === null ? line.words : `${line.words}: ${line.note}`, line.job?.number ?? "", line.job?.name ?? "", line.subject,
  line.changes.map((each) => `${each.field}: ${each.before || "none"}`).join("\n"), line.changes.map((each) => `${each.field}: ${each.after || "none"}`).join("\n"),
  line.facts.map((each) => `${each.field}: ${each.value}`).join("\n"), line.address ?? "", line.userAgent ?? "", line.requestId ?? "",
].map(guardedCell);

/**
 * The entries that fit as a CSV file, newest first, written while it is read, so that its size needs no memory. At most `most` rows; a last
 * row says when there are more. Taking it is itself an entry.
 */
export async function exportRecords(actor: Actor, companyId: string, filter: RecordsFilter, most = EXPORT_ROWS): Promise<ReadableStream<Uint8Array>> {
  await inTransaction(async (transaction) => {
    await companyAccess(actor, companyId, "audit.view", transaction);
    await audit(transaction, actor, { action: "records.export", subject: `companies/${companyId}`, companyId, detail: Object.fromEntries(Object.entries(filter).filter(([, value]) => value)) });
  });
  const encoder = new TextEncoder();
  // A byte order mark stands at the beginning of the file alone.
  const text = (rows: readonly (readonly string[])[]) => encoder.encode(writeTable(rows).slice(1));
  let place: RecordPlace | null = null;
  let written = 0;
  return new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(writeTable([HEADINGS]))),
    async pull(controller) {
      const left = most - written;
      const { records, last } = await readRecords(companyId, filter, Math.min(PAGE, left + 1), place);
      const fits = records.slice(0, left);
      if (fits.length > 0) controller.enqueue(text(fits.map(cells)));
      if (records.length > left) controller.enqueue(text([[`More than ${most} entries fit. The older ones are left out: choose fewer days.`]]));
      written += fits.length;
      place = last;
      if (records.length > left || records.length < Math.min(PAGE, left + 1)) controller.close();
    },
  });
}
