import { randomUUID } from "node:crypto";
import { PDFDocument } from "pdf-lib";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";

async function datasheet(pages: number): Promise<Buffer> {
  const document = await PDFDocument.create();
  for (let page = 1; page <= pages; page += 1) document.addPage([300, 300]);
  return Buffer.from(await document.save());
}

test("an entry is kept with the page its rating was read from, changed, and tells its two versions apart", async ({ profile }) => {
  const page = await profile("administrator");
  const { email, password } = demoPeople.administrator;
  await signIn(page, email, password);
  const name = `Oddfellow OB-${randomUUID().slice(0, 8)}`;

  await page.getByRole("link", { name: "Library", exact: true }).click();
  await expect(page.getByRole("heading", { name: "Library", level: 1 })).toBeVisible();
  await page.getByRole("link", { name: "New entry" }).first().click();
  await page.getByRole("link", { name: "Circuit breaker" }).click();
  await expect(page.getByRole("heading", { name: "New circuit breaker" })).toBeVisible();
  await page.getByLabel("Name", { exact: true }).fill(name);
  const ratings = page.getByRole("table", { name: "Ratings" });
  await ratings.getByLabel("Interrupting rating, kA", { exact: true }).fill("22000 A");
  await ratings.getByLabel("Interrupting rating, kA", { exact: true }).press("Enter");
  await expect(ratings.getByLabel("Interrupting rating, kA", { exact: true })).toHaveValue("22");

  // Leaving is asked about; staying loses nothing.
  await page.getByRole("link", { name: "Jobs", exact: true }).click();
  await page.getByRole("button", { name: "Stay here" }).click();
  await expect(page.getByLabel("Name", { exact: true })).toHaveValue(name);
  await page.getByRole("button", { name: "Keep the entry" }).click();
  await expect(page.getByRole("heading", { name, level: 1 })).toBeVisible();
  await expect(page.getByText("0 of 1 sourced")).toBeVisible();

  await page.getByLabel("Add a datasheet").setInputFiles({ name: "OB-datasheet.pdf", mimeType: "application/pdf", buffer: await datasheet(4) });
  await expect(page.getByRole("link", { name: "OB-datasheet.pdf", exact: true })).toBeVisible();
  await ratings.getByLabel("Stored datasheet of interrupting rating", { exact: true }).selectOption({ label: "OB-datasheet.pdf" });
  await expect(ratings.getByLabel("Document of interrupting rating", { exact: true })).toHaveValue("OB-datasheet");
  await ratings.getByLabel("Page of interrupting rating", { exact: true }).fill("3");
  await ratings.getByLabel("Trip rating, A", { exact: true }).fill("sixty");
  await page.getByLabel("Note on this version").fill("Read from its datasheet");
  await page.getByRole("button", { name: "Save as a new version" }).click();
  await expect(page.getByText("A value above could not be read. It is marked.")).toBeVisible();
  await ratings.getByLabel("Trip rating, A", { exact: true }).fill("60");
  await page.getByRole("button", { name: "Save as a new version" }).click();
  await expect(page.getByText("Saved; version 2 is the one drawings take now.")).toBeVisible();
  await expect(page.getByText("1 of 2 sourced")).toBeVisible();
  await expect(ratings.getByRole("link", { name: "Open the datasheet of interrupting rating at page 3" })).toHaveAttribute("href", /^\/api\/files\/[0-9a-f-]{36}\?inline#page=3$/);

  await page.getByRole("button", { name: /^2\s*Read from its datasheet/ }).click();
  const second = page.getByRole("listitem").filter({ hasText: "Compared with version" });
  await expect(second.getByRole("listitem").filter({ hasText: "Trip rating" })).toContainText("60 A");
  await expect(second.getByRole("listitem").filter({ hasText: "Interrupting rating: page" })).toContainText("3");

  await page.getByRole("link", { name: "Library", exact: true }).first().click();
  await page.getByLabel("Find name, maker or model").fill(name);
  const row = page.getByRole("row").filter({ hasText: name });
  await expect(row).toContainText("60 A");
  await expect(row).toContainText("1 of 2 sourced");
  await expect(page.getByRole("status").filter({ hasText: "1 entry" })).toBeVisible();
  await page.keyboard.press("Enter");
  await expect(page.getByRole("heading", { name, level: 1 })).toBeVisible();
});

test("of a table with bad cells each is named, and the good rows are taken in on confirmation alone", async ({ profile }) => {
  const page = await profile("administrator");
  const { email, password } = demoPeople.administrator;
  await signIn(page, email, password);
  const stamp = randomUUID().slice(0, 8);
  const table = ["Name,Trip rating (A),Poles", `Row ${stamp} a,60,2`, `Row ${stamp} b,sixty,2`, `Row ${stamp} c,70,two`, `Row ${stamp} d,80,2`].join("\r\n");

  await page.goto("/library/import?kind=breaker");
  await page.getByLabel("Table", { exact: true }).setInputFiles({ name: "breakers.csv", mimeType: "text/csv", buffer: Buffer.from(table) });
  const faults = page.getByRole("table", { name: "Cells that were not understood" });
  await expect(faults.getByRole("row").nth(1)).toContainText(/3Trip rating \(A\)sixtymust be a number/);
  await expect(faults.getByRole("row").nth(2)).toContainText(/4Polestwomust be a number/);
  await expect(faults.getByRole("row")).toHaveCount(3);
  const found = async () => {
    const me = (await (await page.request.get("/api/me")).json()) as { companies: { id: string }[] };
    return ((await (await page.request.get(`/api/companies/${me.companies[0]?.id}/library?q=${stamp}`)).json()) as { total: number }).total;
  };
  expect(await found()).toBe(0);
  await page.getByRole("button", { name: "Add the 2 good rows" }).click();
  await expect(page.getByText("2 entries added.")).toBeVisible();
  expect(await found()).toBe(2);
  await page.getByRole("table", { name: "Good rows" }).getByRole("link", { name: `Row ${stamp} d` }).click();
  await expect(page.getByRole("row").filter({ hasText: `Row ${stamp} d` })).toContainText("80 A");
});
