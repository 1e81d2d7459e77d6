"use client";

import { useState } from "react";
import type { CompanyAnswer, CompanyPerson, PersonChange, PersonInput } from "@/lib/api";
import { api } from "@/lib/client/api";
import { companyApi, useCompanyPeople } from "@/lib/client/companyApi";
import { calendarWords } from "@/lib/client/dates";
import { keys, useChange } from "@/lib/client/queries";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { ExpiryWords } from "./LicenseLine";
import { PersonDialog } from "./PersonDialog";
import { PersonForm } from "./PersonForm";

/** From so many people on there is something to search in. */
const MANY = 8;
const fits = (person: CompanyPerson, words: string) => words.toLowerCase().split(/\s+/).every((word) =>
  `${person.name} ${person.email} ${person.roles.join(" ")} ${person.license?.number ?? ""} ${person.license?.state ?? ""} ${person.active ? "" : "closed"}`.toLowerCase().includes(word));

/** The people of one company; administrators change them and see their licenses. */
export function CompanyPeople({ company, self }: { company: CompanyAnswer; self: string }) {
  const people = useCompanyPeople(company.id);
  const stale = [keys.people(company.id), keys.me];
  const add = useChange((input: PersonInput) => api.addPerson(company.id, input), stale);
  const change = useChange(({ id, what }: { id: string; what: PersonChange }) => companyApi.changePerson(company.id, id, what), stale);
  const remove = useChange((id: string) => api.removePerson(company.id, id), stale);
  const [adding, setAdding] = useState(false);
  const [editing, setEditing] = useState<CompanyPerson | null>(null);
  const [words, setWords] = useState("");
  const all = people.data?.people ?? [];
  const shown = all.filter((person) => fits(person, words));
  return (
    <Panel title={company.name} aside={company.may.people && <Button size="bar" look="primary" onClick={() => setAdding(true)}>Add a person</Button>}>
      {people.isPending && <Skeleton lines={3} height={60} />}
      {people.isError && <div className="p-5"><ErrorNote error={people.error} onRetry={() => void people.refetch()} /></div>}
      {all.length >= MANY && (
        <div className="border-b border-g1 px-5 py-2.5">
          <input
            type="search" aria-label={`Find somebody of ${company.name}`} placeholder="Find by name, mail address, role or license" value={words} onChange={(event) => setWords(event.target.value)}
            className="h-bar-control w-full border border-rule bg-paper px-3 text-text placeholder:text-ink3"
          />
        </div>
      )}
      {all.length > 0 && shown.length === 0 && <EmptyNote title="Nobody found">No name, address, role or license here fits.</EmptyNote>}
      <ul>{shown.map((person) => <Person key={person.id} person={person} self={person.userId === self} {...(company.may.people ? { onEdit: setEditing } : {})} />)}</ul>
      <Dialog open={adding} onOpenChange={setAdding} title="Add a person" description={`Somebody who works for ${company.name}.`}>
        <PersonForm submit="Add the person" add={add.mutateAsync} roles={["administrator", "designer", "licensee", "installer"]} onDone={() => setAdding(false)} />
      </Dialog>
      <Dialog open={editing !== null} onOpenChange={(open) => !open && setEditing(null)} title={editing?.name ?? ""} description="Roles in the company. On a job, its own list of people counts.">
        {editing && (
          <PersonDialog
            person={editing} self={editing.userId === self} onDone={() => setEditing(null)}
            change={(what) => change.mutateAsync({ id: editing.id, what })} remove={() => remove.mutateAsync(editing.id)}
          />
        )}
      </Dialog>
    </Panel>
  );
}

function Person({ person, self, onEdit }: { person: CompanyPerson; self: boolean; onEdit?: (person: CompanyPerson) => void }) {
  return (
    <li className="grid min-h-[60px] grid-cols-[minmax(0,1fr)_minmax(0,1fr)_72px] items-center gap-4 border-b border-g2 px-5 py-2.5 last:border-b-0 phone:grid-cols-[minmax(0,1fr)_72px]">
      <div className={`min-w-0 ${onEdit ? "" : "col-span-2"}`}>
        <p className={`truncate text-finding font-finding ${person.active ? "" : "text-ink3"}`}>
          {person.name}{self && <span className="font-normal text-ink3"> (you)</span>}{!person.active && <span className="ml-2 border border-dashed border-rule px-1.5 text-label font-normal text-ink2">account closed</span>}
        </p>
        <p className="truncate text-body text-ink2">{person.roles.join(", ")}</p>
        <p className="truncate text-label text-ink3">{person.email}</p>
      </div>
      {onEdit && (
        <div className="min-w-0 text-body phone:order-last phone:col-span-2">
          {person.license
            ? <><p className="truncate">{person.license.title}, <span className="font-lettering">{person.license.number}</span>, {person.license.state}</p><p className="text-label text-ink3">{person.license.expiry.words === null ? `In force until ${calendarWords(person.license.expiresOn)}` : <ExpiryWords expiry={person.license.expiry} />}</p></>
            : person.roles.includes("licensee") && <p className="text-ochre">No license entered. A licensee enters it on their account page.</p>}
        </div>
      )}
      {onEdit && <Button size="bar" onClick={() => onEdit(person)} aria-label={`Change ${person.name}`}>Change</Button>}
    </li>
  );
}
