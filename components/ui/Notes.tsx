import type { ReactNode } from "react";
import { ApiProblem } from "@/lib/client/api";
import { Button } from "./Button";

/** What went wrong, its request id, and a way to try again. */
export function ErrorNote({ error, onRetry, title = "This could not be loaded" }: { error: unknown; onRetry?: () => void; title?: string }) {
  const problem = error instanceof ApiProblem ? error : null;
  return (
    <div role="alert" className="border-l-[3px] border-red bg-paper p-4 text-text">
      <p className="font-heading">{problem?.status === 0 ? "No connection" : title}</p>
      <p className="mt-1 text-ink2">{problem?.message ?? "Something went wrong on this page. Load it again."}</p>
      {problem?.requestId && <p className="mt-1 text-label text-ink3">Request {problem.requestId}</p>}
      {onRetry && <Button className="mt-3" size="bar" onClick={onRetry}>Try again</Button>}
    </div>
  );
}

/** A refusal beside the button that caused it. */
export function Refused({ error }: { error: unknown }) {
  if (!error) return null;
  const problem = error instanceof ApiProblem ? error : null;
  return (
    <p role="alert" className="text-text font-strong text-red">
      {problem?.message ?? "That did not work. Try again."}
      {problem && problem.status >= 500 && <span className="block text-label font-normal text-ink3">Request {problem.requestId}</span>}
    </p>
  );
}

/** What to do first, where there is nothing yet. */
export function EmptyNote({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="px-5 py-10">
      <p className="text-heading font-heading stretch-heading">{title}</p>
      <p className="mt-1 max-w-[52ch] text-text text-ink2">{children}</p>
      {action && <div className="mt-5 flex gap-2">{action}</div>}
    </div>
  );
}

/** Grey bars where lines will stand. */
export function Skeleton({ lines, height = 68 }: { lines: number; height?: number }) {
  return (
    <div aria-busy="true" aria-label="Loading">
      {Array.from({ length: lines }, (_, index) => (
        <div key={index} className="flex items-center gap-6 border-b border-g2 px-5" style={{ height }}>
          <span className="h-3 w-16 bg-g2" />
          <span className="h-3 bg-g2" style={{ width: `${28 + ((index * 17) % 30)}%` }} />
        </div>
      ))}
    </div>
  );
}
