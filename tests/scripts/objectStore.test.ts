import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { Readable } from "node:stream";
import {
  CreateBucketCommand, DeleteObjectCommand, GetObjectCommand, HeadObjectCommand, ListObjectsV2Command, PutObjectCommand, S3Client,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startObjectStore, type RunningStore } from "@/scripts/fakes/objectStore";

// The other side of the protocol is the maker's own SDK with its default settings.
const credentials = { accessKeyId: "local", secretAccessKey: "a secret of the test", region: "us-east-1" };
const Bucket = "sheets";
const folder = mkdtempSync(path.join(tmpdir(), "object-store-"));
let clockShiftMs = 0;
let store: RunningStore;
let client: S3Client;

const connect = (keys: { accessKeyId: string; secretAccessKey: string }) =>
  new S3Client({ endpoint: store.endpoint, region: credentials.region, forcePathStyle: true, credentials: keys, maxAttempts: 1 });

beforeAll(async () => {
  store = await startObjectStore({ folder, credentials, now: () => Date.now() + clockShiftMs });
  client = connect(credentials);
  await client.send(new CreateBucketCommand({ Bucket }));
});
afterAll(async () => {
  client.destroy();
  await store.close();
  rmSync(folder, { recursive: true, force: true });
});

const put = (Key: string, Body: Buffer | Readable | string, more: object = {}) => client.send(new PutObjectCommand({ Bucket, Key, Body, ...more }));
const read = async (Key: string, Range?: string) => {
  const answer = await client.send(new GetObjectCommand({ Bucket, Key, Range }));
  return Buffer.from((await answer.Body?.transformToByteArray()) ?? []);
};

describe("objects", () => {
  it("gives back what was put, with its type and metadata", async () => {
    const body = Buffer.from(Array.from({ length: 70_000 }, (_, i) => i % 251));
    await put("jobs/a b/ü+1.pdf", body, { ContentType: "application/pdf", Metadata: { digest: "abc" } });
    expect((await read("jobs/a b/ü+1.pdf")).equals(body)).toBe(true);
    const head = await client.send(new HeadObjectCommand({ Bucket, Key: "jobs/a b/ü+1.pdf" }));
    expect(head).toMatchObject({ ContentType: "application/pdf", ContentLength: 70_000, Metadata: { digest: "abc" } });
  });

  it("takes the chunk framing out of a streamed body", async () => {
    const body = Buffer.alloc(200_015, "x\r\n");
    await put("stream", Readable.from([body.subarray(0, 100_000), body.subarray(100_000)]), { ContentLength: body.length });
    expect((await read("stream")).equals(body)).toBe(true);
  });

  it("serves a range and refuses one beyond the end", async () => {
    await put("range", "0123456789");
    expect((await read("range", "bytes=2-4")).toString()).toBe("234");
    expect((await read("range", "bytes=-3")).toString()).toBe("789");
    expect((await read("range", "bytes=7-")).toString()).toBe("789");
    await expect(read("range", "bytes=10-12")).rejects.toMatchObject({ $metadata: { httpStatusCode: 416 } });
  });

  it("replaces, lists by prefix in pages, and deletes", async () => {
    for (const key of ["list/b", "list/a", "list/c", "other"]) await put(key, key);
    await put("list/a", "second");
    expect((await read("list/a")).toString()).toBe("second");
    const first = await client.send(new ListObjectsV2Command({ Bucket, Prefix: "list/", MaxKeys: 2 }));
    expect(first.Contents?.map((each) => each.Key)).toEqual(["list/a", "list/b"]);
    const second = await client.send(new ListObjectsV2Command({ Bucket, Prefix: "list/", ContinuationToken: first.NextContinuationToken }));
    expect(second.Contents?.map((each) => each.Key)).toEqual(["list/c"]);
    await client.send(new DeleteObjectCommand({ Bucket, Key: "list/a" }));
    await expect(read("list/a")).rejects.toMatchObject({ name: "NoSuchKey" });
  });

  it("writes a key once when told so, and of two writers lets one win", async () => {
    await put("sealed", "first", { IfNoneMatch: "*" });
    await expect(put("sealed", "second", { IfNoneMatch: "*" })).rejects.toMatchObject({ $metadata: { httpStatusCode: 412 } });
    expect((await read("sealed")).toString()).toBe("first");
    const race = await Promise.allSettled([1, 2, 3, 4].map((n) => put("race", `${n}`, { IfNoneMatch: "*" })));
    expect(race.filter((each) => each.status === "fulfilled")).toHaveLength(1);
  });
});

describe("signatures", () => {
  it("refuses no signature, a wrong key and a wrong secret", async () => {
    expect((await fetch(`${store.endpoint}/${Bucket}/range`)).status).toBe(403);
    const get = new GetObjectCommand({ Bucket, Key: "range" });
    await expect(connect({ ...credentials, accessKeyId: "other" }).send(get)).rejects.toMatchObject({ name: "InvalidAccessKeyId" });
    await expect(connect({ ...credentials, secretAccessKey: "other" }).send(get)).rejects.toMatchObject({ name: "SignatureDoesNotMatch" });
  });

  it("serves a presigned address as it was signed and in no other form", async () => {
    await put("signed", "the sheet");
    const url = await getSignedUrl(
      client,
      new GetObjectCommand({ Bucket, Key: "signed", ResponseContentDisposition: 'attachment; filename="E-601.pdf"' }),
      { expiresIn: 60 },
    );
    const answer = await fetch(url);
    expect(await answer.text()).toBe("the sheet");
    expect(answer.headers.get("content-disposition")).toContain("E-601.pdf");
    expect((await fetch(url.replace("/signed?", "/range?"))).status).toBe(403);
    expect((await fetch(url.replace("E-601", "E-602"))).status).toBe(403);
    expect((await fetch(url.replace("X-Amz-Expires=60", "X-Amz-Expires=6000"))).status).toBe(403);
    expect((await fetch(url, { method: "DELETE" })).status).toBe(403);
    clockShiftMs = 61_000;
    expect((await fetch(url)).status).toBe(403);
    clockShiftMs = 0;
  });

  it("takes a presigned upload of the signed type alone", async () => {
    const command = new PutObjectCommand({ Bucket, Key: "upload", ContentType: "image/png" });
    const url = await getSignedUrl(client, command, { expiresIn: 60, signableHeaders: new Set(["content-type"]) });
    const send = (type: string) => fetch(url, { method: "PUT", body: "picture", headers: { "content-type": type } });
    expect((await send("text/html")).status).toBe(403);
    expect((await send("image/png")).status).toBe(200);
    expect((await read("upload")).toString()).toBe("picture");
  });
});
