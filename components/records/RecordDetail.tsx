import Link from "next/link";
import type { ReactNode } from "react";
import type { RecordLine } from "@/lib/api";
import { momentWords } from "@/lib/client/dates";
import { paths } from "@/components/jobs/paths";

/** One entry whole: who, when, from where, and what changed. */
export function RecordDetail({ line }: { line: RecordLine }) {
  return (
    <section className="flex min-h-0 flex-col overflow-y-auto bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)] phone:mt-3" aria-labelledby="record-heading">
      <div className="border-b-[1.5px] border-ink px-5 py-3.5">
        <h2 id="record-heading" className="text-heading font-heading stretch-heading">{line.words}</h2>
        {line.note && <p className="mt-0.5 text-text text-ink2">{line.note}</p>}
      </div>
      <dl className="border-b border-g1 px-5 py-3">
        <Fact name="Who">{line.person ? <>{line.person.name}<span className="block text-label text-ink3">{line.person.email}</span></> : "Ferrule itself: work that follows from a person's step"}</Fact>
        <Fact name="When">{momentWords(line.at)}</Fact>
        {line.job && <Fact name="Job"><Link href={paths.job(line.job.id)} className="underline underline-offset-4"><span className="font-lettering">{line.job.number}</span> {line.job.name}</Link></Fact>}
        <Fact name="From">{line.address ?? <span className="text-ink3">address not recorded</span>}{line.userAgent && <span className="block text-label break-words text-ink3">{line.userAgent}</span>}</Fact>
      </dl>
      {line.changes.length > 0 && (
        <div className="border-b border-g1 px-5 py-3">
          <h3 className="mb-2 text-body font-strong text-ink2">What changed</h3>
          <ul className="grid gap-2.5">
            {line.changes.map((change) => (
              <li key={change.field} className="min-w-0 text-text">
                <p className="text-label text-ink3 first-letter:uppercase">{change.field}</p>
                <p className="break-words"><span className="text-ink2">{change.before || "none"}</span> <span aria-label="became">→</span> <span className="font-strong">{change.after || "none"}</span></p>
              </li>
            ))}
          </ul>
        </div>
      )}
      {line.facts.length > 0 && (
        <dl className="border-b border-g1 px-5 py-3">
          {line.facts.map((fact) => <Fact key={fact.field} name={fact.field}>{fact.value}</Fact>)}
        </dl>
      )}
      <dl className="px-5 py-3">
        <Fact name="Action">{line.action}</Fact>
        <Fact name="Subject">{line.subject}</Fact>
        {line.requestId && <Fact name="Request">{line.requestId}</Fact>}
      </dl>
    </section>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[92px_minmax(0,1fr)] gap-3 py-1">
      <dt className="text-body text-ink3 first-letter:uppercase">{name}</dt>
      <dd className="text-text break-words">{children}</dd>
    </div>
  );
}
