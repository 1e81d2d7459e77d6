"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { signOut } from "next-auth/react";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { passwordInput, type PasswordInput } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { useMe } from "@/lib/client/queries";
import { FormSection } from "@/components/jobs/FormSection";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { LicensePanel } from "./LicensePanel";

/** The person's own account: license, seal graphic, password. */
export function AccountPage() {
  const me = useMe();
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto grid w-full max-w-[980px] gap-5 p-6 phone:p-3">
        <div>
          <h1 className="text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em]">{me.data?.name ?? "Account"}</h1>
          <p className="mt-1 text-finding text-ink2">{me.data?.email}</p>
        </div>
        <LicensePanel />
        <PasswordPanel />
      </main>
    </div>
  );
}

function PasswordPanel() {
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm<PasswordInput>({ resolver: zodResolver(passwordInput), defaultValues: { current: "", next: "" } });
  const [failure, setFailure] = useState<unknown>(null);
  const submit = handleSubmit(async (input) => {
    setFailure(null);
    try {
      await api.changePassword(input);
      await signOut({ callbackUrl: "/sign-in?notice=password-changed" });
    } catch (error) {
      if (error instanceof ApiProblem && (error.field === "current" || error.field === "next")) setError(error.field, { message: error.fieldMessage });
      else setFailure(error);
    }
  });
  return (
    <Panel title="Password">
      <form onSubmit={submit} noValidate>
        <FormSection title="Change it" text="You are signed out everywhere and sign in again with the new one.">
          <TextField label="Current password" type="password" autoComplete="current-password" error={errors.current?.message} {...register("current")} />
          <TextField label="New password" type="password" autoComplete="new-password" hint="At least 10 characters." error={errors.next?.message} {...register("next")} />
          <div className="col-span-2 flex items-center gap-3"><Button type="submit" busy={isSubmitting}>Change the password</Button><Refused error={failure} /></div>
        </FormSection>
      </form>
    </Panel>
  );
}
