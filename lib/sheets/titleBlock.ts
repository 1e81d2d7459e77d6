import { PREVIEW_REMARK, isPreview } from "@/lib/code/adoption";
import type { SheetContext as WholeContext, SheetWords } from "./context";
import { BORDER_PX, INNER_PX, TITLE_PX } from "./frame";
import { fitText, letter, textWidth, wrapText } from "./lettering";
import { LETTERING, WEIGHTS, n, path, text, type Primitive, type Style } from "./primitives";
import { sealLines, sealPrimitives } from "./seal";
import type { SheetGeometry } from "./size";

/** The block names no operating states, so a screen may draw it before they are worked out. */
type SheetContext = Omit<WholeContext, "states">;
const PAD = 12;
const LINE = 15;
const COLUMN = 92;
/** Heights of the lower cells, px, from the inner frame's lower edge upward. */
const FOOT = 166, SHEET = 76, TITLE = 72, SCALE = 55, REVISIONS = 93;

/** Most that a seal takes: 1-1/6 in across at half size, 2-1/3 in at full size. */
const SEAL_RADIUS = 56;

/** Where on the sheet set the findings accepted in writing are listed. */
export interface RuleLine { acceptedOn: string }

/** The line every sheet prints about its check, for example `27 RULES RUN: MUST-FIX 0, NEEDS DATA 1 (ACCEPTED, SEE E-603), ACCEPTED 1`. */
export function ruleLine(context: SheetContext, { acceptedOn }: RuleLine): string {
  const { check } = context;
  if (!check) return "NOT CHECKED YET";
  const taken = check.findings.filter((finding) => finding.kind === "needs-data" && finding.accepted !== null).length;
  const data = check.counts.needsData + taken;
  const note = taken === 0 ? "" : taken === data ? ` (ACCEPTED, SEE ${acceptedOn})` : ` (${taken} ACCEPTED, SEE ${acceptedOn})`;
  return `${check.rulesRun} RULES RUN: MUST-FIX ${check.counts.mustFix}, NEEDS DATA ${data}${note}, ACCEPTED ${check.counts.accepted}`;
}

/** The 64 hex digits in groups of four, in lines that fit the block. */
export const digestLines = (digest: string): string[] => {
  const groups = digest.toUpperCase().match(/.{1,4}/g) ?? [];
  return [groups.slice(0, 6), groups.slice(6, 12), groups.slice(12)].filter((line) => line.length).map((line) => line.join(" "));
};

/** Collects primitives of the block; `y` runs down. */
class Block {
  readonly made: Primitive[] = [];
  constructor(readonly left: number, public y: number) {}
  words(dx: number, y: number, words: string, style: Style = "note", size?: number): void {
    if (!words) return;
    const bold = LETTERING[style].bold * (size ? size / LETTERING[style].size : 1);
    const most = TITLE_PX - dx - 6;
    const at = size ?? LETTERING[style].size;
    this.made.push(text(this.left + dx, y, fitText(words, at, LETTERING[style].face, most), style, { size: at, bold }));
  }
  label(dx: number, y: number, words: string): void {
    this.made.push(text(this.left + dx, y, words, "note", { ink: "ink2" }));
  }
  rule(y: number): void {
    this.made.push(path(`M${n(this.left)} ${n(y)}H${n(this.left + TITLE_PX)}`, { weight: WEIGHTS.tableOutline, layer: "ground" }));
  }
  pair(label: string, words: string): void {
    const lines = wrapText(letter(words), 13, "narrow", TITLE_PX - COLUMN - 6).slice(0, 2);
    if (lines.join("") === "") return;
    this.label(PAD, this.y, label);
    lines.forEach((line, i) => this.words(COLUMN, this.y + i * LINE, line));
    this.y += lines.length * LINE;
  }
}

