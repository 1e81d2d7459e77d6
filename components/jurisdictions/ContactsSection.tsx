import { useFieldArray, useFormContext } from "react-hook-form";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import type { Form } from "./jurisdictionForm";

/** Whom to ask at the office: counter, plan reviewer, inspector, the utility's desk. */
export function ContactsSection({ edit }: { edit: boolean }) {
  const { control, register, formState: { errors } } = useFormContext<Form>();
  const { fields, append, remove } = useFieldArray({ control, name: "contacts" });
  return (
    <div className="col-span-2 grid gap-4 phone:col-span-1">
      {fields.length === 0 && <p className="text-text text-ink2">Nobody is entered yet.</p>}
      {fields.map((field, index) => {
        const fault = errors.contacts?.[index];
        return (
          <fieldset key={field.id} className="grid grid-cols-2 gap-x-5 gap-y-4 border border-rule p-4 phone:grid-cols-1">
            <legend className="-ml-1 px-1 text-body font-medium text-ink2">Contact {index + 1}</legend>
            <TextField label="Name or desk" error={fault?.name?.message} {...register(`contacts.${index}.name`)} />
            <TextField label="Role" placeholder="Plan review" error={fault?.role?.message} {...register(`contacts.${index}.role`)} />
            <TextField label="Mail" type="email" error={fault?.email?.message} {...register(`contacts.${index}.email`)} />
            <TextField label="Phone" type="tel" error={fault?.phone?.message} {...register(`contacts.${index}.phone`)} />
            <TextField label="Web page" placeholder="https://" error={fault?.web?.message} className="col-span-2 phone:col-span-1" {...register(`contacts.${index}.web`)} />
            {edit && <div><Button size="bar" onClick={() => remove(index)}>Remove contact {index + 1}</Button></div>}
          </fieldset>
        );
      })}
      {edit && <div><Button onClick={() => append({ name: "", role: "", email: "", phone: "", web: "" })}>Add a contact</Button></div>}
    </div>
  );
}
