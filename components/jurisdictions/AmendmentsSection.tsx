import { useFieldArray, useFormContext, useWatch } from "react-hook-form";
import type { JurisdictionDetail } from "@/lib/api";
import { newId } from "@/lib/client/newId";
import { editionName } from "@/lib/code/adoption";
import type { Edition } from "@/lib/diagram/schema";
import { rules } from "@/lib/rules";
import { limitOf, ruleMeta } from "@/lib/rules/engine/amendments";
import { citationOf } from "@/lib/rules/engine/amend";
import type { RuleMeta } from "@/lib/rules/engine/types";
import { Button } from "@/components/ui/Button";
import { SelectField, TextField } from "@/components/ui/Field";
import type { AmendmentForm, Form } from "./jurisdictionForm";

const EFFECTS: readonly (readonly [AmendmentForm["effect"], string])[] = [
  ["note", "A remark is printed with its findings"], ["limit", "Another limit applies"], ["severity", "It weighs more or less"], ["off", "It does not apply here"],
];
const SEVERITIES = ["must-fix", "should-fix", "advice"] as const;
const GROUPS = [...new Set(rules.map(({ meta }) => meta.group))].map((group) => ({ group, metas: rules.map(({ meta }) => meta).filter((meta) => meta.group === group) }));

/** Amendments of the authority: a rule by its statement, what is amended, and the ordinance that does it. */
export function AmendmentsSection({ jurisdiction, edition }: { jurisdiction: JurisdictionDetail; edition: Edition }) {
  const { control } = useFormContext<Form>();
  const { fields, append, remove } = useFieldArray({ control, name: "amendments" });
  const { edit } = jurisdiction.may;
  return (
    <div className="col-span-2 grid gap-4 phone:col-span-1">
      {fields.length === 0 && <p className="text-text text-ink2">No amendment: the adopted code applies as written.</p>}
      {fields.map((field, index) => <AmendmentCard key={field.id} index={index} edition={edition} edit={edit} unnamed={isUnnamed(jurisdiction, field.key)} onRemove={() => remove(index)} />)}
      {edit && (
        <div>
          <Button onClick={() => append({ key: newId("a"), rule: "", effect: "limit", limitName: "", limit: "", severity: "", citation: "" })}>Add an amendment</Button>
        </div>
      )}
    </div>
  );
}

/** An older amendment that names no limit changes each one of its unit. */
const isUnnamed = ({ amendments }: JurisdictionDetail, key: string) => amendments[key]?.effect === "limit" && amendments[key].limitName === undefined;

interface CardProps { index: number; edition: Edition; edit: boolean; unnamed: boolean; onRemove: () => void }

function AmendmentCard({ index, edition, edit, unnamed, onRemove }: CardProps) {
  const { control, register, setValue, formState: { errors } } = useFormContext<Form>();
  const value = useWatch({ control, name: `amendments.${index}` });
  const meta = ruleMeta(value.rule);
  const limits = meta ? Object.entries(meta.limits) : [];
  const meant = meta ? limitOf(meta, value.limitName || undefined) : null;
  const fault = errors.amendments?.[index];
  const rule = register(`amendments.${index}.rule`);
  const effects = EFFECTS.filter(([effect]) => effect !== "limit" || limits.length > 0 || value.effect === "limit");
  return (
    <fieldset className="grid grid-cols-2 gap-x-5 gap-y-4 border border-rule p-4 phone:grid-cols-1">
      <legend className="-ml-1 px-1 text-body font-medium text-ink2">Amendment {index + 1}</legend>
      <SelectField
        label="Rule" className="col-span-2 phone:col-span-1" error={fault?.rule?.message} {...rule}
        onChange={async (event) => {
          await rule.onChange(event);
          const chosen = ruleMeta(event.target.value);
          setValue(`amendments.${index}.limitName`, "");
          if (chosen && Object.keys(chosen.limits).length === 0 && value.effect === "limit") setValue(`amendments.${index}.effect`, "note");
        }}
      >
        <option value="">choose by its statement</option>
        {value.rule !== "" && !meta && <option value={value.rule}>{value.rule} (no rule of this rule set)</option>}
        {GROUPS.map(({ group, metas }) => (
          <optgroup key={group} label={group}>{metas.map((each) => <option key={each.id} value={each.id}>{each.statement}</option>)}</optgroup>
        ))}
      </SelectField>
      {meta && <OwnText meta={meta} />}
      <SelectField label="What is amended" error={fault?.effect?.message} {...register(`amendments.${index}.effect`)}>
        {effects.map(([effect, words]) => <option key={effect} value={effect}>{words}</option>)}
      </SelectField>
      {value.effect === "limit" && limits.length > 1 && (
        <SelectField label="Which limit" error={fault?.limitName?.message} {...register(`amendments.${index}.limitName`)}>
          <option value="">{unnamed ? "every limit of its unit" : "choose"}</option>
          {limits.map(([name, limit]) => <option key={name} value={name}>{name}, now {limit.value} {limit.unit}</option>)}
        </SelectField>
      )}
      {value.effect === "limit" && (
        <TextField
          label="Limit here" inputMode="decimal" {...(meant ? { unit: meant.limit.unit } : {})} error={fault?.limit?.message}
          hint={meant ? `The rule's own: ${meant.limit.value} ${meant.limit.unit}.` : undefined} {...register(`amendments.${index}.limit`)}
        />
      )}
      {value.effect === "severity" && (
        <SelectField label="Severity here" error={fault?.severity?.message} hint={meta ? `The rule's own: ${meta.severity}.` : undefined} {...register(`amendments.${index}.severity`)}>
          <option value="">choose</option>
          {SEVERITIES.map((severity) => <option key={severity} value={severity}>{severity}</option>)}
        </SelectField>
      )}
      <TextField
        label="Ordinance" placeholder="County ordinance 26-4, section 3" maxLength={120} hint="As it is printed beside the code section." error={fault?.citation?.message}
        className="col-span-2 phone:col-span-1" {...register(`amendments.${index}.citation`)}
      />
      <CitationLine value={value} meta={meta} edition={edition} />
      {edit && <div className="col-span-2 phone:col-span-1"><Button size="bar" onClick={onRemove}>Remove amendment {index + 1}</Button></div>}
    </fieldset>
  );
}

function OwnText({ meta }: { meta: RuleMeta }) {
  const limits = Object.entries(meta.limits).map(([name, { value, unit, source }]) => `${name} ${value} ${unit} (${source})`);
  return (
    <div className="col-span-2 border-l-[3px] border-rule pl-3 text-body text-ink2 phone:col-span-1">
      <p>{meta.statement}</p>
      <p className="mt-1 text-label">{meta.id}: {meta.severity}{limits.length > 0 ? `; ${limits.join(", ")}` : "; no limit that can be amended, its figures stand in the code's tables"}.</p>
    </div>
  );
}

/** What a finding of the rule would print under it, from the engine itself. */
function CitationLine({ value, meta, edition }: { value: AmendmentForm; meta: RuleMeta | undefined; edition: Edition }) {
  if (!meta) return null;
  const { citation } = citationOf(meta, edition, value.citation.trim() === "" ? [] : [value.citation.trim()]);
  return (
    <div className="col-span-2 phone:col-span-1">
      <p className="mb-1 text-body font-medium text-ink2">{value.effect === "off" ? `Under ${editionName(edition)}` : `A finding under ${editionName(edition)} prints`}</p>
      <p className="border border-g1 bg-vellum px-3 py-2 text-body">{value.effect === "off" ? "This rule does not run; nothing of it is printed." : citation || "no section"}</p>
    </div>
  );
}
