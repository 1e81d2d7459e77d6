import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import type { CompanyAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { jurisdictionsApi } from "@/lib/client/jurisdictionsApi";
import { keys, useChange } from "@/lib/client/queries";
import { editionName } from "@/lib/code/adoption";
import { EDITIONS, type Edition } from "@/lib/diagram/schema";
import { paths } from "@/components/jobs/paths";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { SelectField, TextField } from "@/components/ui/Field";
import { Refused } from "@/components/ui/Notes";

interface NewForm { companyId: string; name: string; edition: Edition; ordinance: string }

/** Name and code of a new authority; the rest is filled in on its own page. */
export function NewJurisdiction({ open, onOpenChange, companies }: { open: boolean; onOpenChange: (open: boolean) => void; companies: readonly CompanyAnswer[] }) {
  const router = useRouter();
  const make = useChange(jurisdictionsApi.make, [keys.jurisdictions]);
  const { register, handleSubmit, setError, formState: { errors } } = useForm<NewForm>({ defaultValues: { companyId: companies[0]?.id ?? "", name: "", edition: "2023", ordinance: "" } });
  const submit = handleSubmit(async ({ companyId, name, edition, ordinance }) => {
    try {
      const { id } = await make.mutateAsync({ companyId, name, ordinance, editions: [{ edition, effectiveFrom: null, effectiveTo: null }] });
      router.push(paths.jurisdiction(id));
    } catch (error) {
      if (error instanceof ApiProblem && error.field === "name") setError("name", { message: error.fieldMessage }, { shouldFocus: true });
    }
  });
  const elsewhere = make.error instanceof ApiProblem && make.error.field === "name" ? null : make.error;
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="New jurisdiction" description="The office that grants the permit, and the code it has adopted.">
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        {companies.length > 1 && (
          <SelectField label="Company" {...register("companyId")}>{companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}</SelectField>
        )}
        <TextField label="Name" placeholder="County, city or township" maxLength={120} autoFocus error={errors.name?.message} {...register("name", { validate: (name) => name.trim() !== "" || "is missing" })} />
        <SelectField label="Adopted code" {...register("edition")}>{EDITIONS.map((edition) => <option key={edition} value={edition}>{editionName(edition)}</option>)}</SelectField>
        <TextField label="Ordinance" hint="If it amends the code." maxLength={160} {...register("ordinance")} />
        <Refused error={elsewhere} />
        <div className="flex gap-2">
          <Button type="submit" look="primary" busy={make.isPending}>Enter it</Button>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
        </div>
      </form>
    </Dialog>
  );
}
