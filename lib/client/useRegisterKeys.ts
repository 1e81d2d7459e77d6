import { useEffect, type RefObject } from "react";

interface RegisterKeys {
  /** What is listed, in order. */
  ids: readonly string[];
  chosen: string | null;
  onChoose: (id: string) => void;
  onOpen: (id: string) => void;
  /** Makes a new one; null where the person may not. */
  onNew: (() => void) | null;
  find: RefObject<HTMLInputElement | null>;
}

const STEPS: Readonly<Record<string, number>> = { ArrowDown: 1, ArrowUp: -1, PageDown: 20, PageUp: -20, Home: -Infinity, End: Infinity };

/** Keys of a register: arrows choose, Enter opens, N makes a new one, Ctrl F finds; never while somebody types or a control has the focus. */
export function useRegisterKeys({ ids, chosen, onChoose, onOpen, onNew, find }: RegisterKeys): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === "f") {
        event.preventDefault();
        find.current?.focus();
        find.current?.select();
        return;
      }
      if (event.ctrlKey || event.metaKey || event.altKey) return;
      const inFind = event.target === find.current;
      if (!inFind && event.target !== document.body) return;
      // Home and End belong to the words while they are typed.
      const step = inFind && (event.key === "Home" || event.key === "End") ? undefined : STEPS[event.key];
      if (step !== undefined) {
        const next = ids[Math.min(ids.length - 1, Math.max(0, (chosen === null ? -Math.sign(step) : ids.indexOf(chosen)) + step))];
        if (next === undefined) return;
        event.preventDefault();
        onChoose(next);
      } else if (event.key === "Enter" && chosen !== null) onOpen(chosen);
      else if (event.key.toLowerCase() === "n" && !inFind && onNew) onNew();
      else if (event.key === "Escape" && inFind) find.current?.blur();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [ids, chosen, onChoose, onOpen, onNew, find]);
}
