import "server-only";
import { createHash } from "node:crypto";
import { DeleteObjectCommand, GetObjectCommand, HeadObjectCommand, PutObjectCommand, S3Client, S3ServiceException } from "@aws-sdk/client-s3";
import { env } from "@/lib/server/env";
import { storeDown } from "@/lib/server/http/problem";
import { checkedStream } from "./checkedStream";

/** How long the store may take to accept a connection, and to say something on it, ms. */
const CONNECT_MS = 3_000;
const ANSWER_MS = 20_000;

const holder = globalThis as typeof globalThis & { ferruleStore?: S3Client };

function client(): S3Client {
  const { S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY, S3_FORCE_PATH_STYLE } = env();
  return (holder.ferruleStore ??= new S3Client({
    ...(S3_ENDPOINT ? { endpoint: S3_ENDPOINT } : {}), region: S3_REGION, forcePathStyle: S3_FORCE_PATH_STYLE,
    credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY },
    requestHandler: { connectionTimeout: CONNECT_MS, requestTimeout: ANSWER_MS, throwOnRequestTimeout: true },
  }));
}

/** A stored file. `digest` is its SHA-256, hex; the key is made of it, so a file can only be what its key says. */
export interface StoredFile { key: string; digest: string; bytes: number }
/** First and last byte, both included. */
export interface ByteRange { start: number; end: number }

const digestOf = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
const answered = (error: unknown, ...statuses: number[]) => error instanceof S3ServiceException && statuses.includes(error.$metadata.httpStatusCode ?? 0);

/** What the store could not do, as a refusal a person can act on; the cause goes to the log. */
function failed(what: string, key: string, error: unknown): Error {
  console.error(`store: ${what} ${key}:`, error instanceof Error ? `${error.name}: ${error.message}` : error);
  return storeDown();
}

/**
 * Stores bytes under a key made of their digest. The same bytes are stored once, and nothing is ever overwritten.
 * @param folder what kind of file it is, for example "sheets"
 * @throws Problem 503 `store-down`
 */
export async function putOnce(folder: string, bytes: Uint8Array, contentType: string): Promise<StoredFile> {
  const digest = digestOf(bytes);
  const key = `${folder}/${digest}`;
  await putIfAbsent(key, bytes, contentType);
  return { key, digest, bytes: bytes.byteLength };
}

/** As `putOnce`, under a key the caller made of what the bytes were worked out from. */
export async function putIfAbsent(key: string, bytes: Uint8Array, contentType: string): Promise<void> {
  if (await exists(key)) return;
  try {
    await client().send(new PutObjectCommand({ Bucket: env().S3_BUCKET, Key: key, Body: bytes, ContentType: contentType, IfNoneMatch: "*" }));
  } catch (error) {
    // Somebody stored the same bytes meanwhile.
    if (!answered(error, 412)) throw failed("put", key, error);
  }
}

/** Whether there is such an object. @throws Problem 503 `store-down` */
export async function exists(key: string): Promise<boolean> {
  try {
    await client().send(new HeadObjectCommand({ Bucket: env().S3_BUCKET, Key: key }));
    return true;
  } catch (error) {
    if (answered(error, 404)) return false;
    throw failed("head", key, error);
  }
}

async function open(key: string, range?: ByteRange) {
  try {
    const answer = await client().send(new GetObjectCommand({
      Bucket: env().S3_BUCKET, Key: key, ...(range ? { Range: `bytes=${range.start}-${range.end}` } : {}),
    }));
    if (!answer.Body) throw new Error("no body");
    return answer.Body;
  } catch (error) {
    // A row says that it is there: that it is not is a fault of the store, to be looked into, and no "not found".
    throw failed("get", key, error);
  }
}

async function read(key: string): Promise<Buffer> {
  const body = await open(key);
  try {
    return Buffer.from(await body.transformToByteArray());
  } catch (error) {
    throw failed("read", key, error);
  }
}

/**
 * Bytes of a stored file, checked against the digest in its key.
 * @throws Problem 503 when the store does not give them; Error when they are not what the key says
 */
export async function getBytes(key: string): Promise<Buffer> {
  const bytes = await read(key);
  if (digestOf(bytes) !== key.slice(key.lastIndexOf("/") + 1)) throw new Error(`stored file ${key} was changed`);
  return bytes;
}

/** Bytes under a key that is not made of their own digest, or null where there are none. @throws Problem 503 `store-down` */
export async function getIfPresent(key: string): Promise<Buffer | null> {
  return (await exists(key)) ? read(key) : null;
}

/** A part of a stored file as a stream. @throws Problem 503 `store-down` */
export async function getRange(key: string, range: ByteRange): Promise<ReadableStream<Uint8Array>> {
  return (await open(key, range)).transformToWebStream();
}

/**
 * A whole stored file as a stream that breaks off before its end when the bytes are not what the key says.
 * @throws Problem 503 `store-down`
 */
export async function stream(key: string): Promise<ReadableStream<Uint8Array>> {
  const source: ReadableStream<Uint8Array> = (await open(key)).transformToWebStream();
  return source.pipeThrough(checkedStream(key.slice(key.lastIndexOf("/") + 1)));
}

/**
 * Takes out an object that nothing refers to. The caller holds whatever keeps others from beginning to refer to it.
 * @throws Problem 503 `store-down`
 */
export async function discard(key: string): Promise<void> {
  try {
    await client().send(new DeleteObjectCommand({ Bucket: env().S3_BUCKET, Key: key }));
  } catch (error) {
    throw failed("delete", key, error);
  }
}
