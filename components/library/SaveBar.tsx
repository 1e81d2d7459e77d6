"use client";

import type { ReactNode } from "react";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";

interface SaveBarProps {
  label: string; busy: boolean; changed: boolean;
  /** Why the version was made, for those who read its list later. */
  note: string; onNote: (note: string) => void;
  onTakeBack?: () => void;
  children?: ReactNode;
}

/** Foot of a form that makes a version: what it was made for, and the button. It stays in sight while something is unsaved. */
export function SaveBar({ label, busy, changed, note, onNote, onTakeBack, children }: SaveBarProps) {
  return (
    // A note alone is no change.
    <div onInput={(event) => event.stopPropagation()} className={`${changed ? "sticky bottom-0 z-10" : ""} flex flex-wrap items-end gap-3 border-t border-ink bg-paper px-6 py-3.5 phone:px-4`}>
      <TextField label="Note on this version" className="min-w-[220px] flex-1" value={note} maxLength={300} placeholder="For example: values from datasheet revision D" onChange={(event) => onNote(event.target.value)} />
      <Button type="submit" look="primary" disabled={!changed} busy={busy}>{label}</Button>
      {onTakeBack && changed && <Button onClick={onTakeBack}>Take back</Button>}
      <div className="w-full empty:hidden">{children}</div>
    </div>
  );
}
