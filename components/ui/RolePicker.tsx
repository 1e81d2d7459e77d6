import { ROLES, ROLE_HELP, type Role } from "@/lib/policy";

interface RolePickerProps { value: readonly Role[]; onChange: (roles: Role[]) => void; error?: string | undefined; roles?: readonly Role[] }

/** Roles as a list of check boxes, each with what it is for. */
export function RolePicker({ value, onChange, error, roles = ROLES }: RolePickerProps) {
  return (
    <fieldset>
      <legend className="mb-1 text-body font-medium text-ink2">Roles</legend>
      <div className={`border bg-paper ${error ? "border-2 border-red" : "border-rule"}`}>
        {roles.map((role) => (
          <label key={role} className="flex min-h-control cursor-pointer items-center gap-3 border-b border-g2 px-3 py-1.5 last:border-b-0 hover:bg-vellum">
            <input
              type="checkbox" className="size-4 accent-ink" checked={value.includes(role)}
              onChange={(event) => onChange(event.target.checked ? [...value, role] : value.filter((each) => each !== role))}
            />
            <span className="min-w-0">
              <span className="block text-text font-strong first-letter:uppercase">{role}</span>
              <span className="block text-label text-ink3">{ROLE_HELP[role]}</span>
            </span>
          </label>
        ))}
      </div>
      {error && <p role="alert" className="mt-1 text-label font-strong text-red">{/^[a-z]/.test(error) ? `Roles ${error}.` : error}</p>}
    </fieldset>
  );
}
