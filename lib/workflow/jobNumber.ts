/** Parts of a job number scheme: year in two or four digits, and a running number in as many digits as there are n. */
const PART = /\{(yyyy|yy|n{2,6})\}/g;

/** Why a scheme cannot make numbers, going on from its name; null when it can. */
export function schemeFault(scheme: string): string | null {
  const running = [...scheme.matchAll(PART)].filter(([, part]) => part?.startsWith("n"));
  if (running.length !== 1) return "needs exactly one running number, such as {nnn}";
  const rest = scheme.replace(PART, "");
  if (/[{}]/.test(rest)) return "knows {yy}, {yyyy} and {nn} to {nnnnnn} alone";
  if (!/^[A-Za-z0-9 ./_-]*$/.test(rest)) return "may hold letters, digits, spaces, and . / _ - beside its parts";
  return null;
}

const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/-]/g, "\\$&");
const year = (part: string, today: string): string => (part === "yyyy" ? today.slice(0, 4) : today.slice(2, 4));

/**
 * Next number of a scheme, after the highest of this year among those that are taken. Nothing is reserved by asking.
 * @param taken numbers of the company's jobs
 * @param today YYYY-MM-DD
 */
export function nextJobNumber(scheme: string, taken: readonly string[], today: string): string {
  const pieces = scheme.split(PART);
  // split() with one group gives text and part in turn.
  const pattern = pieces.map((piece, i) => (i % 2 === 0 ? escaped(piece) : piece.startsWith("n") ? "(\\d{1,9})" : year(piece, today))).join("");
  const match = new RegExp(`^${pattern}$`, "i");
  const highest = Math.max(0, ...taken.map((number) => Number(match.exec(number.trim())?.[1] ?? 0)));
  return pieces.map((piece, i) => (i % 2 === 0 ? piece : piece.startsWith("n") ? String(highest + 1).padStart(piece.length, "0") : year(piece, today))).join("");
}
