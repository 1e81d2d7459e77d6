import type { FileAnswer } from "@/lib/api";
import { ApiProblem } from "./api";
import type { KeptPhoto } from "./visitStore";

export interface PhotoOnItsWay {
  readonly photo: KeptPhoto;
  readonly state: "waiting" | "sending" | "refused";
  /** Part that was sent, 0 to 1. */
  readonly sent: number;
  readonly error: ApiProblem | null;
  /** Whether this device keeps it; otherwise the page must stay open until it is sent. */
  readonly kept: boolean;
}
export interface QueueParts {
  readonly send: (photo: KeptPhoto, onProgress: (sent: number) => void) => Promise<FileAnswer>;
  readonly keep: (key: string, photo: KeptPhoto | null) => Promise<void>;
  /** Puts the stored file into the visit; called before the photo is forgotten here. */
  readonly onStored: (photo: KeptPhoto, file: FileAnswer) => Promise<void>;
}
export const PHOTO_RETRY_MS = [2_000, 5_000, 15_000, 30_000] as const;
/** Answers that the same photo, sent again, may fare better with. */
const AGAIN = (status: number): boolean => status === 0 || status === 400 || status === 401 || status === 408 || status === 429 || status >= 500;

/** Sends photos one after the other, and again until they are stored or refused for what they are. */
export class PhotoQueue {
  private list: readonly PhotoOnItsWay[] = [];
  private timer: ReturnType<typeof setTimeout> | null = null;
  private busy = false;
  private stopped = true;
  private attempts = 0;
  private readonly listeners = new Set<() => void>();

  constructor(private readonly parts: QueueParts) {}

  readonly subscribe = (listener: () => void): (() => void) => { this.listeners.add(listener); return () => this.listeners.delete(listener); };
  readonly snapshot = (): readonly PhotoOnItsWay[] => this.list;

  /** Takes up photos that this device kept. */
  resume(photos: readonly KeptPhoto[]): void {
    const known = new Set(this.list.map((each) => each.photo.key));
    this.set([...this.list, ...photos.filter((photo) => !known.has(photo.key)).map((photo): PhotoOnItsWay => ({ photo, state: "waiting", sent: 0, error: null, kept: true }))]);
    this.schedule(0);
  }
  async add(photo: KeptPhoto): Promise<void> {
    this.set([...this.list, { photo, state: "waiting", sent: 0, error: null, kept: true }]);
    try {
      await this.parts.keep(photo.key, photo);
    } catch {
      this.change(photo.key, { kept: false });
    }
    if (this.attempts === 0) this.schedule(0);
  }
  /** Sends now what waits: the connection is back, or somebody asked for it. */
  flush(): void {
    this.attempts = 0;
    this.schedule(0);
  }
  async putAway(key: string): Promise<void> {
    this.set(this.list.filter((each) => each.photo.key !== key || each.state === "sending"));
    await this.parts.keep(key, null).catch(() => undefined);
  }
  start(): void { this.stopped = false; this.schedule(0); }
  stop(): void {
    this.stopped = true;
    if (this.timer) clearTimeout(this.timer);
  }

  private set(list: readonly PhotoOnItsWay[]): void {
    this.list = list;
    this.listeners.forEach((listener) => listener());
  }
  private change(key: string, to: Partial<PhotoOnItsWay>): void {
    this.set(this.list.map((each) => (each.photo.key === key ? { ...each, ...to } : each)));
  }
  private schedule(ms: number): void {
    if (this.timer) clearTimeout(this.timer);
    if (!this.stopped) this.timer = setTimeout(() => void this.run(), ms);
  }
  private async run(): Promise<void> {
    const next = this.list.find((each) => each.state === "waiting");
    if (!next || this.busy || this.stopped) return;
    const { photo } = next;
    this.busy = true;
    this.change(photo.key, { state: "sending", sent: 0, error: null });
    try {
      const file = await this.parts.send(photo, (sent) => this.change(photo.key, { sent }));
      await this.parts.onStored(photo, file);
      this.set(this.list.filter((each) => each.photo.key !== photo.key));
      await this.parts.keep(photo.key, null).catch(() => undefined);
      this.attempts = 0;
      this.busy = false;
      this.schedule(0);
    } catch (error) {
      this.busy = false;
      const problem = error instanceof ApiProblem ? error : null;
      const again = problem === null || AGAIN(problem.status);
      this.change(photo.key, { state: again ? "waiting" : "refused", sent: 0, error: problem });
      if (again) this.attempts += 1;
      this.schedule(again ? PHOTO_RETRY_MS[Math.min(this.attempts, PHOTO_RETRY_MS.length) - 1] ?? PHOTO_RETRY_MS[0] : 0);
    }
  }
}
