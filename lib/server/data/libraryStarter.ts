import "server-only";
import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import { STARTER_SET } from "@/lib/equipment/starter";
import { database } from "./database";
import { identityOf } from "./libraryRows";

/** Puts the starter set into the library of a new company; leaves a library that has entries as it is. */
export async function addStarterSet(companyId: string, transaction: Transaction): Promise<void> {
  const { LibraryEntry, LibraryVersion } = database();
  if ((await LibraryEntry.count({ where: { companyId }, transaction })) > 0) return;
  const rows = STARTER_SET.map((each) => ({ ...each, id: randomUUID() }));
  await LibraryEntry.bulkCreate(
    rows.map(({ id, kind, name, data }) => ({ id, companyId, kind, name, ...identityOf(data), currentVersion: 1, starter: true, createdBy: null })), { transaction },
  );
  await LibraryVersion.bulkCreate(rows.map(({ id, data }) => ({ entryId: id, version: 1, data, madeBy: null })), { transaction });
}
