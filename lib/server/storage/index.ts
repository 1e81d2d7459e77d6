import "server-only";
import { createHash } from "node:crypto";
import { GetObjectCommand, HeadObjectCommand, NotFound, PutObjectCommand, S3Client, S3ServiceException } from "@aws-sdk/client-s3";
import { env } from "@/lib/server/env";

const holder = globalThis as typeof globalThis & { ferruleStore?: S3Client };

function client(): S3Client {
  const { S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY, S3_FORCE_PATH_STYLE } = env();
  return (holder.ferruleStore ??= new S3Client({
    ...(S3_ENDPOINT ? { endpoint: S3_ENDPOINT } : {}), region: S3_REGION, forcePathStyle: S3_FORCE_PATH_STYLE,
    credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY },
  }));
}

/** A stored file. `digest` is its SHA-256, hex; the key is made of it, so a file can only be what its key says. */
export interface StoredFile { key: string; digest: string; bytes: number }

/**
 * Stores bytes under a key made of their digest. The same bytes are stored once, and nothing is ever overwritten.
 * @param folder what kind of file it is, for example "sheets"
 */
export async function putOnce(folder: string, bytes: Uint8Array, contentType: string): Promise<StoredFile> {
  const digest = createHash("sha256").update(bytes).digest("hex");
  const key = `${folder}/${digest}`;
  const file = { key, digest, bytes: bytes.byteLength };
  if (await exists(key)) return file;
  try {
    await client().send(new PutObjectCommand({ Bucket: env().S3_BUCKET, Key: key, Body: bytes, ContentType: contentType, IfNoneMatch: "*" }));
  } catch (error) {
    // Somebody stored the same bytes meanwhile.
    if (!(error instanceof S3ServiceException && error.$metadata.httpStatusCode === 412)) throw error;
  }
  return file;
}

async function exists(key: string): Promise<boolean> {
  try {
    await client().send(new HeadObjectCommand({ Bucket: env().S3_BUCKET, Key: key }));
    return true;
  } catch (error) {
    if (error instanceof NotFound || (error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404)) return false;
    throw error;
  }
}

/**
 * Bytes of a stored file, checked against the digest in its key.
 * @throws Error when the file is missing or is not what its key says
 */
export async function getBytes(key: string): Promise<Buffer> {
  const answer = await client().send(new GetObjectCommand({ Bucket: env().S3_BUCKET, Key: key }));
  if (!answer.Body) throw new Error(`stored file ${key} has no body`);
  const bytes = Buffer.from(await answer.Body.transformToByteArray());
  if (createHash("sha256").update(bytes).digest("hex") !== key.slice(key.lastIndexOf("/") + 1)) throw new Error(`stored file ${key} was changed`);
  return bytes;
}
