import { expect, test } from "@playwright/test";
import { killAndWait, productState } from "./support/product";

test("the web server is started again after a kill, on the same address", async ({ request }) => {
  const before = productState();
  await killAndWait("web server");
  expect(productState().url).toBe(before.url);
  expect(productState().processes["web server"]).not.toBe(before.processes["web server"]);
  expect((await request.get("/icon.svg")).status()).toBe(200);
});
