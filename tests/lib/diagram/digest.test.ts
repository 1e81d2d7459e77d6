import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { canonicalJson, drawingDigest } from "@/lib/diagram/canonical";
import { emptyDrawing } from "@/lib/diagram/new";
import { sha256Hex } from "@/lib/diagram/sha256";
import { smallDrawing } from "./support";

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

describe("SHA-256", () => {
  // FIPS 180-4 with the examples of the NIST cryptographic toolkit (SHA256.pdf, SHA2_Additional.pdf).
  it.each([
    ["", "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855"],
    ["abc", "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"],
    ["abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq", "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1"],
    ["abcdefghbcdefghicdefghijdefghijkefghijklfghijklmghijklmnhijklmnoijklmnopjklmnopqklmnopqrlmnopqrsmnopqrstnopqrstu", "cf5b16a778af8380036ce59e7b0492370b249b11e8f07a51afac45037afee9d1"],
    ["a".repeat(1_000_000), "cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0"],
  ])("of the published message number %#", (message, digest) => {
    expect(sha256Hex(bytes(message))).toBe(digest);
  });
  it("agrees with the runtime's own at every length around the block borders", () => {
    for (let length = 0; length <= 200; length++) {
      const message = Uint8Array.from({ length }, (_, i) => (i * 37 + length) & 255);
      expect(sha256Hex(message)).toBe(createHash("sha256").update(message).digest("hex"));
    }
  });
});

describe("canonical JSON", () => {
  it("sorts keys at every depth and keeps the order of lists", () => {
    expect(canonicalJson({ b: 1, a: { d: [3, 1, { z: null, y: "é\u2028\"" }], c: true } })).toBe("{\"a\":{\"c\":true,\"d\":[3,1,{\"y\":\"é\u2028\\\"\",\"z\":null}]},\"b\":1}");
  });
  it("leaves out what is undefined and refuses what JSON cannot hold", () => {
    expect(canonicalJson({ a: undefined, b: -0 })).toBe("{\"b\":0}");
    expect(() => canonicalJson({ a: [Number.NaN] })).toThrow(RangeError);
    expect(() => canonicalJson(Infinity)).toThrow(RangeError);
  });
});

describe("drawing digest", () => {
  it("does not depend on the order of editing", () => {
    const drawing = smallDrawing();
    const turned = { ...drawing, equipment: Object.fromEntries(Object.entries(drawing.equipment).reverse()) };
    expect(Object.keys(turned.equipment)).not.toEqual(Object.keys(drawing.equipment));
    expect(drawingDigest(turned, "1")).toBe(drawingDigest(drawing, "1"));
  });
  it("changes with the drawing, the rule set and the edition", () => {
    const digests = [
      drawingDigest(emptyDrawing({}), "1"), drawingDigest(emptyDrawing({}), "2"), drawingDigest(emptyDrawing({ edition: "2020" }), "1"),
      drawingDigest(emptyDrawing({ elevationM: 0 }), "1"), drawingDigest(emptyDrawing({}, { owner: "Thorne" }), "1"),
    ];
    expect(new Set(digests).size).toBe(digests.length);
    for (const digest of digests) expect(digest).toMatch(/^[0-9a-f]{64}$/);
  });
});
