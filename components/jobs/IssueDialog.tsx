"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { PURPOSES, line, type Counts } from "@/lib/api";
import { api } from "@/lib/client/api";
import { keys, useChange } from "@/lib/client/queries";
import { previewNote } from "@/lib/code/adoption";
import type { Edition } from "@/lib/diagram/schema";
import { Button } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { Dialog } from "@/components/ui/Dialog";
import { SelectField, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { RedlineMark } from "@/components/ui/RedlineMark";

const schema = z.object({ purpose: z.enum(PURPOSES), description: line(200) });
type Form = z.infer<typeof schema>;

interface IssueDialogProps {
  jobId: string; letter: string; counts: Counts | null; edition: Edition; open: boolean;
  onOpenChange: (open: boolean) => void;
  onIssued?: (revisionId: string) => void;
}

/** Issues the drawing for review, and says which redlines go along. */
export function IssueDialog({ jobId, letter, counts, edition, open, onOpenChange, onIssued }: IssueDialogProps) {
  const issue = useChange((form: Form) => api.issue(jobId, form), [keys.jobs, keys.job(jobId)]);
  const { register, handleSubmit, formState: { errors } } = useForm<Form>({ resolver: zodResolver(schema), defaultValues: { purpose: PURPOSES[0], description: "" } });
  const submit = handleSubmit(async (form) => {
    const made = await issue.mutateAsync(form).catch(() => null);
    if (!made) return;
    onOpenChange(false);
    onIssued?.(made.id);
  });
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={`Issue Rev ${letter} for review`} description="The drawing as it is now is frozen, checked again on the server and laid before the licensee.">
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <SelectField label="Purpose" error={errors.purpose?.message} {...register("purpose")}>
          {PURPOSES.map((purpose) => <option key={purpose} value={purpose}>{purpose}</option>)}
        </SelectField>
        <TextField label="Description" hint="One line for the revision table." error={errors.description?.message} {...register("description")} />
        {counts && <GoesAlong counts={counts} />}
        {previewNote(edition) && <p className="border-l-[3px] border-ochre pl-3 text-text">{previewNote(edition)}</p>}
        <Caution compact />
        <Refused error={issue.error} />
        <div className="flex gap-2">
          <Button type="submit" look="primary" busy={issue.isPending}>Issue Rev {letter}</Button>
          <Button onClick={() => onOpenChange(false)}>Not yet</Button>
        </div>
      </form>
    </Dialog>
  );
}

function GoesAlong({ counts }: { counts: Counts }) {
  if (counts.mustFix + counts.needsData + counts.shouldFix === 0) return <p className="text-text text-ink2">No redline is open.</p>;
  return (
    <div className="border border-g1 bg-vellum px-3 py-2 text-text">
      {counts.mustFix > 0 && <p className="flex items-center gap-2 py-1"><RedlineMark kind="must-fix" number={counts.mustFix} />must-fix go along. They block the seal until repaired or accepted in writing.</p>}
      {counts.needsData > 0 && <p className="flex items-center gap-2 py-1"><RedlineMark kind="needs-data" number={counts.needsData} />needs data go along.</p>}
      {counts.shouldFix > 0 && <p className="flex items-center gap-2 py-1"><RedlineMark kind="should-fix" number={counts.shouldFix} />should-fix go along.</p>}
    </div>
  );
}
