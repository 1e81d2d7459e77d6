"use client";

import { useEffect, useState } from "react";
import { FormProvider, useForm } from "react-hook-form";
import type { JurisdictionDetail, JurisdictionFacts } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { jurisdictionKeys, jurisdictionsApi } from "@/lib/client/jurisdictionsApi";
import { keys, useChange } from "@/lib/client/queries";
import { adoptionInForce, nextAdoption } from "@/lib/code/adoption";
import { REQUIREMENT_LABELS } from "@/lib/diagram/jurisdiction";
import { FormSection } from "@/components/jobs/FormSection";
import { Button } from "@/components/ui/Button";
import { SelectField, TextArea, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { AmendmentsSection } from "./AmendmentsSection";
import { ContactsSection } from "./ContactsSection";
import { EditionsSection } from "./EditionsSection";
import { SetSection } from "./SetSection";
import { formOf, formPath, resolverFor, type Form } from "./jurisdictionForm";

const WIDE = "col-span-2 phone:col-span-1";
const [SWITCH, METER, FURTHER] = REQUIREMENT_LABELS;

/** Everything that is kept of one authority. What is saved changes no drawing: each job takes it over by itself. */
export function JurisdictionForm({ jurisdiction, onReload }: { jurisdiction: JurisdictionDetail; onReload: () => void }) {
  const { edit } = jurisdiction.may;
  const [loaded, setLoaded] = useState(jurisdiction);
  const [saved, setSaved] = useState(false);
  const save = useChange((facts: JurisdictionFacts) => jurisdictionsApi.change(loaded.id, { version: loaded.version, ...facts }), [keys.jurisdictions, jurisdictionKeys.one(loaded.id)]);
  const form = useForm<Form, unknown, JurisdictionFacts>({ resolver: resolverFor(loaded), defaultValues: formOf(loaded), disabled: !edit });
  const { register, handleSubmit, reset, setError, getValues, formState: { errors, isDirty } } = form;
  // A change by somebody else is shown as long as nothing was typed here; otherwise saving says so.
  if (!isDirty && jurisdiction.version > loaded.version) setLoaded(jurisdiction);
  useEffect(() => reset(formOf(loaded)), [loaded, reset]);

  const submit = handleSubmit(async (facts) => {
    setSaved(false);
    try {
      const answer = await save.mutateAsync(facts);
      setLoaded(answer);
      setSaved(true);
    } catch (error) {
      if (!(error instanceof ApiProblem)) return;
      for (const each of error.body.errors ?? []) {
        if (each.field) setError(formPath(getValues(), each.field.split(".")) as "name", { message: each.detail }, { shouldFocus: true });
      }
    }
  });
  const stale = save.error instanceof ApiProblem && save.error.code === "stale-version";
  const today = new Date().toISOString().slice(0, 10);
  const inForce = adoptionInForce(loaded.editions, today);
  return (
    <FormProvider {...form}>
    <form onSubmit={submit} noValidate className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      <FormSection title="Authority" text="As it stands on the sheets and in the register.">
        <TextField label="Name" error={errors.name?.message} {...register("name")} />
        <TextField label="Ordinance" placeholder="If it amends the code" error={errors.ordinance?.message} {...register("ordinance")} />
      </FormSection>
      <FormSection title="Adopted code" text="Editions with the days on which they take effect. A new job begins with the one in force.">
        <EditionsSection inForce={inForce} next={nextAdoption(loaded.editions, today)} edit={edit} />
      </FormSection>
      <FormSection title="Amendments" text="What the authority changed in the rules. Each is printed with the ordinance it rests on.">
        <AmendmentsSection jurisdiction={loaded} edition={inForce.edition} />
      </FormSection>
      <FormSection title="Who signs" text="What the authority asks for before it takes a set.">
        <SelectField label="Asked for" className={WIDE} {...register("signs")}>
          <option value="licensed professional">Seal of a licensed professional</option>
          <option value="preparer declaration accepted">A preparer&apos;s declaration is accepted as well</option>
        </SelectField>
        <p className={`${WIDE} text-body text-ink2`}>Each revision keeps what stood here when it was issued. A set is signed here by a licensee&apos;s seal alone: that a declaration is accepted is recorded and shown, and declaring itself is not done here yet.</p>
      </FormSection>
      <FormSection title="Utility requirements" text="Copied into each drawing with the amendments.">
        {([["lockableVisibleSwitch", SWITCH[1]], ["separateMeter", METER[1]]] as const).map(([field, label]) => (
          <SelectField key={field} label={label} {...register(`requirements.${field}`)}>
            <option value="">not known yet</option>
            <option value="yes">required</option>
            <option value="no">not required</option>
          </SelectField>
        ))}
        <TextArea label={FURTHER[1]} className={WIDE} placeholder="Place of the switch, heights, letters of approval" maxLength={400} error={errors.requirements?.notes?.message} {...register("requirements.notes")} />
      </FormSection>
      <FormSection title="The set" text="How the authority wants its drawings.">
        <SetSection />
      </FormSection>
      <FormSection title="Contacts" text="Whom to ask at the office and at the utility.">
        <ContactsSection edit={edit} />
      </FormSection>
      <FormSection title="Notes" text="For your company alone; they stand on no sheet.">
        <TextArea label="Notes" rows={4} className={WIDE} error={errors.notes?.message} {...register("notes")} />
      </FormSection>
      {edit && (
        <div className={`${isDirty ? "sticky bottom-0 z-10" : ""} flex flex-wrap items-center gap-3 border-t border-ink bg-paper px-8 py-4 phone:px-4`}>
          <Button type="submit" look="primary" disabled={!isDirty} busy={save.isPending}>Save</Button>
          {isDirty && <Button onClick={() => { reset(formOf(loaded)); save.reset(); }}>Take back</Button>}
          {stale && <Button onClick={onReload}>Load it again</Button>}
          {isDirty && loaded.jobs > 0 && !save.isError && <span className="text-text text-ink2">{loaded.jobs} {loaded.jobs === 1 ? "job uses" : "jobs use"} it and {loaded.jobs === 1 ? "stays as it is" : "stay as they are"} until the change is taken over there.</span>}
          {!isDirty && saved && <span role="status" className="text-text text-ink2">Saved.</span>}
          {isDirty && Object.keys(errors).length > 0 && !save.isError && <span role="alert" className="text-text font-strong text-red">Something above is not complete.</span>}
          <Refused error={save.error} />
        </div>
      )}
    </form>
    </FormProvider>
  );
}
