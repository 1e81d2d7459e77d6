import { RAIL } from "@/components/diagram/actions/parts";
import { isKindId, kindDefinition, type KindId } from "@/lib/equipment/registry";

/** Kinds of equipment under the headings of the parts rail. */
export const KIND_GROUPS: readonly { readonly group: string; readonly kinds: readonly { readonly id: KindId; readonly title: string }[] }[] = RAIL
  .map(({ group, parts }) => ({ group, kinds: parts.flatMap(({ id }) => (isKindId(id) ? [{ id, title: kindDefinition(id).title }] : [])) }))
  .filter(({ kinds }) => kinds.length > 0);

/** Title of a kind; its name where this version knows no such kind. */
export const kindTitle = (kind: string): string => (isKindId(kind) ? kindDefinition(kind).title : kind);
/** "switch and protect" as a heading. */
export const groupTitle = (group: string): string => group.charAt(0).toUpperCase() + group.slice(1);
