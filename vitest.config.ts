import path from "node:path";
import { defineConfig } from "vitest/config";

const root = import.meta.dirname;
const resolve = {
  tsconfigPaths: true,
  // The marker package throws outside the server bundle, where it has nothing to mark.
  alias: { "server-only": path.join(root, "node_modules/server-only/empty.js") },
};

export default defineConfig({
  resolve,
  test: {
    env: { TZ: "UTC", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" },
    projects: [
      {
        resolve,
        test: {
          name: "unit",
          environment: "node",
          include: ["tests/{lib,rules,published,property,components,scripts}/**/*.test.{ts,tsx}"],
          env: { TZ: "UTC", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" },
          benchmark: { include: ["tests/bench/**/*.bench.ts"] },
          testTimeout: 30_000,
        },
      },
      {
        resolve,
        test: {
          name: "api",
          environment: "node",
          include: ["tests/api/**/*.test.ts"],
          env: { TZ: "UTC", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" },
          globalSetup: ["tests/api/support/services.ts"],
          setupFiles: ["tests/api/support/ownDatabase.ts"],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        // Measurements through the route handlers, on services of their own; `npm run bench` runs them.
        resolve,
        test: {
          name: "served",
          environment: "node",
          include: ["tests/bench/**/*.served.ts"],
          env: { TZ: "UTC", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" },
          globalSetup: ["tests/api/support/services.ts"],
          setupFiles: ["tests/api/support/ownDatabase.ts"],
          testTimeout: 600_000,
          disableConsoleIntercept: true,
        },
      },
      {
        // Soak, load, large mutation and kill runs, on the product that scripts/testLong.mjs starts.
        resolve,
        test: {
          name: "long",
          environment: "node",
          include: ["tests/long/**/*.test.ts"],
          env: { TZ: "UTC", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" },
          testTimeout: 3_600_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
