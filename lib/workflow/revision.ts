import { z } from "zod";

/**
 * States of a revision. The drawing being worked on is the draft; it becomes a revision when it is issued.
 * `sealing` lasts while the sheets are being drawn with the seal. `void` means that the drawing was
 * changed after the seal, so the sealed sheets no longer show it.
 */
export const REVISION_STATES = ["in review", "returned", "sealing", "sealed", "superseded", "void"] as const;
export const revisionStateSchema = z.enum(REVISION_STATES);
export type RevisionState = z.infer<typeof revisionStateSchema>;
/** State of a job as lists show it: that of its latest revision, or draft before the first. */
export type JobState = RevisionState | "draft";

export const REVISION_EVENTS = ["return", "start seal", "finish seal", "seal failed", "draft changed", "draft restored", "supersede"] as const;
export type RevisionEvent = (typeof REVISION_EVENTS)[number];

const TRANSITIONS: Readonly<Record<RevisionState, Partial<Record<RevisionEvent, RevisionState>>>> = {
  "in review": { return: "returned", "start seal": "sealing" },
  returned: {},
  sealing: { "finish seal": "sealed", "seal failed": "in review" },
  sealed: { "draft changed": "void", supersede: "superseded" },
  // Undoing the change makes the drawing the sealed one again: the same digest is the same drawing.
  void: { "draft restored": "sealed", supersede: "superseded" },
  superseded: {},
};

/** State after an event, or null where the event is not allowed in this state. */
export function nextState(state: RevisionState, event: RevisionEvent): RevisionState | null {
  return TRANSITIONS[state][event] ?? null;
}

/** States in which a revision is with the licensee, so that no other can be issued. */
export const OPEN_STATES: readonly RevisionState[] = ["in review", "sealing"];
/** States in which sealed bytes exist. */
export const SEALED_STATES: readonly RevisionState[] = ["sealed", "superseded", "void"];

/** Why a step was refused; the code is stable, the sentence is for people. */
export interface Refusal {
  code: string;
  detail: string;
  /** Findings that are in the way, by key. */
  findings?: readonly { key: string; message: string }[];
}
