import type { VisitAnswer, VisitChange, VisitContent, VisitInput } from "@/lib/api";
import { ApiProblem } from "./api";
import { mergeVisits, sameVisit } from "./visitMerge";
import type { KeptVisit } from "./visitStore";

export type VisitSave =
  | { readonly kind: "new" }
  | { readonly kind: "saved" }
  | { readonly kind: "waiting" }
  | { readonly kind: "saving" }
  | { readonly kind: "offline" }
  | { readonly kind: "failed"; readonly detail: string; readonly requestId: string; readonly again: boolean }
  /** Somebody changed the same parts; `theirs` is the visit as the server has it. */
  | { readonly kind: "conflict"; readonly parts: readonly string[]; readonly theirs: VisitAnswer };
export interface VisitState {
  readonly content: VisitContent; readonly typed: Readonly<Record<string, string>>; readonly save: VisitSave;
  /** Whether this device keeps what was not sent; without it, the page must stay open. */
  readonly kept: boolean;
}
export interface KeeperParts {
  readonly create: (input: VisitInput) => Promise<VisitAnswer>;
  readonly change: (input: VisitChange) => Promise<VisitAnswer>;
  readonly keep: (visit: KeptVisit | null) => Promise<void>;
  readonly now: () => number;
}

/** A save starts this long after the last key; longer than in a drawing, since a form is written in bursts. */
export const QUIET_MS = 1_500;
export const RETRY_MS = [2_000, 5_000, 15_000, 30_000] as const;
const AGAIN = (status: number): boolean => status === 0 || status === 401 || status === 408 || status === 429 || status >= 500;
const contentOf = ({ visitedOn, byName, data }: VisitContent): VisitContent => ({ visitedOn, byName, data });

/**
 * Keeps one open visit: every change is on the device at once and on the server soon after. Nothing that was typed is dropped;
 * what others changed meanwhile is put under it, and where both changed the same, a person decides.
 */
export class VisitKeeper {
  private state: VisitState;
  private version: number;
  private base: VisitContent | null;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private busy = false;
  private stopped = false;
  private attempts = 0;
  private readonly listeners = new Set<() => void>();

  constructor(private readonly visitId: string, private readonly jobId: string, private readonly parts: KeeperParts, from: { stored: VisitAnswer | null; kept: KeptVisit | null; blank: VisitContent }) {
    const { stored, kept, blank } = from;
    this.version = stored?.version ?? 0;
    this.base = stored ? contentOf(stored) : null;
    const mine = kept?.content ?? this.base ?? blank;
    this.state = { content: mine, typed: kept?.typed ?? {}, save: stored ? { kind: "saved" } : { kind: "new" }, kept: true };
    if (!kept) return;
    // What this device kept goes onto today's visit of the server.
    if (stored && kept.version !== stored.version && kept.base) this.putOnto(stored, kept.base);
    else if (!stored || !sameVisit(mine, contentOf(stored))) this.state = { ...this.state, save: { kind: "waiting" } };
  }

  readonly subscribe = (listener: () => void): (() => void) => { this.listeners.add(listener); return () => this.listeners.delete(listener); };
  readonly snapshot = (): VisitState => this.state;
  /** Whether something is not on the server. */
  get pending(): boolean { return this.state.save.kind !== "saved" && this.state.save.kind !== "new"; }

  change(recipe: (content: VisitContent) => VisitContent): void {
    const content = recipe(this.state.content);
    if (content === this.state.content) return;
    this.set({ content, ...(this.state.save.kind === "conflict" ? {} : { save: this.state.save.kind === "offline" || this.state.save.kind === "failed" ? this.state.save : { kind: "waiting" } }) });
    void this.keep();
    if (this.state.save.kind !== "conflict" && !this.busy) this.schedule(this.attempts > 0 ? this.delay() : QUIET_MS);
  }
  /** Keeps an entry that cannot be read; null when it can. */
  setTyped(field: string, text: string | null): void {
    const { [field]: _, ...others } = this.state.typed;
    if (text === null && !(field in this.state.typed)) return;
    this.set({ typed: text === null ? others : { ...others, [field]: text } });
    void this.keep();
  }
  flush(): Promise<void> { return this.run(); }
  start(): void {
    this.stopped = false;
    if (this.state.save.kind === "waiting" || this.state.save.kind === "offline") this.schedule(0);
  }
  stop(): void {
    this.stopped = true;
    if (this.timer) clearTimeout(this.timer);
  }
  settle(prefer: "mine" | "theirs"): void {
    const { save, content } = this.state;
    if (save.kind !== "conflict") return;
    const theirs = contentOf(save.theirs);
    const merged = mergeVisits(this.base ?? theirs, content, theirs, prefer).content;
    this.version = save.theirs.version;
    this.base = theirs;
    this.set({ content: merged, save: { kind: sameVisit(merged, theirs) ? "saved" : "waiting" } });
    void this.keep();
    this.schedule(0);
  }

