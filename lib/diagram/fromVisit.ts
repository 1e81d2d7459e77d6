import type { Command } from "./commands";
import type { Drawing } from "./schema";
import { visitSource, type VisitChoices, type VisitFacts, type VisitLine } from "./visit/line";
import { panelLines } from "./visit/panels";
import { lengthLines, placeLines, racewayLines } from "./visit/places";
import { serviceLines } from "./visit/service";

export { guessedChoices } from "./visit/guess";
export { NO_CHOICES, celsius, temperatureWords, visitSource } from "./visit/line";
export type { PanelChoice, VisitChoices, VisitFacts, VisitLine } from "./visit/line";

/**
 * Everything of a visit that the drawing could take, given what its rows are on the drawing. What the visit did not look at and
 * what the drawing has already are left out; nothing is ever set to "not known".
 */
export function visitLines(drawing: Drawing, visit: VisitFacts, choices: VisitChoices): VisitLine[] {
  const context = { drawing, visit, choices, source: visitSource(visit) };
  return [...serviceLines(context), ...panelLines(context), ...lengthLines(context), ...placeLines(context), ...racewayLines(context)];
}

/** Lines that are ticked at first: what is not known now, and nothing that wants a thought before. */
export const takenAtFirst = (line: VisitLine): boolean => !line.replaces && line.caution === null;

/**
 * Commands that take the chosen lines over, in order; applied together they are one step.
 * @param taken keys of the lines, as `visitLines` gives them for the same drawing, visit and choices
 */
export function fromVisit(drawing: Drawing, visit: VisitFacts, choices: VisitChoices, taken: ReadonlySet<string>): Command[] {
  return visitLines(drawing, visit, choices).filter((line) => taken.has(line.key) && (line.needs === null || taken.has(line.needs))).flatMap((line) => line.commands);
}
