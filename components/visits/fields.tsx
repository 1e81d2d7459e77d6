"use client";

import { useId, useState, type ReactNode } from "react";
import { readNumber, showValue } from "@/lib/client/readField";
import { TEMPERATURE_LIMITS, TEMPERATURE_UNITS, type ReadTemperature, type TemperatureUnit } from "@/lib/diagram/siteVisit";
import { temperatureWords } from "@/lib/diagram/fromVisit";
import { parseConductorSize } from "@/lib/units";
import { useVisitForm } from "./visitContext";

const CONTROL = "w-full min-w-0 border border-rule bg-paper px-3 text-field text-ink placeholder:text-text placeholder:text-ink3 disabled:bg-panel disabled:text-ink2 aria-invalid:border-2 aria-invalid:border-red";
const BOX = `h-target ${CONTROL}`;
/** Only for what is typed into: to a browser a list of choices is always read-only. */
const INPUT = `${BOX} read-only:bg-panel`;
const EMPTY = "not looked at";

interface Around { label: string; unit?: string; hint?: string | undefined; error?: string | null; wide?: boolean }
function Field({ label, unit, hint, error, wide, children }: Around & { children: (slots: { id: string; describedBy: string | undefined }) => ReactNode }) {
  const id = useId();
  const note = error ?? hint;
  return (
    <div className={`min-w-0 ${wide ? "col-span-full" : ""}`}>
      <label htmlFor={id} className="mb-1 block text-text font-medium text-ink2">{label}{unit && <span className="font-normal text-ink3">, {unit}</span>}</label>
      {children({ id, describedBy: note ? `${id}-note` : undefined })}
      {note && <p id={`${id}-note`} role={error ? "alert" : undefined} className={`mt-1 text-body ${error ? "font-strong text-red" : "text-ink3"}`}>{note}</p>}
    </div>
  );
}

/** One line of text; empty is "not looked at". */
export function TextBox({ value, onChange, max, placeholder = EMPTY, ...around }: Around & { value: string | null; onChange: (text: string | null) => void; max: number; placeholder?: string }) {
  const { readOnly } = useVisitForm();
  return (
    <Field {...around}>
      {({ id, describedBy }) => <input id={id} aria-describedby={describedBy} className={INPUT} value={value ?? ""} maxLength={max} readOnly={readOnly} placeholder={placeholder} onChange={(event) => onChange(event.target.value || null)} />}
    </Field>
  );
}

/** Several lines of text. */
export function LongBox({ value, onChange, max, rows = 2, placeholder = EMPTY, ...around }: Around & { value: string | null; onChange: (text: string | null) => void; max: number; rows?: number; placeholder?: string }) {
  const { readOnly } = useVisitForm();
  return (
    <Field wide {...around}>
      {({ id, describedBy }) => <textarea id={id} aria-describedby={describedBy} rows={rows} className={`block min-h-target resize-y py-2.5 read-only:bg-panel ${CONTROL}`} value={value ?? ""} maxLength={max} readOnly={readOnly} placeholder={placeholder} onChange={(event) => onChange(event.target.value || null)} />}
    </Field>
  );
}

type Answer = { ok: true; value: number | string | null } | { ok: false; reason: string };
interface ReadProps extends Around { name: string; shown: string; placeholder?: string; inputMode?: "decimal" | "numeric" | "text"; read: (text: string) => Answer; onRead: (value: number | string | null) => void }
/** An entry that is read as it is typed. What cannot be read stays as typed, is kept on the device and counts as not looked at. */
function ReadBox({ name, shown, placeholder = EMPTY, inputMode = "text", read, onRead, ...around }: ReadProps) {
  const { readOnly, typed, setTyped } = useVisitForm();
  const [editing, setEditing] = useState<string | null>(null);
  const kept = typed[name];
  const answer = kept === undefined ? null : read(kept);
  return (
    <Field {...around} error={editing === null && answer && !answer.ok ? `${kept}: ${answer.reason}.` : null}>
      {({ id, describedBy }) => (
        <input
          id={id} aria-describedby={describedBy} aria-invalid={(editing === null && kept !== undefined) || undefined} inputMode={inputMode} autoComplete="off" className={`${INPUT} tabular-nums`}
          value={editing ?? kept ?? shown} readOnly={readOnly} placeholder={placeholder} maxLength={40}
          onChange={(event) => {
            const text = event.target.value;
            setEditing(text);
            const now = read(text);
            setTyped(name, now.ok ? null : text);
            onRead(now.ok ? now.value : null);
          }}
          onBlur={() => setEditing(null)}
        />
      )}
    </Field>
  );
}

