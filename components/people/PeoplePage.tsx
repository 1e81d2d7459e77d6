"use client";

import { useState } from "react";
import type { CompanyAnswer, PersonAnswer, PersonInput } from "@/lib/api";
import { api } from "@/lib/client/api";
import { keys, useChange, useMe, usePeople } from "@/lib/client/queries";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { PeopleList } from "./PeopleList";
import { PersonForm } from "./PersonForm";
import { RolesForm } from "./RolesForm";

/** The people of the person's companies. */
export function PeoplePage() {
  const me = useMe();
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto w-full max-w-[880px] p-6 phone:p-3">
        <h1 className="mb-1 text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em]">People</h1>
        <p className="mb-5 max-w-[62ch] text-text text-ink2">Who belongs to the company. Seeing a job takes a place on that job; administrators see all of them. Licensees, clerks and installers from outside are added on the job alone.</p>
        {me.isPending && <div className="bg-paper"><Skeleton lines={3} height={60} /></div>}
        {me.isError && <ErrorNote error={me.error} onRetry={() => void me.refetch()} />}
        {me.data?.companies.length === 0 && <EmptyNote title="You belong to no company here">You see the jobs that you were added to.</EmptyNote>}
        <div className="grid gap-6">{me.data?.companies.map((company) => <CompanyPanel key={company.id} company={company} self={me.data.id} />)}</div>
      </main>
    </div>
  );
}

function CompanyPanel({ company, self }: { company: CompanyAnswer; self: string }) {
  const people = usePeople(company.id);
  const stale = [keys.people(company.id), keys.me];
  const add = useChange((input: PersonInput) => api.addPerson(company.id, input), stale);
  const change = useChange(({ id, roles }: { id: string; roles: PersonAnswer["roles"] }) => api.changePerson(company.id, id, roles), stale);
  const remove = useChange((id: string) => api.removePerson(company.id, id), stale);
  const [adding, setAdding] = useState(false);
  const [editing, setEditing] = useState<PersonAnswer | null>(null);
  return (
    <Panel title={company.name} aside={company.may.people && <Button size="bar" look="primary" onClick={() => setAdding(true)}>Add a person</Button>}>
      {people.isPending && <div className="bg-paper"><Skeleton lines={3} height={60} /></div>}
      {people.isError && <div className="p-5"><ErrorNote error={people.error} onRetry={() => void people.refetch()} /></div>}
      <PeopleList people={people.data?.people ?? []} self={self} onEdit={company.may.people ? setEditing : undefined} />
      <Dialog open={adding} onOpenChange={setAdding} title="Add a person" description={`Somebody who works for ${company.name}.`}>
        <PersonForm submit="Add the person" add={add.mutateAsync} roles={["administrator", "designer", "licensee", "installer"]} onDone={() => setAdding(false)} />
      </Dialog>
      <Dialog open={editing !== null} onOpenChange={(open) => !open && setEditing(null)} title={editing?.name ?? ""} description="Roles in the company. On a job, its own list of people counts.">
        {editing && (
          <RolesForm
            person={editing} removeLabel="Take out of the company" onDone={() => setEditing(null)}
            save={(roles) => change.mutateAsync({ id: editing.id, roles })} remove={() => remove.mutateAsync(editing.id)}
          />
        )}
      </Dialog>
    </Panel>
  );
}
