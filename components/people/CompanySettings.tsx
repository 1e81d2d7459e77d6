"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useEffect } from "react";
import { useForm } from "react-hook-form";
import { companyChange, type CompanyAnswer, type CompanyChange, type CompanyDetail } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { companyApi, companyKey, useCompany } from "@/lib/client/companyApi";
import { keys, useChange } from "@/lib/client/queries";
import { nextJobNumber, schemeFault } from "@/lib/workflow/jobNumber";
import { FormSection } from "@/components/jobs/FormSection";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";

/** Name and job numbers of a company, for its administrators. */
export function CompanySettings({ company }: { company: CompanyAnswer }) {
  const detail = useCompany(company.id);
  return (
    <Panel title={`Settings of ${company.name}`}>
      {detail.isPending && <Skeleton lines={2} />}
      {detail.isError && <div className="p-5"><ErrorNote error={detail.error} onRetry={() => void detail.refetch()} /></div>}
      {detail.data && <SettingsForm detail={detail.data} />}
    </Panel>
  );
}

const FIELDS = ["name", "jobNumberScheme"] as const;

function SettingsForm({ detail }: { detail: CompanyDetail }) {
  const { name, jobNumberScheme } = detail;
  const save = useChange((change: CompanyChange) => companyApi.change(detail.id, change), [companyKey(detail.id), keys.me]);
  const { register, handleSubmit, reset, setError, watch, formState: { errors, isDirty } } = useForm<CompanyChange>({ resolver: zodResolver(companyChange), defaultValues: { name, jobNumberScheme } });
  useEffect(() => reset({ name, jobNumberScheme }), [name, jobNumberScheme, reset]);
  const submit = handleSubmit(async (input) => {
    try {
      await save.mutateAsync(input);
    } catch (error) {
      const field = error instanceof ApiProblem ? FIELDS.find((each) => each === error.field) : undefined;
      if (field) setError(field, { message: (error as ApiProblem).fieldMessage });
    }
  });
  const scheme = (watch("jobNumberScheme") ?? "").trim();
  const example = scheme !== "" && schemeFault(scheme) === null ? nextJobNumber(scheme, [], new Date().toISOString().slice(0, 10)) : null;
  return (
    <form onSubmit={submit} noValidate>
      <FormSection title="Company" text="New jobs are numbered by the scheme; whoever makes one can enter another number. Jobs that are there keep theirs.">
        <TextField label="Name" error={errors.name?.message} {...register("name")} />
        <TextField
          label="Job number scheme" error={errors.jobNumberScheme?.message} spellCheck={false}
          hint={`${example === null ? "" : `First of a year: ${example}. `}{yy} or {yyyy} is the year, {nnn} the running number.`} {...register("jobNumberScheme")}
        />
        <div className="col-span-2 flex items-center gap-3 phone:col-span-1">
          <Button type="submit" look="primary" disabled={!isDirty} busy={save.isPending}>Save the settings</Button>
          {save.isSuccess && !isDirty && <span role="status" className="text-text text-ink2">Saved.</span>}
          <Refused error={save.error} />
        </div>
      </FormSection>
    </form>
  );
}
