"use client";

import { DropdownMenu } from "radix-ui";
import { useState } from "react";
import type { JobAnswer } from "@/lib/api";
import { useMe } from "@/lib/client/queries";
import { buttonClass } from "@/components/ui/Button";
import { ArchiveDialog } from "./ArchiveDialog";
import { DuplicateDialog } from "./DuplicateDialog";

const ITEM = "flex h-bar-control cursor-pointer items-center px-3 text-body outline-none data-[highlighted]:bg-tint";

/** What is done to a job as a whole, seldom. */
export function JobMenu({ job }: { job: JobAnswer }) {
  const me = useMe();
  const [open, setOpen] = useState<"duplicate" | "archive" | null>(null);
  // A copy is a new job of the company; somebody from outside who is on this one cannot make it.
  const duplicate = job.may.duplicate && (me.data?.companies.some((each) => each.id === job.companyId && each.may.createJobs) ?? false);
  const close = (still: boolean) => { if (!still) setOpen(null); };
  if (!duplicate && !job.may.archive) return null;
  return (
    <>
      <DropdownMenu.Root modal={false}>
        <DropdownMenu.Trigger className={buttonClass()}>More<Arrow /></DropdownMenu.Trigger>
        <DropdownMenu.Portal>
          <DropdownMenu.Content align="end" sideOffset={6} className="z-50 min-w-[220px] border border-ink bg-paper py-1 shadow-[3px_3px_0_var(--hatch)]">
            {duplicate && <DropdownMenu.Item className={ITEM} onSelect={() => setOpen("duplicate")}>Duplicate …</DropdownMenu.Item>}
            {job.may.archive && <DropdownMenu.Item className={ITEM} onSelect={() => setOpen("archive")}>{job.archivedAt ? "Take out of the archive …" : "Archive …"}</DropdownMenu.Item>}
          </DropdownMenu.Content>
        </DropdownMenu.Portal>
      </DropdownMenu.Root>
      <DuplicateDialog job={job} open={open === "duplicate"} onOpenChange={close} />
      <ArchiveDialog job={job} open={open === "archive"} onOpenChange={close} />
    </>
  );
}

const Arrow = () => <svg viewBox="0 0 12 8" className="h-2 w-3" aria-hidden="true"><path d="M1 1.5L6 6.5L11 1.5" fill="none" stroke="currentColor" strokeWidth="1.6" /></svg>;