interface NumberProps extends Around { name: string; value: number | null; onChange: (value: number | null) => void; least: number; most: number; whole?: boolean }
/** A number, bare or with a unit of the same quantity. */
export function NumberBox({ value, onChange, least, most, whole = false, unit = "", ...rest }: NumberProps) {
  return (
    <ReadBox
      {...rest} unit={unit} inputMode={whole ? "numeric" : "decimal"} shown={showValue(value)} onRead={(now) => onChange(typeof now === "number" ? now : null)}
      read={(text) => { const answer = readNumber(text, unit, least, most, whole); return answer.ok ? { ok: true, value: typeof answer.value === "number" ? answer.value : null } : answer; }}
    />
  );
}

/** A conductor size as people write it: 6, #6, 1/0, 250 kcmil. */
export function SizeBox({ value, onChange, ...rest }: Around & { name: string; value: string | null; onChange: (value: string | null) => void }) {
  return (
    <ReadBox
      {...rest} shown={value ?? ""} placeholder="6 AWG, as read" onRead={(now) => onChange(typeof now === "string" ? now : null)}
      read={(text) => {
        if (text.trim() === "") return { ok: true, value: null };
        try {
          return { ok: true, value: parseConductorSize(text) };
        } catch {
          return { ok: false, reason: "write a size as 6 AWG, 1/0 AWG or 250 kcmil" };
        }
      }}
    />
  );
}

/** One of a list. */
export function ChoiceBox<T extends string>({ value, options, onChange, ...around }: Around & { value: T | null; options: readonly T[]; onChange: (value: T | null) => void }) {
  const { readOnly } = useVisitForm();
  return (
    <Field {...around}>
      {({ id, describedBy }) => (
        <span className="relative block">
          <select id={id} aria-describedby={describedBy} className={`${BOX} appearance-none pr-10 ${value === null ? "!text-text text-ink3" : ""}`} value={value ?? ""} disabled={readOnly} onChange={(event) => onChange(options.find((each) => each === event.target.value) ?? null)}>
            <option value="">{EMPTY}</option>
            {options.map((option) => <option key={option} value={option}>{option}</option>)}
          </select>
          <svg viewBox="0 0 12 8" className="pointer-events-none absolute top-5 right-3.5 h-2 w-3" aria-hidden="true"><path d="M1 1.5L6 6.5L11 1.5" fill="none" stroke="currentColor" strokeWidth="1.6" /></svg>
        </span>
      )}
    </Field>
  );
}

/** Two or three answers side by side, one press each; pressing the chosen one again takes it back. */
export function Buttons<T extends string>({ label, value, options, words, onChange, small = false }: { label: string; value: T | null; options: readonly T[]; words?: Partial<Record<T, string>>; onChange: (value: T | null) => void; small?: boolean }) {
  const { readOnly } = useVisitForm();
  return (
    <div role="group" aria-label={label} className="flex">
      {options.map((option) => (
        <button
          key={option} type="button" disabled={readOnly} aria-pressed={value === option} onClick={() => onChange(value === option && !small ? null : option)}
          className={`-ml-px h-target min-w-14 border border-rule px-3 text-finding first:ml-0 ${value === option ? "relative z-[1] border-ink bg-ink font-strong text-onink" : "bg-paper text-ink2"}`}
        >{words?.[option] ?? option}</button>
      ))}
    </div>
  );
}

interface TemperatureProps extends Around { name: string; value: ReadTemperature; onChange: (value: ReadTemperature) => void }
/** A temperature in the unit of the thermometer that was read. */
export function TemperatureBox({ name, value, onChange, ...around }: TemperatureProps) {
  const { data, setTyped } = useVisitForm();
  // Who reads one in °C reads the next in °C too.
  const usual = Object.values(data.temperatures).find((each): each is NonNullable<ReadTemperature> => typeof each === "object" && each !== null)?.unit ?? "°F";
  const [chosen, setChosen] = useState<TemperatureUnit | null>(null);
  const unit = value?.unit ?? chosen ?? usual;
  const [least, most] = TEMPERATURE_LIMITS[unit];
  const turn = (next: TemperatureUnit | null) => {
    if (!next) return;
    setChosen(next);
    if (!value) return;
    const [low, high] = TEMPERATURE_LIMITS[next];
    const fits = value.value >= low && value.value <= high;
    setTyped(name, fits ? null : String(value.value));
    onChange(fits ? { value: value.value, unit: next } : null);
  };
  return (
    <div className="flex min-w-0 items-end gap-2">
      <div className="min-w-0 flex-1">
        <NumberBox {...around} {...(value ? { hint: value.unit === "°F" ? temperatureWords(value) : around.hint } : {})} label={around.label} name={name} unit={unit} value={value?.value ?? null} least={least} most={most} onChange={(number) => onChange(number === null ? null : { value: number, unit })} />
      </div>
      <div className={value?.unit === "°F" || around.hint ? "pb-[22px]" : ""}>
        <Buttons label={`Unit of ${around.label.toLowerCase()}`} small value={unit} options={TEMPERATURE_UNITS} onChange={turn} />
      </div>
    </div>
  );
}
