import "server-only";

/** A refusal that becomes an RFC 9457 answer. `code` is stable, `detail` is a sentence for people. */
export class Problem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    readonly detail: string,
    /** Further members of the answer, for example `field`. */
    readonly members: Readonly<Record<string, unknown>> = {},
  ) {
    super(`${code}: ${detail}`);
    this.name = "Problem";
  }
}

/** What is not there, and what the person may not know to be there, are answered alike. */
export const notFound = () => new Problem(404, "not-found", "Not found", "There is nothing here, or nothing that you may see.");
export const forbidden = (detail: string) => new Problem(403, "not-allowed", "Not allowed", detail);
export const signInNeeded = () => new Problem(401, "sign-in", "Sign in", "Sign in to go on.");
export const unprocessable = (field: string, detail: string, code = "field") =>
  new Problem(422, code, "Something in the request is wrong", `${field}: ${detail}`, { field, errors: [{ field, detail }] });
export const conflict = (code: string, detail: string, members: Readonly<Record<string, unknown>> = {}) =>
  new Problem(409, code, "Conflict", detail, members);
export const tooMany = (seconds: number) =>
  new Problem(429, "too-many", "Too many tries", `Wait ${Math.max(1, Math.ceil(seconds))} s and try again.`, { retryAfter: Math.max(1, Math.ceil(seconds)) });
/** The object store did not answer, or could not do it. */
export const storeDown = () =>
  new Problem(503, "store-down", "The file store does not answer", "The store that keeps files does not answer. Nothing was changed and nothing was lost. Try again in a minute.", { retryAfter: 15 });
