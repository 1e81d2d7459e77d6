/**
 * Errors of the calculation core. Each one names the field that was wrong, so that a form, the command line
 * and a rule can point at it instead of guessing from a sentence.
 */
export class FieldError extends Error {
  constructor(
    /** Name of the input field, dotted for nested fields: `parts.0.ambientC`. */
    readonly field: string,
    /** Why the value was refused, without the field name. */
    readonly reason: string,
    /** What would have been accepted, as text, or null where no range exists. */
    readonly allowed: string | null = null,
  ) {
    super(`${field}: ${reason}${allowed === null ? "" : ` (allowed: ${allowed})`}`);
    this.name = new.target.name;
  }
}

/** A quantity that is missing, not a number, out of range, in a wrong unit or not written as the trade writes it. */
export class QuantityError extends FieldError {}
