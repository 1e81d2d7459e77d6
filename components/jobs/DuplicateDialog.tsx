"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { filledLine, line, type JobAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { useDuplicate, useNextNumber } from "@/lib/client/jobsApi";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { paths } from "./paths";

interface DuplicateDialogProps { job: JobAnswer; open: boolean; onOpenChange: (open: boolean) => void }

/** Another job like this one. */
export function DuplicateDialog({ job, open, onOpenChange }: DuplicateDialogProps) {
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={`Duplicate ${job.number}`} description="A new job with the site and title block of this one. Revisions, seals, acceptances, statements and the permit stay with the job they were given for.">
      <DuplicateForm job={job} onCancel={() => onOpenChange(false)} />
    </Dialog>
  );
}

const schema = z.object({ number: line(40), name: filledLine(120), drawing: z.boolean(), people: z.boolean() });
type Form = z.input<typeof schema>;

function DuplicateForm({ job, onCancel }: { job: JobAnswer; onCancel: () => void }) {
  const router = useRouter();
  const next = useNextNumber(job.companyId);
  const duplicate = useDuplicate(job.id);
  const { register, handleSubmit, setError, formState: { errors } } =
    useForm<Form, unknown, z.output<typeof schema>>({ resolver: zodResolver(schema), defaultValues: { number: "", name: job.name, drawing: true, people: false } });
  const submit = handleSubmit(async ({ number, ...rest }) => {
    try {
      const { id } = await duplicate.mutateAsync({ ...rest, ...(number === "" ? {} : { number }) });
      router.push(paths.job(id));
    } catch (error) {
      if (error instanceof ApiProblem && error.field === "number") setError("number", { message: error.fieldMessage }, { shouldFocus: true });
    }
  });
  const tick = "mt-0.5 size-4 shrink-0 accent-[var(--ink)]";
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      <TextField
        label="Job number" placeholder={next.data?.number ?? ""} hint={`Left empty: the next of your company's scheme${next.data ? `, ${next.data.number} now` : ""}.`}
        error={errors.number?.message} {...register("number")}
      />
      <TextField label="Name" error={errors.name?.message} {...register("name")} />
      <label className="flex gap-2.5 text-text"><input type="checkbox" className={tick} {...register("drawing")} /><span>Copy the drawing<span className="block text-body text-ink2">Without it the copy begins with an empty sheet.</span></span></label>
      <label className="flex gap-2.5 text-text"><input type="checkbox" className={tick} {...register("people")} /><span>Put the same people on it, in the same roles</span></label>
      <Refused error={duplicate.error instanceof ApiProblem && duplicate.error.field === "number" ? null : duplicate.error} />
      <div className="flex gap-2">
        <Button type="submit" look="primary" busy={duplicate.isPending}>Make the copy</Button>
        <Button onClick={onCancel}>Not now</Button>
      </div>
    </form>
  );
}
