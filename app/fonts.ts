import localFont from "next/font/local";

/*
 * The same files serve the page, the canvas and the PDF. Fallback metrics are off: a generated
 * fallback face would stand before Ferrule Lettering Narrow, which holds the Ω Δ ≤ ≥ √ that
 * Archivo's subset lacks.
 */
const archivo = localFont({
  src: "../public/fonts/archivo-var.woff2",
  variable: "--font-archivo",
  weight: "100 900",
  declarations: [{ prop: "font-stretch", value: "62% 125%" }],
  adjustFontFallback: false,
  display: "swap",
});

const archivoExtended = localFont({
  src: "../public/fonts/archivo-var-ext.woff2",
  variable: "--font-archivo-ext",
  weight: "100 900",
  declarations: [
    { prop: "font-stretch", value: "62% 125%" },
    { prop: "unicode-range", value: "U+0100-02BA,U+1E00-1E9F,U+1EF2-1EFF,U+20A0-20C0" },
  ],
  adjustFontFallback: false,
  preload: false,
  display: "swap",
});

const lettering = localFont({
  src: "../public/fonts/ferrule-lettering.ttf",
  variable: "--font-lettering",
  adjustFontFallback: false,
  display: "swap",
});

const letteringNarrow = localFont({
  src: "../public/fonts/ferrule-lettering-narrow.ttf",
  variable: "--font-lettering-narrow",
  adjustFontFallback: false,
  display: "swap",
});

/** Class names that put the four font variables on an element. */
export const fontVariables = [archivo, archivoExtended, lettering, letteringNarrow]
  .map((font) => font.variable)
  .join(" ");
