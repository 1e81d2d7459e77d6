import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useRef, useState } from "react";
import type { FileAnswer, FilePurpose } from "@/lib/api";
import { ApiProblem } from "./api";
import { filesKey, uploadFile, type FilePlace } from "./filesApi";
import { newId } from "./newId";

/** A file on its way. It stays chosen until it is stored or put away, so that it can be sent again. */
export interface Sending { key: string; file: File; purpose: FilePurpose; state: "waiting" | "sending" | "failed"; sent: number; error: ApiProblem | null }

/**
 * Sends files one after the other.
 * @param onStored called with each file that was stored
 */
export function useUploads(place: FilePlace, onStored?: (file: FileAnswer) => void) {
  const client = useQueryClient();
  const [list, setList] = useState<readonly Sending[]>([]);
  const stops = useRef(new Map<string, AbortController>());
  const stored = useRef(onStored);
  useEffect(() => { stored.current = onStored; });
  // Nothing goes on sending for a page that is gone.
  useEffect(() => {
    const open = stops.current;
    return () => open.forEach((stop) => stop.abort());
  }, []);

  const change = useCallback((key: string, to: Partial<Sending>) => setList((now) => now.map((each) => (each.key === key ? { ...each, ...to } : each))), []);
  const drop = useCallback((key: string) => setList((now) => now.filter((each) => each.key !== key)), []);

  const next = list.some((each) => each.state === "sending") ? undefined : list.find((each) => each.state === "waiting");
  useEffect(() => {
    if (!next || stops.current.has(next.key)) return;
    const stop = new AbortController();
    stops.current.set(next.key, stop);
    change(next.key, { state: "sending", sent: 0, error: null });
    uploadFile({ place, file: next.file, purpose: next.purpose, signal: stop.signal, onProgress: (sent) => change(next.key, { sent }) })
      .then((answer) => {
        drop(next.key);
        stored.current?.(answer);
      }, (error: unknown) => change(next.key, { state: "failed", error: error instanceof ApiProblem ? error : null }))
      .finally(() => {
        stops.current.delete(next.key);
        // After a failure too: an answer that was lost may have been a good one.
        void client.invalidateQueries({ queryKey: [...filesKey(place)] });
      });
  }, [next, place, client, change, drop]);

  return {
    list,
    add: useCallback((files: Iterable<File>, purpose: FilePurpose) => {
      // Copied at once: the browser empties the list of a chooser that is cleared.
      const chosen = [...files].map((file): Sending => ({ key: newId("upload"), file, purpose, state: "waiting", sent: 0, error: null }));
      setList((now) => [...now, ...chosen]);
    }, []),
    retry: useCallback((key: string) => change(key, { state: "waiting", error: null }), [change]),
    /** Stops sending; what was sent is thrown away by the server. */
    stop: useCallback((key: string) => {
      const sending = stops.current.get(key);
      if (sending) sending.abort();
      else drop(key);
    }, [drop]),
  };
}
