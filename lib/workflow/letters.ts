/** I, O, Q, S, X and Z are left out: on a print they read as 1, 0, 0, 5, a cross and 2 (common drafting practice, no published source). */
const LETTERS = "ABCDEFGHJKLMNPRTUVWY";

/**
 * Revision letter that follows another: A, B, … Y, AA, AB, …
 * @param previous letter of the last sealed revision, or null before the first
 * @throws RangeError when `previous` is no revision letter
 */
export function nextLetter(previous: string | null): string {
  if (previous === null) return "A";
  const digits = [...previous].map((letter) => LETTERS.indexOf(letter));
  if (digits.length === 0 || digits.includes(-1)) throw new RangeError(`${previous} is no revision letter`);
  for (let place = digits.length - 1; place >= 0; place -= 1) {
    const next = (digits[place] ?? 0) + 1;
    if (next < LETTERS.length) {
      digits[place] = next;
      return spell(digits);
    }
    digits[place] = 0;
  }
  return spell([0, ...digits]);
}

const spell = (digits: readonly number[]) => digits.map((digit) => LETTERS.charAt(digit)).join("");
