import type { Config } from "tailwindcss";

/**
 * Every color, size and face of the product. Values live as CSS variables in app/globals.css, so
 * that night and the dimmed sheet change them in one place; components use only these names.
 */
const colorNames = [
  "desk", "desk2", "panel", "vellum", "paper", "grid",
  "ink", "ink2", "ink3", "rule",
  "copper", "copperdk", "red", "ochre", "blue", "green",
  "pv", "bat", "hilite", "ww", "tint", "g1", "g2",
  "dk", "dk2", "sealink", "onred", "onink", "hatch",
] as const;

const colors = Object.fromEntries(colorNames.map((name) => [name, `var(--${name})`]));

const sans = ["var(--font-archivo)", "var(--font-archivo-ext)", "var(--font-lettering-narrow)", "sans-serif"];

export default {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  darkMode: ["selector", ".night"],
  theme: {
    colors: { ...colors, transparent: "transparent", current: "currentColor", inherit: "inherit" },
    fontFamily: {
      sans,
      // The drawing and everything lettered like it.
      lettering: ["var(--font-lettering)", "sans-serif"],
      "lettering-narrow": ["var(--font-lettering-narrow)", "sans-serif"],
    },
    fontSize: {
      small: ["11px", "1.3"],
      label: ["12.5px", "1.3"],
      schedule: ["13px", "28px"],
      body: ["13px", "1.4"],
      text: ["13.5px", "1.38"],
      finding: ["15px", "1.3"],
      field: ["17px", "1.35"],
      heading: ["21px", "1.2"],
      title: ["28px", "1.12"],
      counter: ["42px", "1.06"],
    },
    fontWeight: { normal: "400", medium: "500", strong: "560", finding: "620", heading: "640" },
    // Drafting furniture has square corners; only marks that are circles by meaning are round.
    borderRadius: { none: "0", full: "9999px" },
    extend: {
      // The numeric scale (1 = 4 px: 4, 8, 12, 16, 24, 32) stays; these are the named sizes.
      spacing: {
        row: "28px",
        "bar-control": "36px",
        control: "40px",
        target: "48px",
        bar: "52px",
        "field-header": "58px",
        rail: "80px",
        "rail-narrow": "76px",
        margin: "280px",
        "margin-narrow": "240px",
      },
      boxShadow: { hard: "3px 3px 0 var(--g1)", "hard-ink": "3px 3px 0 var(--ink)" },
      transitionDuration: { quick: "120ms", move: "180ms" },
      screens: { narrow: { max: "1599px" }, phone: { max: "640px" } },
    },
  },
} satisfies Config;
