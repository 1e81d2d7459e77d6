"use client";

import { useState } from "react";
import type { RevisionAnswer } from "@/lib/api";
import { api } from "@/lib/client/api";
import { keys, useChange } from "@/lib/client/queries";
import { editionName } from "@/lib/code/adoption";
import type { Finding } from "@/lib/rules/engine/types";
import { blocksSeal } from "@/lib/workflow";
import { Worksheet } from "@/components/diagram/redlines/worksheet";
import { Button } from "@/components/ui/Button";
import { Refused } from "@/components/ui/Notes";
import { RedlineMark, type MarkKind } from "@/components/ui/RedlineMark";

const kindOf = (finding: Finding): MarkKind => (finding.kind === "needs-data" ? "needs-data" : finding.severity === "must-fix" ? "must-fix" : finding.severity === "should-fix" ? "should-fix" : "note");

/** Open redlines of the revision, those that block the seal first, and what was accepted in writing. */
export function Redlines({ revision }: { revision: RevisionAnswer }) {
  const open = revision.check.findings.filter((finding) => !finding.accepted);
  const accepted = revision.check.findings.filter((finding) => finding.accepted);
  return (
    <section aria-labelledby="open-redlines">
      <h2 id="open-redlines" className="text-heading font-heading stretch-heading">Open redlines <span className="font-normal text-ink2">{open.length}</span></h2>
      <p className="text-label text-ink2">{revision.check.rulesRun} rules run on the server at issue, {editionName(revision.check.edition)}, rule set {revision.ruleSet}.</p>
      {open.length === 0 && <p className="mt-2 border border-ink bg-vellum p-3 text-text">Nothing is open by these rules. That is not an approval: the adopted code and the authority having jurisdiction decide.</p>}
      <ol className="mt-2 list-none">{open.map((finding, index) => <Redline key={finding.key} revision={revision} finding={finding} number={index + 1} />)}</ol>
      {accepted.length > 0 && (
        <details className="mt-2" open>
          <summary className="cursor-pointer border-b border-ink pb-1 text-text font-heading">Accepted in writing {accepted.length}</summary>
          <ul className="list-none">
            {accepted.map((finding) => (
              <li key={finding.key} className="border-b border-desk2 py-2 text-body">
                {finding.message}
                <span className="mt-0.5 block text-label text-ink2">{finding.accepted?.by}, {finding.accepted?.license}, {finding.accepted?.on}: {finding.accepted?.reason}</span>
              </li>
            ))}
          </ul>
        </details>
      )}
    </section>
  );
}

function Redline({ revision, finding, number }: { revision: RevisionAnswer; finding: Finding; number: number }) {
  const accept = useChange((reason: string) => api.acceptFinding(revision.id, finding.key, reason), [keys.revision(revision.id), keys.job(revision.jobId), keys.jobs]);
  const [reason, setReason] = useState("");
  const blocks = blocksSeal(finding);
  return (
    <li className="border-b border-desk2 py-2.5" data-rule={finding.rule} data-key={finding.key}>
      <div className="flex gap-2.5">
        <RedlineMark kind={kindOf(finding)} number={number} />
        <div className="min-w-0 flex-1">
          <p className="text-text font-strong leading-snug">{finding.message}</p>
          <p className="mt-0.5 flex justify-between gap-2 text-label text-ink2"><span>{blocks ? "Blocks the seal" : "Does not block the seal"}</span><span className="text-right">{finding.citation}</span></p>
          {(finding.steps.length > 0 || finding.folded.length > 0) && (
            <details className="mt-1">
              <summary className="cursor-pointer text-label underline decoration-1 underline-offset-4">Worked steps</summary>
              <Worksheet steps={finding.steps} />
              {finding.folded.map((folded) => <p key={folded.rule + folded.message} className="mt-1 text-label text-ink2">{folded.message} {folded.citation}</p>)}
            </details>
          )}
          {revision.may.accept && blocks && (
            <form className="mt-2" onSubmit={(event) => { event.preventDefault(); if (reason.trim()) accept.mutate(reason.trim()); }}>
              <label className="block text-label font-medium text-ink2">Accept in writing
                <textarea value={reason} onChange={(event) => setReason(event.target.value)} rows={2} maxLength={600} className="mt-1 block w-full border border-rule bg-paper p-2 text-text text-ink" placeholder="Why this may stand" />
              </label>
              <Button type="submit" size="bar" className="mt-1.5" busy={accept.isPending} disabled={reason.trim() === ""}>Accept this one</Button>
              <Refused error={accept.error} />
            </form>
          )}
        </div>
      </div>
    </li>
  );
}
