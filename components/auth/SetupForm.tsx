"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { signIn } from "next-auth/react";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { setupInput, type SetupInput } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";

/** First company and its administrator. */
export function SetupForm() {
  const { register, handleSubmit, setError, formState: { errors, isSubmitting } } = useForm<SetupInput>({ resolver: zodResolver(setupInput) });
  const router = useRouter();
  const [failure, setFailure] = useState<unknown>(null);

  const submit = handleSubmit(async (input) => {
    setFailure(null);
    try {
      await api.setUp(input);
      await signIn("credentials", { email: input.email, password: input.password, redirect: false });
      router.replace("/jobs");
    } catch (error) {
      const field = error instanceof ApiProblem ? error.field : undefined;
      if (field === "companyName" || field === "name" || field === "email" || field === "password") setError(field, { message: (error as ApiProblem).fieldMessage });
      else setFailure(error);
    }
  });

  return (
    <form onSubmit={submit} noValidate className="flex max-w-[380px] flex-col gap-4">
      <div>
        <h1 className="text-title font-heading stretch-heading">First use</h1>
        <p className="mt-1 text-text text-ink2">This installation has no accounts yet. Name your company and make its administrator, who then adds everybody else.</p>
      </div>
      <TextField label="Company" autoFocus autoComplete="organization" error={errors.companyName?.message} {...register("companyName")} />
      <TextField label="Your name" autoComplete="name" error={errors.name?.message} {...register("name")} />
      <TextField label="Mail address" type="email" autoComplete="username" error={errors.email?.message} {...register("email")} />
      <TextField label="Password" type="password" autoComplete="new-password" hint="At least 10 characters." error={errors.password?.message} {...register("password")} />
      <Refused error={failure} />
      <Button type="submit" look="primary" busy={isSubmitting}>Make the company</Button>
    </form>
  );
}
