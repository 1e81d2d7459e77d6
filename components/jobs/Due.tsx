import type { OfficeStatus } from "@/lib/api";
import { daysUntil, shortCalendarWords } from "@/lib/client/dates";

interface DueProps { dueOn: string | null; officeStatus: OfficeStatus }

const days = (count: number): string => `${count} ${count === 1 ? "day" : "days"}`;

/** How far off a day is, where that is worth a word: late, today, or within two weeks. */
export function dueWords(daysLeft: number): string | null {
  if (daysLeft < 0) return `${days(-daysLeft)} late`;
  if (daysLeft === 0) return "due today";
  return daysLeft <= 14 ? `in ${days(daysLeft)}` : null;
}

/** The day a job is due, in words too where it is near or past; a closed job is due no more. */
export function Due({ dueOn, officeStatus, line = false }: DueProps & { line?: boolean }) {
  if (officeStatus === "closed") return <span className="text-ink2">closed</span>;
  const hold = officeStatus === "on hold";
  if (dueOn === null) return <span className={hold ? "text-ink2" : "text-ink3"}>{hold ? "on hold" : line ? "no due date" : "–"}</span>;
  const left = daysUntil(dueOn);
  const words = [dueWords(left), hold ? "on hold" : null].filter(Boolean).join(", ");
  return (
    <>
      <span className={left < 0 ? "font-heading text-ochre" : ""}>{shortCalendarWords(dueOn)}</span>
      {words && <span className={`${line ? "ml-2" : "block text-body"} ${left < 0 ? "font-strong text-ochre" : "text-ink2"}`}>{words}</span>}
    </>
  );
}
