"use client";

import { useState, type FormEvent } from "react";
import { personInput, type PersonAnswer, type PersonInput } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import type { Role } from "@/lib/policy";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";
import { RolePicker } from "@/components/ui/RolePicker";

interface PersonFormProps {
  add: (input: PersonInput) => Promise<PersonAnswer>;
  submit: string;
  roles?: readonly Role[];
  onDone: () => void;
}
type Errors = Partial<Record<"email" | "name" | "password" | "roles", string>>;

/**
 * Adds a person by mail address. Who has an account is added with it; for others the form asks for a name and an
 * initial password, which the administrator hands over.
 */
export function PersonForm({ add, submit, roles, onDone }: PersonFormProps) {
  const [form, setForm] = useState<{ email: string; name: string; password: string; roles: Role[] }>({ email: "", name: "", password: "", roles: [] });
  const [errors, setErrors] = useState<Errors>({});
  const [failure, setFailure] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  // Asked for from the start: most people who are added are new.
  const set = (part: Partial<typeof form>) => setForm((now) => ({ ...now, ...part }));

  async function send(event: FormEvent) {
    event.preventDefault();
    setFailure(null);
    const parsed = personInput.safeParse({ email: form.email, roles: form.roles, name: form.name.trim() || undefined, password: form.password || undefined });
    if (!parsed.success) {
      setErrors(Object.fromEntries(parsed.error.issues.map((issue) => [String(issue.path[0]), issue.message])));
      return;
    }
    setErrors({});
    setBusy(true);
    try {
      await add(parsed.data);
      onDone();
    } catch (error) {
      const field = error instanceof ApiProblem ? error.field : undefined;
      if (field === "email" || field === "name" || field === "password" || field === "roles") setErrors({ [field]: (error as ApiProblem).fieldMessage });
      else setFailure(error);
    } finally {
      setBusy(false);
    }
  }

  return (
    <form onSubmit={send} noValidate className="flex flex-col gap-4">
      <TextField label="Mail address" type="email" autoComplete="off" autoFocus value={form.email} onChange={(event) => set({ email: event.target.value })} error={errors.email} />
      <div className="grid grid-cols-2 gap-4 phone:grid-cols-1">
        <TextField label="Name" autoComplete="off" value={form.name} onChange={(event) => set({ name: event.target.value })} error={errors.name} />
        <TextField label="Initial password" type="password" autoComplete="new-password" value={form.password} onChange={(event) => set({ password: event.target.value })} error={errors.password} />
      </div>
      <p className="-mt-2 text-label text-ink3">Name and password are needed only for somebody without an account. Hand the password over yourself; it is changed on the account page.</p>
      <RolePicker value={form.roles} onChange={(next) => set({ roles: next })} error={errors.roles} {...(roles ? { roles } : {})} />
      <Refused error={failure} />
      <div className="flex gap-2">
        <Button type="submit" look="primary" busy={busy}>{submit}</Button>
        <Button onClick={onDone}>Cancel</Button>
      </div>
    </form>
  );
}
