/**
 * A local stand-in for an object store: the S3 protocol, version 4 signatures checked, objects
 * kept as files. For one machine only: no multipart, copy, versions or access lists.
 */
import { createHash } from "node:crypto";
import http from "node:http";
import type { AddressInfo } from "node:net";
import { ObjectFiles, type StoredObject } from "./objectFiles";
import { checkSignature, type Credentials } from "./sigv4";

export interface ObjectStoreOptions {
  /** Folder in which objects are kept. */
  folder: string;
  credentials: Credentials;
  /** Buckets made at the start. */
  buckets?: readonly string[];
  /** 0 or left out takes a free port. */
  port?: number;
  /** Clock in milliseconds since 1970, for tests of expiry. */
  now?: () => number;
}

export interface RunningStore {
  endpoint: string;
  close: () => Promise<void>;
}

const MAX_BODY_BYTES = 256 * 1024 * 1024;
const STATUS: Readonly<Record<string, number>> = {
  AccessDenied: 403, InvalidAccessKeyId: 403, SignatureDoesNotMatch: 403, RequestTimeTooSkewed: 403,
  NoSuchKey: 404, NoSuchBucket: 404, PreconditionFailed: 412, InvalidRange: 416, EntityTooLarge: 400,
  InvalidArgument: 400, XAmzContentSHA256Mismatch: 400, IncompleteBody: 400, MethodNotAllowed: 405, NotImplemented: 501, InternalError: 500,
};

class StoreError extends Error {
  constructor(readonly code: string) {
    super(code);
  }
}

