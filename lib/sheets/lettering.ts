import type { Anchor, Face } from "./primitives";

/** Height of capitals and figures, em. From the fonts in public/fonts (OS/2 table: 736 of 1024 units). */
export const CAP_HEIGHT_EM = 736 / 1024;
/** Depth of descenders and height over the baseline that lettering may take, em; measured on the outlines of both faces. */
export const DESCENT_EM = 0.22;

// Advance widths of the normal face in 1/1000 em, from its hmtx table; tests/lib/sheets compares them with the font files.
const ADVANCES: Readonly<Record<number, string>> = {
  219: "'", 281: " !.:ij|·í", 289: ",;‘’", 305: "[]", 328: "IÍ", 336: "()t", 344: "•", 367: "f", 375: "\"`", 396: "l", 406: "-", 414: "r",
  422: "{}", 434: "1", 469: "°", 484: "svxy", 492: "$z", 500: "*^–“”", 516: "ck²³ç", 531: "Jeé", 555: "oóö", 563: "/\\_", 566: "nuµúüñ", 570: "h",
  574: "abgpqáä", 578: "d", 609: "½¼¾", 617: "XZ", 625: "+<=>?±×≤≥≠", 633: "~", 641: "LY", 648: "F", 656: "023456789#GKS", 664: "P", 668: "C",
  672: "ATVÁÄ", 680: "BDEwÉ", 688: "R", 695: "HUÚÜ", 703: "NÑ", 719: "OQÓÖ", 729: "√", 730: "Δ", 738: "Ω", 750: "→←", 766: "&", 811: "M", 844: "%m",
  852: "W", 859: "@", 1000: "—",
};
const NARROW = 0.8;
/** Signs of the narrow face that are not the normal ones drawn together, 1/1000 em. */
const NARROW_OWN: Readonly<Record<string, number>> = { "Ω": 617, "Δ": 614, "√": 589 };
const BY_CHARACTER: ReadonlyMap<string, number> = new Map(
  Object.entries(ADVANCES).flatMap(([advance, characters]) => [...characters].map((character) => [character, Number(advance)] as const)),
);
/** True when both faces hold the character; others would print as a box. */
export const canLetter = (character: string): boolean => BY_CHARACTER.has(character);

/** Width of a line of lettering, in the unit of `size`. Characters that the face lacks count as wide ones. */
export function textWidth(words: string, size: number, face: Face): number {
  let total = 0;
  for (const character of words) {
    const normal = BY_CHARACTER.get(character) ?? 860;
    total += face === "narrow" ? NARROW_OWN[character] ?? normal * NARROW : normal;
  }
  return (total / 1000) * size;
}

/** Left and right end of a line of lettering, given its anchor. */
export function textSpan(x: number, words: string, size: number, face: Face, anchor: Anchor): { left: number; right: number } {
  const width = textWidth(words, size, face);
  const left = anchor === "start" ? x : anchor === "middle" ? x - width / 2 : x - width;
  return { left, right: left + width };
}

/** Shortens a line to a width, ending in a period-less cut mark, so that nothing is clipped by a box. */
export function fitText(words: string, size: number, face: Face, width: number): string {
  if (textWidth(words, size, face) <= width) return words;
  const characters = [...words];
  while (characters.length > 1 && textWidth(`${characters.join("")}..`, size, face) > width) characters.pop();
  return `${characters.join("").trimEnd()}..`;
}

/** Words that must not begin a line: the unit stays with its figure. */
const UNITS = new Set(["kA", "A", "V", "kW", "kWh", "kVA", "IN", "FT", "%", "°C", "HP", "AWG", "kcmil", "×"]);
const bare = (word: string): string => word.replace(/[,.;:)]+$/, "");
/** Words of a paragraph; a unit or a sign is taken with the figure before it. */
function unbroken(paragraph: string): string[] {
  return paragraph.split(" ").filter(Boolean).reduce<string[]>((words, word) => {
    const last = words.at(-1);
    if (last !== undefined && UNITS.has(bare(word)) && /\d$/.test(last)) words[words.length - 1] = `${last} ${word}`;
    else words.push(word);
    return words;
  }, []);
}
/** Breaks words into lines no wider than `width`; a single word that is wider stays whole. */
export function wrapText(words: string, size: number, face: Face, width: number): string[] {
  const lines: string[] = [];
  for (const paragraph of words.split("\n")) {
    let line = "";
    for (const word of unbroken(paragraph)) {
      const longer = line ? `${line} ${word}` : word;
      if (line && textWidth(longer, size, face) > width) { lines.push(line); line = word; }
      else line = longer;
    }
    lines.push(line);
  }
  return lines;
}

/** Words as they stand on a sheet: capitals, with characters that the faces lack replaced by plain ones. */
export function sheetWords(words: string): string {
  return [...words.replace(/…/g, "...").toUpperCase()].map((c) => (c === "\n" || canLetter(c) ? c : c === "\t" ? " " : "?")).join("");
}
/** Units keep their letters where a capital would change the meaning (kW, kA, mm, dc is lettered DC). */
const UNIT_CASE = /(?<=\d\s?)(KW|KWH|KVA|KA|KCMIL)\b/g;
const UNIT_WORDS: Readonly<Record<string, string>> = { KW: "kW", KWH: "kWh", KVA: "kVA", KA: "kA", KCMIL: "kcmil" };
/** `sheetWords`, keeping unit symbols after a figure. */
export const letter = (words: string): string => sheetWords(words).replace(UNIT_CASE, (unit) => UNIT_WORDS[unit] ?? unit);
