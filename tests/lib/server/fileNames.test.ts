import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { contentDisposition, displayName } from "@/lib/server/files/names";

describe("the name a file is kept under", () => {
  it.each([
    ["Plot plan.pdf", "Plot plan.pdf"],
    ["../../<script>alert(1)</script>.pdf", "alert(1).pdf"],
    ["..\\..\\Windows\\System32\\plan.pdf", "plan.pdf"],
    ["/etc/passwd", "passwd.pdf"],
    ["C:\\Users\\kit\\plan.PDF", "plan.PDF"],
    ["plan\u0000.pdf", "plan.pdf"],
    ["plan\r\nSet-Cookie: a=b.pdf", "planSet-Cookie a=b.pdf"],
    // Right-to-left override: would be shown as "planexe.pdf" turned around.
    ["plan\u202Efdp.exe", "planfdp.pdf"],
    ["pl\u200Ban\uFEFF.pdf", "plan.pdf"],
    ["panel.pdf.exe", "panel.pdf"],
    ["photo.png", "photo.pdf"],
    ["Rev. 2 v1.2", "Rev. 2 v1.2.pdf"],
    ["con.pdf", "file con.pdf"],
    ["...", "file.pdf"],
    ["", "file.pdf"],
    [".pdf", "pdf.pdf"],
    ["  spaced   out .pdf ", "spaced out.pdf"],
    ["übersicht ½ 面.pdf", "übersicht ½ 面.pdf"],
    ["a\u0308.pdf", "ä.pdf"],
    ["<img src=x onerror=alert(1)>.pdf", "pdf.pdf"],
  ])("of %j is %j", (given, wanted) => {
    expect(displayName(given, "application/pdf")).toBe(wanted);
  });

  it("keeps the endings that cameras give", () => {
    expect(displayName("IMG_1.JPEG", "image/jpeg")).toBe("IMG_1.JPEG");
    expect(displayName("IMG_1.pdf", "image/jpeg")).toBe("IMG_1.jpg");
  });

  it("is never longer than 120 characters and never ends in half of one", () => {
    expect(displayName(`${"x".repeat(300)}.pdf`, "application/pdf")).toBe(`${"x".repeat(116)}.pdf`);
    const faces = displayName(`a${"\u{1F600}".repeat(100)}.pdf`, "application/pdf");
    expect(faces.length).toBeLessThanOrEqual(120);
    expect(faces).toBe(`a${"\u{1F600}".repeat(57)}.pdf`);
  });

  it("of any text is one safe part of a path with the right ending, and stays what it is when cleaned again", () => {
    const nasty = fc.string({ unit: fc.oneof(fc.constantFrom("/", "\\", "..", "<", ">", "\"", "\u0000", "\r\n", "\u202E", ".pdf", "%", ":", " "), fc.string({ unit: "binary", minLength: 1, maxLength: 2 })), maxLength: 80 });
    fc.assert(fc.property(nasty, (given) => {
      const name = displayName(given, "application/pdf");
      expect(name).toMatch(/^[^\p{C}/\\<>:"|?*%]+\.pdf$/iu);
      expect(name).not.toMatch(/^[.\s]/);
      expect(name.length).toBeLessThanOrEqual(120);
      expect(displayName(name, "application/pdf")).toBe(name);
    }), { numRuns: 2_000 });
  });
});

describe("the header of a download", () => {
  it("carries the name twice, as RFC 6266 and RFC 8187 want it", () => {
    // RFC 6266, 5: a plain name for old readers beside the real one, with the pound sign and euro of its example.
    expect(contentDisposition("attachment", "€ rates.pdf")).toBe("attachment; filename=\"_ rates.pdf\"; filename*=UTF-8''%E2%82%AC%20rates.pdf");
    expect(contentDisposition("inline", "It's (1)*.pdf")).toBe("inline; filename=\"It's (1)*.pdf\"; filename*=UTF-8''It%27s%20%281%29%2A.pdf");
  });

  it("holds nothing that ends it early, whatever the name", () => {
    fc.assert(fc.property(fc.string({ unit: "binary" }), (given) => {
      const header = contentDisposition("attachment", displayName(given, "image/png"));
      expect(header).toMatch(/^attachment; filename="[\x20-\x21\x23-\x24\x26-\x5b\x5d-\x7e]*"; filename\*=UTF-8''[A-Za-z0-9!#$&+.^_`|~%-]*$/);
    }));
  });
});
