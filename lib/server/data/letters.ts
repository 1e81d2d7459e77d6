import "server-only";
import type { Transaction } from "sequelize";
import { nextLetter } from "@/lib/workflow";
import { database } from "./database";

/** Letter under which the drawing will be issued next: a returned letter is used again, a sealed one is not. */
export async function draftLetter(jobId: string, transaction?: Transaction): Promise<string> {
  const last = await database().Revision.findOne({
    where: { jobId }, attributes: ["letter", "state"], order: [["issuedAt", "DESC"], ["issue", "DESC"]], transaction: transaction ?? null,
  });
  if (!last) return nextLetter(null);
  return ["sealed", "superseded", "void"].includes(last.state) ? nextLetter(last.letter) : last.letter;
}
