import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";
import { SheetHand } from "./support/sheet";

/** Rules that the twelve planted mistakes break, with how many redlines each gives. */
const PLANTED = {
  "pv-with-other-systems": 1, "nipple-overfill": 1, "class2-with-power": 1, "ocpd-above-conductor": 1, "sources-not-interlocked": 1, "busbar-no-method": 1,
  "string-over-inverter": 1, "parallel-firmware": 1, "parallel-lead-length": 1, "dc-interrupting": 1, "neutral-bond-count": 1, "ct-wrong-side": 1, "rating-unknown": 1,
};
const count = (rules: readonly string[]): Record<string, number> => Object.fromEntries([...new Set(rules)].map((rule) => [rule, rules.filter((each) => each === rule).length]));

test("designer repairs the planted drawing and issues it, the licensee seals it, the clerk downloads it", async ({ profile }) => {
  test.setTimeout(300_000);
  const designer = await profile("designer");
  const hand = new SheetHand(designer);
  const licenseeName = demoPeople.licensee.name;
  let jobUrl = "";

  await test.step("the designer opens the drawing and sees exactly the planted findings", async () => {
    await signIn(designer, demoPeople.designer.email, demoPeople.designer.password);
    await designer.getByRole("link", { name: "Teasel Hill Creamery, as drawn by the owner" }).first().click();
    await designer.waitForURL(/\/jobs\/[0-9a-f-]{36}$/);
    jobUrl = designer.url();
    await designer.goto(`${jobUrl}/drawing`);
    await hand.canvas.waitFor();
    await expect(hand.margin.locator("li[data-rule]")).toHaveCount(13);
    expect(count((await hand.redlines()).map((each) => each.rule))).toEqual(PLANTED);
    await expect(hand.margin.getByRole("status", { name: "Redlines" })).toContainText("10 must-fix, 2 should-fix, 1 needs data");
    await expect(hand.canvas.getByRole("button", { name: /^must-fix .*CB-I2 is 60 A/ })).toBeAttached();
  });

  await test.step("repairs by suggestion", async () => {
    for (const [rule, label] of [
      ["ocpd-above-conductor", "Set CB-I2 to 45 A"], ["sources-not-interlocked", /^Add a mechanical interlock/], ["string-over-inverter", /modules in series$/],
      ["neutral-bond-count", /^Remove neutral strap/], ["dc-interrupting", /^Use a device of 20 kA/], ["parallel-firmware", /^Plan 4\.2\.1/], ["parallel-lead-length", /^Cut B4/],
      ["nipple-overfill", /^Make N-2/], ["ct-wrong-side", /^Move CT-1/], ["class2-with-power", /^Take K-1/],
    ] as const) await hand.suggestion(rule, label);
  });

  await test.step("repairs by hand: the breaker in the schedule, the strings and the data cables in their own raceways", async () => {
    const conductors = await hand.schedule("Conductors");
    await hand.cell(conductors, "K-2", /Route$/, "C-1b JB-2 C-6");
    const equipment = await hand.schedule("Equipment");
    await hand.cell(equipment, "CB-N", /(^|\n)Rating A$/, "80");
    await expect(hand.canvas.getByRole("button", { name: /^Circuit breaker CB-N, 80 A 2P/ })).toBeAttached();
    await hand.expectRedline("busbar-no-method", false);
    await designer.getByRole("button", { name: "Close drawer" }).click();
    for (const string of ["S3", "S4"]) {
      await hand.choose(new RegExp(`^Circuit, PV dc ${string},`));
      for (const raceway of ["WW-1", "N-14"]) await hand.margin.getByRole("button", { name: `Take out of ${raceway}` }).click();
    }
    await hand.expectRedline("pv-with-other-systems", false);
    await hand.expectRedline("raceway-not-routed", false);
    await expect(hand.margin.locator('li[data-severity="must-fix"]:not([data-rule="rating-unknown"])')).toHaveCount(0);
    await hand.saved();
  });

  let revision = "";
  await test.step("issues it for review", async () => {
    await designer.getByRole("link", { name: "Issue for review" }).click();
    await designer.getByRole("dialog").getByLabel("Description").fill("First issue");
    await designer.getByRole("dialog").getByRole("button", { name: /^Issue Rev/ }).click();
    await designer.waitForURL(/\/review\//);
    revision = designer.url();
    await expect(designer.getByRole("heading", { name: "Open redlines" })).toBeVisible();
  });

  const licensee = await profile("licensee");
  await test.step("the licensee accepts the unknown rating in writing and seals", async () => {
    await signIn(licensee, demoPeople.licensee.email, demoPeople.licensee.password);
    await licensee.goto(revision);
    await expect(licensee.getByRole("button", { name: /^Seal Rev/ })).toBeDisabled();
    const item = licensee.locator('li[data-rule="rating-unknown"]', { hasText: "DS-1" });
    await expect(item).toHaveCount(1);
    await item.getByLabel("Accept in writing").fill("Rating plate to be verified before energizing.");
    await item.getByRole("button", { name: "Accept this one" }).click();
    await expect(licensee.getByText("Nothing stands in the way of the seal.")).toBeVisible();
    await licensee.getByLabel("Your password").fill("not the password");
    await licensee.getByRole("button", { name: /^Seal Rev/ }).click();
    await expect(licensee.getByText("This is not your password. Nothing was sealed.")).toBeVisible();
    await licensee.getByLabel("Your password").fill(demoPeople.licensee.password);
    await licensee.getByRole("button", { name: /^Seal Rev/ }).click();
    await expect(licensee.getByRole("heading", { name: /is sealed/ })).toBeVisible({ timeout: 60_000 });
  });

  await test.step("the clerk sees it as the current one and downloads the file the digest speaks of", async () => {
    const clerk = await profile("clerk");
    await signIn(clerk, demoPeople.clerk.email, demoPeople.clerk.password);
    await clerk.goto("/counter");
    const sealed = clerk.getByRole("main").getByRole("listitem").filter({ hasText: licenseeName }).first();
    await expect(sealed).toContainText("Sealed");
    await sealed.getByRole("link").first().click();
    const started = clerk.waitForEvent("download");
    await clerk.getByRole("link", { name: /Download the sealed set/ }).click();
    const file = await (await started).path();
    const bytes = readFileSync(file);
    await expect(clerk.locator(`[data-digest="${createHash("sha256").update(bytes).digest("hex")}"]`)).toBeVisible();
    const words = execFileSync("pdftotext", ["-layout", file, "-"], { encoding: "utf8" });
    for (const each of ["MM-225", "IC-200", "CB-I2", "INV-1", "INV-2", "DB-1", "BT-4", "PNL-C", "WW-1", "WW-2", "JB-1", "G-1", "S1", "F5", "B4", "D2", "K-11", "N-13", "E-601", "E-603", "DRAWING DIGEST", "SEAL CODE", " RULES RUN"]) expect(words).toContain(each);
    const digest = await clerk.locator("[data-digest]").nth(1).getAttribute("data-digest");
    expect(words.replace(/\s+/g, "")).toContain((digest ?? "missing").slice(0, 24).toUpperCase());
    expect(words.replace(/\s+/g, "").toLowerCase()).not.toContain(createHash("sha256").update(bytes).digest("hex").slice(0, 24));
    execFileSync("qpdf", ["--check", file]);
    const fonts = execFileSync("pdffonts", [file], { encoding: "utf8" }).trim().split("\n").slice(2);
    expect(fonts.length).toBeGreaterThan(0);
    for (const font of fonts) expect(font.trim().split(/\s+/).at(-5)).toBe("yes");
    expect((await clerk.request.get(`${new URL(jobUrl).pathname}/drawing`.replace("/jobs/", "/api/jobs/"))).status()).toBe(403);
  });
});
