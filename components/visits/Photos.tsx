"use client";

import { useCallback, useRef } from "react";
import { fileUrl, uploadRefusal } from "@/lib/client/filesApi";
import type { PhotoOnItsWay } from "@/lib/client/photoQueue";
import type { PhotoTarget } from "@/lib/client/visitStore";
import { FilePicture } from "@/components/files/FilePicture";
import { useVisitForm } from "./visitContext";

const TYPES = "image/jpeg,image/png,image/webp";
const BUTTON = "inline-flex h-target flex-1 items-center justify-center gap-2 border border-ink bg-vellum px-4 text-finding font-strong hover:bg-paper";

/** Takes photos with the phone's camera, or chooses some that were taken. */
export function PhotoButtons({ target, label }: { target: PhotoTarget; label: string }) {
  const { addPhotos, readOnly } = useVisitForm();
  const camera = useRef<HTMLInputElement>(null);
  const chooser = useRef<HTMLInputElement>(null);
  if (readOnly) return null;
  const input = (ref: typeof camera, name: string, capture: boolean) => (
    <input
      ref={ref} type="file" accept={TYPES} aria-label={name} className="sr-only" tabIndex={-1} multiple={!capture} {...(capture ? { capture: "environment" as const } : {})}
      onChange={(event) => { if (event.target.files) addPhotos(event.target.files, target); event.target.value = ""; }}
    />
  );
  return (
    <div className="col-span-full flex gap-2">
      {input(camera, `Take a photo: ${label}`, true)}
      {input(chooser, `Choose photos: ${label}`, false)}
      <button type="button" className={`${BUTTON} hidden phone:inline-flex`} onClick={() => camera.current?.click()}>
        <svg viewBox="0 0 22 18" className="h-[18px] w-[22px]" aria-hidden="true"><path d="M1 4h5l2-3h6l2 3h5v13H1z M11 14a4 4 0 1 0 0-8a4 4 0 0 0 0 8z" fill="none" stroke="currentColor" strokeWidth="1.6" /></svg>
        Take a photo
      </button>
      <button type="button" className={`${BUTTON} phone:flex-none`} onClick={() => chooser.current?.click()}><span className="hidden phone:inline">Choose</span><span className="phone:hidden">Add photos of {label}</span></button>
    </div>
  );
}

/** Photos of one place in the visit that are still on their way. */
export function PhotosOnTheirWay({ panel }: { panel: string | null }) {
  const { photos } = useVisitForm();
  const here = photos.filter((each) => each.photo.target.panel === panel);
  if (here.length === 0) return null;
  return <ul aria-label="Photos on their way" className="col-span-full grid gap-2">{here.map((each) => <OnItsWay key={each.photo.key} each={each} />)}</ul>;
}

function OnItsWay({ each: { photo, state, sent, error, kept } }: { each: PhotoOnItsWay }) {
  const { queue } = useVisitForm();
  const show = useCallback((element: HTMLImageElement | null) => {
    if (!element) return undefined;
    const url = URL.createObjectURL(photo.file);
    element.src = url;
    return () => URL.revokeObjectURL(url);
  }, [photo.file]);
  const where = kept ? "Kept on this device" : "Not kept on this device: stay on this page";
  const words = state === "sending" ? `Sending, ${Math.round(sent * 100)} %` : state === "waiting" ? (error ? `${where}, sent again soon` : `${where}, waits for its turn`) : null;
  return (
    <li className="flex items-center gap-3 border border-dashed border-rule p-2">
      {/* eslint-disable-next-line @next/next/no-img-element -- a picture of this device that no optimizer can reach */}
      <img ref={show} alt="" className="size-16 shrink-0 bg-panel object-cover" />
      <div className="min-w-0 flex-1">
        <p className="truncate text-finding font-strong">{photo.file.name}</p>
        {words && <p className="text-text text-ink2" role="status">{words}</p>}
        {state === "refused" && <p role="alert" className="text-text text-red">{error ? uploadRefusal("It", error) : "That did not work."}</p>}
        {state !== "refused" && error && error.status !== 0 && <p className="text-body text-ink3">{error.message}</p>}
      </div>
      {state !== "sending" && <button type="button" className="h-target px-3 text-finding underline underline-offset-4" onClick={() => void queue.putAway(photo.key)}>Put away</button>}
    </li>
  );
}

/** Stored photos of a panel's label, to open and to take out of the visit. The files stay with the job. */
export function LabelPhotos({ files, name, onRemove }: { files: readonly string[]; name: string; onRemove: (file: string) => void }) {
  const { readOnly } = useVisitForm();
  if (files.length === 0) return null;
  return (
    <ul aria-label={`Label photos of ${name}`} className="col-span-full flex flex-wrap gap-3">
      {files.map((file, index) => (
        <li key={file} className="w-28">
          <a href={fileUrl(file, { inline: true })} target="_blank" rel="noreferrer" className="block"><FilePicture file={{ id: file, name: "", widthPx: 112, heightPx: 112 }} alt={`Label of ${name}, photo ${index + 1}`} className="size-28 object-cover shadow-[0_0_0_1px_var(--rule)]" /></a>
          {!readOnly && <button type="button" className="h-target w-full text-text underline underline-offset-4" onClick={() => onRemove(file)}>Take out</button>}
        </li>
      ))}
    </ul>
  );
}
