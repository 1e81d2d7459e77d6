import Link from "next/link";
import { useEffect, useRef } from "react";
import type { JobLine } from "@/lib/api";
import { whenWords } from "@/lib/client/dates";
import { RedlineCounts } from "@/components/ui/RedlineMark";
import { StateStamp } from "@/components/ui/StateStamp";
import { Due } from "./Due";
import { paths } from "./paths";

interface JobsTableProps { jobs: readonly JobLine[]; chosenId: string | null; onChoose: (id: string) => void }

const HEAD = "h-9 border-b border-ink bg-paper px-3 text-left text-body font-medium text-ink2";

/** The register itself. The job's name is the link; a click anywhere in a line shows it beside. */
export function JobsTable({ jobs, chosenId, onChoose }: JobsTableProps) {
  return (
    <table className="w-full border-separate border-spacing-0">
      <thead className="sticky top-0 z-[1]">
        <tr>
          <th className={`${HEAD} pl-5`}>Job</th>
          <th className={HEAD}>Name and place</th>
          <th className={HEAD}>Rev</th>
          <th className={HEAD}>State</th>
          <th className={HEAD}>Open redlines</th>
          <th className={`${HEAD} narrow:hidden`}>Permit</th>
          <th className={HEAD}>Due</th>
          <th className={HEAD}>Waits for</th>
          <th className={`${HEAD} pr-5 text-right`}>Changed</th>
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
  const cell = `h-[68px] border-b border-g2 px-3 text-text whitespace-nowrap ${chosen ? "bg-tint" : "group-hover:bg-vellum"}`;
  const place = [job.place, job.jurisdiction].filter(Boolean).join(", ");
  return (
    <tr ref={row} className="group cursor-default" aria-current={chosen || undefined} onClick={() => onChoose(job.id)}>
      <td className={`${cell} pl-5 font-lettering text-[16px] ${chosen ? "[box-shadow:inset_5px_0_0_var(--copper)]" : ""}`}>{job.number}</td>
      <td className={`${cell} max-w-[360px] narrow:max-w-[250px]`}>
        <Link href={paths.job(job.id)} className="block truncate text-finding font-finding hover:underline">{job.name}</Link>
        <span className="block truncate text-body text-ink2">{place || "no address yet"}</span>
      </td>
      <td className={cell}>{job.revision ?? "–"}</td>
      <td className={cell}><StateStamp state={job.state} /></td>
      <td className={cell}>{job.counts ? <RedlineCounts counts={job.counts} /> : <span className="text-ink3">counting</span>}</td>
      <td className={`${cell} narrow:hidden`}>{job.permitNumber || <span className="text-ink3">not yet</span>}</td>
      <td className={cell}><Due dueOn={job.dueOn} officeStatus={job.officeStatus} /></td>
      <td className={`${cell} max-w-[220px] truncate ${job.waitsFor?.mine ? "font-heading" : ""}`}>{job.waitsFor?.text ?? "Nobody"}</td>
      <td className={`${cell} pr-5 text-right text-ink2`}>{whenWords(job.changedAt)}</td>
    </tr>
  );
}
