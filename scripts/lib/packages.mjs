/**
 * What has to be on the machine: the project's own packages, and a few of Debian's.
 */
import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { Stop, say, step } from "./say.mjs";
import { run } from "./processes.mjs";

/**
 * Are the installed packages those of the lock file? Compared by content, since file times say
 * nothing after a copy or a checkout.
 * @param {string} root @returns {boolean}
 */
export function packagesMatchLock(root) {
  try {
    const lock = JSON.parse(fs.readFileSync(path.join(root, "package-lock.json"), "utf8")).packages;
    const installed = JSON.parse(fs.readFileSync(path.join(root, "node_modules/.package-lock.json"), "utf8")).packages;
    return Object.entries(lock).every(([name, entry]) => {
      if (name === "") return true;
      const present = installed[name];
      // Parts for other systems, and entries npm itself calls extraneous, are left out by it.
      if (!present) return Boolean(entry.optional || entry.devOptional || entry.peer || entry.extraneous);
      return present.version === entry.version;
    });
  } catch {
    return false;
  }
}

/** Installs the project's packages when they are absent or not those of the lock file. @param {string} root */
export async function ensurePackages(root) {
  if (packagesMatchLock(root)) return;
  const npm = process.env.npm_execpath;
  const [command, args] = npm && npm.endsWith(".js") ? [process.execPath, [npm]] : ["npm", []];
  await step("Installing the project's packages (npm ci)", async () => {
    const { code, output } = await run(command, [...args, "ci", "--include=dev", "--no-audit", "--no-fund"], { cwd: root });
    if (code !== 0) throw new Stop(`npm ci failed:\n${output.slice(-4000)}`);
  });
}

/** @param {string} name @returns {string | null} full path of a program on PATH */
export function which(name) {
  for (const folder of (process.env.PATH ?? "").split(path.delimiter)) {
    const file = path.join(folder, name);
    try {
      fs.accessSync(file, fs.constants.X_OK);
      if (fs.statSync(file).isFile()) return file;
    } catch {
      // Not here.
    }
  }
  return null;
}

/** @param {string[]} packages @returns {string} the one command to type */
export const aptCommand = (packages) =>
  `${process.getuid?.() === 0 ? "" : "sudo "}apt-get install -y ${packages.join(" ")}`;

/**
 * Installs Debian packages as root or through sudo, otherwise ends with the one command to type.
 * @param {string[]} packages @param {string} purpose
 */
export async function installDebian(packages, purpose) {
  const command = aptCommand(packages);
  const explain = (/** @type {string} */ why) =>
    new Stop(`${purpose} ${packages.length > 1 ? "are" : "is"} missing${why}. Install with:\n\n    ${command}\n`, 2);
  if (process.env.FERRULE_NO_INSTALL === "yes") throw explain("");
  const apt = which("apt-get");
  if (!apt) throw explain(", and this system has no apt-get");
  /** @type {string[]} */
  let prefix = [];
  if (process.getuid?.() !== 0) {
    const sudo = which("sudo");
    if (!sudo) throw explain(", and there is neither root nor sudo");
    const silent = spawnSync(sudo, ["-n", "true"], { stdio: "ignore" }).status === 0;
    if (!silent) {
      if (!process.stdin.isTTY) throw explain(", and sudo asks for a password");
      say(`  ${purpose} missing; sudo may ask for your password.`);
      if (spawnSync(sudo, ["-v"], { stdio: "inherit" }).status !== 0) throw explain("");
    }
    prefix = [sudo, "-n"];
  }
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const apply = (/** @type {string[]} */ args) => {
    const [first, ...rest] = [...prefix, "env", "DEBIAN_FRONTEND=noninteractive", apt, ...args];
    return run(first ?? apt, rest, { env });
  };
  await step(`Installing ${packages.join(", ")} from Debian's packages`, async () => {
    const lockWait = ["-o", "DPkg::Lock::Timeout=300"];
    let answer = await apply(["install", "-y", "--no-install-recommends", ...lockWait, ...packages]);
    if (answer.code !== 0) {
      await apply(["update", ...lockWait]);
      answer = await apply(["install", "-y", "--no-install-recommends", ...lockWait, ...packages]);
    }
    if (answer.code !== 0) {
      say(answer.output.slice(-2000));
      throw explain("");
    }
  });
}

/** Debian package by the program it brings. */
const TEST_TOOLS = [
  { package: "chromium", found: () => Boolean(process.env.CHROMIUM_PATH || fs.existsSync("/usr/bin/chromium") || which("chromium")) },
  { package: "poppler-utils", found: () => Boolean(which("pdftotext") && which("pdffonts")) },
  { package: "qpdf", found: () => Boolean(which("qpdf")) },
  { package: "python3-openpyxl", found: () => pythonHas("openpyxl") },
  { package: "python3-ezdxf", found: () => pythonHas("ezdxf") },
];

/** @param {string} module */
function pythonHas(module) {
  return spawnSync("/usr/bin/python3", ["-c", `import ${module}`], { stdio: "ignore" }).status === 0;
}

/** Installs the programs with which tests read what the product makes. */
export async function ensureTestTools() {
  const missing = TEST_TOOLS.filter((tool) => !tool.found()).map((tool) => tool.package);
  if (missing.length > 0) await installDebian(missing, `Test tools (${missing.join(", ")})`);
}
