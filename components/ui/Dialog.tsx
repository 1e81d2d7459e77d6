"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** What happens, in a sentence. */
  description: string;
  children: ReactNode;
}

/**
 * A question laid over the desk; Esc and a click beside it put it away. The browser's own modal: it keeps the focus
 * inside, gives it back, and needs no style of its own, which the page policy would refuse.
 */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  const element = useRef<HTMLDialogElement>(null);
  const id = useId();
  useEffect(() => {
    const dialog = element.current;
    if (open && !dialog?.open) dialog?.showModal();
    if (!open && dialog?.open) dialog.close();
  }, [open]);
  return (
    <dialog
      ref={element} aria-labelledby={`${id}-title`} aria-describedby={`${id}-text`}
      onClose={() => open && onOpenChange(false)}
      onMouseDown={(event) => event.target === event.currentTarget && onOpenChange(false)}
      className="m-auto max-h-[88vh] w-[min(560px,92vw)] overflow-y-auto border-[1.5px] border-ink bg-paper text-ink shadow-[4px_5px_0_var(--hatch)] backdrop:bg-ink/35"
    >
      {open && (
        <div className="p-6">
          <h2 id={`${id}-title`} className="text-heading font-heading stretch-heading">{title}</h2>
          <p id={`${id}-text`} className="mt-1 mb-5 text-text text-ink2">{description}</p>
          {children}
        </div>
      )}
    </dialog>
  );
}
