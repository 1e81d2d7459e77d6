import { expect, type Locator, type Page } from "@playwright/test";

/** px a grid unit at 100 %, as printed at half size. */
const PX = 12;

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
    const inner = await this.origin();
    return { x: frame.x + transform.x + (inner + x * PX) * transform.zoom, y: frame.y + transform.y + (inner + y * PX) * transform.zoom };
  }
  /** px from the flow's origin to the inner frame's origin. */
  protected async origin(): Promise<number> { return 0; }

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
  /** Picks a part in the rail and sets it down. */
  async place(part: string, x: number, y: number): Promise<void> {
    await this.page.getByRole("navigation", { name: "Parts" }).getByRole("button", { name: part, exact: true }).click();
    await this.press(x, y);
  }
  /** Joins two ports by dragging from one to the other. */
  async join(from: readonly [number, number], to: readonly [number, number]): Promise<void> { await this.drag(from, to); }

  /** Fills a field of the Data tab and leaves it. */
  async field(label: string | RegExp, value: string): Promise<void> {
    const panel = this.page.getByRole("tabpanel").first();
    const field = panel.getByLabel(label).first();
    if (await field.evaluate((node) => node.tagName === "SELECT")) await field.selectOption({ label: value });
    else { await field.fill(value); await field.press("Enter"); }
  }
  async saved(): Promise<void> {
    await expect(this.page.getByTestId("save-state")).toHaveText(/All changes saved/, { timeout: 20_000 });
  }
}
