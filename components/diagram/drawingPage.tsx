"use client";
import { useEffect, useState } from "react";
import type { DrawingAnswer } from "@/lib/api";
import { api, ApiProblem } from "@/lib/client/api";
import type { Draft } from "@/lib/client/autosave";
import { recover } from "@/lib/client/openDrawing";
import { DrawingTrouble } from "./chrome/drawingTrouble";
import { OpeningSheet } from "./chrome/openingSheet";
import { Editor } from "./editor";

type Loaded = { kind: "opening" } | { kind: "open"; answer: DrawingAnswer; draft: Draft | null; people: readonly string[] } | { kind: "trouble"; title: string; detail: string; requestId: string | null };

/** Reads the drawing of a job with what this device keeps of it, and opens the editor. */
export function DrawingPage({ jobId }: { jobId: string }) {
  const [state, setState] = useState<Loaded>({ kind: "opening" });
  const [turn, setTurn] = useState(0);
  useEffect(() => {
    let here = true;
    const read = async (): Promise<void> => {
      try {
        const [first, members] = await Promise.all([api.drawing(jobId), api.members(jobId).catch(() => ({ members: [] }))]);
        const { answer, draft } = await recover(first);
        if (here) setState({ kind: "open", answer, draft, people: members.members.map((person) => person.name) });
      } catch (error) {
        const problem = error instanceof ApiProblem ? error : null;
        if (here) setState({ kind: "trouble", title: problem?.status === 404 ? "There is no such drawing" : "The drawing could not be read", detail: problem?.message ?? String(error), requestId: problem?.requestId || null });
      }
    };
    void read();
    return () => { here = false; };
  }, [jobId, turn]);
  if (state.kind === "opening") return <OpeningSheet />;
  if (state.kind === "trouble") return <DrawingTrouble title={state.title} detail={state.detail} requestId={state.requestId} onRetry={() => { setState({ kind: "opening" }); setTurn((now) => now + 1); }} />;
  return <Editor key={`${state.answer.id}-${turn}`} answer={state.answer} draft={state.draft} people={state.people} />;
}
