import "server-only";
import { randomInt } from "node:crypto";
import type { RevisionStatus } from "@/lib/api";
import { conflict, forbidden } from "@/lib/server/http/problem";
import { audit } from "./audit";
import type { Actor } from "./actor";
import { database, inTransaction } from "./database";
import { licenseOf } from "./licenses";
import { lockRevision, refusalsFor, revisionStatus, step } from "./revisions";
import { queueSheets } from "./sheetSets";
import { reauthenticate } from "./users";

/** Without I, L, O and U, which are misread or make words. */
const CODE_LETTERS = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";
const group = () => Array.from({ length: 4 }, () => CODE_LETTERS.charAt(randomInt(CODE_LETTERS.length))).join("");
/** A seal whose sheets were not drawn after this time may be asked for again. */
const STALLED_MS = 10 * 60_000;

/**
 * Seals a revision: the person's password again, everything in the way named, then the sheets are drawn with the seal by the
 * worker, whose word that the bytes are stored completes it (finishSheets).
 */
export async function sealRevision(actor: Actor, revisionId: string, password: string): Promise<RevisionStatus> {
  const { Drawing, FindingAcceptance, Seal } = database();
  // Before the password, so that a person without the role learns nothing from it.
  await inTransaction((transaction) => lockRevision(actor, revisionId, "revision.seal", transaction));
  await reauthenticate(actor, password, "password");
  await inTransaction(async (transaction) => {
    const { revision, job } = await lockRevision(actor, revisionId, "revision.seal", transaction);
    const begun = await Seal.findOne({ where: { revisionId }, transaction });
    if (revision.state === "sealing" && begun) {
      if (begun.sealedBy !== actor.id) throw forbidden(`${begun.licenseeName} is sealing this revision.`);
      if (Date.now() - begun.sealedAt.getTime() > STALLED_MS) await queueSheets(revision.id, "sealed", transaction);
      return;
    }
    // The draft must not move between the check and the seal.
    await Drawing.findByPk(revision.drawingId, { attributes: ["id"], transaction, lock: transaction.LOCK.SHARE });
    revision.acceptances = await FindingAcceptance.findAll({ where: { revisionId }, transaction });
    const license = await licenseOf(actor.id);
    const refusals = await refusalsFor(revision, license, transaction);
    const [first] = refusals;
    if (first || !license?.sealObjectKey) {
      throw conflict(first?.code ?? "license-missing", refusals.map((each) => each.detail).join(" "), { refusals });
    }
    const state = step(revision, "start seal");
    await Seal.create(
      {
        revisionId, sealedBy: actor.id, licenseeName: actor.name, licenseState: license.state, licenseNumber: license.number,
        licenseTitle: license.title, licenseExpiresOn: license.expiresOn, sealObjectKey: license.sealObjectKey,
        sealCode: `${group()}-${group()}`, sealedAt: new Date(),
      },
      { transaction },
    );
    await revision.update({ state }, { transaction });
    await queueSheets(revision.id, "sealed", transaction);
    await audit(transaction, actor, {
      action: "revision.seal", subject: `revisions/${revision.id}`, jobId: job.id, detail: { letter: revision.letter, digest: revision.digest, license: license.number },
    });
  });
  return revisionStatus(actor, revisionId);
}
