"use client";

import { useState } from "react";
import type { RevisionAnswer } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { calendarWords, momentWords } from "@/lib/client/dates";
import { keys, useChange } from "@/lib/client/queries";
import { previewNote } from "@/lib/code/adoption";
import { Digest } from "@/components/counter/Digest";
import { LicenseLine } from "@/components/people/LicenseLine";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { TextArea, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { RedlineMark } from "@/components/ui/RedlineMark";

/** The seal: what it does, what stands in its way, and who may set it. After sealing, its facts. */
export function SealPanel({ revision }: { revision: RevisionAnswer }) {
  return (
    <section aria-labelledby="seal" className="border border-ink bg-vellum p-5">
      <h2 id="seal" className="text-heading font-heading stretch-heading">{revision.seal && revision.state !== "sealing" ? `Rev ${revision.letter} is sealed` : `Seal Rev ${revision.letter}`}</h2>
      {revision.seal && revision.state !== "sealing" ? <Sealed revision={revision} /> : revision.state === "sealing" ? <Sealing revision={revision} /> : <Seal revision={revision} />}
    </section>
  );
}

function Sealed({ revision }: { revision: RevisionAnswer }) {
  const { seal, sealedSet } = revision;
  if (!seal) return null;
  return (
    <>
      <p className="mt-1 text-text">By {seal.licensee}, {seal.title}, license {seal.licenseNumber}, {seal.licenseState}, {momentWords(seal.sealedAt)}. License in force until {calendarWords(seal.licenseExpiresOn)}.</p>
      {revision.state === "void" && <p className="mt-2 border-l-[3px] border-red pl-3 text-text font-strong">The drawing was changed after the seal: the seal is void. What was sealed is kept as it was.</p>}
      <p className="mt-3 text-body font-medium text-ink2">Seal code</p>
      <p className="font-lettering text-heading">{seal.sealCode}</p>
      <Digest name="File digest" digest={sealedSet?.fileDigest ?? null} note="SHA-256 of the sealed file. It stands nowhere in the file." />
      <Digest name="Drawing digest" digest={revision.digest} note="SHA-256 of the drawing with rule set and edition. Printed on each sheet." />
    </>
  );
}

/** Whom the authority asks to sign, and why nobody can under an edition that was not read. */
function Asked({ revision }: { revision: RevisionAnswer }) {
  const { jurisdiction, check, sealRefusals } = revision;
  const preview = sealRefusals.some((each) => each.code === "edition-preview") ? "" : previewNote(check.edition);
  return (
    <>
      {jurisdiction && (
        <p className="mt-1 text-text text-ink2">
          {jurisdiction.signs === "licensed professional" ? `${jurisdiction.name} asks for the seal of a licensed professional.` : `${jurisdiction.name} accepts a preparer's declaration as well. Declaring is not done here yet; this set is signed by a licensee's seal.`}
        </p>
      )}
      {preview && <p className="mt-2 border-l-[3px] border-ochre pl-3 text-text">{preview}</p>}
    </>
  );
}

function Sealing({ revision }: { revision: RevisionAnswer }) {
  return <p role="status" className="mt-1 text-text">The sheets of Rev {revision.letter} are being drawn and their bytes frozen. This takes some seconds; the page goes on by itself.</p>;
}

function Seal({ revision }: { revision: RevisionAnswer }) {
  const stale = [keys.revision(revision.id), keys.job(revision.jobId), keys.jobs];
  const seal = useChange((password: string) => api.seal(revision.id, password), stale);
  const sendBack = useChange((comment: string) => api.returnRevision(revision.id, comment), stale);
  const [password, setPassword] = useState("");
  const [comment, setComment] = useState("");
  const [returning, setReturning] = useState(false);
  const clear = revision.sealRefusals.length === 0;
  const wrong = seal.error instanceof ApiProblem && seal.error.field === "password";
  return (
    <>
      <Asked revision={revision} />
      <ul className="mt-2 list-none border-t border-g1 empty:hidden">
        {revision.sealRefusals.map((refusal) => (
          <li key={refusal.code} className="flex gap-2.5 border-b border-g1 py-2 text-text"><RedlineMark kind={refusal.code.includes("data") ? "needs-data" : "must-fix"} label="blocks the seal" /><span>{refusal.detail}</span></li>
        ))}
        {/* What stands in the way is worked out for who may seal; to others it would read as cleared. */}
        {clear && revision.may.seal && <li className="border-b border-g1 py-2 text-text">Nothing stands in the way of the seal.</li>}
      </ul>
      {revision.returnedBy && <blockquote className="mt-3 border-l-[3px] border-blue pl-3 text-text"><p className="whitespace-pre-line">{revision.returnComment}</p><footer className="text-label text-ink2">Returned by {revision.returnedBy}</footer></blockquote>}
      {revision.may.seal ? (
        <form className="mt-3" onSubmit={(event) => { event.preventDefault(); seal.mutate(password); setPassword(""); }}>
          <LicenseLine className="mb-3 border-l-[3px] border-ochre pl-3" />
          <p className="mb-3 text-label text-ink2">Sealing asks for your password again, prints the drawing digest and a seal code on every sheet, freezes the bytes and stores the digest of the file apart. Seal only what is under your responsible charge.</p>
          <TextField label="Your password" type="password" autoComplete="current-password" value={password} error={wrong ? "This is not your password. Nothing was sealed." : undefined} onChange={(event) => { setPassword(event.target.value); if (wrong) seal.reset(); }} />
          {!wrong && <Refused error={seal.error} />}
          <div className="mt-3 flex flex-wrap gap-2">
            <Button type="submit" look="primary" busy={seal.isPending} disabled={!clear || password === ""}>Seal Rev {revision.letter}</Button>
            {revision.may.return && <Button onClick={() => setReturning(true)}>Return with comments</Button>}
          </div>
        </form>
      ) : (
        <div className="mt-3 flex flex-wrap items-center gap-2 text-text text-ink2">
          <p>{revision.state === "in review" ? "Waits for a licensee on this job." : `This revision is ${revision.state}.`}</p>
          {revision.may.return && <Button onClick={() => setReturning(true)}>Return with comments</Button>}
        </div>
      )}
      <Dialog open={returning} onOpenChange={setReturning} title={`Return Rev ${revision.letter}`} description="The designer sees your comment on the job and issues a corrected revision.">
        <form className="flex flex-col gap-4" onSubmit={(event) => { event.preventDefault(); sendBack.mutate(comment, { onSuccess: () => setReturning(false) }); }}>
          <TextArea label="Comment" value={comment} onChange={(event) => setComment(event.target.value)} />
          <Refused error={sendBack.error} />
          <div className="flex gap-2"><Button type="submit" look="primary" busy={sendBack.isPending} disabled={comment.trim() === ""}>Return it</Button><Button onClick={() => setReturning(false)}>Not yet</Button></div>
        </form>
      </Dialog>
    </>
  );
}
