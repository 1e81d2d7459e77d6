import type { ReactNode } from "react";
import type { JobLine } from "@/lib/api";
import { editionName } from "@/lib/code/adoption";
import { LinkButton } from "@/components/ui/Button";
import { RedlineMark, type MarkKind } from "@/components/ui/RedlineMark";
import { Caution } from "@/components/ui/Caution";
import { Due } from "./Due";
import { PlaceLine } from "./PlaceLine";
import { SheetPicture } from "./SheetPicture";
import { paths } from "./paths";

/** The chosen job: its sheet in small, what it is, and what comes next. */
export function JobPreview({ job }: { job: JobLine }) {
  return (
    <aside aria-label={job.name} className="min-h-0 overflow-y-auto pr-2 pb-4 phone:mt-4">
      <SheetPicture jobId={job.id} changedAt={job.changedAt} />
      <h2 className="mt-5 text-[25px] leading-tight font-heading stretch-heading tracking-[-0.01em] narrow:text-heading">{job.name}</h2>
      <p className="mt-1 text-finding text-ink2 narrow:text-text"><PlaceLine addressLines={job.addressLines} parcel={job.parcel} empty="No address yet" /></p>
      <dl className="mt-4 grid grid-cols-[86px_minmax(0,1fr)] border-t border-ink text-text">
        <Fact name="Code">{`${editionName(job.edition)}${job.jurisdiction ? `, ${job.jurisdiction}` : ""}`}</Fact>
        <Fact name="Permit">{job.permitNumber || "not yet"}</Fact>
        {job.dueOn && <Fact name="Due"><Due dueOn={job.dueOn} officeStatus={job.officeStatus} line /></Fact>}
        <Fact name="Licensee">{job.licensees.join(", ") || "none on the job yet"}</Fact>
        <Fact name="You are">{job.roles.join(", ")}</Fact>
      </dl>
      <Next job={job} />
      <div className="mt-4 flex flex-wrap gap-2">
        <LinkButton href={paths.drawing(job.id)} look="primary">Open E-601</LinkButton>
        <LinkButton href={paths.job(job.id)}>Job page</LinkButton>
      </div>
      <Caution compact className="mt-6" />
    </aside>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="border-b border-desk2 py-2 text-ink2">{name}</dt>
      <dd className="border-b border-desk2 py-2">{children}</dd>
    </>
  );
}

const plural = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;

function Next({ job }: { job: JobLine }) {
  const { counts, state } = job;
  const steps: { kind: MarkKind; number?: number; text: string }[] = [];
  if (state === "in review") steps.push({ kind: "note", text: `Rev ${job.revision} is with the licensee.` });
  if (state === "void") steps.push({ kind: "note", text: `The drawing was changed after Rev ${job.revision} was sealed. Issue the change, or take it back.` });
  if (counts && counts.mustFix > 0) steps.push({ kind: "must-fix", number: counts.mustFix, text: `Clear ${plural(counts.mustFix, "must-fix redline", "must-fix redlines")}, or send ${counts.mustFix === 1 ? "it" : "them"} along to review.` });
  if (counts && counts.needsData > 0) steps.push({ kind: "needs-data", number: counts.needsData, text: `Find ${plural(counts.needsData, "missing value", "missing values")}.` });
  if (counts && counts.shouldFix > 0) steps.push({ kind: "should-fix", number: counts.shouldFix, text: `Look at ${plural(counts.shouldFix, "should-fix redline", "should-fix redlines")}.` });
  if (steps.length === 0) return null;
  return (
    <section className="mt-5 border border-ink bg-vellum px-4 pt-3 pb-1">
      <h3 className="text-finding font-heading">Next</h3>
      <ol>
        {steps.map((step) => (
          <li key={step.text} className="flex items-center gap-3 border-t border-desk2 py-2 text-text first:border-t-0">
            <RedlineMark kind={step.kind} {...(step.number === undefined ? {} : { number: step.number })} />
            <span>{step.text}</span>
          </li>
        ))}
      </ol>
    </section>
  );
}
