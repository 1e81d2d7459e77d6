import type { Suggestion } from "@/lib/rules/engine/types";
import type { Edit } from "./edit";

/** Takes a checker's suggestion as one step. */
export const suggestionEdit = (suggestion: Suggestion): Edit =>
  ({ commands: [{ type: "applySuggestion", label: suggestion.label, patches: suggestion.patches }] });
