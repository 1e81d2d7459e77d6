import "server-only";
import type { jsPDF } from "jspdf";
import { DOMParser, parseHTML } from "linkedom";

/** What the PDF writer asks of a browser and does not find in Node. */
interface Globals { document?: unknown; DOMParser?: unknown; CSSStyleSheet?: unknown; CSSStyleRule?: unknown }

/** Width of words in px, as the PDF will letter them: the writer draws no kerning, so neither is measured. */
function measured(pdf: jsPDF, node: { getAttribute(name: string): string | null; textContent: string | null }) {
  // The writer asks with a unit ("16px") as well as without.
  const size = Number.parseFloat(node.getAttribute("font-size") ?? "13");
  pdf.setFont(node.getAttribute("font-family") ?? "", "normal");
  return { x: 0, y: -size * 0.75, width: pdf.getStringUnitWidth(node.textContent ?? "") * size, height: size };
}

/**
 * Runs `work` with the few browser globals the PDF writer uses, and takes them away again. Calls must not overlap: the globals
 * are shared by the process.
 */
export async function withBrowserGlobals<T>(pdf: jsPDF, svg: string, work: (element: Element) => Promise<T>): Promise<T> {
  const { document } = parseHTML("<!doctype html><html><body></body></html>");
  const implementation = { createHTMLDocument: () => parseHTML("<!doctype html><html><body></body></html>").document };
  const createElement = document.createElement.bind(document);
  const createElementNS = document.createElementNS.bind(document);
  const shim = Object.assign(document, {
    implementation,
    createElement: (name: string) => (name === "canvas" ? Object.assign(createElement(name), { getContext: () => null }) : createElement(name)),
    createElementNS: (space: string, name: string) => {
      const node = createElementNS(space as never, name);
      return name === "text" ? Object.assign(node, { getBBox: () => measured(pdf, node as never) }) : node;
    },
  });
  class NoStyle {}
  const globals = globalThis as unknown as Globals;
  const before: Globals = { document: globals.document, DOMParser: globals.DOMParser, CSSStyleSheet: globals.CSSStyleSheet, CSSStyleRule: globals.CSSStyleRule };
  Object.assign(globals, { document: shim, DOMParser, CSSStyleSheet: NoStyle, CSSStyleRule: NoStyle });
  try {
    const element = new DOMParser().parseFromString(svg, "image/svg+xml").documentElement;
    return await work(element as unknown as Element);
  } finally {
    for (const [name, value] of Object.entries(before)) {
      if (value === undefined) delete (globals as Record<string, unknown>)[name];
      else (globals as Record<string, unknown>)[name] = value;
    }
  }
}
