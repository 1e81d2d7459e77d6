"use client";

import type { JobAnswer } from "@/lib/api";
import { useArchive } from "@/lib/client/jobsApi";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { Refused } from "@/components/ui/Notes";

interface ArchiveDialogProps { job: JobAnswer; open: boolean; onOpenChange: (open: boolean) => void }

/** Asks before a job goes into the archive or comes out of it, and says what that means. */
export function ArchiveDialog({ job, open, onOpenChange }: ArchiveDialogProps) {
  const archive = useArchive(job.id);
  const into = job.archivedAt === null;
  const go = async () => {
    if (await archive.mutateAsync(into).then(() => true, () => false)) onOpenChange(false);
  };
  return (
    <Dialog
      open={open} onOpenChange={onOpenChange} title={into ? `Archive ${job.number}` : `Take ${job.number} out of the archive`}
      description={into
        ? "The job leaves the register and stays as it is: nothing can be drawn, issued or sealed on it. Sealed sheets can still be downloaded. It is found again under Archived."
        : "The job comes back into the register, and its drawing can be changed again."}
    >
      <div className="flex flex-col gap-4">
        {into && (job.state === "in review" || job.state === "sealing") && <p className="border-l-[3px] border-ochre pl-3 text-text">Rev {job.revision} is {job.state === "sealing" ? "being sealed" : "in review"}. In the archive it can be neither returned nor sealed.</p>}
        <Refused error={archive.error} />
        <div className="flex gap-2">
          <Button look="primary" busy={archive.isPending} onClick={() => void go()}>{into ? "Archive the job" : "Take it out"}</Button>
          <Button onClick={() => onOpenChange(false)}>Not now</Button>
        </div>
      </div>
    </Dialog>
  );
}
