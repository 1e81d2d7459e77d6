import type { ReactNode } from "react";

/** Part of a calm form: what it is about on the left, its fields in two columns on the right. */
export function FormSection({ title, text, children }: { title: string; text: string; children: ReactNode }) {
  return (
    <section className="grid grid-cols-[240px_minmax(0,1fr)] gap-8 border-b border-g1 px-8 py-6 last:border-b-0 phone:grid-cols-1 phone:gap-4 phone:px-4">
      <div>
        <h2 className="text-finding font-heading">{title}</h2>
        <p className="mt-1 text-body text-ink2">{text}</p>
      </div>
      <div className="grid grid-cols-2 gap-x-5 gap-y-4 phone:grid-cols-1">{children}</div>
    </section>
  );
}
