"use client";

import { visitSaveWords } from "@/lib/client/visitKeeper";
import { Button } from "@/components/ui/Button";
import { useVisitForm } from "./visitContext";

const LOOK: Readonly<Record<string, string>> = { saved: "border-ink text-ink", new: "border-rule border-dashed text-ink2", conflict: "border-red border-2 text-red", failed: "border-ochre border-2 text-ink" };

/** Save state in words, always in sight. */
export function SaveStamp() {
  const { state, photos } = useVisitForm();
  const words = visitSaveWords(state.save, photos.filter((each) => each.state !== "refused").length);
  return <p role="status" aria-live="polite" className={`max-w-[46vw] border bg-paper px-3 py-1.5 text-body leading-tight font-strong ${LOOK[state.save.kind] ?? "border-ink border-dashed text-ink"}`}>{words}</p>;
}

/** What keeps a visit from being saved, and what to do about it. */
export function SaveTrouble({ onFlush, onSettle }: { onFlush: () => void; onSettle: (prefer: "mine" | "theirs") => void }) {
  const { state: { save, kept, typed } } = useVisitForm();
  const unread = Object.keys(typed).length;
  return (
    <>
      {save.kind === "conflict" && (
        <Strip tone="red">
          <p className="font-heading">{save.theirs.updatedBy || "Somebody"} changed this visit too: {save.parts.join(", ").toLowerCase()}.</p>
          <p className="text-ink2">Everything else was put together. Where both of you wrote, choose whose stays.</p>
          <div className="mt-2 flex flex-wrap gap-2"><Button className="!h-target" onClick={() => onSettle("mine")}>Keep what I wrote</Button><Button className="!h-target" onClick={() => onSettle("theirs")}>Take what they wrote</Button></div>
        </Strip>
      )}
      {save.kind === "failed" && (
        <Strip tone="ochre">
          <p className="font-heading">Not saved yet. What you wrote is kept {kept ? "on this device" : "on this page"}.</p>
          <p className="text-ink2">{save.detail}{save.requestId && <span className="block text-label text-ink3">Request {save.requestId}</span>}</p>
          <Button className="mt-2 !h-target" onClick={onFlush}>Try again</Button>
        </Strip>
      )}
      {!kept && <Strip tone="ochre"><p>This device does not keep what is not sent. Stay on this page until it says that all is saved.</p></Strip>}
      {unread > 0 && <Strip tone="ochre"><p>{unread === 1 ? "One entry" : `${unread} entries`} could not be read and {unread === 1 ? "is" : "are"} kept on this device alone. Look for the red {unread === 1 ? "field" : "fields"}.</p></Strip>}
    </>
  );
}

function Strip({ tone, children }: { tone: "red" | "ochre"; children: React.ReactNode }) {
  return <div role="alert" className={`mb-4 border-l-[3px] bg-paper p-4 text-finding ${tone === "red" ? "border-red" : "border-ochre"}`}>{children}</div>;
}
