import { deflateSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { otherKind } from "@/lib/server/files/kinds";
import { countPdfPages } from "@/lib/server/files/pdf";
import { requestedRange } from "@/lib/server/files/range";
import { turns } from "@/lib/server/files/turns";
import { checkedStream } from "@/lib/server/storage/checkedStream";

describe("a Range header", () => {
  // RFC 9110, 14.1.2: the examples for a representation of 10000 bytes.
  it.each([
    ["bytes=0-499", { start: 0, end: 499 }], ["bytes=500-999", { start: 500, end: 999 }], ["bytes=-500", { start: 9500, end: 9999 }], ["bytes=9500-", { start: 9500, end: 9999 }],
  ])("%s is read as the standard's example says", (header, range) => {
    expect(requestedRange(header, 10_000)).toEqual(range);
  });

  it("that is not understood asks for the whole file, one past the end for none", () => {
    for (const header of [null, "", "bytes=", "bytes=-", "bytes=a-b", "bytes=5-2", "bytes=0-1,3-4", "items=0-1"]) expect(requestedRange(header, 10)).toBeNull();
    for (const header of ["bytes=10-", "bytes=10-12", "bytes=-0"]) expect(requestedRange(header, 10)).toBe("outside");
  });
});

describe("a PDF whose tables unpack to gigabytes", () => {
  it("is refused soon", async () => {
    const packed = deflateSync(Buffer.alloc(300_000_000, "1 "));
    const bomb = Buffer.concat([
      Buffer.from(`%PDF-1.7\n1 0 obj\n<</Type/ObjStm/N 1/First 4/Filter/FlateDecode/Length ${packed.length}>>\nstream\n`), packed,
      Buffer.from("\nendstream\nendobj\ntrailer<</Root 2 0 R>>\n%%EOF"),
    ]);
    await expect(countPdfPages(bomb)).rejects.toMatchObject({ fault: "too dense" });
  });
});

describe("what is not taken", () => {
  it("is named from its first bytes", () => {
    expect(otherKind(Buffer.from("II*\0rest"))).toBe("a TIFF picture");
    expect(otherKind(Buffer.from("\0\0\0\x18ftypheic"))).toBe("a HEIC picture");
    expect(otherKind(Buffer.from("AC1032 drawing"))).toBe("a DWG drawing");
    expect(otherKind(Buffer.from([0, 1, 2, 3, 0xff, 0]))).toBe("of no kind that is known here");
  });
});

describe("turns", () => {
  it("run at most so many at a time, in order, and go on after a failure", async () => {
    const inTurn = turns(2);
    let running = 0;
    let most = 0;
    const order: number[] = [];
    const work = (index: number) => inTurn(async () => {
      running += 1;
      most = Math.max(most, running);
      order.push(index);
      await new Promise((resolve) => setTimeout(resolve, 2));
      running -= 1;
      if (index === 1) throw new Error("of the test");
      return index;
    });
    const results = await Promise.allSettled([0, 1, 2, 3, 4, 5].map(work));
    expect([most, running, order]).toEqual([2, 0, [0, 1, 2, 3, 4, 5]]);
    expect(results.map((each) => each.status)).toEqual(["fulfilled", "rejected", "fulfilled", "fulfilled", "fulfilled", "fulfilled"]);
  });
});

describe("a stream checked against its digest", () => {
  // SHA-256 of "abc": FIPS 180-4 example.
  const ABC = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";
  const read = async (parts: string[]) => {
    const source = new ReadableStream<Uint8Array>({
      start(controller) {
        parts.forEach((part) => controller.enqueue(new TextEncoder().encode(part)));
        controller.close();
      },
    });
    return new Response(source.pipeThrough(checkedStream(ABC))).text();
  };

  it("passes what it should be, and never lets the end of anything else through", async () => {
    expect(await read(["a", "b", "c"])).toBe("abc");
    await expect(read(["a", "b", "d"])).rejects.toThrow();
  });
});
