import { setFieldCommand } from "@/components/diagram/actions/commandsOf";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { markKind } from "@/components/diagram/redlines/markKind";
import type { FieldAnswer } from "@/lib/client/readField";
import type { Command } from "@/lib/diagram/commands";
import type { ElementRef } from "@/lib/diagram/schema";
import type { Finding } from "@/lib/rules/engine/types";
import type { FieldMark } from "@/components/fields/fields";

const NONE: readonly Finding[] = [];
const sameElement = (a: ElementRef, b: ElementRef): boolean => a.collection === b.collection && a.id === b.id;

/** Sets fields of one element through the command gate; answers are why not, or null, as the fields want them. */
export function useEdit(ref: ElementRef) {
  const store = useEditorStore();
  const readOnly = useEditor((editor) => editor.readOnly);
  const findings = useEditor((editor) => editor.check?.findings ?? NONE);
  const run = (commands: readonly Command[], title?: string): string | null => {
    if (store.getState().run(commands, title)) return null;
    return store.getState().notice?.text ?? "not accepted";
  };
  const set = (field: string, value: unknown, title?: string): string | null => run([setFieldCommand(store.getState().drawing, ref, field, value)], title);
  const take = (field: string, answer: FieldAnswer, title?: string): string | null => (answer.ok ? set(field, answer.value, title) : answer.reason);
  /** Finding that underlines a field of this element. */
  const mark = (field: string): FieldMark | null => {
    const found = findings.find((finding) => (sameElement(finding.anchor, ref) && finding.field === field) || finding.fields.some((each) => sameElement(each.ref, ref) && each.field === field));
    return found ? { kind: markKind(found), message: found.message } : null;
  };
  return { readOnly, run, set, take, mark };
}
