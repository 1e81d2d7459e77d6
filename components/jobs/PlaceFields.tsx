import { useFormContext } from "react-hook-form";
import { TextArea, TextField } from "@/components/ui/Field";
import type { PlaceForm } from "./siteForm";

/** Title-block facts of the site. */
export function PlaceFields({ contractorHint }: { contractorHint?: string }) {
  const { register, formState: { errors } } = useFormContext<PlaceForm>();
  return (
    <>
      <TextArea label="Address" placeholder={"41 Wicket Lane\nNettlecombe"} error={errors.addressLines?.message} {...register("addressLines")} />
      <TextArea label="Scope" placeholder="What is built" error={errors.scope?.message} {...register("scope")} />
      <TextField label="Parcel" error={errors.parcel?.message} {...register("parcel")} />
      <TextField label="Owner" error={errors.owner?.message} {...register("owner")} />
      <TextField label="Prepared by" error={errors.preparer?.message} {...register("preparer")} />
      <TextField label="Contractor" hint={contractorHint} error={errors.contractor?.message} {...register("contractor")} />
      <TextField label="Permit number" placeholder="not yet" error={errors.permitNumber?.message} {...register("permitNumber")} />
    </>
  );
}
