"use client";

import { useMemo } from "react";
import type { RevisionAnswer } from "@/lib/api";
import { api } from "@/lib/client/api";
import { useRevision } from "@/lib/client/queries";
import { SheetDrawing } from "@/components/jobs/SheetDrawing";
import { paperClass } from "@/components/jobs/SheetPicture";

function wordsOf(revision: RevisionAnswer) {
  const { seal } = revision;
  const signedOn = seal?.sealedAt.slice(0, 10) ?? "";
  return {
    revisions: [{ letter: revision.letter, description: revision.description || revision.purpose, date: signedOn, by: revision.issuedBy }],
    seal: seal && {
      licensee: seal.licensee, title: seal.title, state: seal.licenseState, number: seal.licenseNumber, expiresOn: seal.licenseExpiresOn, signedOn, sealCode: seal.sealCode, graphic: null, legend: "",
    },
  };
}

/** The sealed one-line in small. What counts is the file; this is for finding one's way. */
export function SealedPicture({ revisionId }: { revisionId: string }) {
  const revision = useRevision(revisionId);
  const words = useMemo(() => revision.data && wordsOf(revision.data), [revision.data]);
  return (
    <a href={api.sheetsUrl(revisionId, true)} target="_blank" rel="noreferrer" aria-label="Open the sealed file in the browser" className={paperClass}>
      {revision.data && words && <SheetDrawing drawing={revision.data.drawing} check={revision.data.check} revisions={words.revisions} seal={words.seal} />}
      {revision.isError && <span className="absolute inset-0 grid place-items-center text-text text-ink2">The picture could not be loaded</span>}
    </a>
  );
}