/** The title block along the right edge. */
export function titleBlockPrimitives(g: SheetGeometry, context: SheetContext, words: SheetWords, rules: RuleLine): Primitive[] {
  const left = g.widthPx - INNER_PX - TITLE_PX;
  const bottom = g.heightPx - INNER_PX;
  const block = new Block(left, INNER_PX);
  job(block, context);
  people(block, context);
  const revisionsTop = bottom - FOOT - SHEET - TITLE - SCALE - REVISIONS;
  sealCell(block, context, revisionsTop);
  revisions(block, context, revisionsTop);
  scale(block, g, words, revisionsTop + REVISIONS);
  titleAndNumber(block, words, bottom);
  foot(block, context, rules, bottom - FOOT);
  return block.made;
}

function job(block: Block, { drawing }: SheetContext): void {
  const { titleBlock: t } = drawing.sheet;
  block.label(PAD, 82, "JOB");
  const width = TITLE_PX - PAD - 8;
  const name = letter(t.jobName || "NO NAME");
  const size = wrapText(name, 22, "normal", width).length <= 2 && textWidth(name, 22, "normal") < 2 * width ? 22 : 17;
  const lines = wrapText(name, size, "normal", width).slice(0, 3);
  lines.forEach((line, i) => block.words(PAD, 106 + i * (size + 1), line, "heading", size));
  block.y = 106 + (lines.length - 1) * (size + 1) + 19;
  const small = [...t.addressLines.split("\n"), t.parcel && `PARCEL ${t.parcel}`, t.owner && `OWNER ${t.owner}`].filter(Boolean);
  for (const line of small.flatMap((each) => wrapText(letter(each), 13, "narrow", width)).slice(0, 5)) {
    block.words(PAD, block.y, line);
    block.y += LINE;
  }
  block.y -= 4;
  block.rule(block.y);
  block.y += LINE;
}

function people(block: Block, { drawing }: SheetContext): void {
  const { titleBlock: t } = drawing.sheet;
  block.pair("DESIGNED", t.designedBy);
  block.pair("CHECKED", t.checkedBy);
  block.pair("PREPARER", t.preparer);
  block.pair("CONTRACTOR", t.contractor);
  block.pair("UTILITY", drawing.site.utilityName ?? "");
  block.y -= 5;
  block.rule(block.y);
  block.y += LINE;
  block.pair("CODES", t.codes || `NEC ${drawing.site.edition}`);
  block.pair("PERMIT", t.permitNumber);
  block.pair("JOB NO.", t.jobNumber);
  block.y -= 5;
  block.rule(block.y);
  block.y += LINE;
}

/** Seal at the left, its words at the right; while there is none, its place stands in the middle. */
function sealCell(block: Block, { seal, sealPlace }: SheetContext, bottom: number): void {
  block.label(PAD, block.y, "SEAL");
  const top = block.y + 6;
  const radius = Math.max(38, Math.min(SEAL_RADIUS, (bottom - top - 8) / 2));
  const middle = (top + bottom) / 2;
  const center = seal ? PAD + radius : TITLE_PX / 2;
  block.made.push(...sealPrimitives(block.left + center, middle, radius, seal, sealPlace));
  if (seal) {
    const at = PAD + 2 * radius + 7;
    const lines = sealLines(seal, TITLE_PX - at - 4);
    const pitch = Math.min(LINE, (bottom - block.y) / lines.length);
    const first = (block.y - LINE + bottom) / 2 - ((lines.length - 1) * pitch) / 2 + 5;
    lines.forEach((line, i) => block.words(at, first + i * pitch, line));
  }
  block.rule(bottom);
}

