"use client";
import { useId, useState, type ReactNode } from "react";
import { FIELD, HEADING, LABEL } from "@/components/diagram/chrome/controls";
import { WAVE_CLASS } from "@/components/diagram/redlines/wave";
import type { MarkKind } from "@/components/diagram/redlines/markKind";

/** A finding that names this field, for its underline and its sentence. */
export interface FieldMark { readonly kind: MarkKind; readonly message: string }

interface FieldProps {
  readonly label: string;
  readonly value: string;
  readonly unit?: string;
  readonly readOnly: boolean;
  readonly mark?: FieldMark | null;
  readonly hint?: string;
  readonly wide?: boolean;
  /** Label for the ear alone, where a table's heading says it to the eye. */
  readonly bare?: boolean;
  /** Words in an empty field; a value that is needed says that it is not known. */
  readonly empty?: string;
  /** Takes the text; the answer is why not, or null. */
  readonly onCommit: (text: string) => string | null;
}

interface ShellProps { id: string; label: string; unit?: string | undefined; mark?: FieldMark | null | undefined; wide?: boolean | undefined; bare?: boolean | undefined; children: ReactNode; refusal: string | null; hint?: string | undefined }
function Shell({ id, label, unit, mark, wide, bare, children, refusal, hint }: ShellProps) {
  return (
    <div className={`flex min-w-0 flex-col justify-end ${wide ? "col-span-2" : ""}`}>
      <label htmlFor={id} className={bare ? "sr-only" : LABEL}><span className={mark ? WAVE_CLASS[mark.kind] : ""}>{label}</span>{unit ? `, ${unit}` : ""}</label>
      {children}
      {refusal && <p role="alert" className="mt-0.5 text-small text-red">{refusal}</p>}
      {!refusal && hint && <p className="mt-0.5 text-small text-ink3">{hint}</p>}
    </div>
  );
}

/** Field that is taken over on Enter or when it is left; Esc gives back what was there. */
export function TextField({ label, value, unit, readOnly, mark, hint, wide, bare, empty = "not known", onCommit, list, suggestions }: FieldProps & { list?: readonly string[]; /** Id of a datalist that several fields share. */ suggestions?: string }) {
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const commit = (): void => {
    if (typed === null) return;
    if (typed === value) { setTyped(null); setRefusal(null); return; }
    const answer = onCommit(typed);
    setRefusal(answer);
    if (answer === null) setTyped(null);
  };
  return (
    <Shell id={id} label={label} refusal={refusal} unit={unit} mark={mark} wide={wide} bare={bare} hint={hint}>
      <input
        id={id} className={FIELD} value={typed ?? value} readOnly={readOnly} placeholder={empty} list={list ? `${id}-list` : suggestions} autoComplete="off"
        aria-invalid={refusal !== null} title={mark?.message}
        onChange={(event) => setTyped(event.target.value)} onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === "Enter") { event.preventDefault(); commit(); }
          else if (event.key === "Escape" && typed !== null) { event.stopPropagation(); setTyped(null); setRefusal(null); }
        }}
      />
      {list && <datalist id={`${id}-list`}>{list.map((option) => <option key={option} value={option} />)}</datalist>}
    </Shell>
  );
}

/** Choice among the trade's words; the first one is always "not known" where that is a value. */
export function ChoiceField({ label, value, options, readOnly, mark, wide, bare, unknown = true, onCommit, words }: FieldProps & { options: readonly string[]; unknown?: boolean; words?: Readonly<Record<string, string>> }) {
  const id = useId();
  const [refusal, setRefusal] = useState<string | null>(null);
  return (
    <Shell id={id} label={label} refusal={refusal} mark={mark} wide={wide} bare={bare}>
      <select id={id} className={FIELD} value={value} disabled={readOnly} title={mark?.message} onChange={(event) => setRefusal(onCommit(event.target.value))}>
        {unknown && <option value="">not known</option>}
        {options.map((option) => <option key={option} value={option}>{words?.[option] ?? option}</option>)}
      </select>
    </Shell>
  );
}

/** Document and page a rated value was read from, as one line under its field. */
export function SourceLine({ label, value, readOnly, onCommit }: Pick<FieldProps, "label" | "value" | "readOnly" | "onCommit">) {
  const [typed, setTyped] = useState<string | null>(null);
  const commit = (): void => {
    if (typed !== null && typed !== value) onCommit(typed);
    setTyped(null);
  };
  return (
    <input
      aria-label={label} value={typed ?? value} readOnly={readOnly} placeholder="source, page" className="w-full min-w-0 border-b border-dotted border-rule bg-transparent px-1 text-small text-ink2 placeholder:text-ink3"
      onChange={(event) => setTyped(event.target.value)} onBlur={commit} onKeyDown={(event) => { if (event.key === "Enter") { event.preventDefault(); commit(); } }}
    />
  );
}

/** Fields under a heading, in two columns or in four. */
export function FieldGroup({ title, note, children, open = true, columns = 2 }: { title: string; note?: string; children: ReactNode; open?: boolean; columns?: 2 | 4 }) {
  return (
    <details open={open}>
      <summary className={`${HEADING} cursor-pointer list-none [&::-webkit-details-marker]:hidden`}><span>{title}</span>{note && <span className="text-small font-normal text-ink2">{note}</span>}</summary>
      <div className={`mt-2 grid gap-x-2 gap-y-2 ${columns === 4 ? "grid-cols-4 narrow:grid-cols-3 phone:grid-cols-1" : "grid-cols-2"}`}>{children}</div>
    </details>
  );
}
