import { conductorSchedule, equipmentSchedule, racewaySchedule, type Schedule } from "@/lib/schedules";

export type { CellAnswer, ScheduleRow } from "@/lib/schedules";
/** The schedules as the drawer shows them: columns, rows and what an entry asks for. */
export type ScheduleGrid = Schedule;
export { conductorSchedule as conductorGrid, equipmentSchedule as equipmentGrid, racewaySchedule as racewayGrid };
