"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useEffect, useRef, useState } from "react";
import { useForm } from "react-hook-form";
import { SEAL_GRAPHIC_BYTES, licenseInput, type LicenseAnswer, type LicenseInput } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { calendarWords } from "@/lib/client/dates";
import { keys, useChange, useLicense } from "@/lib/client/queries";
import { FormSection } from "@/components/jobs/FormSection";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { ExpiryWords } from "./LicenseLine";

const EMPTY: LicenseInput = { state: "", number: "", title: "", expiresOn: "" };
const formOf = (license: LicenseAnswer | null): LicenseInput =>
  license ? { state: license.state, number: license.number, title: license.title, expiresOn: license.expiresOn } : EMPTY;

/** What a licensee seals under. */
export function LicensePanel() {
  const license = useLicense();
  return (
    <Panel title="License" aside={license.data?.license && <LicenseState license={license.data.license} />}>
      {license.isPending && <Skeleton lines={2} />}
      {license.isError && <div className="p-5"><ErrorNote error={license.error} onRetry={() => void license.refetch()} /></div>}
      {license.data && <LicenseForm license={license.data.license} />}
      {license.data && <SealGraphic license={license.data.license} />}
    </Panel>
  );
}

function LicenseState({ license }: { license: LicenseAnswer }) {
  return license.expiry.words !== null
    ? <span className="text-text"><ExpiryWords expiry={license.expiry} /></span>
    : <span className="text-text text-ink2">In force until {calendarWords(license.expiresOn)}</span>;
}

function LicenseForm({ license }: { license: LicenseAnswer | null }) {
  const save = useChange(api.putLicense, [keys.license, keys.me]);
  const { register, handleSubmit, reset, setError, formState: { errors, isDirty } } = useForm<LicenseInput>({ resolver: zodResolver(licenseInput), defaultValues: formOf(license) });
  useEffect(() => reset(formOf(license)), [license, reset]);
  const submit = handleSubmit(async (input) => {
    try {
      await save.mutateAsync(input);
    } catch (error) {
      const field = error instanceof ApiProblem ? error.field : undefined;
      if (field && field in EMPTY) setError(field as keyof LicenseInput, { message: (error as ApiProblem).fieldMessage });
    }
  });
  return (
    <form onSubmit={submit} noValidate>
      <FormSection title="Entry" text="Only who holds a license enters one here. It is printed on what you seal, as it was on that day.">
        <TextField label="State or board" error={errors.state?.message} {...register("state")} />
        <TextField label="License number" error={errors.number?.message} {...register("number")} />
        <TextField label="Title" placeholder="Professional engineer" error={errors.title?.message} {...register("title")} />
        <TextField label="In force until" type="date" hint="Its last day. It ends at midnight UTC: in North America that afternoon or evening." error={errors.expiresOn?.message} {...register("expiresOn")} />
        <div className="col-span-2 flex items-center gap-3">
          <Button type="submit" look="primary" disabled={!isDirty} busy={save.isPending}>Save the license</Button>
          {save.isSuccess && !isDirty && <span role="status" className="text-text text-ink2">Saved.</span>}
          <Refused error={save.error} />
        </div>
      </FormSection>
    </form>
  );
}

function SealGraphic({ license }: { license: LicenseAnswer | null }) {
  const input = useRef<HTMLInputElement>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [version, setVersion] = useState(0);
  const upload = useChange((file: Blob) => api.putSealGraphic(file), [keys.license]);
  async function choose(file: File | undefined) {
    setRefusal(null);
    if (!file) return;
    if (file.size > SEAL_GRAPHIC_BYTES) {
      setRefusal("The file is larger than 512 kB.");
      return;
    }
    try {
      await upload.mutateAsync(file);
      setVersion((now) => now + 1);
    } catch (error) {
      setRefusal(error instanceof ApiProblem ? error.message : "The file could not be stored.");
    }
  }
  return (
    <FormSection title="Seal graphic" text="A PNG of your seal, at most 512 kB. At 2 in on the sheet it should be 600 px wide or more.">
      <div className="grid size-40 place-items-center border border-dashed border-ink bg-paper">
        {license?.sealGraphic
          // The picture comes from this site, behind the session; an optimizer has no use for it.
          // eslint-disable-next-line @next/next/no-img-element
          ? <img src={`/api/me/license/seal-graphic?v=${version}`} alt="Your seal" className="max-h-36 max-w-36" />
          : <span className="px-4 text-center text-label text-ink3">{license ? "No seal yet" : "Enter the license first"}</span>}
      </div>
      <div className="flex flex-col items-start gap-2">
        <input ref={input} type="file" accept="image/png" aria-label="Seal graphic, PNG" className="sr-only" tabIndex={-1} onChange={(event) => { void choose(event.target.files?.[0]); event.target.value = ""; }} />
        <Button disabled={!license} busy={upload.isPending} onClick={() => input.current?.click()}>{license?.sealGraphic ? "Replace the seal graphic" : "Upload the seal graphic"}</Button>
        {license?.sealGraphic && <p className="text-label text-ink3">{license.sealGraphic.widthPx} × {license.sealGraphic.heightPx} px</p>}
        {refusal && <p role="alert" className="text-text font-strong text-red">{refusal}</p>}
      </div>
    </FormSection>
  );
}
