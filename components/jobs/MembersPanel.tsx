"use client";

import { useState } from "react";
import type { JobAnswer, PersonAnswer, PersonInput } from "@/lib/api";
import { api } from "@/lib/client/api";
import { keys, useChange, useMe, useMembers } from "@/lib/client/queries";
import { PeopleList } from "@/components/people/PeopleList";
import { PersonForm } from "@/components/people/PersonForm";
import { RolesForm } from "@/components/people/RolesForm";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { ErrorNote, Skeleton } from "@/components/ui/Notes";
import { Panel } from "./Panel";

/** Who is on the job, in which roles. */
export function MembersPanel({ job }: { job: JobAnswer }) {
  const members = useMembers(job.id);
  const me = useMe();
  const stale = [keys.members(job.id), keys.job(job.id), keys.jobs];
  const add = useChange((input: PersonInput) => api.addMember(job.id, input), stale);
  const change = useChange(({ id, roles }: { id: string; roles: PersonAnswer["roles"] }) => api.changeMember(job.id, id, roles), stale);
  const remove = useChange((id: string) => api.removeMember(job.id, id), stale);
  const [adding, setAdding] = useState(false);
  const [editing, setEditing] = useState<PersonAnswer | null>(null);
  const people = members.data?.members ?? [];
  const missing = members.data ? (["designer", "licensee", "permit clerk"] as const).filter((role) => !people.some((person) => person.roles.includes(role))) : [];
  return (
    <Panel title="People" aside={job.may.manageMembers && <Button size="bar" onClick={() => setAdding(true)}>Add a person</Button>}>
      {members.isPending && <Skeleton lines={3} height={60} />}
      {members.isError && <div className="p-5"><ErrorNote error={members.error} onRetry={() => void members.refetch()} /></div>}
      <PeopleList people={people} self={me.data?.id} onEdit={job.may.manageMembers ? setEditing : undefined} />
      {missing.length > 0 && <p className="border-t border-g2 px-5 py-3 text-body text-ink2">Nobody yet as {missing.join(", ")}.</p>}
      <Dialog open={adding} onOpenChange={setAdding} title="Add a person to this job" description="Somebody from outside is on this job alone and sees nothing else of the company.">
        <PersonForm submit="Add to the job" add={add.mutateAsync} onDone={() => setAdding(false)} />
      </Dialog>
      <Dialog open={editing !== null} onOpenChange={(open) => !open && setEditing(null)} title={editing?.name ?? ""} description="Roles in this job. Several at once are allowed.">
        {editing && (
          <RolesForm
            person={editing} removeLabel="Take off the job" onDone={() => setEditing(null)}
            save={(roles) => change.mutateAsync({ id: editing.id, roles })} remove={() => remove.mutateAsync(editing.id)}
          />
        )}
      </Dialog>
    </Panel>
  );
}
