"use client";

import type { CounterAnswer, CounterRevision } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { calendarWords, dateWords, momentWords, sizeWords } from "@/lib/client/dates";
import { useCounterJob } from "@/lib/client/queries";
import { PlaceLine } from "@/components/jobs/PlaceLine";
import { Caution } from "@/components/ui/Caution";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { CounterBar } from "./CounterBar";
import { Digest } from "./Digest";
import { SealedPicture } from "./SealedPicture";
import { SealState } from "./SealState";

/** One job at the counter: is there a sealed set, is it the current one, and the file itself. */
export function CounterJob({ jobId }: { jobId: string }) {
  const job = useCounterJob(jobId);
  const missing = job.error instanceof ApiProblem && job.error.status === 404;
  return (
    <div className="min-h-full bg-panel">
      <CounterBar place={job.data?.jurisdiction ?? null} />
      <main className="mx-auto max-w-[1520px] px-10 py-9 phone:px-4">
        {job.isPending && <Skeleton lines={4} />}
        {job.isError && <ErrorNote error={job.error} {...(missing ? { title: "There is no such permit" } : { onRetry: () => void job.refetch() })} />}
        {job.data && <Permit job={job.data} />}
      </main>
    </div>
  );
}

function Permit({ job }: { job: CounterAnswer }) {
  const [current] = job.revisions.filter((each) => each.state !== "superseded");
  const earlier = job.revisions.filter((each) => each.id !== current?.id);
  return (
    <div className="grid grid-cols-[minmax(0,512px)_minmax(0,1fr)] gap-12 narrow:grid-cols-[minmax(0,420px)_minmax(0,1fr)] narrow:gap-8 phone:grid-cols-1">
      <div>
        <p className="text-finding font-strong text-ink2">{job.permitNumber || `Job ${job.number}`}</p>
        <h1 className="text-counter font-heading stretch-heading tracking-[-0.015em] narrow:text-[34px]">{job.name}</h1>
        <p className="mt-1 text-finding text-ink2"><PlaceLine addressLines={job.addressLines} parcel={job.parcel} /></p>
        {current ? (
          <>
            <SealState revision={current} replaced={earlier[0] ?? null} />
            <a href={api.sheetsUrl(current.id)} className={`mt-6 block border border-ink px-6 py-4 ${current.state === "void" ? "bg-vellum hover:bg-paper" : "bg-ink text-onink hover:bg-ink2"}`}>
              <span className="block text-[20px] font-heading">{current.state === "void" ? "Download what was sealed" : "Download the sealed set"}</span>
              <span className="text-text">{[current.sheetSet.sheets && `${current.sheetSet.sheets} ${current.sheetSet.sheets === 1 ? "sheet" : "sheets"}`, "one PDF", current.sheetSet.bytes && sizeWords(current.sheetSet.bytes)].filter(Boolean).join(", ")}</span>
            </a>
            <Caution className="mt-7" />
          </>
        ) : (
          <div className="mt-6 border-y border-ink">
            <EmptyNote title="Nothing sealed yet">The office has not sealed a set for this job. It appears here as soon as it is.</EmptyNote>
            <Caution compact className="mb-5" />
          </div>
        )}
      </div>
      <div>
        {current && <SealedPicture revisionId={current.id} />}
        {current && <Facts revision={current} />}
        {earlier.length > 0 && <Earlier revisions={earlier} />}
      </div>
    </div>
  );
}

function Facts({ revision }: { revision: CounterRevision }) {
  const { seal, counts } = revision;
  const rows: [string, string][] = [
    ["Sealed by", `${seal.licensee}, ${seal.title}`],
    ["License", `${seal.licenseNumber}, ${seal.licenseState}, in force until ${calendarWords(seal.licenseExpiresOn)}`],
    ["Seal code", seal.sealCode],
    ["Purpose", revision.purpose],
    ["Code", `NEC ${revision.edition}`],
    ["Checked", `${revision.rulesRun} rules run. Open: must-fix ${counts.mustFix}, needs data ${counts.needsData}. Accepted in writing: ${counts.accepted}`],
  ];
  return (
    <section className="mt-8 border border-ink bg-vellum p-6">
      <h2 className="border-b border-ink pb-3 text-heading font-heading stretch-heading">What was sealed</h2>
      <dl className="grid grid-cols-2 gap-x-8 text-text narrow:grid-cols-1">
        {rows.map(([name, value]) => (
          <div key={name} className="grid grid-cols-[104px_minmax(0,1fr)] border-b border-desk2 py-2"><dt className="text-ink2">{name}</dt><dd>{value}</dd></div>
        ))}
      </dl>
      <div className="grid grid-cols-2 gap-x-8 narrow:grid-cols-1">
        <Digest name="File digest" digest={revision.sheetSet.fileDigest} note="SHA-256 of the file you download. It stands nowhere in the file." />
        <Digest name="Drawing digest" digest={revision.drawingDigest} note={`SHA-256 of the drawing with rule set ${revision.ruleSet}. This one is printed on each sheet.`} />
      </div>
    </section>
  );
}

function Earlier({ revisions }: { revisions: readonly CounterRevision[] }) {
  return (
    <section className="mt-7">
      <h2 className="text-finding font-heading">Earlier sets</h2>
      <ul className="mt-2 border-t border-ink">
        {revisions.map((each) => (
          <li key={each.id} className="flex items-center justify-between gap-3 border-b border-desk2 py-2.5 text-text">
            <span>Rev {each.letter}, sealed {dateWords(each.seal.sealedAt)}, superseded {each.supersededAt ? momentWords(each.supersededAt) : ""}</span>
            <a href={api.sheetsUrl(each.id)} className="underline decoration-1 underline-offset-4 hover:decoration-2">Download</a>
          </li>
        ))}
      </ul>
    </section>
  );
}
