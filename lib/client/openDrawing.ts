import { checkDocument } from "@/lib/diagram/check";
import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing } from "@/lib/diagram/schema";
import type { DrawingAnswer } from "@/lib/api";
import { api } from "./api";
import { Autosave, type Draft } from "./autosave";
import { startChecker, type Checker } from "./checker";
import { readDraft, writeDraft } from "./draft";
import { createEditorStore, type EditorStore } from "./editorStore";
import { sendSave } from "./sendSave";
import { settle } from "./settle";

/** A drawing open in this page: its store, its save and its checker. */
export interface OpenDrawing {
  readonly store: EditorStore;
  /** Sends what waits now. */
  readonly saveNow: () => void;
  readonly settleConflict: (keep: "mine" | "theirs") => void;
  readonly start: () => void;
  readonly stop: () => void;
}

/** Puts changes kept on this device back onto the drawing as the server has it. `left` counts those that no longer fit. */
export function withDraft(drawing: Drawing, draft: Draft): { drawing: Drawing; waiting: Draft["waiting"]; left: number } {
  let result = drawing;
  let left = 0;
  const waiting = draft.waiting.filter((change) => {
    try {
      const next = applyPatches(result, change.patches);
      if (checkDocument(next).length > 0) throw new RangeError("the drawing would be broken");
      result = next;
      return true;
    } catch {
      left++;
      return false;
    }
  });
  return { drawing: result, waiting, left };
}

/**
 * Reads a draft of this device, sends again what had been sent without an answer, and reads the drawing once more
 * after it, so that what the server already has is not applied twice.
 */
export async function recover(answer: DrawingAnswer): Promise<{ answer: DrawingAnswer; draft: Draft | null }> {
  const draft = answer.may.edit ? await readDraft(answer.id) : null;
  if (!draft) return { answer, draft: null };
  if (!draft.sent) return { answer, draft };
  const sent = await sendSave(answer.id, draft.sent);
  if (sent.kind === "saved") return { answer: await api.drawing(answer.jobId), draft: { ...draft, sent: null } };
  // Refused or not reachable: what was sent is offered again as a waiting change on today's drawing.
  return { answer, draft: { ...draft, sent: null, waiting: [{ title: draft.sent.title, patches: draft.sent.patches }, ...draft.waiting] } };
}

/** Opens a drawing that was read from the server, with what this device still keeps of it. */
export function openDrawing(answer: DrawingAnswer, draft: Draft | null): OpenDrawing {
  const recovered = draft ? withDraft(answer.drawing, draft) : { drawing: answer.drawing, waiting: [], left: 0 };
  let autosave: Autosave<Drawing> | null = null;
  let checker: Checker | null = null;
  let unsubscribe: (() => void) | null = null;
  let started = false;
  const store = createEditorStore({ drawing: recovered.drawing, readOnly: !answer.may.edit }, (change) => autosave?.add(change));

  const readAgain = async (): Promise<void> => {
    try {
      const fresh = await api.drawing(answer.jobId);
      store.getState().replace(fresh.drawing);
      store.getState().say("Others have changed the drawing. It was read again.");
    } catch {
      store.getState().say("Others have changed the drawing. Load the page again to see it.", "refused");
    }
  };
  autosave = new Autosave<Drawing>({
    drawingId: answer.id, now: () => Date.now(), newId: () => crypto.randomUUID(),
    send: (batch) => sendSave(answer.id, batch),
    keep: (kept) => writeDraft(answer.id, kept),
    onState: (save) => store.getState().set({ save }),
    onOthers: (patches) => { if (!store.getState().takeOthers(patches)) void readAgain(); },
  }, answer.sequence);

  const online = (): void => { void autosave?.flush(); };
  const leaving = (event: BeforeUnloadEvent): void => {
    if (!autosave || autosave.kept === 0) return;
    void autosave.flush();
    event.preventDefault();
  };
  return {
    store,
    saveNow: () => void autosave?.flush(),
    settleConflict: (keep) => {
      const { save, replace, say } = store.getState();
      if (save.kind !== "conflict" || !autosave) return;
      const settled = settle(save.conflict, autosave.pendingChanges(), keep);
      replace(settled.drawing);
      autosave.settle(save.conflict.sequence, settled.changes);
      say(settled.left > 0 ? `Settled. ${settled.left} of your changes no longer fit and were left out.` : "Settled.");
    },
    start: () => {
      autosave?.go();
      checker = startChecker((check) => store.getState().set({ check, checkError: null }), (checkError) => store.getState().set({ checkError }));
      checker.request(store.getState().drawing);
      unsubscribe = store.subscribe((now, before) => { if (now.drawing !== before.drawing) checker?.request(now.drawing); });
      if (started) {
        // Started a second time by a development double mount: what was recovered is already in the queue.
      } else if (recovered.waiting.length > 0 && draft) {
        autosave?.resume({ ...draft, sequence: answer.sequence, sent: null, waiting: recovered.waiting });
        store.getState().say(`${recovered.waiting.length} ${recovered.waiting.length === 1 ? "change" : "changes"} kept on this device ${recovered.waiting.length === 1 ? "was" : "were"} put back.`);
      } else if (draft) void writeDraft(answer.id, null);
      if (!started && recovered.left > 0) store.getState().say(`${recovered.left} kept ${recovered.left === 1 ? "change does" : "changes do"} not fit the drawing any more and ${recovered.left === 1 ? "was" : "were"} left out.`, "refused");
      started = true;
      window.addEventListener("online", online);
      window.addEventListener("beforeunload", leaving);
    },
    stop: () => {
      checker?.stop();
      unsubscribe?.();
      void autosave?.flush();
      autosave?.stop();
      window.removeEventListener("online", online);
      window.removeEventListener("beforeunload", leaving);
    },
  };
}
