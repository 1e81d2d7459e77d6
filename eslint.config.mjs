import { defineConfig, globalIgnores } from "eslint/config";
import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypeScript from "eslint-config-next/typescript";

const hexColor = "/^#([0-9a-fA-F]{3}|[0-9a-fA-F]{6}|[0-9a-fA-F]{8})$/";
const hexInClass = "/\\[#[0-9a-fA-F]{3,8}\\]/";
const colorMessage =
  "Colors are tokens of tailwind.config.ts: a value written here does not follow night, the dimmed sheet or print.";

export default defineConfig([
  ...nextVitals,
  ...nextTypeScript,
  globalIgnores([".next/**", ".next-test/**", ".data/**", "next-env.d.ts", "playwright-report/**", "test-results/**"]),
  {
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/ban-ts-comment": "error",
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "import/no-anonymous-default-export": "off",
      eqeqeq: ["error", "always", { null: "ignore" }],
    },
  },
  {
    files: ["app/**/*.{ts,tsx}", "components/**/*.{ts,tsx}"],
    rules: {
      "no-restricted-syntax": [
        "error",
        { selector: `Literal[value=${hexColor}]`, message: colorMessage },
        { selector: `Literal[value=${hexInClass}]`, message: colorMessage },
        { selector: `TemplateElement[value.raw=${hexInClass}]`, message: colorMessage },
      ],
    },
  },
  {
    // The pure core repeats: the same drawing gives the same findings, whenever and wherever it is checked.
    files: ["lib/**/*.ts"],
    ignores: ["lib/server/**", "lib/client/**"],
    rules: {
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "The core is pure: take identifiers or random values as arguments." },
        { object: "Date", property: "now", message: "The core has no clock: take the time as an argument." },
        { object: "process", property: "env", message: "The core has no environment: lib/server/env.ts reads it." },
      ],
      "no-restricted-syntax": [
        "error",
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: "The core has no clock: take the time as an argument." },
      ],
    },
  },
  {
    files: ["app/**", "components/**", "lib/server/**", "models/**"],
    ignores: ["lib/server/env.ts"],
    rules: {
      "no-restricted-properties": [
        "error",
        { object: "process", property: "env", message: "Read settings through lib/server/env.ts, which checks them once and names what is wrong." },
      ],
    },
  },
]);
