import { expect, test } from "@playwright/test";

test("every page comes in the product's own faces and colors, with the headers that protect it", async ({ page }) => {
  const response = await page.goto("/");
  const headers = response?.headers() ?? {};
  expect(headers["x-content-type-options"]).toBe("nosniff");
  expect(headers["x-frame-options"]).toBe("DENY");
  expect(headers["x-powered-by"]).toBeUndefined();
  const faces = await page.evaluate(async () => {
    const style = getComputedStyle(document.documentElement);
    const names = ["--font-archivo", "--font-lettering", "--font-lettering-narrow"].map((name) => style.getPropertyValue(name).trim());
    // Ω stands in Ferrule Lettering alone.
    return Promise.all(names.map(async (name) => (await document.fonts.load(`16px ${name}`, "Ω1")).length));
  });
  expect(faces.every((count) => count > 0)).toBe(true);
  expect(await page.evaluate(() => getComputedStyle(document.body).fontSize)).toBe("13px");
  // The desk by day, as design token: never a color of the browser's own.
  expect(await page.evaluate(() => getComputedStyle(document.body).backgroundColor)).toBe("rgb(219, 213, 202)");
});

test("the desk is dark by night when its cookie says so", async ({ page, context, baseURL }) => {
  await context.addCookies([{ name: "ferrule-desk", value: "night", url: baseURL ?? "" }]);
  await page.goto("/");
  expect(await page.evaluate(() => getComputedStyle(document.body).backgroundColor)).toBe("rgb(36, 33, 29)");
});
