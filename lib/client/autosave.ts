import type { PatchOperation } from "@/lib/rules/engine/types";
import type { Change, Conflict, SaveAnswer, SaveBatch, SaveState } from "./saveState";

/** What is kept on this device until the server has confirmed it. */
export interface Draft {
  readonly drawingId: string;
  readonly sequence: number;
  /** Sent, answer not seen. It is sent again first, under the same id. */
  readonly sent: SaveBatch | null;
  readonly waiting: readonly Change[];
  readonly savedAt: number;
}

export interface AutosaveParts<Document> {
  readonly drawingId: string;
  readonly send: (batch: SaveBatch) => Promise<SaveAnswer<Document>>;
  /** Stores or, with null, removes the draft of this device. */
  readonly keep: (draft: Draft | null) => Promise<void>;
  readonly newId: () => string;
  readonly now: () => number;
  readonly onState: (state: SaveState<Document>) => void;
  /** Changes of other people that came back with a save; they overlap none of ours. */
  readonly onOthers: (patches: readonly PatchOperation[]) => void;
}

/** A save starts this long after the last edit; with the round trip it stays within a second. */
export const QUIET_MS = 500;
/** Waits before trying again, the last one repeated. */
export const RETRY_MS = [1_000, 2_000, 5_000, 15_000, 30_000] as const;

/**
 * Sends changes soon after they are made, one save at a time, and drops none: what is not confirmed
 * stays in memory and on the device, and is sent again until it is confirmed or a person decides.
 */
export class Autosave<Document> {
  private sequence: number;
  private waiting: Change[] = [];
  private sent: { batch: SaveBatch; changes: number } | null = null;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private attempts = 0;
  private offlineSince: number | null = null;
  private busy = false;
  private stopped = false;
  private conflict: Conflict<Document> | null = null;

  constructor(private readonly parts: AutosaveParts<Document>, sequence: number) {
    this.sequence = sequence;
  }

  /** Number of changes the server has not confirmed. */
  get kept(): number { return this.waiting.length + (this.sent?.changes ?? 0); }
  get currentSequence(): number { return this.sequence; }
  get unsaved(): readonly Change[] { return this.waiting; }

  /** Takes up what a former page left on this device. */
  resume(draft: Draft): void {
    if (draft.sent) this.sent = { batch: draft.sent, changes: 1 };
    this.waiting.push(...draft.waiting);
    this.report();
    this.schedule(0);
  }

  add(change: Change): void {
    if (change.patches.length === 0) return;
    this.waiting.push(change);
    void this.keepDraft();
    this.report();
    // Words keep the failure while a later retry is due; otherwise the quiet time starts again.
    if (!this.conflict && !this.busy) this.schedule(this.attempts > 0 ? this.retryDelay() : QUIET_MS);
  }

  /** Sends now: the button "Try again", the page going away, the connection coming back. */
  flush(): Promise<void> {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    return this.run();
  }

  /** Goes on after a stop, for a page that is shown again. */
  go(): void {
    this.stopped = false;
    if (this.waiting.length > 0 || this.sent) this.schedule(QUIET_MS);
  }

  stop(): void {
    this.stopped = true;
    if (this.timer) clearTimeout(this.timer);
  }

  /** After a person has settled the conflict: `changes` lead from the server's drawing to the settled one. */
  settle(sequence: number, changes: readonly Change[]): void {
    this.conflict = null;
    this.sent = null;
    this.sequence = sequence;
    this.waiting = changes.filter((change) => change.patches.length > 0);
    this.attempts = 0;
    void this.keepDraft();
    this.report();
    if (this.waiting.length > 0) this.schedule(0);
  }

  private retryDelay(): number {
    return RETRY_MS[Math.min(this.attempts, RETRY_MS.length) - 1] ?? QUIET_MS;
  }

  private schedule(delay: number): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = this.stopped ? null : setTimeout(() => { this.timer = null; void this.run(); }, delay);
  }

  private async keepDraft(): Promise<void> {
    const empty = !this.sent && this.waiting.length === 0;
    await this.parts.keep(empty ? null : {
      drawingId: this.parts.drawingId, sequence: this.sequence, sent: this.sent?.batch ?? null, waiting: [...this.waiting], savedAt: this.parts.now(),
    }).catch(() => undefined); // A full or missing device store must not stop the save itself.
  }

  private report(): void {
    if (this.conflict) this.parts.onState({ kind: "conflict", kept: this.kept, conflict: this.conflict });
    else if (this.kept === 0) this.parts.onState({ kind: "saved" });
    else if (this.offlineSince !== null) this.parts.onState({ kind: "offline", kept: this.kept, since: this.offlineSince });
    else if (this.attempts === 0) this.parts.onState({ kind: "saving", kept: this.kept });
    else if (this.failure) this.parts.onState({ ...this.failure, kept: this.kept });
  }
  private failure: Extract<SaveState<Document>, { kind: "failed" }> | null = null;

  private async run(): Promise<void> {
    if (this.busy || this.stopped || this.conflict) return;
    if (!this.sent) {
      if (this.waiting.length === 0) return;
      const batch: SaveBatch = {
        saveId: this.parts.newId(), baseSequence: this.sequence,
        title: this.waiting.length === 1 ? (this.waiting[0] as Change).title : `${(this.waiting[0] as Change).title} and ${this.waiting.length - 1} more`,
        patches: this.waiting.flatMap((change) => change.patches),
      };
      this.sent = { batch, changes: this.waiting.length };
      this.waiting = [];
      await this.keepDraft();
    }
    this.busy = true;
    const answer = await this.parts.send(this.sent.batch).catch((): SaveAnswer<Document> => ({ kind: "offline" }));
    this.busy = false;
    if (answer.kind === "saved") {
      this.sent = null;
      this.sequence = answer.sequence;
      this.attempts = 0;
      this.offlineSince = null;
      this.failure = null;
      if (answer.rebased.length > 0) this.parts.onOthers(answer.rebased);
      await this.keepDraft();
      this.report();
      if (this.waiting.length > 0) this.schedule(0);
      return;
    }
    if (answer.kind === "conflict") {
      this.conflict = answer.conflict;
      this.report();
      return;
    }
    this.attempts++;
    if (answer.kind === "offline") this.offlineSince ??= this.parts.now();
    else {
      this.offlineSince = null;
      this.failure = { kind: "failed", kept: this.kept, at: this.parts.now(), detail: answer.detail, requestId: answer.requestId, again: answer.again };
    }
    this.report();
    if (answer.kind === "offline" || answer.again) this.schedule(this.retryDelay());
  }

  /** Changes that are not in the server's drawing: what was sent and refused, then what waits. */
  pendingChanges(): readonly Change[] {
    return [...(this.sent ? [{ title: this.sent.batch.title, patches: this.sent.batch.patches }] : []), ...this.waiting];
  }
}
