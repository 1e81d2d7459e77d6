"use client";

import type { ComponentType } from "react";
import type { VisitData, VisitPart } from "@/lib/diagram/siteVisit";
import { PART_WORDS } from "@/lib/client/visitMerge";
import { FoundPart, PanelsPart, ServicePart } from "./equipmentParts";
import { GroundingPart, LengthsPart, NotesPart, PhotosPart, PlacesPart, RoofPart, TemperaturesPart } from "./siteParts";
import { useVisitForm } from "./visitContext";

/** Parts in the order in which a person walks: from the meter to the roof. */
const PARTS: readonly { part: VisitPart; short: string; Body: ComponentType }[] = [
  { part: "service", short: "Service", Body: ServicePart },
  { part: "panels", short: "Panels", Body: PanelsPart },
  { part: "grounding", short: "Grounding", Body: GroundingPart },
  { part: "found", short: "Other", Body: FoundPart },
  { part: "places", short: "Places", Body: PlacesPart },
  { part: "lengths", short: "Runs", Body: LengthsPart },
  { part: "temperatures", short: "Temps", Body: TemperaturesPart },
  { part: "roof", short: "Roof", Body: RoofPart },
  { part: "photos", short: "Photos", Body: PhotosPart },
  { part: "note", short: "Notes", Body: NotesPart },
];

/** How much of a part was looked at: rows of a list, or values of a group. */
function lookedAt(data: VisitData, part: VisitPart): string {
  const value = data[part];
  if (Array.isArray(value)) return value.length === 0 ? "" : String(value.length);
  if (value === null || typeof value === "string") return value ? "1" : "";
  const all = Object.values(value);
  const known = all.filter((each) => each !== null).length;
  return known === 0 ? "" : `${known} of ${all.length}`;
}

/** Who was there, on which day, and everything that was found. */
export function VisitForm() {
  const { data, state, readOnly, setHead } = useVisitForm();
  return (
    <div className="grid grid-cols-[200px_minmax(0,1fr)] items-start gap-6 phone:grid-cols-1 phone:gap-0">
      <nav aria-label="Parts of the visit" className="sticky top-6 phone:fixed phone:inset-x-0 phone:top-auto phone:bottom-0 phone:z-20 phone:border-t-[1.5px] phone:border-ink phone:bg-panel">
        <ul className="phone:flex phone:overflow-x-auto">
          {PARTS.map(({ part, short }) => {
            const count = lookedAt(data, part);
            return (
              <li key={part} className="shrink-0 border-b border-desk2 phone:border-r phone:border-b-0">
                <a href={`#visit-${part}`} className="flex h-bar-control items-center justify-between gap-3 px-2 text-text hover:bg-panel phone:h-[56px] phone:flex-col phone:justify-center phone:gap-0 phone:px-4">
                  <span className="font-strong"><span className="phone:hidden">{PART_WORDS[part]}</span><span className="hidden phone:inline">{short}</span></span>
                  <span className={`text-label ${count ? "text-ink2" : "text-ink3"}`}>{count || "–"}</span>
                </a>
              </li>
            );
          })}
        </ul>
      </nav>
      <div className="min-w-0 bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)] phone:shadow-none">
        <div className="grid grid-cols-2 gap-x-5 gap-y-4 border-b-[1.5px] border-ink px-6 py-5 phone:px-4">
          <Head label="Day of the visit" type="date" value={state.content.visitedOn} readOnly={readOnly} onChange={(visitedOn) => visitedOn && setHead({ visitedOn })} />
          <Head label="Who was there" type="text" value={state.content.byName} readOnly={readOnly} onChange={(byName) => setHead({ byName })} />
        </div>
        {PARTS.map(({ part, Body }) => (
          <section key={part} id={`visit-${part}`} aria-labelledby={`visit-${part}-title`} className="scroll-mt-4 border-b phone:scroll-mt-[64px] border-g1 px-6 py-6 last:border-b-0 phone:px-4">
            <h2 id={`visit-${part}-title`} className="mb-4 text-heading font-heading stretch-heading">{PART_WORDS[part]}</h2>
            <div className="grid grid-cols-2 gap-x-5 gap-y-5 phone:grid-cols-1"><Body /></div>
          </section>
        ))}
      </div>
    </div>
  );
}

function Head({ label, type, value, readOnly, onChange }: { label: string; type: "date" | "text"; value: string; readOnly: boolean; onChange: (value: string) => void }) {
  return (
    <label className="block min-w-0">
      <span className="mb-1 block text-text font-medium text-ink2">{label}</span>
      <input type={type} value={value} readOnly={readOnly} maxLength={80} className="h-target w-full min-w-0 border border-rule bg-paper px-3 text-field text-ink read-only:bg-panel" onChange={(event) => onChange(event.target.value)} />
    </label>
  );
}
