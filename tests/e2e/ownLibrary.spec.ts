import { randomUUID } from "node:crypto";
import { PDFDocument } from "pdf-lib";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";
import { SheetHand } from "./support/sheet";

test("a drawing takes an own entry with its datasheet page, an own authority changes a finding, and a later version is taken over by choice", async ({ profile }) => {
  test.setTimeout(180_000);
  const page = await profile("designer");
  await signIn(page, demoPeople.designer.email, demoPeople.designer.password);
  const mark = randomUUID().slice(0, 6);
  const [entry, county] = [`Marrow switch ${mark}`, `Marrow County ${mark}`];
  const ratings = page.getByRole("table", { name: "Ratings" });

  await test.step("an entry with the page its rating was read from", async () => {
    await page.goto("/library/new?kind=disconnect");
    await page.getByLabel("Name", { exact: true }).fill(entry);
    await ratings.getByLabel("Rating, A", { exact: true }).fill("200");
    await page.getByRole("button", { name: "Keep the entry" }).click();
    await expect(page.getByRole("heading", { name: entry, level: 1 })).toBeVisible();
    const document = await PDFDocument.create();
    for (let i = 0; i < 3; i += 1) document.addPage([300, 300]);
    await page.getByLabel("Add a datasheet").setInputFiles({ name: "switch.pdf", mimeType: "application/pdf", buffer: Buffer.from(await document.save()) });
    await expect(page.getByRole("link", { name: "switch.pdf", exact: true })).toBeVisible();
    await ratings.getByLabel("Stored datasheet of rating", { exact: true }).selectOption({ label: "switch.pdf" });
    await ratings.getByLabel("Page of rating", { exact: true }).fill("2");
    await page.getByRole("button", { name: "Save as a new version" }).click();
    await expect(page.getByText(/version 2 is the one/)).toBeVisible();
  });
  const entryPage = page.url();

  await test.step("an authority that calls for what the rule only advises", async () => {
    await page.goto("/jurisdictions");
    await page.getByRole("button", { name: "New jurisdiction" }).click();
    const dialog = page.getByRole("dialog");
    await dialog.getByLabel("Name").fill(county);
    await dialog.getByLabel("Ordinance").fill("Ordinance 7");
    await dialog.getByRole("button", { name: "Enter it" }).click();
    await page.waitForURL(/jurisdictions\/[0-9a-f-]{36}/);
    await page.getByRole("button", { name: /Add an amendment/ }).click();
    await page.getByLabel("Rule", { exact: true }).selectOption("orphan-equipment");
    await page.getByLabel("What is amended").selectOption("severity");
    await page.getByLabel("Severity here").selectOption("must-fix");
    await page.getByLabel("Ordinance").last().fill("Ordinance 7, section 3");
    await page.getByRole("button", { name: "Save", exact: true }).click();
    await expect(page.getByText(/Saved/).first()).toBeVisible();
  });

  await test.step("a job under it", async () => {
    await page.goto("/jobs/new");
    await page.getByLabel("Name", { exact: true }).fill(`Marrow barn ${mark}`);
    await page.getByLabel("Authority having jurisdiction").selectOption({ label: county });
    await page.getByRole("button", { name: "Make the job" }).click();
    await page.waitForURL(/\/jobs\/[0-9a-f-]{36}$/);
    await page.goto(`${page.url()}/drawing`);
  });
  const drawing = page.url();
  const hand = new SheetHand(page);
  const library = hand.margin.locator("details", { has: page.locator("summary", { hasText: "Library" }) });

  await test.step("its ratings in the drawing, and the finding as the ordinance has it", async () => {
    await hand.canvas.waitFor();
    await hand.place("disconnect", 20, 10);
    await library.locator("summary").click();
    await library.getByLabel("Choose from the library").selectOption({ label: entry });
    await library.getByRole("button", { name: "Take its ratings" }).click();
    await expect(library.getByText(`${entry}, version 2`)).toBeVisible();
    await hand.margin.getByRole("tab", { name: /Redlines/ }).click();
    const finding = hand.margin.locator('li[data-severity="must-fix"]', { hasText: "No source reaches DS-1" });
    await expect(finding).toContainText("Ordinance 7, section 3");
    await hand.saved();
  });

  await test.step("a later version says what would change, and is taken over by choice", async () => {
    await page.goto(entryPage);
    await ratings.getByLabel("Rating, A", { exact: true }).fill("225");
    await page.getByRole("button", { name: "Save as a new version" }).click();
    await expect(page.getByText(/version 3 is the one/)).toBeVisible();
    await page.goto(drawing);
    await hand.choose(/^Disconnect switch/);
    await expect(library.getByText("Rating: 200 A → 225 A")).toBeVisible();
    await library.getByRole("button", { name: "Take over version 3" }).click();
    await expect(library.getByText(`${entry}, version 3`)).toBeVisible();
  });
});
