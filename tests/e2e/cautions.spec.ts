import { demoPeople } from "@/seeders/demoAccounts";
import { CAUTION_TEXT } from "@/lib/cautions";
import { expect, signIn, test } from "./support/profiles";

const words = (text: string): string => text.replace(/\s+/g, " ").trim();

test("every check, sheet and download page carries the cautions", async ({ profile }) => {
  const page = await profile("designer");
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const jobs = await (await page.request.get("/api/jobs")).json() as { jobs: { id: string }[] };
  const routes = ["/jobs", ...jobs.jobs.slice(0, 2).flatMap(({ id }) => [`/jobs/${id}`, `/jobs/${id}/drawing`, `/jobs/${id}/issue`])];
  for (const { id } of jobs.jobs.slice(0, 2)) {
    const revisions = await (await page.request.get(`/api/jobs/${id}/revisions`)).json() as { revisions: { id: string }[] };
    routes.push(...revisions.revisions.slice(0, 1).map((each) => `/jobs/${id}/review/${each.id}`));
  }
  for (const route of routes) {
    await page.goto(route);
    await expect.poll(async () => words(await page.locator("body").innerText()), { message: route, timeout: 15_000 }).toContain(words(CAUTION_TEXT).slice(0, 60));
  }
  const clerk = await profile("clerk");
  await signIn(clerk, demoPeople.clerk.email, demoPeople.clerk.password);
  const counter = await (await clerk.request.get("/api/counter")).json() as { jobs: { jobId: string }[] };
  for (const route of ["/counter", ...counter.jobs.map(({ jobId }) => `/counter/${jobId}`)]) {
    await clerk.goto(route);
    await expect.poll(async () => words(await clerk.locator("body").innerText()), { message: route, timeout: 15_000 }).toContain(words(CAUTION_TEXT).slice(0, 60));
  }
});

test("words with script in them stay words on every screen", async ({ profile }) => {
  const page = await profile("designer");
  let alerts = 0;
  page.on("dialog", (dialog) => { alerts += 1; void dialog.dismiss(); });
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const name = `<img src=x onerror=alert(1)> & <script>alert(2)</script> ${Date.now() % 10_000}`;
  await page.goto("/jobs/new");
  await page.getByLabel("Job number").fill(`X-${Date.now() % 100_000}`);
  await page.getByLabel("Name", { exact: true }).fill(name);
  await page.getByLabel("Authority having jurisdiction").selectOption({ label: "Orrin County" });
  await page.getByRole("button", { name: "Make the job" }).click();
  await page.waitForURL(/\/jobs\/[0-9a-f-]{36}$/);
  await expect(page.getByRole("heading", { name })).toBeVisible();
  const job = page.url();
  for (const route of ["/jobs", `${job}/drawing`]) {
    await page.goto(route);
    await expect(page.getByText(name).first()).toBeVisible();
  }
  expect(alerts).toBe(0);
});
