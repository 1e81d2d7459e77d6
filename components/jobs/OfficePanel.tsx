"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useEffect } from "react";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { OFFICE_STATUSES, type JobAnswer, type JobChange } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { keys, useChange } from "@/lib/client/queries";
import { Button } from "@/components/ui/Button";
import { SelectField, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { Panel } from "./Panel";
import { officeChange, officeForm, officeFormOf, type OfficeForm } from "./officeForm";

/** Due date, where the office stands, and the permit with its fee. Nothing of it is on a sheet, so none of it touches a seal. */
export function OfficePanel({ job }: { job: JobAnswer }) {
  const save = useChange((change: JobChange) => api.changeJob(job.id, change), [keys.job(job.id), keys.jobs]);
  const { register, handleSubmit, reset, setError, formState: { errors, isDirty, dirtyFields } } =
    useForm<OfficeForm, unknown, z.output<typeof officeForm>>({ resolver: zodResolver(officeForm), defaultValues: officeFormOf(job), disabled: !job.may.edit });
  // Somebody else's change is shown as long as nothing was typed here.
  useEffect(() => {
    if (!isDirty) reset(officeFormOf(job));
  }, [job, isDirty, reset]);
  const submit = handleSubmit(async (filled) => {
    try {
      reset(officeFormOf(await save.mutateAsync(officeChange(filled, dirtyFields))));
    } catch (error) {
      const field = error instanceof ApiProblem ? officeForm.keyof().safeParse(error.field) : null;
      if (field?.success) setError(field.data, { message: (error as ApiProblem).fieldMessage }, { shouldFocus: true });
    }
  });
  return (
    <Panel title="Due date and permit">
      <form onSubmit={submit} noValidate aria-label="Due date and permit">
        <div className="grid grid-cols-2 gap-x-4 gap-y-4 p-5">
          <TextField label="Due" type="date" error={errors.dueOn?.message} {...register("dueOn")} />
          <SelectField label="Office status" error={errors.officeStatus?.message} {...register("officeStatus")}>
            {OFFICE_STATUSES.map((each) => <option key={each} value={each}>{each}</option>)}
          </SelectField>
        </div>
        <div className="grid grid-cols-2 gap-x-4 gap-y-4 border-t border-g1 p-5">
          <div className="col-span-2 flex items-baseline justify-between gap-3">
            <h3 className="text-finding font-heading">Permit</h3>
            <p className="min-w-0 truncate font-lettering text-[15px]">{job.permitNumber || <span className="font-sans text-text text-ink2">no number yet</span>}</p>
          </div>
          <p className="col-span-2 -mt-3 text-label text-ink3">The number stands in the title block and is entered there. The fee is noted for the office; nothing is paid here.</p>
          <TextField label="Fee" unit="USD" inputMode="decimal" placeholder={job.may.edit ? "412.50" : ""} error={errors.permitFeeCents?.message} {...register("permitFeeCents")} />
          <TextField label="Paid on" type="date" error={errors.permitFeePaidOn?.message} {...register("permitFeePaidOn")} />
          <TextField label="Receipt number" className="col-span-2" error={errors.permitReceipt?.message} {...register("permitReceipt")} />
        </div>
        {job.may.edit && (isDirty || save.isSuccess || save.isError) && (
          <div className="flex flex-wrap items-center gap-3 border-t border-ink px-5 py-4">
            {isDirty && <Button type="submit" look="primary" busy={save.isPending}>Save due date and permit</Button>}
            {isDirty && <Button onClick={() => { save.reset(); reset(officeFormOf(job)); }}>Take back</Button>}
            {!isDirty && save.isSuccess && <span role="status" className="text-text text-ink2">Saved.</span>}
            <Refused error={save.error instanceof ApiProblem && save.error.status === 422 ? null : save.error} />
          </div>
        )}
      </form>
    </Panel>
  );
}
