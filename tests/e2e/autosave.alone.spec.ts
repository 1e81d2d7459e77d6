import { randomUUID } from "node:crypto";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";
import { killAndWait, productState } from "./support/product";
import { SheetHand } from "./support/sheet";

/** Makes a job of its own through the API that the pages use. */
async function newJob(page: import("@playwright/test").Page): Promise<string> {
  const { url } = productState();
  const me = await (await page.request.get("/api/me")).json() as { companies: { id: string }[] };
  const made = await page.request.post("/api/jobs", {
    headers: { origin: url },
    data: {
      companyId: me.companies[0]?.id, number: `K-${randomUUID().slice(0, 8)}`, name: "Power cut", addressLines: "", parcel: "", owner: "", scope: "", permitNumber: "", preparer: "", contractor: "",
      jurisdiction: { name: `Test county ${randomUUID().slice(0, 8)}`, edition: "2023", ordinance: "" },
      site: { edition: "2023", occupancy: null, recordLowC: null, designHighC: null, elevationM: null, utilityName: null, availableFaultCurrentA: null, temperatureSource: null },
    },
  });
  expect(made.status(), await made.text()).toBeLessThan(300);
  return ((await made.json()) as { id: string }).id;
}

test("a power cut during autosave loses nothing that was acknowledged", async ({ profile }) => {
  test.setTimeout(180_000);
  const page = await profile("designer");
  const { url } = productState();
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const jobId = await newJob(page);
  const first = await (await page.request.get(`/api/jobs/${jobId}/drawing`)).json() as { id: string; sequence: number };
  let sequence = first.sequence;
  const acknowledged: string[] = [];
  const save = async (id: string): Promise<boolean> => {
    const answer = await page.request.post(`/api/drawings/${first.id}/patches`, {
      headers: { origin: url }, timeout: 5000,
      data: { saveId: randomUUID(), baseSequence: sequence, title: "place a note", patches: [{ op: "add", path: `/texts/${id}`, value: { at: { x: 1, y: 1 }, lines: id, style: "note", keynote: null, vertical: false } }] },
    }).catch(() => null);
    if (!answer?.ok()) return false;
    sequence = ((await answer.json()) as { sequence: number }).sequence;
    acknowledged.push(id);
    return true;
  };
  const killed = (async () => { await new Promise((resolve) => setTimeout(resolve, 600)); await killAndWait("web server"); })();
  for (let n = 0; n < 40 || acknowledged.length < 30; n += 1) {
    if (n > 400) throw new Error("the server did not come back");
    if (!(await save(`note-${n}`))) {
      await new Promise((resolve) => setTimeout(resolve, 150));
      // Whether the lost answer belongs to a stored edit is not known; the drawing says.
      const now = await page.request.get(`/api/jobs/${jobId}/drawing`).then((answer) => (answer.ok() ? answer.json() as Promise<{ sequence: number }> : null), () => null);
      if (now) sequence = now.sequence;
    }
  }
  await killed;
  const after = await (await page.request.get(`/api/jobs/${jobId}/drawing`)).json() as { drawing: { texts: Record<string, unknown> } };
  expect(acknowledged.filter((id) => !Object.hasOwn(after.drawing.texts, id))).toEqual([]);
});

test("an editor left open through a power cut saves what was drawn meanwhile", async ({ profile }) => {
  test.setTimeout(180_000);
  const page = await profile("designer");
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const jobId = await newJob(page);
  await page.goto(`/jobs/${jobId}/drawing`);
  const hand = new SheetHand(page);
  await hand.canvas.waitFor();
  await hand.place("utility", 8, 2);
  await hand.saved();
  const cut = killAndWait("web server");
  await hand.place("generator", 30, 2);
  await hand.place("panelboard", 52, 2);
  await cut;
  await expect(page.getByTestId("save-state")).toHaveText(/All changes saved/, { timeout: 60_000 });
  await page.reload();
  await hand.canvas.waitFor();
  for (const name of [/^Utility service UTIL-1/, /^Generator G-1/, /^Panelboard PNL-1/]) await expect(hand.canvas.getByRole("button", { name })).toBeAttached();
});
