import { randomBytes, randomUUID } from "node:crypto";
import net from "node:net";
import type { Page } from "@playwright/test";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";

/** A PDF of one page with so many bytes that nothing packs. */
function largePdf(bytes: number): Buffer {
  return Buffer.concat([
    Buffer.from("%PDF-1.4\n1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj\n2 0 obj<</Type/Pages/Kids[3 0 R]/Count 1>>endobj\n3 0 obj<</Type/Page/Parent 2 0 R/MediaBox[0 0 99 99]>>endobj\n"),
    Buffer.from(`4 0 obj<</Length ${bytes}>>stream\n`), randomBytes(bytes), Buffer.from("\nendstream endobj\ntrailer<</Root 1 0 R/Size 5>>\n%%EOF\n"),
  ]);
}

async function newJob(page: Page, origin: string): Promise<string> {
  const me = await (await page.request.get("/api/me")).json() as { companies: { id: string }[] };
  const made = await page.request.post("/api/jobs", {
    headers: { origin },
    data: {
      companyId: me.companies[0]?.id, number: `F-${randomUUID().slice(0, 8)}`, name: "Papers", addressLines: "", parcel: "", owner: "", scope: "", permitNumber: "", preparer: "", contractor: "",
      jurisdiction: { name: `Paper county ${randomUUID().slice(0, 8)}`, edition: "2023", ordinance: "" },
      site: { edition: "2023", occupancy: null, recordLowC: null, designHighC: null, elevationM: null, utilityName: null, availableFaultCurrentA: null, temperatureSource: null },
    },
  });
  expect(made.status(), await made.text()).toBe(201);
  return ((await made.json()) as { id: string }).id;
}
const names = async (page: Page, jobId: string): Promise<string[]> =>
  ((await (await page.request.get(`/api/jobs/${jobId}/files`)).json()) as { files: { name: string }[] }).files.map((file) => file.name);

test("a file of 15 MB passes whole, and one whose connection breaks leaves nothing", async ({ profile, baseURL }) => {
  const page = await profile("designer");
  const origin = new URL(baseURL ?? "").origin;
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const jobId = await newJob(page, origin);
  const bytes = largePdf(15_000_000);
  const address = (name: string) => `/api/jobs/${jobId}/files?name=${name}&purpose=document`;
  const stored = await page.request.post(address("survey.pdf"), { headers: { origin, "content-type": "application/octet-stream" }, data: bytes });
  expect(stored.status(), await stored.text()).toBe(201);
  const { id } = (await stored.json()) as { id: string };
  const back = await page.request.get(`/api/files/${id}`);
  expect((await back.body()).equals(bytes)).toBe(true);
  expect(back.headers()).toMatchObject({ "content-security-policy": "default-src 'none'; sandbox", "x-content-type-options": "nosniff" });

  const { hostname, port } = new URL(origin);
  const cookie = (await page.context().cookies()).map(({ name, value }) => `${name}=${value}`).join("; ");
  const socket = net.connect(Number(port), hostname);
  socket.on("error", () => undefined);
  socket.write(`POST ${address("cut.pdf")} HTTP/1.1\r\nHost: ${hostname}:${port}\r\nOrigin: ${origin}\r\nCookie: ${cookie}\r\nContent-Length: ${bytes.length}\r\n\r\n`);
  await new Promise<void>((resolve) => socket.write(bytes.subarray(0, 8_000_000), () => resolve()));
  socket.destroy();
  await page.waitForTimeout(1_500);
  expect(await names(page, jobId)).toEqual(["survey.pdf"]);
});

test("the documents of a job: a refusal says what the file is, one that met a store that was down is sent again", async ({ profile, baseURL }) => {
  const page = await profile("designer");
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const jobId = await newJob(page, new URL(baseURL ?? "").origin);
  await page.goto(`/jobs/${jobId}`);
  const panel = page.locator("#documents");
  await expect(panel.getByText("No documents yet")).toBeVisible();
  const choose = panel.locator("input[type=file]");

  await choose.setInputFiles([
    { name: "letter.pdf", mimeType: "application/pdf", buffer: Buffer.from("Dear installer,\n") }, { name: "empty.pdf", mimeType: "application/pdf", buffer: Buffer.alloc(0) },
  ]);
  await expect(panel.getByText("It is text, whatever its name says")).toBeVisible();
  await expect(panel.getByText("The file is empty (0 bytes).")).toBeVisible();
  for (let left = 2; left > 0; left -= 1) await panel.getByRole("button", { name: "Put away" }).first().click();

  let down = true;
  await page.route(`**/api/jobs/${jobId}/files?*`, (route) => (down ? route.fulfill({
    status: 503, contentType: "application/problem+json",
    body: JSON.stringify({ type: "about:blank", title: "Down", status: 503, code: "store-down", detail: "The store that keeps files does not answer. Nothing was changed and nothing was lost.", requestId: "of-the-test" }),
  }) : route.continue()));
  await choose.setInputFiles({ name: "plan.pdf", mimeType: "application/pdf", buffer: largePdf(50_000) });
  await expect(panel.getByText("nothing was lost")).toBeVisible();
  await expect(panel.getByText("Request of-the-test")).toBeVisible();
  down = false;
  await panel.getByRole("button", { name: "Try again" }).press("Enter");
  await expect(panel.getByRole("link", { name: "plan.pdf", exact: true })).toBeVisible();
  await expect(panel.getByText("PDF, 1 page, 50 kB")).toBeVisible();

  await panel.getByRole("button", { name: "Remove plan.pdf" }).press("Enter");
  await page.getByRole("button", { name: "Keep it" }).press("Enter");
  await panel.getByRole("button", { name: "Remove plan.pdf" }).press("Enter");
  await page.getByRole("button", { name: "Remove it" }).press("Enter");
  await expect(panel.getByText("No documents yet")).toBeVisible();
  expect(await names(page, jobId)).toEqual([]);
});
