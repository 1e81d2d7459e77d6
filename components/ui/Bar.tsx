import type { ReactNode } from "react";
import { Brand } from "./Brand";

/** The slim bar on top of every page: brand, cells as in a title block, then actions. */
export function Bar({ children, actions, home = "/" }: { children?: ReactNode; actions?: ReactNode; home?: string }) {
  return (
    <header className="relative z-10 flex h-bar shrink-0 items-stretch border-b-[1.5px] border-ink bg-panel print:hidden">
      <Brand href={home} />
      {children}
      <div className="flex-1 border-l border-desk2" />
      <div className="flex items-center gap-2 px-3">{actions}</div>
    </header>
  );
}

/** A cell of the bar: small label above, value below. */
export function BarCell({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="flex min-w-0 flex-col justify-center border-l border-desk2 pr-3.5 pl-2.5 leading-tight whitespace-nowrap">
      <span className="mb-0.5 text-small stretch-label text-ink2">{label}</span>
      <span className="truncate text-text font-medium">{children}</span>
    </div>
  );
}
