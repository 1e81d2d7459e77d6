import Link from "next/link";
import { useEffect, useRef } from "react";
import type { JobLine } from "@/lib/api";
import { whenWords } from "@/lib/client/dates";
import { RedlineCounts } from "@/components/ui/RedlineMark";
import { StateStamp } from "@/components/ui/StateStamp";
import { Due } from "./Due";
import { paths } from "./paths";

interface JobsTableProps { jobs: readonly JobLine[]; chosenId: string | null; onChoose: (id: string) => void }

const HEAD = "h-9 border-b border-ink bg-paper px-3 text-left text-body font-medium text-ink2 narrow:px-2";

/** The register itself. The job's name is the link; a click anywhere in a line shows it beside. */
export function JobsTable({ jobs, chosenId, onChoose }: JobsTableProps) {
  return (
    <table className="w-full min-w-[840px] table-fixed border-separate border-spacing-0">
      <thead className="sticky top-0 z-[1]">
        <tr>
          <th className={`${HEAD} w-[130px] pl-5 narrow:w-[124px] narrow:pl-5`}>Job and permit</th>
          <th className={HEAD}>Name and place</th>
          <th className={`${HEAD} w-[50px] narrow:w-[42px]`}>Rev</th>
          <th className={`${HEAD} w-[114px] narrow:w-[102px]`}>State</th>
          <th className={`${HEAD} w-[118px] narrow:w-[104px]`}>Open redlines</th>
          <th className={`${HEAD} w-[112px] narrow:w-[98px]`}>Due</th>
          <th className={`${HEAD} w-[164px] narrow:w-[142px]`}>Waits for</th>
          <th className={`${HEAD} w-[130px] pr-5 text-right narrow:w-[124px] narrow:pr-4`}>Changed</th>
        </tr>
      </thead>
      <tbody>{jobs.map((job) => <JobRow key={job.id} job={job} chosen={job.id === chosenId} onChoose={onChoose} />)}</tbody>
    </table>
  );
}

function JobRow({ job, chosen, onChoose }: { job: JobLine; chosen: boolean; onChoose: (id: string) => void }) {
  const row = useRef<HTMLTableRowElement>(null);
  useEffect(() => {
    if (chosen) row.current?.scrollIntoView({ block: "nearest" });
  }, [chosen]);
  const cell = `h-[68px] border-b border-g2 px-3 text-text whitespace-nowrap narrow:px-2 ${chosen ? "bg-tint" : "group-hover:bg-vellum"}`;
  const place = [job.place, job.jurisdiction].filter(Boolean).join(", ") || "no address yet";
  return (
    <tr ref={row} className="group cursor-default" aria-current={chosen || undefined} onClick={() => onChoose(job.id)}>
      <td className={`${cell} pl-5 narrow:pl-5 ${chosen ? "[box-shadow:inset_5px_0_0_var(--copper)]" : ""}`}>
        <span title={job.number} className="block truncate font-lettering text-[16px]">{job.number}</span>
        {job.permitNumber && <span title={`Permit ${job.permitNumber}`} className="block truncate text-body text-ink2">{job.permitNumber}</span>}
      </td>
      <td className={cell}>
        <Link href={paths.job(job.id)} title={job.name} className="block truncate text-finding font-finding hover:underline">{job.name}</Link>
        <span title={place} className="block truncate text-body text-ink2">{place}</span>
      </td>
      <td className={cell}>{job.revision ?? "–"}</td>
      <td className={cell}><StateStamp state={job.state} /></td>
      <td className={cell}>{job.counts ? <RedlineCounts counts={job.counts} /> : <span className="text-ink3">counting</span>}</td>
      <td className={cell}><Due dueOn={job.dueOn} officeStatus={job.officeStatus} /></td>
      <td title={job.waitsFor?.text} className={`${cell} truncate ${job.waitsFor?.mine ? "font-heading" : ""}`}>{job.waitsFor?.text ?? "Nobody"}</td>
      <td className={`${cell} pr-5 text-right text-ink2 narrow:pr-4`}>{whenWords(job.changedAt)}</td>
    </tr>
  );
}
