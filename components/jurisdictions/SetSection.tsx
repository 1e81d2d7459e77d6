import { useFormContext } from "react-hook-form";
import { SPLITS, STAMP_PLACES } from "@/lib/api";
import { SHEET_SIZES } from "@/lib/diagram/schema";
import { FILE_NAME_PARTS, sampleFileName, templateFault } from "@/lib/sheets/fileName";
import { SHEET_INCHES } from "@/lib/sheets/size";
import { SelectField, TextField } from "@/components/ui/Field";
import type { Form } from "./jurisdictionForm";

/** Stands at what is recorded and not yet read by the sheets, so that nobody relies on it. */
const KEPT = "Kept for the file set; not yet read by the sheets.";

/** How the authority wants the set: what is used today, and apart from it what is only kept. */
export function SetSection() {
  const { register, watch, formState: { errors } } = useFormContext<Form>();
  const fault = errors.exportProfile;
  const [template, split, where] = [watch("exportProfile.fileNameTemplate"), watch("exportProfile.split"), watch("exportProfile.stampStrip.where")];
  const wrong = templateFault(template, split);
  return (
    <>
      <SelectField label="Sheet size" hint="New jobs here begin with it." error={fault?.sheetSize?.message} {...register("exportProfile.sheetSize")}>
        {SHEET_SIZES.map((size) => <option key={size} value={size}>{size}, {SHEET_INCHES[size].join(" × ")} in</option>)}
      </SelectField>
      <SelectField label="Bookmark for each sheet" hint="In the PDF, from the next issue on." {...register("exportProfile.bookmarks")}>
        <option value="yes">yes</option>
        <option value="no">no</option>
      </SelectField>
      <div className="col-span-2 phone:col-span-1">
        <TextField label="File name" error={fault?.fileNameTemplate?.message} spellCheck={false} {...register("exportProfile.fileNameTemplate")} />
        <p className="mt-2 text-body" aria-live="polite">{wrong ? <span className="text-ink2">File name {wrong}.</span> : <>For example <span className="border border-g1 bg-vellum px-2 py-1">{sampleFileName(template)}</span></>}</p>
        <dl className="mt-2 grid grid-cols-[auto_1fr] gap-x-3 text-label text-ink2">
          {Object.entries(FILE_NAME_PARTS).map(([part, words]) => (
            <div key={part} className="contents"><dt className="font-medium">{`{${part}}`}</dt><dd>{words}</dd></div>
          ))}
        </dl>
      </div>
      <h3 className="col-span-2 mt-2 border-t border-g1 pt-4 text-body font-strong phone:col-span-1">{KEPT}</h3>
      <SelectField label="Files" error={fault?.split?.message} {...register("exportProfile.split")}>
        {SPLITS.map((each) => <option key={each} value={each}>{each}</option>)}
      </SelectField>
      <TextField label="Largest file" unit="MB" inputMode="decimal" placeholder="not said" error={fault?.maximumBytes?.message} {...register("exportProfile.maximumBytes")} />
      <TextField label="Least lettering" unit="in, plotted" inputMode="decimal" placeholder="not said" error={fault?.leastLetteringIn?.message} {...register("exportProfile.leastLetteringIn")} />
      <SelectField label="Cut sheets in the set" {...register("exportProfile.cutSheets")}>
        <option value="">not said</option>
        <option value="yes">asked for</option>
        <option value="no">not wanted</option>
      </SelectField>
      <SelectField label="Strip kept clear for stamps" {...register("exportProfile.stampStrip.where")}>
        <option value="">not said</option>
        {STAMP_PLACES.map((place) => <option key={place} value={place}>{place}</option>)}
      </SelectField>
      {where !== "" && (
        <div className="grid grid-cols-2 gap-x-5">
          <TextField label="Strip width" unit="in" inputMode="decimal" error={fault?.stampStrip?.widthIn?.message} {...register("exportProfile.stampStrip.widthIn")} />
          <TextField label="Strip height" unit="in" inputMode="decimal" error={fault?.stampStrip?.heightIn?.message} {...register("exportProfile.stampStrip.heightIn")} />
        </div>
      )}
    </>
  );
}
