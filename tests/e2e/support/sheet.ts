import { expect, type Locator, type Page } from "@playwright/test";

/** px a grid unit at 100 %, as printed at half size. */
const PX = 12;
/** px from the paper's corner to the inner frame, where grid places are counted from. */
const FRAME = 60;

/** A hand on the sheet: real pointer and key events at grid places, nothing else. */
export class SheetHand {
  constructor(readonly page: Page) {}

  get canvas(): Locator { return this.page.getByTestId("canvas"); }

  /** Where a grid place lies in the window now. */
  async at(x: number, y: number): Promise<{ x: number; y: number }> {
    const frame = await this.canvas.boundingBox();
    if (!frame) throw new Error("The sheet is not shown.");
    const transform = await this.canvas.locator(".react-flow__viewport").evaluate((node) => {
      const { a, e, f } = new DOMMatrixReadOnly(getComputedStyle(node).transform);
      return { zoom: a, x: e, y: f };
    });
    return { x: frame.x + transform.x + (FRAME + x * PX) * transform.zoom, y: frame.y + transform.y + (FRAME + y * PX) * transform.zoom };
  }

  async press(x: number, y: number): Promise<void> {
    const { x: px, y: py } = await this.at(x, y);
    await this.page.mouse.move(px, py, { steps: 3 });
    await this.page.mouse.down();
    await this.page.mouse.up();
  }
  async drag(from: readonly [number, number], to: readonly [number, number]): Promise<void> {
    const a = await this.at(...from);
    const b = await this.at(...to);
    await this.page.mouse.move(a.x, a.y, { steps: 3 });
    await this.page.mouse.down();
    await this.page.mouse.move((a.x + b.x) / 2, (a.y + b.y) / 2, { steps: 6 });
    await this.page.mouse.move(b.x, b.y, { steps: 6 });
    await this.page.mouse.up();
  }
  /** Picks a part in the rail by its kind and sets it down. */
  async place(part: string, x: number, y: number): Promise<void> {
    await this.page.getByRole("navigation", { name: "Parts" }).locator(`[data-part="${part}"]`).click();
    await this.press(x, y);
  }
  /** Joins two ports by dragging from one to the other. */
  async join(from: readonly [number, number], to: readonly [number, number]): Promise<void> { await this.drag(from, to); }

  get margin(): Locator { return this.page.getByRole("complementary", { name: "Margin" }); }

  /** Chooses an element by its name with the keyboard, as a person does who walks the drawing with Tab. */
  async choose(name: string | RegExp): Promise<void> {
    const element = this.canvas.getByRole("button", { name }).first();
    await element.focus();
    await this.page.keyboard.press("Enter");
    await expect(this.margin.getByRole("tab", { name: "Data" })).toHaveAttribute("aria-selected", "true");
  }
  /** Enters values into the Data tab of the chosen element: label and what is typed or chosen. `group` is a heading to look under. */
  async enter(values: Readonly<Record<string, string>>, group?: string): Promise<void> {
    const place = group ? this.margin.locator("details", { has: this.page.locator("summary", { hasText: group }) }).last() : this.margin;
    if (group && !(await place.evaluate((node) => (node as HTMLDetailsElement).open))) await place.locator("summary").first().click();
    for (const [label, value] of Object.entries(values)) {
      const field = place.getByLabel(label, { exact: false }).first();
      if (!(await field.isVisible())) await field.evaluate((node) => { const details = node.closest("details"); if (details) details.open = true; });
      if (await field.evaluate((node) => node.tagName === "SELECT")) await field.selectOption({ label: value });
      else {
        await field.fill(value);
        await field.press("Enter");
      }
    }
  }
  /** Chooses a circuit and adds a raceway to its route from the list. */
  async through(circuit: string, raceway: string): Promise<void> {
    await this.choose(new RegExp(`^Circuit, .* ${circuit},`));
    await this.margin.getByLabel("Add a raceway to the route").selectOption({ label: raceway });
  }
  /** The redlines in the margin, as rule names with the sentence each shows. */
  async redlines(): Promise<{ rule: string; text: string }[]> {
    await this.margin.getByRole("tab", { name: /^Redlines/ }).click();
    return this.margin.locator("li[data-rule]").evaluateAll((items) => items.map((item) => ({ rule: item.getAttribute("data-rule") ?? "", text: (item.textContent ?? "").trim() })));
  }
  /** Opens a redline in the margin and takes one of its suggestions. */
  async suggestion(rule: string, label: string | RegExp): Promise<void> {
    await this.margin.getByRole("tab", { name: /^Redlines/ }).click();
    await this.margin.locator(`li[data-rule="${rule}"] button`).first().click();
    await this.margin.getByRole("button", { name: label }).first().click();
    await this.expectRedline(rule, false);
  }
  async expectRedline(rule: string, there = true): Promise<void> {
    await this.margin.getByRole("tab", { name: /^Redlines/ }).click();
    const item = this.margin.locator(`li[data-rule="${rule}"]`);
    if (there) await expect(item.first()).toBeVisible();
    else await expect(item).toHaveCount(0);
  }
  /** Opens a schedule in the drawer. */
  async schedule(name: "Conductors" | "Raceways" | "Equipment"): Promise<Locator> {
    const tab = this.page.getByRole("tab", { name: new RegExp(`^${name}`) });
    if ((await tab.getAttribute("aria-selected")) !== "true") await tab.click();
    const grid = this.page.getByRole("region", { name: "Schedules" }).getByRole("grid");
    await grid.waitFor();
    return grid;
  }
  /** Types into a cell of the open schedule, found by its row's tag and its column's heading. */
  async cell(grid: Locator, tag: string, column: string | RegExp, value: string): Promise<Locator> {
    const heads = await grid.getByRole("columnheader").allInnerTexts();
    const index = heads.findIndex((head) => (typeof column === "string" ? head.trim() === column : column.test(head)));
    if (index < 0) throw new Error(`no column ${String(column)} among ${heads.join(" | ")}`);
    const row = grid.getByRole("row").filter({ has: this.page.locator('[aria-colindex="1"]', { hasText: new RegExp(`^${tag}(,|$)`) }) }).first();
    // Only rows near the window are there: the wheel goes to the top, then down until the row shows.
    const box = await grid.boundingBox();
    if (!box) throw new Error("The schedule is not shown.");
    if (!(await row.isVisible())) {
      await this.page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
      await this.page.mouse.wheel(0, -10_000);
      for (let turns = 0; turns < 60 && !(await row.isVisible()); turns += 1) {
        await this.page.mouse.wheel(0, 84);
        await this.page.waitForTimeout(40);
      }
    }
    const cell = row.getByRole("gridcell").nth(index);
    await cell.scrollIntoViewIfNeeded();
    await cell.click();
    await this.page.keyboard.type(value);
    await this.page.keyboard.press("Enter");
    return cell;
  }
  async saved(): Promise<void> {
    await expect(this.page.getByTestId("save-state")).toHaveText(/All changes saved/, { timeout: 20_000 });
  }
}
