import { KIND_GROUPS, groupTitle } from "./kinds";

/** Every kind as an option, under the headings of the parts rail. */
export function KindOptions() {
  return KIND_GROUPS.map(({ group, kinds }) => (
    <optgroup key={group} label={groupTitle(group)}>{kinds.map(({ id, title }) => <option key={id} value={id}>{title}</option>)}</optgroup>
  ));
}
