/**
 * A local stand-in for a mail server: takes every message, delivers none, keeps them as files and
 * shows them on a small page. Loopback only.
 */
import { randomUUID } from "node:crypto";
import { promises as fs } from "node:fs";
import http from "node:http";
import type { AddressInfo } from "node:net";
import path from "node:path";
import { simpleParser, type ParsedMail } from "mailparser";
import { SMTPServer } from "smtp-server";

export interface CaughtMessage {
  id: string;
  receivedAt: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  attachments: { filename: string; contentType: string; size: number }[];
}

export interface RunningMail {
  smtpUrl: string;
  /** Page on which the messages are read; `/messages.json` has them as data. */
  webUrl: string;
  close: () => Promise<void>;
}

export interface MailOptions {
  folder: string;
  smtpPort?: number;
  webPort?: number;
}

const escapeHtml = (text: string) => text.replace(/[<>&"']/g, (character) => `&#${character.charCodeAt(0)};`);
const MAX_MESSAGE_BYTES = 40 * 1024 * 1024;

function summarize(id: string, receivedAt: string, recipients: string[], mail: ParsedMail): CaughtMessage {
  return {
    id,
    receivedAt,
    from: mail.from?.text ?? "",
    to: recipients,
    subject: mail.subject ?? "",
    text: mail.text ?? "",
    attachments: mail.attachments.map((each) => ({ filename: each.filename ?? "unnamed", contentType: each.contentType, size: each.size })),
  };
}

class Mailbox {
  constructor(private readonly folder: string) {}

  file(id: string, ending: "eml" | "json"): string {
    return path.join(this.folder, `${id}.${ending}`);
  }

  async keep(raw: Buffer, recipients: string[]): Promise<void> {
    const receivedAt = new Date().toISOString();
    const id = `${receivedAt.replace(/[:.]/g, "-")}-${randomUUID().slice(0, 8)}`;
    await fs.writeFile(this.file(id, "eml"), raw);
    const message = summarize(id, receivedAt, recipients, await simpleParser(raw));
    await fs.writeFile(`${this.file(id, "json")}.draft`, JSON.stringify(message, null, 2));
    await fs.rename(`${this.file(id, "json")}.draft`, this.file(id, "json"));
  }

  /** All messages, newest first. */
  async all(): Promise<CaughtMessage[]> {
    const names = (await fs.readdir(this.folder)).filter((name) => name.endsWith(".json")).sort().reverse();
    return Promise.all(names.map(async (name) => JSON.parse(await fs.readFile(path.join(this.folder, name), "utf8")) as CaughtMessage));
  }

  async parse(id: string): Promise<ParsedMail | null> {
    if (!/^[0-9TZa-f-]+$/.test(id)) return null;
    return fs.readFile(this.file(id, "eml")).then((raw) => simpleParser(raw), () => null);
  }
}

/** Starts the mail catcher and its page. */
export async function startMail(options: MailOptions): Promise<RunningMail> {
  await fs.mkdir(options.folder, { recursive: true });
  const mailbox = new Mailbox(options.folder);
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    size: MAX_MESSAGE_BYTES,
    logger: false,
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on("data", (chunk: Buffer) => chunks.push(chunk));
      stream.on("end", () => {
        if (stream.sizeExceeded) {
          done(Object.assign(new Error("Message too large"), { responseCode: 552 }));
          return;
        }
        const recipients = session.envelope.rcptTo.map((each) => each.address);
        mailbox.keep(Buffer.concat(chunks), recipients).then(() => done(), (error: Error) => done(error));
      });
    },
  });
  smtp.on("error", (error: Error) => console.error(`mail: ${error.message}`));
  await new Promise<void>((resolve) => smtp.listen(options.smtpPort ?? 0, "127.0.0.1", () => resolve()));
  const web = http.createServer((request, response) => {
    serve(mailbox, request, response).catch((error: unknown) => {
      console.error(error);
      response.writeHead(500).end();
    });
  });
  await new Promise<void>((resolve, reject) => {
    web.once("error", reject);
    web.listen(options.webPort ?? 0, "127.0.0.1", resolve);
  });
  return {
    smtpUrl: `smtp://127.0.0.1:${(smtp.server.address() as AddressInfo).port}`,
    webUrl: `http://127.0.0.1:${(web.address() as AddressInfo).port}`,
    close: async () => {
      await new Promise<void>((resolve) => {
        web.close(() => resolve());
        web.closeAllConnections();
      });
      await new Promise<void>((resolve) => smtp.close(() => resolve()));
    },
  };
}

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(title)}</title><style>body{font:14px/1.5 sans-serif;margin:24px;max-width:960px}table{border-collapse:collapse;width:100%}td,th{text-align:left;padding:6px 10px;border-bottom:1px solid #bbb}pre{white-space:pre-wrap}iframe{width:100%;height:480px;border:1px solid #bbb}</style></head><body>${body}</body></html>`;
}

async function serve(mailbox: Mailbox, request: http.IncomingMessage, response: http.ServerResponse): Promise<void> {
  const [, first = "", id = "", part = ""] = (request.url ?? "/").split("?")[0]?.split("/").map(decodeURIComponent) ?? [];
  const html = (body: string, status = 200) => {
    // A caught message may hold anything; none of it runs here.
    response.writeHead(status, { "content-type": "text/html; charset=utf-8", "content-security-policy": "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; sandbox allow-same-origin allow-popups" });
    response.end(body);
  };
  if (first === "") {
    const rows = (await mailbox.all())
      .map((each) => `<tr><td>${each.receivedAt.replace("T", " ").slice(0, 19)} UTC</td><td>${escapeHtml(each.to.join(", "))}</td><td><a href="/message/${each.id}">${escapeHtml(each.subject || "(no subject)")}</a></td></tr>`)
      .join("");
    return html(page("Caught mail", `<h1>Caught mail</h1><p>Messages the application sent here. None was delivered.</p>${rows ? `<table><tr><th>Received</th><th>To</th><th>Subject</th></tr>${rows}</table>` : "<p>No message yet.</p>"}`));
  }
  if (first === "messages.json") {
    response.writeHead(200, { "content-type": "application/json" });
    response.end(JSON.stringify(await mailbox.all()));
    return;
  }
  const mail = first === "message" ? await mailbox.parse(id) : null;
  if (!mail) return html(page("Not found", "<h1>No such message</h1>"), 404);
  if (part === "") {
    const files = mail.attachments.map((each, index) => `<li><a href="/message/${id}/${index}">${escapeHtml(each.filename ?? "unnamed")}</a> (${each.size} bytes)</li>`).join("");
    const rich = mail.html ? `<h2>As formatted</h2><iframe sandbox src="/message/${id}/html" title="Formatted message"></iframe>` : "";
    return html(page(mail.subject ?? "", `<p><a href="/">All messages</a></p><h1>${escapeHtml(mail.subject ?? "")}</h1><p>From ${escapeHtml(mail.from?.text ?? "")}</p><pre>${escapeHtml(mail.text ?? "")}</pre>${files ? `<h2>Attachments</h2><ul>${files}</ul>` : ""}${rich}`));
  }
  if (part === "html") return html(typeof mail.html === "string" ? mail.html : "");
  const attachment = mail.attachments[Number(part)];
  if (!attachment) return html(page("Not found", "<h1>No such attachment</h1>"), 404);
  response.writeHead(200, { "content-type": "application/octet-stream", "content-disposition": `attachment; filename*=UTF-8''${encodeURIComponent(attachment.filename ?? "unnamed")}` });
  response.end(attachment.content);
}
