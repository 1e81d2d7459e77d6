"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useEffect, useState } from "react";
import { FormProvider, useForm } from "react-hook-form";
import { z } from "zod";
import type { JobAnswer } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { keys, useChange, useJurisdictions } from "@/lib/client/queries";
import { Button } from "@/components/ui/Button";
import { SelectField, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { FormSection } from "./FormSection";
import { JurisdictionNotice } from "./JurisdictionNotice";
import { Panel } from "./Panel";
import { PlaceFields } from "./PlaceFields";
import { SiteFields } from "./SiteFields";
import { placeForm, siteForm, siteFormOf, siteOfForm } from "./siteForm";

const schema = z.object({ jurisdictionId: z.string(), ...placeForm.shape, ...siteForm.shape });
type Form = z.input<typeof schema>;

const formOf = (job: JobAnswer): Form => ({
  number: job.number, name: job.name, addressLines: job.addressLines, parcel: job.parcel, owner: job.owner, scope: job.scope, permitNumber: job.permitNumber,
  preparer: job.preparer, contractor: job.contractor, jurisdictionId: job.jurisdiction?.id ?? "", ...siteFormOf(job.site),
});

/** Site and title block. What is changed here is changed in the drawing, as an edit of its own. */
export function SitePanel({ job }: { job: JobAnswer }) {
  const jurisdictions = useJurisdictions();
  const change = useChange((input: Parameters<typeof api.changeJob>[1]) => api.changeJob(job.id, input), [keys.job(job.id), keys.jobs]);
  const [saved, setSaved] = useState(false);
  const form = useForm<Form, unknown, z.output<typeof schema>>({ resolver: zodResolver(schema), defaultValues: formOf(job), disabled: !job.may.edit });
  const { register, handleSubmit, reset, setError, formState: { errors, isDirty, dirtyFields } } = form;
  // Somebody else's change is shown as long as nothing was typed here.
  useEffect(() => {
    if (!isDirty) reset(formOf(job));
  }, [job, isDirty, reset]);

  const submit = handleSubmit(async (filled) => {
    setSaved(false);
    const { jurisdictionId, number, name, addressLines, parcel, owner, scope, permitNumber, preparer, contractor, ...site } = filled;
    const place = { number, name, addressLines, parcel, owner, scope, permitNumber, preparer, contractor };
    const touched = <T extends object>(values: T) => Object.fromEntries(Object.entries(values).filter(([field]) => field in dirtyFields)) as Partial<T>;
    const siteChange = touched(siteOfForm(site));
    try {
      const answer = await change.mutateAsync({
        ...touched(place), ...("jurisdictionId" in dirtyFields && jurisdictionId ? { jurisdictionId } : {}), ...(Object.keys(siteChange).length > 0 ? { site: siteChange } : {}),
      });
      reset(formOf(answer));
      setSaved(true);
    } catch (error) {
      if (error instanceof ApiProblem && error.field === "number") setError("number", { message: error.fieldMessage }, { shouldFocus: true });
    }
  });

  return (
    <Panel title="Site and title block" aside={!job.may.edit && <span className="text-label text-ink2">{job.archivedAt ? "To read; the job is in the archive" : "To read; designers and administrators change it"}</span>}>
      <FormProvider {...form}>
      <form onSubmit={submit} noValidate>
        <FormSection title="Job" text="Number and name stand on every sheet.">
          <TextField label="Job number" error={errors.number?.message} {...register("number")} />
          <TextField label="Name" error={errors.name?.message} {...register("name")} />
          <PlaceFields />
        </FormSection>
        <FormSection title="Jurisdiction" text="Its amendments and requirements come along when another is chosen.">
          <SelectField label="Authority having jurisdiction" className="col-span-2" {...register("jurisdictionId")}>
            {!job.jurisdiction && <option value="">not known yet</option>}
            {/* One option stays where it is while the others load: a select without its option shows another. */}
            {job.jurisdiction && <option key={job.jurisdiction.id} value={job.jurisdiction.id}>{job.jurisdiction.name}</option>}
            {jurisdictions.data?.jurisdictions.filter((each) => each.id !== job.jurisdiction?.id).map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
          </SelectField>
          <JurisdictionNotice job={job} />
          {Object.entries(job.site.amendments).map(([id, each]) => (
            <p key={id} className="col-span-2 border-l-[3px] border-blue pl-3 text-text text-ink2">{each.citation}</p>
          ))}
        </FormSection>
        <FormSection title="Site" text="Temperatures set string voltage and conductor ampacity; the fault current sets interrupting ratings.">
          <SiteFields />
        </FormSection>
        {job.may.edit && (
          <div className={`${isDirty ? "sticky bottom-0" : ""} flex items-center gap-3 border-t border-ink bg-paper px-8 py-4 phone:px-4`}>
            <Button type="submit" look="primary" disabled={!isDirty} busy={change.isPending}>Save</Button>
            {isDirty && <Button onClick={() => reset(formOf(job))}>Take back</Button>}
            {isDirty && (job.state === "sealed") && <span className="text-text">Saving makes the seal of Rev {job.revision} void.</span>}
            {!isDirty && saved && <span role="status" className="text-text text-ink2">Saved.</span>}
            <Refused error={change.error instanceof ApiProblem && change.error.field === "number" ? null : change.error} />
          </div>
        )}
      </form>
      </FormProvider>
    </Panel>
  );
}
