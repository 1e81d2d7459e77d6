import type { FieldErrors, UseFormRegister } from "react-hook-form";
import { EDITIONS, OCCUPANCIES } from "@/lib/diagram/schema";
import { SelectField, TextField } from "@/components/ui/Field";
import type { SiteForm } from "./siteForm";

interface SiteFieldsProps { register: UseFormRegister<SiteForm>; errors: FieldErrors<SiteForm>; disabled?: boolean }

/** Site data. An empty field means "not known yet" and shows as needs data where a rule asks for it. */
export function SiteFields({ register, errors, disabled = false }: SiteFieldsProps) {
  return (
    <>
      <SelectField label="Adopted code" disabled={disabled} error={errors.edition?.message} {...register("edition")}>
        {EDITIONS.map((edition) => <option key={edition} value={edition}>NEC {edition}</option>)}
      </SelectField>
      <SelectField label="Occupancy" disabled={disabled} error={errors.occupancy?.message} {...register("occupancy")}>
        <option value="">not known yet</option>
        {OCCUPANCIES.map((occupancy) => <option key={occupancy} value={occupancy}>{occupancy}</option>)}
      </SelectField>
      <TextField label="Record low" unit="°C" inputMode="decimal" placeholder="not known yet" disabled={disabled} error={errors.recordLowC?.message} {...register("recordLowC")} />
      <TextField label="Design high" unit="°C" inputMode="decimal" placeholder="not known yet" disabled={disabled} error={errors.designHighC?.message} {...register("designHighC")} />
      <TextField label="Elevation" unit="m" inputMode="decimal" placeholder="not known yet" disabled={disabled} error={errors.elevationM?.message} {...register("elevationM")} />
      <TextField label="Temperatures from" placeholder="Station or letter" disabled={disabled} error={errors.temperatureSource?.message} {...register("temperatureSource")} />
      <TextField label="Utility" disabled={disabled} error={errors.utilityName?.message} {...register("utilityName")} />
      <TextField label="Available fault current" unit="A" inputMode="decimal" placeholder="not known yet" disabled={disabled} error={errors.availableFaultCurrentA?.message} {...register("availableFaultCurrentA")} />
    </>
  );
}
