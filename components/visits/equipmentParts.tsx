"use client";

import { SERVICE_SYSTEMS } from "@/lib/diagram/schema";
import { emptyRow } from "@/lib/diagram/siteVisit";
import { ChoiceBox, LongBox, NumberBox, TextBox } from "./fields";
import { LabelPhotos, PhotoButtons, PhotosOnTheirWay } from "./Photos";
import { Rows } from "./Rows";
import { useVisitForm } from "./visitContext";

/** The utility's side: what it supplies and what it states. */
export function ServicePart() {
  const { data: { service }, setGroup } = useVisitForm();
  const set = (to: Partial<typeof service>) => setGroup("service", to);
  return (
    <>
      <TextBox label="Utility" max={80} value={service.utilityName} onChange={(utilityName) => set({ utilityName })} />
      <ChoiceBox label="Service" options={SERVICE_SYSTEMS} value={service.system} onChange={(system) => set({ system })} />
      <NumberBox label="Main rating" name="service.mainRatingA" unit="A" least={1} most={6000} value={service.mainRatingA} onChange={(mainRatingA) => set({ mainRatingA })} hint="As marked on the handle." />
      <NumberBox label="Available fault current" name="service.availableFaultCurrentA" unit="A" least={0} most={200_000} value={service.availableFaultCurrentA} onChange={(availableFaultCurrentA) => set({ availableFaultCurrentA })} hint="As the utility states it. It is not read at the site." />
      <TextBox label="Stated by" max={120} placeholder="Letter, call, service map" value={service.faultCurrentStatedBy} onChange={(faultCurrentStatedBy) => set({ faultCurrentStatedBy })} />
      <TextBox label="Meter number" max={40} value={service.meterNumber} onChange={(meterNumber) => set({ meterNumber })} />
      <TextBox label="Meter type" max={80} value={service.meterType} onChange={(meterType) => set({ meterType })} />
    </>
  );
}

/** Panels that are there, each with photos of its label. */
export function PanelsPart() {
  const { setRow } = useVisitForm();
  return (
    <Rows part="panels" noun="panel" empty="Service equipment, subpanels, disconnects with a bus: one card each. Photograph the label first, then copy the ratings off it." make={emptyRow.panels} title={(row) => row.name}>
      {(row, set) => (
        <>
          <LabelPhotos files={row.labelPhotos} name={row.name ?? "this panel"} onRemove={(file) => setRow("panels", row.id, { labelPhotos: row.labelPhotos.filter((each) => each !== file) })} />
          <PhotosOnTheirWay panel={row.id} />
          <PhotoButtons target={{ panel: row.id }} label="the label" />
          <TextBox label="Name" max={40} placeholder="Main panel, PNL-A" value={row.name} onChange={(name) => set({ name })} hint="The tag, where it is drawn already." />
          <TextBox label="Where it is" max={80} value={row.location} onChange={(location) => set({ location })} />
          <NumberBox label="Bus rating" name={`panels.${row.id}.busA`} unit="A" least={1} most={6000} value={row.busA} onChange={(busA) => set({ busA })} />
          <NumberBox label="Main rating" name={`panels.${row.id}.mainA`} unit="A" least={1} most={6000} value={row.mainA} onChange={(mainA) => set({ mainA })} hint="Empty for main lugs only." />
          <NumberBox label="Spaces in all" name={`panels.${row.id}.spacesTotal`} whole least={1} most={84} value={row.spacesTotal} onChange={(spacesTotal) => set({ spacesTotal })} />
          <NumberBox label="Spaces free" name={`panels.${row.id}.spacesFree`} whole least={0} most={84} value={row.spacesFree} onChange={(spacesFree) => set({ spacesFree })} />
          <LongBox label="Label, as read" max={400} rows={3} placeholder="Maker, model, short-circuit rating, breaker types" value={row.labelText} onChange={(labelText) => set({ labelText })} />
          <LongBox label="Note" max={400} placeholder="Heat marks, doubled lugs, no room to open the door" value={row.note} onChange={(note) => set({ note })} />
        </>
      )}
    </Rows>
  );
}

/** Whatever else is there and stays, or has to go. */
export function FoundPart() {
  return (
    <Rows part="found" noun="piece of equipment" empty="Generator, transfer switch, water heater, charger, an older inverter: whatever the drawing has to show." make={emptyRow.found} title={(row) => row.what}>
      {(row, set) => (
        <>
          <TextBox label="What it is" max={80} placeholder="Generator" value={row.what} onChange={(what) => set({ what })} />
          <TextBox label="Where it is" max={80} value={row.place} onChange={(place) => set({ place })} />
          <LongBox label="Nameplate, as read" max={400} value={row.labelText} onChange={(labelText) => set({ labelText })} />
          <LongBox label="Note" max={400} placeholder="" value={row.note} onChange={(note) => set({ note })} />
        </>
      )}
    </Rows>
  );
}
