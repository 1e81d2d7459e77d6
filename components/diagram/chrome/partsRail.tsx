"use client";
import { useRef } from "react";
import { keyOfPart, RAIL } from "@/components/diagram/actions/parts";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { SELECT, type PartId } from "@/lib/client/editorTypes";
import { PartIcon } from "./partIcon";

/**
 * The part template at the sheet's left edge. A press picks a part up: the next press on the sheet sets it down, or it is
 * dragged there; Enter on a part sets it down in the middle of the view. Arrow keys walk the rail.
 */
export function PartsRail({ onPlaceInView }: { onPlaceInView: (part: PartId) => void }) {
  const store = useEditorStore();
  const tool = useEditor((editor) => editor.tool);
  const rail = useRef<HTMLElement>(null);
  const active: PartId | null = tool.kind === "place" ? tool.part : tool.kind === "join" ? "circuit" : null;
  const pick = (part: PartId): void => store.getState().setTool(part === "circuit" ? { kind: "join", from: null } : { kind: "place", part });
  const walk = (event: React.KeyboardEvent): void => {
    const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
    if (!step) return;
    event.preventDefault();
    event.stopPropagation();
    const buttons = [...(rail.current?.querySelectorAll<HTMLButtonElement>("button[data-part]") ?? [])];
    buttons[(buttons.indexOf(event.target as HTMLButtonElement) + step + buttons.length) % buttons.length]?.focus();
  };
  return (
    <nav ref={rail} aria-label="Parts" className="absolute left-0 top-2 bottom-2 z-[7] w-rail overflow-y-auto border border-l-0 border-rule bg-panel px-1 [scrollbar-width:none] narrow:w-rail-narrow" onKeyDown={walk}>
      {RAIL.map(({ group, parts }, groupIndex) => (
        <div key={group} role="group" aria-label={group} className="border-b-[1.5px] border-ink py-0.5 last:border-b-0">
          {parts.map((part, index) => {
            const key = keyOfPart(part.id);
            return (
              <button
                key={part.id} type="button" data-part={part.id} aria-pressed={active === part.id} tabIndex={groupIndex === 0 && index === 0 ? 0 : -1} title={`${part.title}${key ? ` (${key.toUpperCase()})` : ""}`}
                className={`block w-full touch-none pb-[3px] text-center select-none ${active === part.id ? "bg-tint outline-2 -outline-offset-1 outline-copper" : "hover:bg-vellum"}`}
                onPointerDown={(event) => { if (event.button === 0) pick(part.id); }}
                onClick={(event) => {
                  // A press with the pointer has picked it already; the keyboard (detail 0) sets it down in view.
                  if (event.detail !== 0) return;
                  if (part.id === "circuit") pick("circuit");
                  else { onPlaceInView(part.id); store.getState().setTool(SELECT); }
                }}
              >
                <PartIcon part={part.id} />
                <span className="block text-small leading-[1.1] text-ink2 stretch-schedule">{part.title}</span>
              </button>
            );
          })}
        </div>
      ))}
    </nav>
  );
}
