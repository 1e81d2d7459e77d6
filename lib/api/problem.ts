/** An error answer (RFC 9457). `code` is stable; `field` names the part of the request that is wrong. */
export interface ProblemBody {
  type: string; title: string; status: number; code: string; detail: string; requestId: string;
  field?: string;
  /** All wrong fields, where there are several. */
  errors?: readonly { field: string; detail: string }[];
  [member: string]: unknown;
}
