import { useFormContext } from "react-hook-form";
import { editionName } from "@/lib/code/adoption";
import { EDITIONS, OCCUPANCIES } from "@/lib/diagram/schema";
import { SelectField, TextField } from "@/components/ui/Field";
import type { SiteForm } from "./siteForm";

/** Site data. An empty field means "not known yet" and shows as needs data where a rule asks for it. */
export function SiteFields() {
  const { register, formState: { errors } } = useFormContext<SiteForm>();
  return (
    <>
      <SelectField label="Adopted code" error={errors.edition?.message} {...register("edition")}>
        {EDITIONS.map((edition) => <option key={edition} value={edition}>{editionName(edition)}</option>)}
      </SelectField>
      <SelectField label="Occupancy" error={errors.occupancy?.message} {...register("occupancy")}>
        <option value="">not known yet</option>
        {OCCUPANCIES.map((occupancy) => <option key={occupancy} value={occupancy}>{occupancy}</option>)}
      </SelectField>
      <TextField label="Record low" unit="°C" inputMode="decimal" placeholder="not known yet" error={errors.recordLowC?.message} {...register("recordLowC")} />
      <TextField label="Design high" unit="°C" inputMode="decimal" placeholder="not known yet" error={errors.designHighC?.message} {...register("designHighC")} />
      <TextField label="Elevation" unit="m" inputMode="decimal" placeholder="not known yet" error={errors.elevationM?.message} {...register("elevationM")} />
      <TextField label="Temperatures from" placeholder="Station or letter" error={errors.temperatureSource?.message} {...register("temperatureSource")} />
      <TextField label="Utility" error={errors.utilityName?.message} {...register("utilityName")} />
      <TextField label="Available fault current" unit="A" inputMode="decimal" placeholder="not known yet" error={errors.availableFaultCurrentA?.message} {...register("availableFaultCurrentA")} />
    </>
  );
}
