"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { signIn } from "next-auth/react";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { returnPath } from "@/lib/client/returnPath";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";

const schema = z.object({ email: z.string().trim().min(1, "is missing"), password: z.string().min(1, "is missing") });
type Credentials = z.infer<typeof schema>;

/** Address and password. */
export function SignInForm({ next, notice }: { next: string | undefined; notice: string | undefined }) {
  const { register, handleSubmit, setFocus, resetField, formState: { errors, isSubmitting } } = useForm<Credentials>({ resolver: zodResolver(schema) });
  const [refusal, setRefusal] = useState<string | null>(null);

  const submit = handleSubmit(async ({ email, password }) => {
    setRefusal(null);
    const answer = await signIn("credentials", { email, password, redirect: false }).catch(() => null);
    // The library answers "ok" also with an error set.
    if (answer && !answer.error) {
      // A whole page load, so that nothing of another person's session stays in memory.
      window.location.assign(returnPath(next));
      return new Promise<void>(() => undefined);
    }
    setRefusal(!answer ? "The server does not answer. Check the connection and try again."
      : answer.error === "too-many" ? "Too many tries. Wait five minutes and try again."
        : "Address or password is not right.");
    resetField("password");
    setFocus("password");
  });

  return (
    <form onSubmit={submit} noValidate className="flex max-w-[340px] flex-col gap-4">
      <h1 className="text-title font-heading stretch-heading">Sign in</h1>
      {notice && <p role="status" className="border-l-[3px] border-green pl-3 text-text">{notice}</p>}
      <TextField label="Mail address" type="email" autoComplete="username" autoFocus error={errors.email?.message} {...register("email")} />
      <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...register("password")} />
      {refusal && <p role="alert" className="text-text font-strong text-red">{refusal}</p>}
      <Button type="submit" look="primary" busy={isSubmitting} className="mt-1">{isSubmitting ? "Signing in" : "Sign in"}</Button>
      <p className="text-label text-ink3">No account? The administrator of your company or of the job makes one for you.</p>
    </form>
  );
}
