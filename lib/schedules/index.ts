/** Schedules derived from the drawing: the grids on screen and the printed sheets read the same columns and rows. */
export { equipmentSchedule } from "./equipment";
export { conductorSchedule, conductorText } from "./conductors";
export { racewaySchedule } from "./raceways";
export { circuitFigures, sectionFigures, type CircuitFigures, type SectionFigures } from "./circuitFigures";
export { racewayFigures, type RacewayFigures } from "./racewayFigures";
export { printedColumns } from "./print";
export type { CellAnswer, CellValue, Schedule, ScheduleColumn, ScheduleRow } from "./types";
