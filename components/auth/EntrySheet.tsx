import type { ReactNode } from "react";
import { Caution } from "@/components/ui/Caution";
import { BrandMark } from "@/components/ui/Brand";

const ZONES = ["4", "3", "2", "1"];
const ROWS = ["B", "A"];

/** The door: a small sheet with border, zones and a title block that says where one is. */
export function EntrySheet({ title, number, children }: { title: string; number: string; children: ReactNode }) {
  return (
    <main className="grid min-h-full place-items-center p-6 phone:p-3">
      <div className="w-full max-w-[920px] bg-paper p-3 shadow-[0_0_0_1px_var(--rule),3px_4px_0_0_var(--hatch)]">
        <div className="border border-ink">
          <div className="grid grid-cols-4 border-b border-ink text-center font-lettering text-label text-ink2" aria-hidden="true">
            {ZONES.map((zone) => <span key={zone} className="border-l border-ink py-0.5 first:border-l-0">{zone}</span>)}
          </div>
          <div className="flex">
            <div className="flex w-6 flex-col border-r border-ink font-lettering text-label text-ink2 phone:hidden" aria-hidden="true">
              {ROWS.map((row) => <span key={row} className="grid flex-1 place-items-center border-t border-ink first:border-t-0">{row}</span>)}
            </div>
            <div className="grid min-w-0 flex-1 grid-cols-[minmax(0,1fr)_260px] outline-2 outline-ink phone:grid-cols-1">
              <div className="p-9 phone:p-5">{children}</div>
              <TitleBlock title={title} number={number} />
            </div>
          </div>
        </div>
      </div>
    </main>
  );
}

function TitleBlock({ title, number }: { title: string; number: string }) {
  return (
    <div className="flex flex-col border-l-2 border-ink phone:border-t-2 phone:border-l-0">
      <div className="border-b border-ink p-5">
        <BrandMark className="h-9 w-[61px]" />
        <p className="mt-3 font-lettering text-[25px] leading-none tracking-wide">FERRULE</p>
        <p className="mt-3 text-body text-ink2">One-line drawings for solar, storage and generators: drawn on a sheet, checked while drawing, sealed, built from.</p>
      </div>
      <div className="flex-1 border-b border-ink p-5">
        <Caution />
      </div>
      <dl className="grid grid-cols-[1fr_auto] font-lettering">
        <div className="border-r border-ink p-3">
          <dt className="text-small text-ink2">SHEET TITLE</dt>
          <dd className="mt-1 text-[15px] uppercase">{title}</dd>
        </div>
        <div className="p-3">
          <dt className="text-small text-ink2">SHEET</dt>
          <dd className="mt-1 text-[21px] leading-none">{number}</dd>
        </div>
      </dl>
    </div>
  );
}
