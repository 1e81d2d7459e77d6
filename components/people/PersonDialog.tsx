"use client";

import { useState } from "react";
import type { CompanyPerson, PersonChange } from "@/lib/api";
import { Button } from "@/components/ui/Button";
import { Refused } from "@/components/ui/Notes";
import { RolesForm } from "./RolesForm";

interface PersonDialogProps {
  person: CompanyPerson;
  self: boolean;
  change: (change: PersonChange) => Promise<unknown>;
  remove: () => Promise<unknown>;
  onDone: () => void;
}

/** Roles of somebody of the company, the way out, and their account. */
export function PersonDialog({ person, self, change, remove, onDone }: PersonDialogProps) {
  const [asked, setAsked] = useState(false);
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  async function setActive(active: boolean) {
    setBusy(true);
    setFailure(null);
    try {
      await change({ active });
      onDone();
    } catch (error) {
      setFailure(error);
    } finally {
      setBusy(false);
    }
  }
  return (
    <>
      <RolesForm person={person} removeLabel="Take out of the company" save={(roles) => change({ roles })} remove={remove} onDone={onDone} />
      {!self && (
        <section className="mt-6 border-t border-g1 pt-4">
          <h3 className="text-finding font-heading">Account</h3>
          <p className="mt-1 mb-3 text-body text-ink2">
            {person.active
              ? "Closing it signs the person out everywhere at once. Their roles, places on jobs and what they did stay, and it can be opened again."
              : "It is closed: nobody signs in with it. Opened again, it has the roles above."}
          </p>
          <div className="flex flex-wrap items-center gap-3">
            {!person.active && <Button busy={busy} onClick={() => void setActive(true)}>Open the account</Button>}
            {person.active && (asked
              ? <Button busy={busy} onClick={() => void setActive(false)}>Yes, close the account</Button>
              : <Button onClick={() => setAsked(true)}>Close the account</Button>)}
            <Refused error={failure} />
          </div>
        </section>
      )}
    </>
  );
}
