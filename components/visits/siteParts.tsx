"use client";

import { ELECTRODES, emptyRow } from "@/lib/diagram/siteVisit";
import { Buttons, ChoiceBox, LongBox, NumberBox, SizeBox, TemperatureBox, TextBox } from "./fields";
import { FilePicture } from "@/components/files/FilePicture";
import { fileUrl } from "@/lib/client/filesApi";
import { PhotoButtons, PhotosOnTheirWay } from "./Photos";
import { Rows } from "./Rows";
import { useVisitForm } from "./visitContext";

/** Runs that were measured, along the way the raceway will take. */
export function LengthsPart() {
  return (
    <Rows part="lengths" noun="run" empty="From where to where, along the way the raceway will take, up and down included." make={emptyRow.lengths} title={(row) => (row.from || row.to ? `${row.from ?? "?"} to ${row.to ?? "?"}` : null)}>
      {(row, set) => (
        <>
          <TextBox label="From" max={60} placeholder="INV-1, or a place" value={row.from} onChange={(from) => set({ from })} />
          <TextBox label="To" max={60} placeholder="MM-1, or a place" value={row.to} onChange={(to) => set({ to })} />
          <NumberBox label="Length" name={`lengths.${row.id}.lengthFt`} unit="ft" least={0} most={20_000} value={row.lengthFt} onChange={(lengthFt) => set({ lengthFt })} hint="42 ft 6 in is read too." />
          <LongBox label="Way" max={400} placeholder="Along the joists, through the north gable" value={row.route} onChange={(route) => set({ route })} />
        </>
      )}
    </Rows>
  );
}

const EXPOSURES = ["indoor dry", "indoor damp", "outdoor", "roof", "underground"] as const;
/** Where new equipment could stand, with the room around it. */
export function PlacesPart() {
  return (
    <Rows part="places" noun="place" empty="Where inverter, battery, disconnect and boxes could stand. Measure the clear width, height and depth in front." make={emptyRow.places} title={(row) => row.what}>
      {(row, set) => (
        <>
          <TextBox label="For" max={80} placeholder="INV-1, battery" value={row.what} onChange={(what) => set({ what })} />
          <TextBox label="Building" max={80} value={row.building} onChange={(building) => set({ building })} />
          <TextBox label="Place" max={80} placeholder="East wall by the meter" value={row.place} onChange={(place) => set({ place })} />
          <ChoiceBox label="Exposure" options={EXPOSURES} value={row.exposure} onChange={(exposure) => set({ exposure })} />
          <NumberBox label="Clear width" name={`places.${row.id}.clearWidthIn`} unit="in" least={0} most={240} value={row.clearWidthIn} onChange={(clearWidthIn) => set({ clearWidthIn })} />
          <NumberBox label="Clear height" name={`places.${row.id}.clearHeightIn`} unit="in" least={0} most={240} value={row.clearHeightIn} onChange={(clearHeightIn) => set({ clearHeightIn })} />
          <NumberBox label="Clear depth in front" name={`places.${row.id}.clearDepthIn`} unit="in" least={0} most={240} value={row.clearDepthIn} onChange={(clearDepthIn) => set({ clearDepthIn })} />
          <TemperatureBox label="Ambient" name={`places.${row.id}.ambient`} value={row.ambient} onChange={(ambient) => set({ ambient })} />
          <LongBox label="Note" max={400} placeholder="Sun from noon on, window 3 ft away, vehicles" value={row.note} onChange={(note) => set({ note })} />
        </>
      )}
    </Rows>
  );
}

export function TemperaturesPart() {
  const { data: { temperatures }, setGroup } = useVisitForm();
  const set = (to: Partial<typeof temperatures>) => setGroup("temperatures", to);
  return (
    <>
      <TemperatureBox label="Air over the roof" name="temperatures.roof" value={temperatures.roof} onChange={(roof) => set({ roof })} />
      <TemperatureBox label="Attic" name="temperatures.attic" value={temperatures.attic} onChange={(attic) => set({ attic })} />
      <TemperatureBox label="Equipment room" name="temperatures.room" value={temperatures.room} onChange={(room) => set({ room })} />
      <TextBox label="When" max={80} placeholder="2 PM, sunny, 84 °F outdoors" value={temperatures.when} onChange={(when) => set({ when })} />
      <TextBox wide label="How it was measured" max={160} placeholder="Probe in the shade, 4 in over the roof" value={temperatures.how} onChange={(how) => set({ how })} hint="What is read on one day is not the highest that is expected. The designer decides what the drawing takes." />
    </>
  );
}

