"use client";
import Link from "next/link";
import { CAUTION_TEXT } from "@/lib/cautions";
import { BUTTON, PRIMARY } from "./controls";

/** What happened, the request it happened in, and what can be done. */
export function DrawingTrouble({ title, detail, requestId, onRetry }: { title: string; detail: string; requestId: string | null; onRetry: () => void }) {
  return (
    <main className="grid min-h-dvh place-items-center bg-desk p-6">
      <section role="alert" className="max-w-lg border border-ink bg-vellum p-6 shadow-hard">
        <h1 className="text-heading font-heading">{title}</h1>
        <p className="mt-2 text-text">{detail}</p>
        {requestId && <p className="mt-1 text-label text-ink2">Request {requestId}</p>}
        <div className="mt-4 flex gap-2"><button type="button" className={PRIMARY} onClick={onRetry}>Try again</button><Link href="/jobs" className={BUTTON}>All jobs</Link></div>
        <p className="mt-5 border-t border-desk2 pt-2 text-small text-ink2">{CAUTION_TEXT}</p>
      </section>
    </main>
  );
}
