"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { FormProvider, useForm, useWatch } from "react-hook-form";
import { z } from "zod";
import { line } from "@/lib/api";
import type { JurisdictionAnswer } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { editionName } from "@/lib/code/adoption";
import { useNextNumber } from "@/lib/client/jobsApi";
import { keys, useChange, useJurisdictions, useMe } from "@/lib/client/queries";
import { Button, LinkButton } from "@/components/ui/Button";
import { SelectField, TextField } from "@/components/ui/Field";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { FormSection } from "./FormSection";
import { OfficeBar } from "./OfficeBar";
import { PlaceFields } from "./PlaceFields";
import { SiteFields } from "./SiteFields";
import { paths } from "./paths";
import { EMPTY_SITE, placeForm, siteForm, siteOfForm } from "./siteForm";

const NEW = "new";
const schema = z.object({ companyId: z.string(), jurisdictionId: z.string().min(1, "Choose the jurisdiction, or enter a new one."), jurisdictionName: line(120), ordinance: line(160), ...placeForm.shape, number: line(40), ...siteForm.shape })
  .superRefine((form, context) => {
    if (form.jurisdictionId === NEW && form.jurisdictionName === "") context.addIssue({ code: "custom", path: ["jurisdictionName"], message: "is missing" });
  });
type Form = z.input<typeof schema>;

const EMPTY = { number: "", name: "", addressLines: "", parcel: "", owner: "", scope: "", permitNumber: "", preparer: "", contractor: "", jurisdictionId: "", jurisdictionName: "", ordinance: "", ...EMPTY_SITE };

/** A new job with its site; the drawing begins as an empty sheet. */
export function NewJobForm() {
  const me = useMe();
  const jurisdictions = useJurisdictions();
  const companies = (me.data?.companies ?? []).filter((each) => each.may.createJobs);
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto w-full max-w-[1120px] p-6 phone:p-3">
        {(me.isPending || jurisdictions.isPending) && <div className="bg-paper"><Skeleton lines={4} /></div>}
        {jurisdictions.isError && <ErrorNote error={jurisdictions.error} onRetry={() => void jurisdictions.refetch()} />}
        {me.data && companies.length === 0 && <ErrorNote error={null} title="You cannot make jobs" />}
        {me.data && jurisdictions.data && companies.length > 0 && <Sheet companies={companies} jurisdictions={jurisdictions.data.jurisdictions} />}
      </main>
    </div>
  );
}

function Sheet({ companies, jurisdictions }: { companies: readonly { id: string; name: string }[]; jurisdictions: readonly JurisdictionAnswer[] }) {
  const router = useRouter();
  const create = useChange(api.createJob, [keys.jobs, keys.jurisdictions]);
  const [failure, setFailure] = useState<unknown>(null);
  const form = useForm<Form, unknown, z.output<typeof schema>>({ resolver: zodResolver(schema), defaultValues: { ...EMPTY, companyId: companies[0]?.id ?? "" } });
  const { control, register, handleSubmit, setError, setValue, formState: { errors } } = form;
  const [jurisdictionId, companyId] = useWatch({ control, name: ["jurisdictionId", "companyId"] });
  const next = useNextNumber(companyId).data?.number;
  const known = jurisdictions.find((each) => each.id === jurisdictionId);

  const submit = handleSubmit(async (filled) => {
    setFailure(null);
    const { companyId, jurisdictionId: id, jurisdictionName, ordinance, number, name, addressLines, parcel, owner, scope, permitNumber, preparer, contractor, ...site } = filled;
    try {
      const { id: jobId } = await create.mutateAsync({
        companyId, ...(number === "" ? {} : { number }), name, addressLines, parcel, owner, scope, permitNumber, preparer, contractor,
        jurisdiction: id === NEW ? { name: jurisdictionName, edition: site.edition, ordinance } : { id }, site: siteOfForm(site),
      });
      router.push(paths.job(jobId));
    } catch (error) {
      if (error instanceof ApiProblem && error.field === "number") setError("number", { message: error.fieldMessage }, { shouldFocus: true });
      else if (error instanceof ApiProblem && error.field === "jurisdiction.name") setError("jurisdictionName", { message: error.fieldMessage }, { shouldFocus: true });
      else setFailure(error);
    }
  });

  const jurisdictionField = register("jurisdictionId");
  return (
    <FormProvider {...form}>
    <form onSubmit={submit} noValidate className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      <div className="border-b-[1.5px] border-ink px-8 py-6 phone:px-4">
        <h1 className="text-title font-heading stretch-heading">New job</h1>
        <p className="mt-1 max-w-[62ch] text-text text-ink2">What is entered here stands in the title block and is read by the rules. What you do not know yet stays empty; the checker says where it is needed.</p>
      </div>
      <FormSection title="Job" text="Number and name stand on every sheet.">
        {companies.length > 1 && (
          <SelectField label="Company" className="col-span-2" {...register("companyId")}>
            {companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
          </SelectField>
        )}
        <TextField label="Job number" placeholder={next ?? ""} hint={`Left empty: the next of your company's scheme${next ? `, ${next} now` : ""}.`} autoFocus error={errors.number?.message} {...register("number")} />
        <TextField label="Name" placeholder="Place or owner" error={errors.name?.message} {...register("name")} />
        <PlaceFields contractorHint="Left empty: your company." />
      </FormSection>
      <FormSection title="Jurisdiction" text="Whose code is adopted, and what was amended locally. Amendments of a known jurisdiction come along.">
        <SelectField
          label="Authority having jurisdiction" className="col-span-2" error={errors.jurisdictionId?.message} {...jurisdictionField}
          onChange={async (event) => {
            await jurisdictionField.onChange(event);
            const chosen = jurisdictions.find((each) => each.id === event.target.value);
            if (chosen) setValue("edition", chosen.edition);
          }}
        >
          <option value="">choose</option>
          {jurisdictions.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
          <option value={NEW}>Another jurisdiction …</option>
        </SelectField>
        {jurisdictionId === NEW && (
          <>
            <TextField label="Name of the jurisdiction" error={errors.jurisdictionName?.message} {...register("jurisdictionName")} />
            <TextField label="Ordinance" hint="If it amends the code." error={errors.ordinance?.message} {...register("ordinance")} />
          </>
        )}
        {known && <KnownJurisdiction jurisdiction={known} />}
      </FormSection>
      <FormSection title="Site" text="Temperatures set string voltage and conductor ampacity; the fault current sets interrupting ratings.">
        <SiteFields />
      </FormSection>
      <div className="flex items-center gap-3 border-t border-ink px-8 py-5 phone:px-4">
        <Button type="submit" look="primary" busy={create.isPending}>Make the job</Button>
        <LinkButton href={paths.jobs} look="quiet">Cancel</LinkButton>
        <Refused error={failure} />
      </div>
    </form>
    </FormProvider>
  );
}

function KnownJurisdiction({ jurisdiction }: { jurisdiction: JurisdictionAnswer }) {
  const amendments = Object.entries(jurisdiction.amendments);
  return (
    <div className="col-span-2 border-l-[3px] border-blue pl-3 text-text">
      <p>Adopted: {editionName(jurisdiction.edition)}{jurisdiction.ordinance && `, ${jurisdiction.ordinance}`}.</p>
      {amendments.map(([id, each]) => (
        <p key={id} className="text-ink2">{each.citation}</p>
      ))}
    </div>
  );
}
