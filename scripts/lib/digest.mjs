import crypto from "node:crypto";
import fs from "node:fs";
import path from "node:path";

const FOLDERS = ["app", "components", "lib", "models", "public", "types"];
const FILES = ["package-lock.json", "next.config.mjs", "postcss.config.mjs", "tailwind.config.ts", "tsconfig.json",
  "proxy.ts", "instrumentation.ts", "instrumentation-client.ts"];

/** @param {string} folder @returns {string[]} */
function filesUnder(folder) {
  if (!fs.existsSync(folder)) return [];
  return fs.readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name));
}

/**
 * SHA-256 over everything a build is made from, by content, so that neither a checkout nor a copy
 * makes a build needless or stale.
 * @param {string} root @returns {string}
 */
export function sourceDigest(root) {
  const files = [...FOLDERS.flatMap((folder) => filesUnder(path.join(root, folder))), ...FILES.map((file) => path.join(root, file))]
    .filter((file) => fs.existsSync(file))
    .sort();
  const hash = crypto.createHash("sha256");
  for (const file of files) {
    hash.update(path.relative(root, file)).update("\0").update(fs.readFileSync(file)).update("\0");
  }
  return hash.digest("hex");
}

/**
 * Is the build in `distFolder` one of these sources?
 * @param {string} root @param {string} distFolder @param {string} noteFile
 */
export function isBuilt(root, distFolder, noteFile) {
  try {
    const note = JSON.parse(fs.readFileSync(noteFile, "utf8"));
    const buildId = fs.readFileSync(path.join(distFolder, "BUILD_ID"), "utf8").trim();
    return note.buildId === buildId && note.digest === sourceDigest(root);
  } catch {
    return false;
  }
}
