import { FieldError } from "@/lib/units";

/** A look-up outside what a published table holds. Tables are never extended by guessing. */
export class CodeLookupError extends FieldError {}