function revisions(block: Block, context: SheetContext, top: number): void {
  const { left } = block;
  block.label(PAD, top + 15, "REV");
  block.label(46, top + 15, "DESCRIPTION");
  block.label(157, top + 15, "DATE");
  block.label(219, top + 15, "BY");
  const rows = 4, rowPx = 18, bottom = top + REVISIONS;
  const lines = [38, 152, 214].map((x) => `M${n(left + x)} ${n(top)}V${n(bottom)}`);
  for (let i = 1; i <= rows; i += 1) lines.push(`M${n(left)} ${n(bottom - rowPx * i)}H${n(left + TITLE_PX)}`);
  block.made.push(path(lines.join(""), { weight: WEIGHTS.tableLine, layer: "ground" }));
  // Newest on top of the older ones; when there are more than fit, the oldest are in the store and not on the sheet.
  context.revisions.slice(-rows).forEach((revision, i) => {
    const y = bottom - 4.6 - i * rowPx;
    const cell = (dx: number, words: string, width: number) => block.words(dx, y, fitText(letter(words), 13, "narrow", width));
    cell(14, revision.letter, 22);
    cell(44, revision.description, 106);
    cell(157, `${revision.date.slice(5)}-${revision.date.slice(2, 4)}`, 56);
    cell(219, initials(revision.by), 29);
  });
  block.rule(bottom);
}

/** Initials of a name: Ines Okafor-Lund is IOL. */
export const initials = (name: string): string => name.split(/[\s-]+/).map((part) => part.charAt(0).toUpperCase()).filter((c) => /\p{L}/u.test(c)).join("").slice(0, 4);

function scale(block: Block, g: SheetGeometry, words: SheetWords, top: number): void {
  block.label(PAD, top + 15, "SCALE");
  block.made.push(text(block.left + PAD, top + 31, words.scale, "note"));
  block.label(COLUMN, top + 15, "PLOTTED SIZE");
  block.words(COLUMN, top + 31, `${g.widthIn} × ${g.heightIn} IN, ${g.size}`);
  if (g.halfSize) block.words(COLUMN, top + 47, g.halfSize);
  block.made.push(path(`M${n(block.left + COLUMN - 8)} ${n(top)}V${n(top + SCALE)}`, { weight: WEIGHTS.tableLine, layer: "ground" }));
  block.rule(top + SCALE);
}

function titleAndNumber(block: Block, words: SheetWords, bottom: number): void {
  const top = bottom - FOOT - SHEET - TITLE;
  block.label(PAD, top + 16, "SHEET TITLE");
  const title = letter(words.title);
  const size = Math.min(22, ((TITLE_PX - PAD - 8) / textWidth(title, 1, "normal")));
  block.words(PAD, top + 40, title, "heading", Math.max(15, size));
  block.words(PAD, top + 60, letter(words.subtitle), "tag", 15);
  block.rule(top + TITLE);
  const y = top + TITLE;
  block.label(PAD, y + 16, "SHEET");
  block.words(PAD, y + 60, letter(words.number), "heading", 42);
  block.made.push(text(block.left + TITLE_PX - PAD, y + 60, `${words.index} OF ${words.count}`, "tag", { size: 15, bold: 0.45, anchor: "end" }));
  block.rule(y + SHEET);
}

function foot(block: Block, context: SheetContext, rules: RuleLine, top: number): void {
  const { check, seal } = context;
  const edition = check?.edition ?? context.drawing.site.edition;
  const lines = [
    "DRAWING DIGEST, SHA-256", ...digestLines(context.digest),
    `SEAL CODE ${seal?.sealCode ?? "NONE"}`,
    ...wrapText(`NEC ${edition}${isPreview(edition) ? ` (${letter(PREVIEW_REMARK)})` : ""}, RULE SET ${check?.ruleSet ?? "NONE"}`, 13, "narrow", TITLE_PX - PAD - 6),
    ...wrapText(ruleLine(context, rules), 13, "narrow", TITLE_PX - PAD - 6),
  ];
  lines.slice(0, 10).forEach((line, i) => block.words(PAD, top + 17 + i * 15.6, line));
}
export const TITLE_LEFT = (g: SheetGeometry): number => g.widthPx - INNER_PX - TITLE_PX;
export const PAPER_EDGE_PX = BORDER_PX;
