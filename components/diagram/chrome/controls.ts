/** Class names of the editor's controls, so that every panel's buttons and fields are the same size and outline. */
export const BUTTON = "inline-flex h-bar-control items-center justify-center whitespace-nowrap border border-ink bg-vellum px-3 text-body font-strong stretch-label text-ink disabled:border-rule disabled:bg-transparent disabled:text-ink3";
export const PRIMARY = "inline-flex h-bar-control items-center justify-center whitespace-nowrap border border-ink bg-ink px-3 text-body font-strong stretch-label text-onink disabled:border-rule disabled:bg-transparent disabled:text-ink3";
export const QUIET = "inline-grid h-bar-control w-8 place-items-center disabled:opacity-40";
export const FIELD = "h-bar-control w-full min-w-0 border border-rule bg-paper px-2 text-body font-strong stretch-label text-ink placeholder:font-normal placeholder:text-ink3 read-only:bg-transparent disabled:bg-transparent disabled:text-ink2 aria-invalid:border-red";
export const LABEL = "block text-small stretch-label text-ink2";
export const HEADING = "mt-4 flex items-baseline justify-between border-b border-ink pb-1 text-text font-heading";