  private set(change: Partial<VisitState>): void {
    this.state = { ...this.state, ...change };
    this.listeners.forEach((listener) => listener());
  }
  private async keep(): Promise<void> {
    const { content, typed, save } = this.state;
    const needed = this.pending || Object.keys(typed).length > 0;
    try {
      await this.parts.keep(needed || save.kind === "conflict" ? { visitId: this.visitId, jobId: this.jobId, version: this.version, base: this.base, content, typed, keptAt: this.parts.now() } : null);
      if (!this.state.kept) this.set({ kept: true });
    } catch {
      if (this.state.kept) this.set({ kept: false });
    }
  }
  private schedule(ms: number): void {
    if (this.timer) clearTimeout(this.timer);
    if (!this.stopped) this.timer = setTimeout(() => void this.run(), ms);
  }
  private delay(): number { return RETRY_MS[Math.min(this.attempts, RETRY_MS.length) - 1] ?? RETRY_MS[0]; }

  private async run(): Promise<void> {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    const { save, content: sent } = this.state;
    if (this.busy || this.stopped || save.kind === "conflict" || save.kind === "new" || (this.base && sameVisit(sent, this.base))) {
      if (!this.busy && this.base && sameVisit(sent, this.base) && this.pending && save.kind !== "conflict") { this.set({ save: { kind: "saved" } }); await this.keep(); }
      return;
    }
    this.busy = true;
    this.set({ save: { kind: "saving" } });
    try {
      const answer = this.version === 0 ? await this.parts.create({ id: this.visitId, ...sent }) : await this.parts.change({ version: this.version, ...sent });
      this.busy = false;
      this.attempts = 0;
      this.took(answer, sent);
    } catch (error) {
      this.busy = false;
      this.refused(error);
    }
    await this.keep();
  }
  private took(answer: VisitAnswer, sent: VisitContent): void {
    this.version = answer.version;
    // A visit sent a second time is answered as it was stored the first time.
    if (answer.version === 1 && !sameVisit(contentOf({ ...answer, byName: sent.byName }), sent)) { this.base = contentOf(answer); this.set({ save: { kind: "waiting" } }); this.schedule(0); return; }
    this.base = sent;
    const more = !sameVisit(this.state.content, sent);
    this.set({ save: { kind: more ? "waiting" : "saved" } });
    if (more) this.schedule(QUIET_MS);
  }
  private refused(error: unknown): void {
    const problem = error instanceof ApiProblem ? error : null;
    const theirs = problem?.code === "stale-version" ? (problem.body["visit"] as VisitAnswer | undefined) : undefined;
    if (theirs && this.base) { this.putOnto(theirs, this.base); return; }
    const again = problem === null || AGAIN(problem.status);
    this.attempts += 1;
    if (problem?.status === 0) this.set({ save: { kind: "offline" } });
    else this.set({ save: { kind: "failed", detail: problem?.status === 401 ? "You were signed out. Sign in again in another tab; what you wrote stays here." : problem?.message ?? "That did not work.", requestId: problem?.requestId ?? "", again } });
    if (again) this.schedule(this.delay());
  }
  /** Goes on from what the server has, with what was changed here on top. */
  private putOnto(theirs: VisitAnswer, base: VisitContent): void {
    const { content, clashes } = mergeVisits(base, this.state.content, contentOf(theirs));
    if (clashes.length > 0) {
      this.base = base;
      this.set({ save: { kind: "conflict", parts: clashes, theirs } });
      return;
    }
    this.version = theirs.version;
    this.base = contentOf(theirs);
    this.set({ content, save: { kind: "waiting" } });
    this.schedule(0);
  }
}

/** The save state in words, as the bar shows it. */
export function visitSaveWords(save: VisitSave, photosWaiting: number): string {
  const photos = photosWaiting > 0 ? `, ${photosWaiting} ${photosWaiting === 1 ? "photo" : "photos"} to send` : "";
  switch (save.kind) {
    case "new": return photosWaiting > 0 ? `Nothing written yet${photos}` : "Nothing written yet";
    case "saved": return photosWaiting > 0 ? `Text saved${photos}` : "All saved";
    case "waiting": return `Kept here${photos}`;
    case "saving": return "Saving";
    case "offline": return `No connection, kept here${photos}`;
    case "failed": return `Not saved, kept here${photos}`;
    case "conflict": return "Changed by two people";
  }
}
