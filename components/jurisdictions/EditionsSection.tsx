import { useFieldArray, useFormContext } from "react-hook-form";
import { editionName, isPreview, previewNote, type Adoption } from "@/lib/code/adoption";
import { EDITIONS } from "@/lib/diagram/schema";
import { Button } from "@/components/ui/Button";
import { SelectField, TextField } from "@/components/ui/Field";
import type { Form } from "./jurisdictionForm";

/** Adopted editions with their dates; which one is in force is worked out, never typed. */
export function EditionsSection({ inForce, next, edit }: { inForce: Adoption; next: Adoption | null; edit: boolean }) {
  const { control, register, watch, formState: { errors } } = useFormContext<Form>();
  const { fields, append, remove } = useFieldArray({ control, name: "editions" });
  const chosen = watch("editions").map((each) => each.edition);
  const free = EDITIONS.filter((edition) => !chosen.includes(edition));
  // What is adopted next is most often the one after the last.
  const left = free.find((edition) => chosen.every((each) => each < edition)) ?? free[0];
  const preview = chosen.find((edition) => previewNote(edition) !== "");
  const list = errors.editions?.root?.message ?? errors.editions?.message;
  return (
    <div className="col-span-2 grid gap-4 phone:col-span-1">
      <p className="text-text"><strong className="font-strong">In force today: {editionName(inForce.edition)}.</strong>{next && ` ${editionName(next.edition)} from ${next.effectiveFrom}.`}</p>
      {fields.map((field, index) => (
        <div key={field.id} className="grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_minmax(0,1fr)_auto] items-start gap-x-4 gap-y-2 phone:grid-cols-1">
          <SelectField label="Edition" error={errors.editions?.[index]?.edition?.message} {...register(`editions.${index}.edition`)}>
            {EDITIONS.map((edition) => <option key={edition} value={edition}>NEC {edition}{isPreview(edition) ? " (preview)" : ""}</option>)}
          </SelectField>
          <TextField label="In effect from" type="date" hint="Empty: since before." error={errors.editions?.[index]?.effectiveFrom?.message} {...register(`editions.${index}.effectiveFrom`)} />
          <TextField label="Until" type="date" hint="Empty: open." error={errors.editions?.[index]?.effectiveTo?.message} {...register(`editions.${index}.effectiveTo`)} />
          {edit && <Button className="mt-[22px]" disabled={fields.length === 1} aria-label={`Remove edition ${index + 1}`} onClick={() => remove(index)}>Remove</Button>}
        </div>
      ))}
      {list && <p role="alert" className="text-label font-strong text-red">Editions {list}.</p>}
      {preview && <p className="border-l-[3px] border-blue pl-3 text-body text-ink2">{previewNote(preview)}</p>}
      {edit && left && <div><Button onClick={() => append({ edition: left, effectiveFrom: "", effectiveTo: "" })}>Add an edition</Button></div>}
    </div>
  );
}
