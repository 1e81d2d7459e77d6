/**
 * The process that draws the PDFs and does other queued work, so that a save never waits for it.
 * Jobs come from the database (graphile-worker); what they do is in lib/server/jobs/tasks.ts.
 */
import { existsSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { Logger, run, type TaskList } from "graphile-worker";

const root = path.resolve(import.meta.dirname, "..");
const tasksFile = path.join(root, "lib/server/jobs/tasks.ts");
const connectionString = process.env["DATABASE_URL"];
if (!connectionString) throw new Error("DATABASE_URL is not set.");

const tasks = existsSync(tasksFile) ? ((await import(pathToFileURL(tasksFile).href)) as { taskList?: TaskList }) : {};
const taskList = tasks.taskList;
if (!taskList) console.warn("No task list in lib/server/jobs/tasks.ts: queued jobs wait.");

const logger = new Logger(() => (level, message) => {
  if (level !== "debug") console.log(`${new Date().toISOString()} ${level} ${message}`);
});
const runner = taskList
  ? await run({ connectionString, taskList, concurrency: 1, pollInterval: 2000, noHandleSignals: true, logger })
  : null;
console.log(`worker ready: ${Object.keys(taskList ?? {}).join(", ") || "no tasks"}`);

// Without a runner nothing else would keep the process alive.
const idle = runner ? null : setInterval(() => undefined, 60_000);
for (const signal of ["SIGINT", "SIGTERM"] as const) {
  process.once(signal, () => {
    if (idle) clearInterval(idle);
    void (runner?.stop() ?? Promise.resolve()).catch(() => undefined).then(() => process.exit(0));
  });
}
