import type { ReactNode } from "react";

/** A piece of paper on the desk with a heading. */
export function Panel({ title, aside, children, id }: { title: string; aside?: ReactNode; children: ReactNode; id?: string }) {
  return (
    <section id={id} className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      <div className="flex min-h-[56px] items-center justify-between gap-4 border-b-[1.5px] border-ink px-5">
        <h2 className="text-heading font-heading stretch-heading">{title}</h2>
        {aside}
      </div>
      {children}
    </section>
  );
}
