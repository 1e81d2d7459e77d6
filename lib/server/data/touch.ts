import "server-only";
import type { Transaction } from "sequelize";
import { database } from "./database";

/** Sets the time of a job's last change. In SQL, since the mapper skips an update of nothing but that time. */
export async function touchJob(jobId: string, transaction: Transaction): Promise<void> {
  await database().sequelize.query("update jobs set updated_at = now() where id = :jobId", { replacements: { jobId }, transaction });
}
