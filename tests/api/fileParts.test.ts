import net from "node:net";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import type { FileAnswer } from "@/lib/api";
import { POST } from "@/app/api/jobs/[jobId]/files/route";
import { database } from "@/lib/server/data/database";
import { ownBucket, pdf, socketServer, storedKeys, uploadPath, uploaded } from "./support/files";
import { firstAdministrator, newJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let jobId: string;
let bytes: Buffer;
let file: FileAnswer;

beforeAll(async () => {
  await ownBucket();
  owner = await firstAdministrator();
  jobId = await newJob(owner);
  bytes = await pdf(2);
  file = await uploaded(owner, `/api/jobs/${jobId}`, bytes);
});

const part = (range: string, headers: Record<string, string> = {}) => request("GET", `/api/files/${file.id}`, { as: owner, headers: { range, ...headers } });

describe("a part of a file", () => {
  it.each([
    ["bytes=0-9", 0, 9], ["bytes=10-", 10, null], ["bytes=-7", -7, null], ["bytes=5-999999999", 5, null], ["bytes=-999999999", 0, null],
  ])("%s is answered with exactly it", async (range, start, end) => {
    const answer = await part(range);
    const from = start < 0 ? bytes.length + start : start;
    const to = end ?? bytes.length - 1;
    expect(answer.status).toBe(206);
    expect(answer.headers.get("content-range")).toBe(`bytes ${from}-${to}/${bytes.length}`);
    expect(answer.bytes.equals(bytes.subarray(from, to + 1))).toBe(true);
  });

  it.each(["bytes=999999999-", "bytes=-0"])("%s is not there, and the size is said (416)", async (range) => {
    const answer = await part(range);
    expect(answer).toMatchObject({ status: 416, body: { code: "range" } });
    expect(answer.headers.get("content-range")).toBe(`bytes */${bytes.length}`);
  });

  it.each(["bytes=9-1", "lines=1-2", "bytes=0-1,4-5", "bytes="])("%s is answered with the whole file", async (range) => {
    const answer = await part(range);
    expect([answer.status, answer.bytes.length]).toEqual([200, bytes.length]);
  });

  it("of another state of the file is not mixed into it", async () => {
    expect((await part("bytes=0-9", { "if-range": `"${file.digest}"` })).status).toBe(206);
    expect((await part("bytes=0-9", { "if-range": '"another"' })).status).toBe(200);
  });

  it("is not sent to a reader who has the file", async () => {
    const answer = await request("GET", `/api/files/${file.id}`, { as: owner, headers: { "if-none-match": `W/"x", "${file.digest}"` } });
    expect([answer.status, answer.bytes.length]).toEqual([304, 0]);
  });
});

describe("a smaller copy of a picture", () => {
  it("is as wide as was asked, carries no data of the camera, and is kept for the next time", async () => {
    const picture = await sharp({ create: { width: 1600, height: 800, channels: 3, background: "#1d4f91" } }).withExif({ IFD0: { Make: "Camera of the tests" } }).jpeg().toBuffer();
    const { id, digest } = await uploaded(owner, `/api/jobs/${jobId}`, picture, "roof.jpg", "picture");
    for (const [width, height] of [[320, 160], [1280, 640]]) {
      const small = await request("GET", `/api/files/${id}?width=${width}`, { as: owner });
      expect(await sharp(small.bytes).metadata()).toMatchObject({ format: "webp", width, height });
      expect((await sharp(small.bytes).metadata()).exif).toBeUndefined();
      expect(small.headers.get("content-type")).toBe("image/webp");
      expect(small.headers.get("x-content-type-options")).toBe("nosniff");
      expect((await request("GET", `/api/files/${id}?width=${width}`, { as: owner })).bytes.equals(small.bytes)).toBe(true);
    }
    expect((await storedKeys()).filter((key) => key.startsWith("thumbs/"))).toEqual([`thumbs/${digest}-1280`, `thumbs/${digest}-320`]);
    expect((await request("GET", `/api/files/${id}?width=500`, { as: owner }))).toMatchObject({ status: 422, body: { field: "width" } });
  });
});

describe("an upload that breaks off", () => {
  it("leaves no row and no object", async () => {
    const whole = await pdf(40, "long");
    const [rows, keys] = [await database().StoredFile.count(), await storedKeys()];
    const server = await socketServer((given) => POST(given, { params: Promise.resolve({ jobId }) }));
    const socket = net.connect(server.port, "127.0.0.1");
    socket.on("error", () => undefined);
    socket.write(`POST ${uploadPath(`/api/jobs/${jobId}`, "long.pdf", "document")} HTTP/1.1\r\nHost: localhost\r\nOrigin: ${process.env["NEXTAUTH_URL"]}\r\nCookie: ${owner.cookie}\r\nContent-Length: ${whole.length}\r\n\r\n`);
    await new Promise<void>((resolve) => socket.write(whole.subarray(0, whole.length / 2), () => resolve()));
    await new Promise((resolve) => setTimeout(resolve, 100));
    socket.destroy();
    const answer = await server.answered;
    await server.close();
    expect(answer.status).toBe(400);
    expect(await answer.json()).toMatchObject({ code: "interrupted" });
    expect(await database().StoredFile.count()).toBe(rows);
    expect(await storedKeys()).toEqual(keys);
  });

  it("is not taken for a short file when it ends without an error", async () => {
    const whole = await pdf(2, "short");
    const answer = await request("POST", uploadPath(`/api/jobs/${jobId}`, "short.pdf", "document"), {
      as: owner, raw: new Uint8Array(whole), headers: { "content-type": "application/octet-stream", "content-length": String(whole.length + 1) },
    });
    expect(answer).toMatchObject({ status: 400, body: { code: "interrupted" } });
  });
});
