/**
 * The local services in one process: object store and mail catcher, each only when its settings
 * name no real one. What they listen on is written, once both are ready, to FERRULE_SERVICES_FILE.
 */
import { rename, writeFile } from "node:fs/promises";
import path from "node:path";
import { startMail } from "./mail";
import { startObjectStore } from "./objectStore";

function required(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set.`);
  return value;
}

const dataFolder = required("FERRULE_DATA");
const portOf = (name: string) => Number(process.env[name] ?? 0);
const closers: (() => Promise<void>)[] = [];
const addresses: Record<string, string> = {};

if (process.env["FERRULE_LOCAL_STORE"] === "yes") {
  const store = await startObjectStore({
    folder: path.join(dataFolder, "objects"),
    credentials: {
      accessKeyId: required("S3_ACCESS_KEY_ID"),
      secretAccessKey: required("S3_SECRET_ACCESS_KEY"),
      region: required("S3_REGION"),
    },
    buckets: [required("S3_BUCKET")],
    port: portOf("FERRULE_STORE_PORT"),
  });
  addresses["store"] = store.endpoint;
  closers.push(store.close);
}
if (process.env["FERRULE_LOCAL_MAIL"] === "yes") {
  const mail = await startMail({
    folder: path.join(dataFolder, "mail"),
    smtpPort: portOf("FERRULE_SMTP_PORT"),
    webPort: portOf("FERRULE_MAIL_WEB_PORT"),
  });
  addresses["smtp"] = mail.smtpUrl;
  addresses["mailWeb"] = mail.webUrl;
  closers.push(mail.close);
}

const file = required("FERRULE_SERVICES_FILE");
await writeFile(`${file}.draft`, JSON.stringify(addresses));
await rename(`${file}.draft`, file);

for (const signal of ["SIGINT", "SIGTERM"] as const) {
  process.once(signal, () => {
    void Promise.all(closers.map((close) => close())).then(() => process.exit(0));
  });
}
