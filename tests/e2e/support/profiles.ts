import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { chromium, test as base, type BrowserContext, type Page } from "@playwright/test";

/** Opens a browser profile of its own for a person, as on another machine: nothing is shared with the others. */
export type OpenProfile = (name: string, viewport?: { width: number; height: number }) => Promise<Page>;

interface Fixtures { profile: OpenProfile }

export const test = base.extend<Fixtures>({
  profile: async ({ launchOptions, baseURL }, provide) => {
    const opened: { context: BrowserContext; folder: string }[] = [];
    await provide(async (name, viewport = { width: 1600, height: 1000 }) => {
      const folder = await mkdtemp(path.join(tmpdir(), `profile-${name}-`));
      const context = await chromium.launchPersistentContext(folder, {
        ...launchOptions, baseURL, viewport, locale: "en-US", timezoneId: "America/New_York", acceptDownloads: true,
      });
      context.setDefaultTimeout(15_000);
      opened.push({ context, folder });
      return context.pages()[0] ?? await context.newPage();
    });
    for (const { context, folder } of opened) {
      await context.close();
      await rm(folder, { recursive: true, force: true });
    }
  },
});
export { expect } from "@playwright/test";

/** Signs in through the page, as a person does. */
export async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("Mail address").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => !url.pathname.startsWith("/sign-in"));
}
