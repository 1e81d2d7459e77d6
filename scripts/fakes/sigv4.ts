import { createHash, createHmac, timingSafeEqual, type Hash, type Hmac } from "node:crypto";
import type { IncomingHttpHeaders } from "node:http";
import { SignatureV4 } from "@smithy/signature-v4";

export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
  region: string;
}

export interface SignedRequest {
  method: string;
  /** Path as sent, still percent-encoded. */
  path: string;
  query: Record<string, string>;
  headers: IncomingHttpHeaders;
}

/** Result of a check; `code` is the storage protocol's own error name. */
export type SignatureCheck = { ok: true; payloadHash: string } | { ok: false; code: string };

class NodeSha256 {
  private readonly state: Hash | Hmac;
  constructor(secret?: string | ArrayBuffer | ArrayBufferView) {
    const key = typeof secret === "string" ? secret : secret && toBytes(secret);
    this.state = key === undefined ? createHash("sha256") : createHmac("sha256", key);
  }
  update(data: string | ArrayBuffer | ArrayBufferView): void {
    this.state.update(typeof data === "string" ? data : toBytes(data));
  }
  async digest(): Promise<Uint8Array> {
    return new Uint8Array(this.state.digest());
  }
  reset(): void {
    throw new Error("A digest is used once.");
  }
}

function toBytes(data: ArrayBuffer | ArrayBufferView): Uint8Array {
  return ArrayBuffer.isView(data) ? new Uint8Array(data.buffer, data.byteOffset, data.byteLength) : new Uint8Array(data);
}

function same(a: string, b: string): boolean {
  const left = createHash("sha256").update(a).digest();
  const right = createHash("sha256").update(b).digest();
  return timingSafeEqual(left, right);
}

function parseDate(text: string | undefined): Date | null {
  const match = /^(\d{4})(\d{2})(\d{2})T(\d{2})(\d{2})(\d{2})Z$/.exec(text ?? "");
  if (!match) return null;
  const [, year, month, day, hour, minute, second] = match.map(Number);
  return new Date(Date.UTC(year ?? 0, (month ?? 1) - 1, day, hour, minute, second));
}

const MAX_SKEW_MS = 15 * 60 * 1000;

/**
 * Checks a version 4 signature by signing the request again with the known secret.
 * Accepts the header form and the presigned form. `now` is in milliseconds since 1970.
 */
export async function checkSignature(request: SignedRequest, credentials: Credentials, now: number): Promise<SignatureCheck> {
  const signer = new SignatureV4({
    service: "s3",
    region: credentials.region,
    credentials: { accessKeyId: credentials.accessKeyId, secretAccessKey: credentials.secretAccessKey },
    sha256: NodeSha256,
    uriEscapePath: false,
    applyChecksum: false,
  });
  return request.query["X-Amz-Signature"] !== undefined
    ? checkPresigned(request, credentials, signer, now)
    : checkHeader(request, credentials, signer, now);
}

function pick(headers: IncomingHttpHeaders, names: readonly string[]): Record<string, string> {
  const picked: Record<string, string> = {};
  for (const name of names) {
    const value = headers[name];
    if (value !== undefined) picked[name] = Array.isArray(value) ? value.join(",") : value;
  }
  return picked;
}

async function checkHeader(request: SignedRequest, credentials: Credentials, signer: SignatureV4, now: number): Promise<SignatureCheck> {
  const authorization = request.headers.authorization ?? "";
  const match = /^AWS4-HMAC-SHA256 Credential=([^/,]+)\/[^,]+,\s*SignedHeaders=([^,]+),\s*Signature=([0-9a-f]+)$/.exec(authorization);
  if (!match) return { ok: false, code: "AccessDenied" };
  const [, accessKeyId = "", signedHeaders = ""] = match;
  if (accessKeyId !== credentials.accessKeyId) return { ok: false, code: "InvalidAccessKeyId" };
  const signingDate = parseDate(pick(request.headers, ["x-amz-date"])["x-amz-date"]);
  if (!signingDate || Math.abs(now - signingDate.getTime()) > MAX_SKEW_MS) return { ok: false, code: "RequestTimeTooSkewed" };
  const names = signedHeaders.split(";");
  if (!names.includes("host")) return { ok: false, code: "AccessDenied" };
  const signed = await signer.sign(
    { method: request.method, protocol: "http:", hostname: "", path: request.path, query: request.query, headers: pick(request.headers, names) },
    { signingDate, signableHeaders: new Set(names) },
  );
  if (!same(signed.headers["authorization"] ?? "", authorization)) return { ok: false, code: "SignatureDoesNotMatch" };
  return { ok: true, payloadHash: pick(request.headers, ["x-amz-content-sha256"])["x-amz-content-sha256"] ?? "UNSIGNED-PAYLOAD" };
}

async function checkPresigned(request: SignedRequest, credentials: Credentials, signer: SignatureV4, now: number): Promise<SignatureCheck> {
  const own = new Set(["X-Amz-Algorithm", "X-Amz-Content-Sha256", "X-Amz-Credential", "X-Amz-Date", "X-Amz-Expires", "X-Amz-Signature", "X-Amz-SignedHeaders"]);
  const { query } = request;
  const [accessKeyId] = (query["X-Amz-Credential"] ?? "").split("/");
  if (accessKeyId !== credentials.accessKeyId) return { ok: false, code: "InvalidAccessKeyId" };
  const signingDate = parseDate(query["X-Amz-Date"]);
  const expiresIn = Number(query["X-Amz-Expires"]);
  if (!signingDate || !Number.isInteger(expiresIn) || expiresIn < 1 || expiresIn > 604_800) return { ok: false, code: "AccessDenied" };
  if (now > signingDate.getTime() + expiresIn * 1000 || now < signingDate.getTime() - MAX_SKEW_MS) return { ok: false, code: "AccessDenied" };
  const names = (query["X-Amz-SignedHeaders"] ?? "").split(";");
  const presigned = await signer.presign(
    {
      method: request.method,
      protocol: "http:",
      hostname: "",
      path: request.path,
      query: Object.fromEntries(Object.entries(query).filter(([name]) => !own.has(name))),
      headers: { ...pick(request.headers, names), "X-Amz-Content-Sha256": "UNSIGNED-PAYLOAD" },
    },
    { signingDate, expiresIn, signableHeaders: new Set(names), unhoistableHeaders: new Set(names) },
  );
  const expected = presigned.query?.["X-Amz-Signature"];
  if (typeof expected !== "string" || !same(expected, query["X-Amz-Signature"] ?? "")) return { ok: false, code: "SignatureDoesNotMatch" };
  return { ok: true, payloadHash: "UNSIGNED-PAYLOAD" };
}
