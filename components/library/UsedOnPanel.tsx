import Link from "next/link";
import type { LibraryEntryAnswer } from "@/lib/api";
import { Panel } from "@/components/jobs/Panel";
import { paths } from "@/components/jobs/paths";

/** Drawings that hold equipment of this entry, with its tags and the version it was drawn with. */
export function UsedOnPanel({ entry }: { entry: LibraryEntryAnswer }) {
  const jobs = new Set(entry.usedBy.map((use) => use.jobId)).size;
  return (
    <Panel title="Used on" aside={jobs > 0 && <span className="text-label text-ink2">{jobs === 1 ? "1 job" : `${jobs} jobs`}</span>}>
      {entry.usedBy.length === 0 ? <p className="px-5 py-4 text-text text-ink2">No drawing you can see holds it. Drawings keep the values they were drawn with, whatever changes here.</p> : (
        <ul>
          {entry.usedBy.map((use) => (
            <li key={`${use.jobId} ${use.version}`} className="border-b border-g2 px-5 py-2.5 last:border-b-0">
              <Link href={paths.job(use.jobId)} className="block truncate text-text font-finding hover:underline"><span className="font-lettering">{use.number}</span> {use.name}</Link>
              <p className="text-label text-ink2"><span className="font-lettering">{use.tags.join(", ")}</span>, version {use.version}{use.version < entry.version && <span className="text-ochre">: {entry.version - use.version === 1 ? "one version" : `${entry.version - use.version} versions`} behind</span>}</p>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
