import { DASHES, type Ink, type Primitive, n } from "./primitives";

/** Inks on paper: black on white, so that a copy of a copy keeps everything. */
export const PRINT_INKS: Readonly<Record<Ink, string>> = {
  ink: "#000000", ink2: "#000000", paper: "#ffffff", ww: "#ffffff", pv: "#000000", bat: "#000000", seal: "#000000", red: "#000000", copper: "#000000",
};
/** Family names of the two faces, as embedded. */
export const FACE_FAMILIES = { normal: "Ferrule Lettering", narrow: "Ferrule Lettering Narrow" } as const;

const escapeXml = (words: string): string => words.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");

/** One primitive as SVG with presentation attributes only: the PDF writer reads neither style nor class. */
export function primitiveSvg(primitive: Primitive, inks: Readonly<Record<Ink, string>> = PRINT_INKS): string {
  switch (primitive.type) {
    case "path": {
      const stroke = primitive.stroke === null ? ` stroke="none"` : ` stroke="${inks[primitive.stroke]}" stroke-width="${n(primitive.weight)}"`;
      const dashes = DASHES[primitive.dash];
      const dash = dashes.length ? ` stroke-dasharray="${dashes.join(" ")}"` : "";
      const cap = primitive.cap === "butt" ? "" : ` stroke-linecap="${primitive.cap}"`;
      return `<path d="${primitive.d}" fill="${primitive.fill === null ? "none" : inks[primitive.fill]}"${stroke}${dash}${cap} stroke-linejoin="round"/>`;
    }
    case "text": {
      const anchor = primitive.anchor === "start" ? "" : ` text-anchor="${primitive.anchor}"`;
      const bold = primitive.bold > 0 ? ` stroke="${inks[primitive.ink]}" stroke-width="${n(primitive.bold)}"` : "";
      const turn = primitive.turn ? ` transform="rotate(${primitive.turn} ${n(primitive.x)} ${n(primitive.y)})"` : "";
      return `<text x="${n(primitive.x)}" y="${n(primitive.y)}" font-family="${FACE_FAMILIES[primitive.face]}" font-size="${n(primitive.size)}" fill="${inks[primitive.ink]}"${bold}${anchor}${turn}>${escapeXml(primitive.text)}</text>`;
    }
    case "image":
      return `<image x="${n(primitive.x)}" y="${n(primitive.y)}" width="${n(primitive.width)}" height="${n(primitive.height)}" href="${primitive.href}"/>`;
    case "group": {
      const moves = [
        primitive.x || primitive.y ? `translate(${n(primitive.x)} ${n(primitive.y)})` : "",
        primitive.turn ? `rotate(${primitive.turn})` : "",
        primitive.mirrored || primitive.scale !== 1 ? `scale(${primitive.mirrored ? -primitive.scale : primitive.scale} ${primitive.scale})` : "",
      ].filter(Boolean).join(" ");
      const inner = primitive.children.map((child) => primitiveSvg(child, inks)).join("");
      return `<g${moves ? ` transform="${moves}"` : ""}>${inner}</g>`;
    }
  }
}

/**
 * A whole sheet as SVG.
 * @param widthPx width of the sheet at half size, px
 */
export function sheetSvg(primitives: readonly Primitive[], widthPx: number, heightPx: number, inks: Readonly<Record<Ink, string>> = PRINT_INKS): string {
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${n(widthPx)} ${n(heightPx)}" width="${n(widthPx)}" height="${n(heightPx)}">${primitives.map((each) => primitiveSvg(each, inks)).join("")}</svg>`;
}