export function RoofPart() {
  const { data: { roof }, setGroup } = useVisitForm();
  return (
    <>
      <TextBox label="Roof" max={80} placeholder="Asphalt shingles, standing seam" value={roof.type} onChange={(type) => setGroup("roof", { type })} />
      <NumberBox label="Conduit above the roof" name="roof.conduitAboveRoofIn" unit="in" least={0} most={240} value={roof.conduitAboveRoofIn} onChange={(conduitAboveRoofIn) => setGroup("roof", { conduitAboveRoofIn })} hint="From the roof to the underside of the conduit." />
      <LongBox label="Note" max={400} placeholder="Age, pitch, rafters, shade" value={roof.note} onChange={(note) => setGroup("roof", { note })} />
    </>
  );
}

export function GroundingPart() {
  const { data: { grounding }, setGroup, readOnly } = useVisitForm();
  const found = new Set(grounding.electrodes ?? []);
  return (
    <>
      <fieldset className="col-span-full min-w-0">
        <legend className="mb-1 text-text font-medium text-ink2">Electrodes found</legend>
        <div className="grid grid-cols-3 gap-2 phone:grid-cols-2">
          {ELECTRODES.map((each) => (
            <button
              key={each} type="button" disabled={readOnly} aria-pressed={found.has(each)}
              className={`min-h-target border px-3 py-1 text-left text-finding ${found.has(each) ? "border-ink bg-ink font-strong text-onink" : "border-rule bg-paper text-ink2"}`}
              onClick={() => { const next = ELECTRODES.filter((kind) => (kind === each ? !found.has(kind) : found.has(kind))); setGroup("grounding", { electrodes: next.length > 0 ? next : null }); }}
            ><span className="first-letter:uppercase inline-block">{each}</span></button>
          ))}
        </div>
      </fieldset>
      <SizeBox label="Grounding electrode conductor" name="grounding.conductorSize" value={grounding.conductorSize} onChange={(conductorSize) => setGroup("grounding", { conductorSize })} />
      <div>
        <p className="mb-1 text-text font-medium text-ink2">Bond of neutral and ground seen in the service equipment</p>
        <Buttons label="Bond of neutral and ground seen" value={grounding.bondSeen} options={["yes", "no"] as const} onChange={(bondSeen) => setGroup("grounding", { bondSeen })} />
      </div>
      <LongBox label="Note" max={400} value={grounding.note} onChange={(note) => setGroup("grounding", { note })} />
    </>
  );
}

export function PhotosPart() {
  const { data: { photos }, setRow, removeRow, readOnly } = useVisitForm();
  return (
    <>
      <PhotosOnTheirWay panel={null} />
      <PhotoButtons target={{ panel: null }} label="the site" />
      <ul aria-label="Photos of the site" className="col-span-full grid gap-4">
        {photos.map((photo, index) => (
          <li key={photo.id} className="grid grid-cols-[160px_minmax(0,1fr)] gap-4 border border-rule p-3 phone:grid-cols-1">
            <a href={fileUrl(photo.file, { inline: true })} target="_blank" rel="noreferrer" className="block"><FilePicture file={{ id: photo.file, name: "", widthPx: 320, heightPx: 240 }} alt={photo.what ?? `Photo ${index + 1}`} className="h-[120px] w-full object-cover phone:h-48" /></a>
            <div className="grid gap-3">
              <TextBox label="What it shows" max={80} placeholder="Meter, wall for the battery, attic" value={photo.what} onChange={(what) => setRow("photos", photo.id, { what })} />
              <TextBox label="Caption" max={200} placeholder="" value={photo.caption} onChange={(caption) => setRow("photos", photo.id, { caption })} />
              {!readOnly && <button type="button" className="h-target justify-self-start text-text underline underline-offset-4" onClick={() => removeRow("photos", photo.id)}>Take out of the visit</button>}
            </div>
          </li>
        ))}
      </ul>
    </>
  );
}

export function NotesPart() {
  const { data, set } = useVisitForm();
  return <LongBox label="Whatever else was seen" max={4000} rows={5} placeholder="Dog, gate code, who to call, what the owner wants backed up" value={data.note} onChange={(note) => set("note", note)} />;
}
