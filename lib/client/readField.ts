// Fields of forms and cells of schedules read what people write by the same rules.
export { readNumber, readProperty, showValue, type FieldAnswer } from "@/lib/schedules/readField";
