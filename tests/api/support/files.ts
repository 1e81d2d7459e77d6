import { randomUUID } from "node:crypto";
import http from "node:http";
import type { AddressInfo } from "node:net";
import { CreateBucketCommand, ListObjectsV2Command, S3Client } from "@aws-sdk/client-s3";
import { PDFDocument } from "pdf-lib";
import sharp from "sharp";
import { NextRequest } from "next/server";
import type { FileAnswer, FilePurpose } from "@/lib/api";
import { env } from "@/lib/server/env";
import type { Person } from "./people";
import { request, type Answer, type Loose } from "./server";

/** A PDF with some pages. */
export async function pdf(pages = 1, text = "Plot plan"): Promise<Buffer> {
  const document = await PDFDocument.create();
  for (let page = 0; page < pages; page += 1) document.addPage([200, 100]).drawText(`${text} ${page + 1}`);
  return Buffer.from(await document.save());
}

/** A phone's photo lying on its side: 60 × 40 px stored, 40 × 60 px upright, with camera and place in its data. */
export const photoWithPlace = (): Promise<Buffer> =>
  sharp({ create: { width: 60, height: 40, channels: 3, background: "#a8481f" } }).jpeg({ quality: 95 })
    .withExif({ IFD0: { Make: "Camera of the tests", Orientation: "6" }, IFD3: { GPSLatitudeRef: "N", GPSLatitude: "51/1 30/1 3230/100", GPSLongitudeRef: "W", GPSLongitude: "0/1 7/1 4366/100" } })
    .withMetadata({ orientation: 6 }).toBuffer();

export const uploadPath = (place: string, name: string, purpose: FilePurpose) => `${place}/files?name=${encodeURIComponent(name)}&purpose=${encodeURIComponent(purpose)}`;

/** Sends a file as the browser does. `place` is the address of the job or library entry. */
export const upload = (as: Person, place: string, bytes: Buffer, name = "plan.pdf", purpose: FilePurpose = "document"): Promise<Answer<Loose>> =>
  request("POST", uploadPath(place, name, purpose), { as, raw: new Uint8Array(bytes), headers: { "content-type": "application/octet-stream" } });

export async function uploaded(as: Person, place: string, bytes: Buffer, name?: string, purpose?: FilePurpose): Promise<FileAnswer> {
  const answer = await upload(as, place, bytes, name, purpose);
  if (answer.status !== 201) throw new Error(`the upload answered ${answer.status}: ${JSON.stringify(answer.body)}`);
  return answer.body;
}

const holder = globalThis as typeof globalThis & { ferruleStore?: S3Client };
const clientFor = (endpoint: string) => {
  const { S3_REGION, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = env();
  return new S3Client({ endpoint, region: S3_REGION, forcePathStyle: true, credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY } });
};

/** A bucket of this test file's own, so that everything in it was put there by it. Before anything reads the settings. */
export async function ownBucket(): Promise<void> {
  process.env["S3_BUCKET"] = `test-${randomUUID()}`;
  await clientFor(env().S3_ENDPOINT ?? "").send(new CreateBucketCommand({ Bucket: env().S3_BUCKET }));
}

/** Keys of everything in the bucket, in order. */
export async function storedKeys(): Promise<string[]> {
  const answer = await clientFor(env().S3_ENDPOINT ?? "").send(new ListObjectsV2Command({ Bucket: env().S3_BUCKET }));
  if (answer.IsTruncated) throw new Error("more objects than one answer holds");
  return (answer.Contents ?? []).map((each) => each.Key ?? "");
}

/** Runs `work` while the store's address answers nobody. */
export async function withoutStore<Result>(work: () => Promise<Result>): Promise<Result> {
  const usual = holder.ferruleStore;
  holder.ferruleStore = clientFor(await deadEndpoint());
  try {
    return await work();
  } finally {
    if (usual) holder.ferruleStore = usual;
    else delete holder.ferruleStore;
  }
}

/** A port that answers nobody. */
async function deadEndpoint(): Promise<string> {
  const server = http.createServer();
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  await new Promise((resolve) => server.close(resolve));
  return `http://127.0.0.1:${port}`;
}

/**
 * A socket server in front of one handler, for what a request in memory cannot show: a connection that breaks. The body
 * reaches the handler as the framework hands it over, a stream that fails with the socket.
 */
export async function socketServer(handler: (request: NextRequest) => Promise<Response>): Promise<{ port: number; answered: Promise<Response>; close: () => Promise<void> }> {
  let settle: (response: Response) => void = () => undefined;
  const answered = new Promise<Response>((resolve) => { settle = resolve; });
  const server = http.createServer((incoming, outgoing) => {
    const body = new ReadableStream<Uint8Array>({
      start(controller) {
        incoming.on("data", (chunk: Buffer) => controller.enqueue(new Uint8Array(chunk)));
        incoming.on("end", () => controller.close());
        incoming.on("error", (error) => controller.error(error));
      },
    });
    const headers = Object.fromEntries(Object.entries(incoming.headers).flatMap(([name, value]) => (typeof value === "string" ? [[name, value]] : [])));
    const given = new NextRequest(new URL(incoming.url ?? "/", process.env["NEXTAUTH_URL"]), {
      method: incoming.method ?? "POST", headers, body, duplex: "half",
    } as ConstructorParameters<typeof NextRequest>[1]);
    void handler(given).then((response) => {
      settle(response.clone());
      outgoing.writeHead(response.status).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return {
    port: (server.address() as AddressInfo).port, answered,
    close: () => new Promise((resolve) => { server.close(() => resolve()); server.closeAllConnections(); }),
  };
}
