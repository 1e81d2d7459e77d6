import { uploadRefusal } from "@/lib/client/filesApi";
import { sizeWords } from "@/lib/client/dates";
import type { Sending } from "@/lib/client/useUploads";
import { Button } from "@/components/ui/Button";

/** What the same file, sent again, may fare better with. */
const worthRetrying = (status: number) => status === 0 || status === 400 || status === 429 || status >= 500;

/** One file on its way, or the reason it did not arrive. */
export function SendingRow({ sending, onStop, onRetry }: { sending: Sending; onStop: () => void; onRetry: () => void }) {
  const { file, state, sent, error } = sending;
  const failed = state === "failed";
  const again = failed && (!error || worthRetrying(error.status));
  const percent = Math.round(sent * 100);
  const words = state === "waiting" ? "Waits for its turn" : sent < 1 ? `${percent} % of ${sizeWords(file.size)}` : "Sent; the server looks at it";
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-g2 px-4 py-2.5 last:border-b-0">
      <div className="min-w-0 flex-1 basis-56">
        <p className="truncate text-text font-strong" title={file.name}>{file.name}</p>
        {failed ? (
          <p role="alert" className="text-text text-red">
            {error ? uploadRefusal("It", error) : "That did not work."}
            {error && error.status >= 500 && <span className="block text-label text-ink3">Request {error.requestId}</span>}
          </p>
        ) : (
          <>
            {state === "sending" && <progress value={percent} max={100} aria-label={`Sending ${file.name}`} className="mt-1 block h-1.5 w-full appearance-none border border-rule bg-paper [&::-moz-progress-bar]:bg-ink [&::-webkit-progress-bar]:bg-paper [&::-webkit-progress-value]:bg-ink" />}
            <p className="mt-1 text-label text-ink2" role={state === "sending" && sent === 1 ? "status" : undefined}>{words}</p>
          </>
        )}
      </div>
      <div className="flex gap-2">
        {again && <Button size="bar" onClick={onRetry}>Try again</Button>}
        <Button size="bar" look="quiet" onClick={onStop}>{failed ? "Put away" : "Stop"}</Button>
      </div>
    </li>
  );
}
