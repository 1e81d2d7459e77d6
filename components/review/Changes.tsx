"use client";

import { useMemo } from "react";
import type { RevisionAnswer } from "@/lib/api";
import { canonicalJson } from "@/lib/diagram/canonical";
import { COLLECTIONS, type Drawing } from "@/lib/diagram/schema";
import { useRevision } from "@/lib/client/queries";

interface Change { tag: string; what: string }
const tagOf = (element: unknown): string => (typeof element === "object" && element !== null && "tag" in element && typeof element.tag === "string" ? element.tag : "");

/** Elements that were added, removed or changed between two drawings, by tag. */
function changes(before: Drawing, now: Drawing): Change[] {
  return COLLECTIONS.flatMap((collection) => {
    const was = before[collection] as Record<string, unknown>;
    const is = now[collection] as Record<string, unknown>;
    return [...new Set([...Object.keys(was), ...Object.keys(is)])].sort().flatMap((id): Change[] => {
      const tag = tagOf(is[id]) || tagOf(was[id]) || collection;
      if (!Object.hasOwn(was, id)) return [{ tag, what: "added" }];
      if (!Object.hasOwn(is, id)) return [{ tag, what: "removed" }];
      return canonicalJson(was[id]) === canonicalJson(is[id]) ? [] : [{ tag, what: "changed" }];
    });
  });
}

/** What changed since the last sealed revision. */
export function Changes({ revision }: { revision: RevisionAnswer }) {
  if (!revision.previous) return <p className="border-t border-rule px-5 py-2.5 text-text text-ink2">No revision of this job was sealed before: everything is new.</p>;
  return <Since revision={revision} previous={revision.previous} />;
}

function Since({ revision, previous }: { revision: RevisionAnswer; previous: { id: string; letter: string } }) {
  const before = useRevision(previous.id);
  const list = useMemo(() => (before.data ? changes(before.data.drawing, revision.drawing) : []), [before.data, revision.drawing]);
  return (
    <section aria-labelledby="changes" className="max-h-[30%] overflow-y-auto border-t border-rule px-5 py-3">
      <h2 id="changes" className="text-finding font-heading">Since Rev {previous.letter} <span className="font-normal text-ink2">{before.isPending ? "" : list.length === 0 ? "nothing changed" : `${list.length} changes`}</span></h2>
      <ul className="mt-1 grid grid-cols-2 gap-x-6 text-body">{list.map((each, index) => <li key={index} className="flex justify-between border-b border-g2 py-1"><span className="font-strong">{each.tag}</span><span className="text-ink2">{each.what}</span></li>)}</ul>
    </section>
  );
}
