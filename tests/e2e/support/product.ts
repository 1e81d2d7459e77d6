import { readFileSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";

/** The running product as the test command started it. */
interface ProductState {
  url: string;
  mailUrl: string;
  processes: Record<string, number>;
}

export interface CaughtMessage {
  id: string;
  receivedAt: string;
  to: string[];
  subject: string;
  text: string;
  attachments: { filename: string; contentType: string; size: number }[];
}

/** Address, mail page and process numbers. Throws when the product was not started by the test command. */
export function productState(): ProductState {
  const file = process.env["FERRULE_STATE_FILE"];
  if (!file) throw new Error("This test needs the product that `npm test -- --only e2e` starts.");
  return JSON.parse(readFileSync(file, "utf8")) as ProductState;
}

/** Kills a process of the product as a power cut would, and waits until it runs again. */
export async function killAndWait(name: "web server" | "PDF worker", timeoutMs = 30_000): Promise<void> {
  const before = productState().processes[name];
  if (before === undefined) throw new Error(`No process is named ${name}.`);
  process.kill(before, "SIGKILL");
  const until = Date.now() + timeoutMs;
  while (Date.now() < until) {
    await sleep(100);
    const { processes, url } = productState();
    if (processes[name] === before) continue;
    const up = await fetch(`${url}/icon.svg`).then((answer) => answer.ok, () => false);
    if (up) return;
  }
  throw new Error(`The ${name} did not come back within ${timeoutMs} ms.`);
}

/** Messages caught for an address, newest first. */
export async function mailFor(address: string): Promise<CaughtMessage[]> {
  const messages = (await (await fetch(`${productState().mailUrl}/messages.json`)).json()) as CaughtMessage[];
  return messages.filter((message) => message.to.includes(address));
}