const escapeXml = (text: string) => text.replace(/[<>&"']/g, (character) => `&#${character.charCodeAt(0)};`);

/** Starts the store on loopback. */
export async function startObjectStore(options: ObjectStoreOptions): Promise<RunningStore> {
  const files = new ObjectFiles(options.folder);
  for (const bucket of options.buckets ?? []) await files.createBucket(bucket);
  const now = options.now ?? Date.now;
  const server = http.createServer((request, response) => {
    answer(files, options.credentials, now, request, response).catch((error: unknown) => {
      const code = error instanceof StoreError ? error.code : "InternalError";
      if (code === "InternalError") console.error(error);
      const body = `<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>${code}</Message></Error>`;
      // Drain what was not read, or the client sees a reset instead of the answer.
      request.resume();
      response.writeHead(STATUS[code] ?? 500, { "content-type": "application/xml" });
      response.end(request.method === "HEAD" ? undefined : body);
    });
  });
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(options.port ?? 0, "127.0.0.1", resolve);
  });
  const { port } = server.address() as AddressInfo;
  return {
    endpoint: `http://127.0.0.1:${port}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

async function answer(
  files: ObjectFiles,
  credentials: Credentials,
  now: () => number,
  request: http.IncomingMessage,
  response: http.ServerResponse,
): Promise<void> {
  const [rawPath = "/", rawQuery = ""] = (request.url ?? "/").split("?", 2);
  const query = Object.fromEntries(new URLSearchParams(rawQuery));
  const method = request.method ?? "GET";
  const check = await checkSignature({ method, path: rawPath, query, headers: request.headers }, credentials, now());
  if (!check.ok) throw new StoreError(check.code);

  const [bucket = "", ...rest] = rawPath.slice(1).split("/").map(decodeURIComponent);
  const key = rest.join("/");
  if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(bucket)) throw new StoreError("NoSuchBucket");
  if (key === "" && method === "PUT") {
    await files.createBucket(bucket);
    response.writeHead(200).end();
    return;
  }
  if (!(await files.hasBucket(bucket))) throw new StoreError("NoSuchBucket");
  if (key === "") return answerBucket(files, bucket, method, query, response);

  if (method === "PUT") return put(files, bucket, key, check.payloadHash, request, response);
  if (method === "DELETE") {
    await files.remove(bucket, key);
    response.writeHead(204).end();
    return;
  }
  if (method !== "GET" && method !== "HEAD") throw new StoreError("NotImplemented");
  const object = await files.describe(bucket, key);
  if (!object) throw new StoreError("NoSuchKey");
  await get(files, bucket, object, query, request, response);
}

async function answerBucket(files: ObjectFiles, bucket: string, method: string, query: Record<string, string>, response: http.ServerResponse) {
  if (method === "HEAD") {
    response.writeHead(200).end();
    return;
  }
  if (method !== "GET") throw new StoreError("NotImplemented");
  const after = query["continuation-token"] ?? query["start-after"] ?? "";
  const limit = Math.min(Number(query["max-keys"] ?? 1000) || 1000, 1000);
  const all = (await files.list(bucket, query["prefix"] ?? "")).filter((object) => object.key > after);
  const page = all.slice(0, limit);
  const more = all.length > page.length;
  const contents = page
    .map((object) => `<Contents><Key>${escapeXml(object.key)}</Key><LastModified>${object.modified}</LastModified><ETag>&quot;${object.etag}&quot;</ETag><Size>${object.size}</Size></Contents>`)
    .join("");
  const next = more ? `<NextContinuationToken>${escapeXml(page.at(-1)?.key ?? "")}</NextContinuationToken>` : "";
  response.writeHead(200, { "content-type": "application/xml" });
  response.end(
    `<?xml version="1.0" encoding="UTF-8"?><ListBucketResult><Name>${bucket}</Name><KeyCount>${page.length}</KeyCount><MaxKeys>${limit}</MaxKeys><IsTruncated>${more}</IsTruncated>${next}${contents}</ListBucketResult>`,
  );
}

async function readBody(request: http.IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > MAX_BODY_BYTES) throw new StoreError("EntityTooLarge");
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

/** Takes the data out of a body sent in signed or unsigned chunks, each led by its length in hexadecimal. */
function unchunk(body: Buffer, expectedLength: number): Buffer {
  const parts: Buffer[] = [];
  let position = 0;
  for (;;) {
    const lineEnd = body.indexOf("\r\n", position);
    if (lineEnd < 0) throw new StoreError("IncompleteBody");
    const size = Number.parseInt(body.toString("latin1", position, lineEnd).split(";")[0] ?? "", 16);
    if (!Number.isFinite(size)) throw new StoreError("InvalidArgument");
    if (size === 0) break;
    parts.push(body.subarray(lineEnd + 2, lineEnd + 2 + size));
    position = lineEnd + 2 + size + 2;
  }
  const data = Buffer.concat(parts);
  if (data.length !== expectedLength) throw new StoreError("IncompleteBody");
  return data;
}

async function put(files: ObjectFiles, bucket: string, key: string, payloadHash: string, request: http.IncomingMessage, response: http.ServerResponse) {
  const raw = await readBody(request);
  if (/^[0-9a-f]{64}$/.test(payloadHash) && createHash("sha256").update(raw).digest("hex") !== payloadHash) {
    throw new StoreError("XAmzContentSHA256Mismatch");
  }
  const chunked = payloadHash.startsWith("STREAMING-");
  const body = chunked ? unchunk(raw, Number(request.headers["x-amz-decoded-content-length"])) : raw;
  const metadata: Record<string, string> = {};
  for (const [name, value] of Object.entries(request.headers)) {
    if (name.startsWith("x-amz-meta-") && typeof value === "string") metadata[name] = value;
  }
  const about = { contentType: request.headers["content-type"] ?? "application/octet-stream", metadata };
  const onlyIfAbsent = request.headers["if-none-match"] === "*";
  const object = await files.write(bucket, key, body, about, onlyIfAbsent);
  if (!object) throw new StoreError("PreconditionFailed");
  response.writeHead(200, { etag: `"${object.etag}"` }).end();
}

/** Reads a `Range` header of one span. Null means the whole object. */
function parseRange(header: string | undefined, size: number): { start: number; end: number } | null {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header ?? "");
  if (!match || (match[1] === "" && match[2] === "")) return null;
  const start = match[1] === "" ? Math.max(0, size - Number(match[2])) : Number(match[1]);
  const end = match[1] !== "" && match[2] !== "" ? Math.min(Number(match[2]), size - 1) : size - 1;
  if (start >= size || start > end) throw new StoreError("InvalidRange");
  return { start, end };
}

async function get(
  files: ObjectFiles,
  bucket: string,
  object: StoredObject,
  query: Record<string, string>,
  request: http.IncomingMessage,
  response: http.ServerResponse,
) {
  const range = parseRange(request.headers.range, object.size);
  const headers: Record<string, string | number> = {
    "content-type": query["response-content-type"] ?? object.contentType,
    "last-modified": new Date(object.modified).toUTCString(),
    etag: `"${object.etag}"`,
    "accept-ranges": "bytes",
    "content-length": range ? range.end - range.start + 1 : object.size,
    ...object.metadata,
  };
  if (query["response-content-disposition"]) headers["content-disposition"] = query["response-content-disposition"];
  if (range) headers["content-range"] = `bytes ${range.start}-${range.end}/${object.size}`;
  response.writeHead(range ? 206 : 200, headers);
  if (request.method === "HEAD") {
    response.end();
    return;
  }
  const body = await files.read(bucket, object);
  response.end(range ? body.subarray(range.start, range.end + 1) : body);
}
