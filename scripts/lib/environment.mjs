/**
 * Settings of a run: the caller's environment, then .env, then what the local services supply.
 * Secrets of the local services are made once and kept under .data/secret.
 */
import crypto from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/**
 * Reads KEY=value lines; # starts a comment line; quotes around a value are dropped.
 * @param {string} text @returns {Record<string, string>}
 */
export function parseEnv(text) {
  /** @type {Record<string, string>} */
  const values = {};
  for (const line of text.split(/\r?\n/)) {
    const match = /^\s*(?:export\s+)?([A-Za-z_][A-Za-z0-9_]*)\s*=\s*(.*)$/.exec(line);
    if (!match) continue;
    const [, key = "", raw = ""] = match;
    const quoted = /^(["'])(.*)\1\s*(?:#.*)?$/.exec(raw);
    values[key] = quoted ? (quoted[2] ?? "") : raw.replace(/\s+#.*$/, "").trim();
  }
  return values;
}

/** @param {string} root @returns {Record<string, string>} settings of .env; empty ones are as if not there */
export function readDotEnv(root) {
  try {
    return Object.fromEntries(Object.entries(parseEnv(fs.readFileSync(path.join(root, ".env"), "utf8"))).filter(([, value]) => value !== ""));
  } catch {
    return {};
  }
}

/**
 * A secret made on first use and kept.
 * @param {string} dataFolder @param {string} name @returns {string}
 */
export function keptSecret(dataFolder, name) {
  const folder = path.join(dataFolder, "secret");
  const file = path.join(folder, name);
  try {
    const kept = fs.readFileSync(file, "utf8").trim();
    if (kept) return kept;
  } catch {
    // Made below.
  }
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  const secret = crypto.randomBytes(32).toString("base64url");
  fs.writeFileSync(file, `${secret}\n`, { mode: 0o600 });
  return secret;
}
