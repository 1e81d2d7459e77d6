import { randomUUID } from "node:crypto";
import { expect, it } from "vitest";
import { demoPeople } from "@/seeders/demoAccounts";
import { killAndWait, productState } from "@/tests/e2e/support/product";

const WRITERS = 4;
const EDITS = 1000;
const KILLS = 5;

/** Signs in over HTTP as the sign-in page does; the answer is the cookie header. */
async function session(): Promise<string> {
  const { url } = productState();
  const cookies = new Map<string, string>();
  const keep = (answer: Response): void => {
    for (const each of answer.headers.getSetCookie()) {
      const [pair = ""] = each.split(";");
      cookies.set(pair.slice(0, pair.indexOf("=")), pair.slice(pair.indexOf("=") + 1));
    }
  };
  const header = (): string => [...cookies].map(([name, value]) => `${name}=${value}`).join("; ");
  const csrf = await fetch(`${url}/api/auth/csrf`);
  keep(csrf);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const { email, password } = demoPeople.designer;
  keep(await fetch(`${url}/api/auth/callback/credentials`, {
    method: "POST", redirect: "manual", headers: { cookie: header(), origin: url, "content-type": "application/x-www-form-urlencoded" },
    body: new URLSearchParams({ csrfToken, email, password, json: "true", callbackUrl: url }),
  }));
  return header();
}
const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

it(`${EDITS} acknowledged edits are all there after ${KILLS} kills of the web server under load`, async () => {
  const cookie = await session();
  const { url } = productState();
  const call = async (path: string, body?: unknown): Promise<{ status: number; body: Record<string, unknown> } | null> => {
    try {
      const answer = await fetch(`${url}${path}`, {
        method: body === undefined ? "GET" : "POST", signal: AbortSignal.timeout(8000),
        headers: { cookie, origin: url, ...(body === undefined ? {} : { "content-type": "application/json" }) }, ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      });
      return { status: answer.status, body: (await answer.json()) as Record<string, unknown> };
    } catch {
      return null;
    }
  };
  const jobs = (await call("/api/jobs"))?.body as { jobs: { id: string }[] };
  const jobId = jobs.jobs[0]?.id ?? "";
  const drawing = async () => (await call(`/api/jobs/${jobId}/drawing`))?.body as { id: string; sequence: number; drawing: { texts: Record<string, unknown> } } | undefined;
  const first = await drawing();
  const acknowledged: string[] = [];
  const times: number[] = [];
  let refused = 0;
  const writer = async (number: number): Promise<void> => {
    let sequence = first?.sequence ?? 0;
    for (let n = 0; acknowledged.length < EDITS; n += 1) {
      const id = `w${number}-${n}`;
      const save = { saveId: randomUUID(), baseSequence: sequence, title: "place a note", patches: [{ op: "add", path: `/texts/${id}`, value: { at: { x: number, y: 1 }, lines: id, style: "note", keynote: null, vertical: false } }] };
      // The same save is sent again until it is answered, as the editor does.
      for (;;) {
        const started = performance.now();
        const answer = await call(`/api/drawings/${first?.id}/patches`, save);
        if (answer?.status === 200) { times.push(performance.now() - started); acknowledged.push(id); sequence = answer.body["sequence"] as number; break; }
        if (answer && answer.status < 500 && answer.status !== 429) { refused += 1; sequence = (await drawing())?.sequence ?? sequence; break; }
        await pause(answer?.status === 429 ? 400 : 120);
      }
    }
  };
  const killing = (async () => { for (let n = 0; n < KILLS; n += 1) { await pause(2500); await killAndWait("web server"); } })();
  await Promise.all(Array.from({ length: WRITERS }, (_, number) => writer(number)));
  await killing;
  const after = await drawing();
  const sorted = times.toSorted((a, b) => a - b);
  console.log(`acknowledged ${acknowledged.length}, refused ${refused}, save median ${sorted[Math.floor(sorted.length / 2)]?.toFixed(0)} ms, p95 ${sorted[Math.floor(sorted.length * 0.95)]?.toFixed(0)} ms`);
  expect(acknowledged.filter((id) => !Object.hasOwn(after?.drawing.texts ?? {}, id))).toEqual([]);
}, 600_000);
