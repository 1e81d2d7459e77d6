import type { PersonAnswer } from "@/lib/api";
import { Button } from "@/components/ui/Button";

/** People with their roles; who may, gets a way to change them. */
export function PeopleList({ people, onEdit, self }: { people: readonly PersonAnswer[]; onEdit?: ((person: PersonAnswer) => void) | undefined; self: string | undefined }) {
  return (
    <ul>
      {people.map((person) => (
        <li key={person.id} className="flex min-h-[60px] items-center gap-4 border-b border-g2 px-5 py-2.5 last:border-b-0">
          <div className="min-w-0 flex-1">
            <p className="truncate text-finding font-finding">{person.name}{person.userId === self && <span className="font-normal text-ink3"> (you)</span>}</p>
            <p className="truncate text-body text-ink2">{person.roles.join(", ")}</p>
            <p className="truncate text-label text-ink3">{person.email}</p>
          </div>
          {onEdit && <Button size="bar" onClick={() => onEdit(person)} aria-label={`Change the roles of ${person.name}`}>Roles</Button>}
        </li>
      ))}
    </ul>
  );
}
