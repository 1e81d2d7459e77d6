import { Dialog as Radix } from "radix-ui";
import type { ReactNode } from "react";

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** What happens, in a sentence. */
  description: string;
  children: ReactNode;
}

/** A question laid over the desk; Esc and a click outside put it away. */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/35" />
        <Radix.Content className="fixed top-1/2 left-1/2 z-50 max-h-[88vh] w-[min(560px,92vw)] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-[1.5px] border-ink bg-paper p-6 shadow-[4px_5px_0_var(--hatch)]">
          <Radix.Title className="text-heading font-heading stretch-heading">{title}</Radix.Title>
          <Radix.Description className="mt-1 mb-5 text-text text-ink2">{description}</Radix.Description>
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
