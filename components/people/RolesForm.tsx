"use client";

import { useState } from "react";
import type { PersonAnswer } from "@/lib/api";
import type { Role } from "@/lib/policy";
import { Button } from "@/components/ui/Button";
import { Refused } from "@/components/ui/Notes";
import { RolePicker } from "@/components/ui/RolePicker";

interface RolesFormProps {
  person: PersonAnswer;
  save: (roles: Role[]) => Promise<unknown>;
  remove: () => Promise<unknown>;
  removeLabel: string;
  onDone: () => void;
}

/** Roles of somebody who is there already, and the way out. */
export function RolesForm({ person, save, remove, removeLabel, onDone }: RolesFormProps) {
  const [roles, setRoles] = useState<Role[]>(person.roles);
  const [failure, setFailure] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  const [asked, setAsked] = useState(false);
  async function run(work: () => Promise<unknown>) {
    setBusy(true);
    setFailure(null);
    try {
      await work();
      onDone();
    } catch (error) {
      setFailure(error);
    } finally {
      setBusy(false);
    }
  }
  return (
    <div className="flex flex-col gap-4">
      <RolePicker value={roles} onChange={setRoles} error={roles.length === 0 ? "need at least one choice" : undefined} />
      <Refused error={failure} />
      <div className="flex flex-wrap gap-2">
        <Button look="primary" busy={busy} disabled={roles.length === 0} onClick={() => void run(() => save(roles))}>Save roles</Button>
        <Button onClick={onDone}>Cancel</Button>
        <span className="flex-1" />
        {asked
          ? <Button busy={busy} onClick={() => void run(remove)}>Yes, {removeLabel.toLowerCase()}</Button>
          : <Button look="quiet" onClick={() => setAsked(true)}>{removeLabel}</Button>}
      </div>
    </div>
  );
}
