import { further } from "./further";
import { service } from "./service";
import { sources } from "./sources";

export { STARTER_SOURCE, type StarterEntry } from "./entry";
/** Generic entries a company's library starts with: invented values, at least one entry a kind. */
export const STARTER_SET = [...service, ...sources, ...further];
