/**
 * npm run notices: writes THIRD-PARTY-NOTICES.md from the packages that ship with the product
 * (everything the lock file does not mark as for development) and the fonts.
 * With --check it only tells whether the file is up to date.
 */
import fs from "node:fs";
import path from "node:path";

const root = path.resolve(path.dirname(new URL(import.meta.url).pathname), "..");
const target = path.join(root, "THIRD-PARTY-NOTICES.md");
const lock = JSON.parse(fs.readFileSync(path.join(root, "package-lock.json"), "utf8"));

/**
 * The license a package states, from the lock file, which holds it also for the parts that are for
 * other systems and not installed here.
 * @param {string} place @param {Record<string, any>} entry @returns {string}
 */
function licenseOf(place, entry) {
  if (typeof entry.license === "string") return entry.license;
  const file = path.join(root, place, "package.json");
  const about = fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, "utf8")) : {};
  if (about.license?.type) return about.license.type;
  // An old form: a list.
  if (Array.isArray(about.licenses)) return about.licenses.map((/** @type {any} */ each) => each.type ?? each).join(" OR ");
  return "not stated in its package file";
}

/** @type {Map<string, { name: string, version: string, license: string }>} */
const packages = new Map();
for (const [place, entry] of Object.entries(lock.packages)) {
  if (place === "" || entry.dev || entry.devOptional || entry.extraneous) continue;
  const name = place.slice(place.lastIndexOf("node_modules/") + "node_modules/".length);
  packages.set(`${name}@${entry.version}`, { name, version: entry.version, license: licenseOf(place, entry) });
}
const rows = [...packages.values()].sort((a, b) => (a.name === b.name ? (a.version < b.version ? -1 : 1) : a.name < b.name ? -1 : 1));
/** @type {Map<string, number>} */
const counts = new Map();
for (const { license } of rows) counts.set(license, (counts.get(license) ?? 0) + 1);

const text = `# Third-party notices

Ferrule is licensed under the Apache License 2.0 (LICENSE). It is used together with the works below,
each under its own license. This file is made by \`npm run notices\`. The whole license text of a package lies in
its folder under \`node_modules\`.

## Fonts (shipped in public/fonts)

| Font | License | Notice |
| --- | --- | --- |
| Archivo (variable) | SIL Open Font License 1.1 | public/fonts/OFL-archivo.txt |
| Ferrule Lettering, Ferrule Lettering Narrow (derived from a face under the same license; see public/fonts/FONTLOG.txt) | SIL Open Font License 1.1 | public/fonts/OFL-lettering.txt |

## Packages (${rows.length})

${[...counts].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1)).map(([license, count]) => `- ${license}: ${count}`).join("\n")}

| Package | Version | License |
| --- | --- | --- |
${rows.map((each) => `| ${each.name} | ${each.version} | ${each.license} |`).join("\n")}
`;

if (process.argv.includes("--check")) {
  if (!fs.existsSync(target) || fs.readFileSync(target, "utf8") !== text) {
    console.error("THIRD-PARTY-NOTICES.md is not that of the lock file: run npm run notices.");
    process.exitCode = 1;
  }
} else {
  fs.writeFileSync(target, text);
  console.log(`${rows.length} packages`);
}
