import { useId, type InputHTMLAttributes, type ReactNode, type Ref, type SelectHTMLAttributes, type TextareaHTMLAttributes } from "react";

interface Around { label: string; error?: string | undefined; hint?: string | undefined; unit?: string; className?: string }
interface Slots { id: string; described: string | undefined; invalid: boolean }

const CONTROL = "w-full border border-rule bg-paper px-3 text-text text-ink placeholder:text-ink3 aria-invalid:border-2 aria-invalid:border-red disabled:bg-panel disabled:text-ink2";
export const controlClass = `h-control ${CONTROL}`;

/** Label above, control, then what is wrong or else a hint. */
function Around({ label, error, hint, unit, className = "", children }: Around & { children: (slots: Slots) => ReactNode }) {
  const id = useId();
  const noteId = `${id}-note`;
  // Short messages go on from the label; whole sentences of the server stand by themselves.
  const wrong = error && /^[a-z]/.test(error) ? `${label} ${error}.` : error;
  const note = wrong ?? hint;
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className="mb-1 block text-body font-medium text-ink2">
        {label}
        {unit && <span className="font-normal text-ink3">, {unit}</span>}
      </label>
      {children({ id, described: note ? noteId : undefined, invalid: error !== undefined })}
      {note && <p id={noteId} className={`mt-1 text-label ${error ? "font-strong text-red" : "text-ink3"}`} {...(error ? { role: "alert" } : {})}>{note}</p>}
    </div>
  );
}

type TextFieldProps = Around & InputHTMLAttributes<HTMLInputElement> & { ref?: Ref<HTMLInputElement> };

/** One line of text. */
export function TextField({ label, error, hint, unit, className, ref, ...rest }: TextFieldProps) {
  return (
    <Around label={label} error={error} hint={hint} {...(unit ? { unit } : {})} {...(className ? { className } : {})}>
      {({ id, described, invalid }) => <input ref={ref} id={id} aria-describedby={described} aria-invalid={invalid || undefined} className={controlClass} {...rest} />}
    </Around>
  );
}

type TextAreaProps = Around & TextareaHTMLAttributes<HTMLTextAreaElement> & { ref?: Ref<HTMLTextAreaElement> };

/** Several lines of text. */
export function TextArea({ label, error, hint, className, ref, rows = 2, ...rest }: TextAreaProps) {
  return (
    <Around label={label} error={error} hint={hint} {...(className ? { className } : {})}>
      {({ id, described, invalid }) => (
        <textarea ref={ref} id={id} rows={rows} aria-describedby={described} aria-invalid={invalid || undefined} className={`block min-h-control resize-y py-2.5 ${CONTROL}`} {...rest} />
      )}
    </Around>
  );
}

type SelectFieldProps = Around & SelectHTMLAttributes<HTMLSelectElement> & { ref?: Ref<HTMLSelectElement> };

/** One of a list. */
export function SelectField({ label, error, hint, className, ref, children, ...rest }: SelectFieldProps) {
  return (
    <Around label={label} error={error} hint={hint} {...(className ? { className } : {})}>
      {({ id, described, invalid }) => (
        <span className="relative block">
          <select ref={ref} id={id} aria-describedby={described} aria-invalid={invalid || undefined} className={`${controlClass} appearance-none pr-9`} {...rest}>{children}</select>
          <svg viewBox="0 0 12 8" className="pointer-events-none absolute top-4 right-3 h-2 w-3" aria-hidden="true">
            <path d="M1 1.5L6 6.5L11 1.5" fill="none" stroke="currentColor" strokeWidth="1.6" />
          </svg>
        </span>
      )}
    </Around>
  );
}
