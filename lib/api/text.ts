import { z } from "zod";

/* Messages go on from the name of their field: "Job number is missing". */

/** Text of one line as people type it: trimmed, without control characters. Angle brackets are allowed; every output escapes them. */
export const line = (max: number) =>
  z.string().trim().max(max, `is longer than ${max} characters`).regex(/^[^\u0000-\u001f\u007f]*$/, "holds a control character");
/** As `line`, and not empty. */
export const filledLine = (max: number) => line(max).min(1, "is missing");
/** Text of several lines. */
export const paragraph = (max: number) =>
  z.string().trim().max(max, `is longer than ${max} characters`).regex(/^[^\u0000-\u0008\u000b-\u001f\u007f]*$/, "holds a control character");
export const filledParagraph = (max: number) => paragraph(max).min(1, "is missing");
export const emailAddress = z.string().trim().toLowerCase().max(254).pipe(z.email("is no mail address"));
/** A password a person chooses. Length is what counts; the rest is their business. */
export const newPassword = z.string().min(10, "needs at least 10 characters").max(200, "is longer than 200 characters");
