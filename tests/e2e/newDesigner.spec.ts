import { execFileSync } from "node:child_process";
import { demoPeople } from "@/seeders/demoAccounts";
import { expect, signIn, test } from "./support/profiles";
import { SheetHand } from "./support/sheet";

const stamp = Date.now().toString(36).slice(-5);
const designer = { name: "Runa Tallgrass", email: `runa-${stamp}@example.test`, password: "a-meadow-of-tall-grass" };

test("a new designer draws a system from an empty sheet, repairs three mistakes, and a licensee seals it", async ({ profile }) => {
  test.setTimeout(300_000);

  await test.step("an administrator adds the designer", async () => {
    const page = await profile("administrator");
    await signIn(page, demoPeople.administrator.email, demoPeople.administrator.password);
    await page.goto("/people");
    await page.getByRole("button", { name: "Add a person" }).click();
    const form = page.getByRole("dialog");
    await form.getByLabel("Mail address").fill(designer.email);
    await form.getByLabel("Name", { exact: true }).fill(designer.name);
    await form.getByLabel("Initial password").fill(designer.password);
    await form.getByRole("checkbox", { name: /designer/i }).check();
    await form.getByRole("button", { name: "Add the person" }).click();
    await expect(page.getByText(designer.email)).toBeVisible();
  });

  const page = await profile("designer");
  const hand = new SheetHand(page);

  await test.step("the designer makes a job with an empty drawing and puts the licensee on it", async () => {
    await signIn(page, designer.email, designer.password);
    await page.goto("/jobs/new");
    await page.getByLabel("Job number").fill(`27-${stamp}`);
    await page.getByLabel("Name", { exact: true }).fill("Fernhollow Workshop");
    await page.getByLabel("Address").fill("3 Fernhollow Road\nNettlecombe");
    await page.getByLabel("Authority having jurisdiction").selectOption({ label: "Orrin County" });
    await page.getByLabel("Occupancy").selectOption("accessory building");
    await page.getByLabel("Record low").fill("-20");
    await page.getByLabel("Design high").fill("32");
    await page.getByLabel("Available fault current").fill("9500");
    await page.getByRole("button", { name: "Make the job" }).click();
    await page.waitForURL(/\/jobs\/[0-9a-f-]{36}$/);
    await page.getByRole("button", { name: "Add a person" }).click();
    const form = page.getByRole("dialog");
    await form.getByLabel("Mail address").fill(demoPeople.licensee.email);
    await form.getByRole("checkbox", { name: /licensee/i }).check();
    await form.getByRole("button", { name: "Add to the job" }).click();
    await expect(page.getByText(demoPeople.licensee.name).first()).toBeVisible();
    await page.goto(`${page.url()}/drawing`);
    await hand.canvas.waitFor();
    const drawer = page.getByRole("button", { name: "Close drawer" });
    if (await drawer.isVisible()) await drawer.click();
  });

  await test.step("draws utility, meter-main, panel, generator, inverter, battery with disconnect and a string", async () => {
    await hand.place("utility", 8, 2);
    await hand.place("meter-main", 2, 15);
    await hand.enter({ "Bus rating": "200", "Short-circuit rating": "22", Spaces: "8" });
    await hand.join([8, 6], [11, 16]);
    await hand.place("breaker", 16, 24);
    await hand.place("panelboard", 34, 2);
    await hand.enter({ "Bus rating": "125", "Short-circuit rating": "10", Spaces: "12" });
    for (const y of [8, 11, 14]) await hand.place("breaker", 42, y);
    await hand.place("generator", 62, 2);
    await hand.enter({ Output: "12", "Rated current": "50" });
    await hand.place("hybrid-inverter", 62, 22);
    await hand.place("battery", 84, 36);
    await hand.place("disconnect", 76, 29);
    await hand.enter({ "Used on": "battery dc" });
    await hand.place("pv-string", 62, 42);
  });

  await test.step("joins them by dragging from port to port", async () => {
    await hand.join([16, 24], [43, 8]);
    await hand.join([65, 12.6], [43, 11]);
    await hand.join([66, 22], [43, 14]);
    await hand.join([76, 29], [71.6, 29.3]);
    await hand.join([79, 29], [84, 36]);
    await hand.join([62, 46], [64.5, 33.3]);
    await hand.join([85.5, 37], [70.8, 33.3]);
    await expect(page.getByRole("tab", { name: /^Conductors/ })).toContainText("8");
  });
  await test.step("draws a wireway with two circuits and a nipple with the data cable", async () => {
    await hand.place("wireway", 40, 36);
    await hand.enter({ Width: "4", Height: "4" });
    await hand.place("nipple", 78, 40);
    await hand.enter({ "Trade size": "3/4 in" });
    for (const circuit of ["F3", "F4"]) await hand.through(circuit, "WW-1, wireway");
    await hand.through("K-1", "N-1, nipple");
  });

  await test.step("enters ratings in the equipment schedule and conductors in theirs", async () => {
    const equipment = await hand.schedule("Equipment");
    for (const [tag, values] of Object.entries({
      "CB-1": { "Rating A": "200", "Interrupting rating kA": "22" }, "CB-2": { "Rating A": "60", "Interrupting rating kA": "22" },
      "CB-3": { "Rating A": "60", "Interrupting rating kA": "10" }, "CB-4": { "Rating A": "60", "Interrupting rating kA": "10" },
      "CB-5": { "Rating A": "60", "Interrupting rating kA": "10" }, "CB-6": { "Rating A": "60", "Interrupting rating kA": "10" },
    })) for (const [column, value] of Object.entries(values)) await hand.cell(equipment, tag, new RegExp(`(^|\\n)${column}$`), value);
    await expect(hand.canvas.getByRole("button", { name: "Circuit breaker CB-5, 60 A 2P" })).toBeAttached();
    const conductors = await hand.schedule("Conductors");
    for (const [tag, size, neutral, ground] of [["F2", "6 AWG", "6 AWG", "10 AWG"], ["F3", "6 AWG", "6 AWG", "10 AWG"], ["F4", "8 AWG", "8 AWG", "10 AWG"]] as const) {
      await hand.cell(conductors, tag, "Size", size);
      await hand.cell(conductors, tag, "Neutral", neutral);
      await hand.cell(conductors, tag, "EGC", ground);
    }
    await page.getByRole("button", { name: "Close drawer" }).click();
  });
  await test.step("sees three mistakes underlined: no interlock, a breaker above its conductor, data with power", async () => {
    await hand.expectRedline("sources-not-interlocked");
    await hand.choose(/^Hybrid inverter INV-1/);
    await hand.enter({ "Largest ac overcurrent device": "50", "Ac output current": "32" });
    await hand.through("K-1", "WW-1, wireway");
    for (const end of [/^Circuit breaker CB-5/]) {
      await hand.choose(end);
      await hand.enter({ "Terminal marked": "75 °C" }, "Load port");
    }
    await hand.choose(/^Hybrid inverter INV-1/);
    await hand.enter({ "Terminal marked": "75 °C" }, "Ac port");
    await hand.expectRedline("ocpd-above-conductor");
    await hand.expectRedline("class2-with-power");
    for (const sentence of [/can be closed together/, /CB-5 is 60 A on 8 AWG/, /K-1 \(Class 2\)/]) {
      await expect(hand.canvas.getByRole("button", { name: sentence })).toBeAttached();
    }
  });

  await test.step("repairs them: a smaller breaker, the cable out of the wireway, an interlock", async () => {
    await hand.suggestion("ocpd-above-conductor", /^Set CB-5 to/);
    await hand.suggestion("class2-with-power", /^Take K-1/);
    await hand.suggestion("sources-not-interlocked", /^Add a mechanical interlock/);
    await expect(hand.canvas.getByRole("button", { name: /^Circuit breaker CB-5, 4\d A 2P|^Circuit breaker CB-5, 50 A 2P/ })).toBeAttached();
  });

  await test.step("enters what is known of the rest, and issues it", async () => {
    await hand.choose(/^main bonding jumper/);
    await hand.enter({ Fitted: "yes, in place" });
    await hand.choose(/^neutral strap/);
    await hand.enter({ Fitted: "no, removed" });
    await hand.choose(/^PV string PV-1/);
    await hand.enter({ "Modules in series": "9", "Module open-circuit voltage": "41.2", "Module short-circuit current": "13.9", "Coefficient of open-circuit voltage": "-0.27", "Largest series fuse": "25" });
    await hand.choose(/^Hybrid inverter INV-1/);
    await hand.enter({ "PV input, largest voltage": "550", "Battery current, largest dc input": "120" });
    await expect(hand.margin.locator('li[data-severity="must-fix"]')).toHaveCount(0);
    await hand.saved();
    await page.getByRole("link", { name: "Issue for review" }).click();
    await page.getByRole("dialog").getByRole("button", { name: /^Issue Rev/ }).click();
    await page.waitForURL(/\/review\//);
  });

  await test.step("a licensee answers for each open value in writing, seals, and the set is printed", async () => {
    const licensee = await profile("licensee");
    await signIn(licensee, demoPeople.licensee.email, demoPeople.licensee.password);
    await licensee.goto(page.url());
    await licensee.getByRole("heading", { name: "Open redlines" }).waitFor();
    const open = licensee.locator("li[data-key]", { has: licensee.getByLabel("Accept in writing") });
    for (let left = await open.count(); left > 0; left -= 1) {
      await open.first().getByLabel("Accept in writing").fill("To be read from the rating plate before energizing.");
      await open.first().getByRole("button", { name: "Accept this one" }).click();
      await expect(open).toHaveCount(left - 1);
    }
    await licensee.getByLabel("Your password").fill(demoPeople.licensee.password);
    await licensee.getByRole("button", { name: /^Seal Rev/ }).click();
    await expect(licensee.getByRole("heading", { name: /is sealed/ })).toBeVisible({ timeout: 60_000 });
    const started = licensee.waitForEvent("download");
    await licensee.getByRole("link", { name: "Download the sealed set" }).click();
    const words = execFileSync("pdftotext", ["-layout", await (await started).path(), "-"], { encoding: "utf8" });
    for (const each of ["FERNHOLLOW", "MM-1", "PNL-1", "INV-1", "BT-1", "G-1", "WW-1", "N-1", "K-1", "IL-1", "SEAL CODE"]) expect(words).toContain(each);
  });
});
