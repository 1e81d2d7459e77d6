import type { Sequelize } from "sequelize";
import { AuditEntry, initAuditEntry } from "./auditEntry";
import { Company, initCompany } from "./company";
import { Drawing, initDrawing } from "./drawing";
import { DrawingPatch, initDrawingPatch } from "./drawingPatch";
import { FindingAcceptance, initFindingAcceptance } from "./findingAcceptance";
import { Job, initJob } from "./job";
import { JobMember, initJobMember } from "./jobMember";
import { Jurisdiction, initJurisdiction } from "./jurisdiction";
import { LibraryEntry, initLibraryEntry } from "./libraryEntry";
import { LibraryVersion, initLibraryVersion } from "./libraryVersion";
import { License, initLicense } from "./license";
import { Membership, initMembership } from "./membership";
import { Revision, initRevision } from "./revision";
import { Seal, initSeal } from "./seal";
import { SheetSet, initSheetSet } from "./sheetSet";
import { SiteVisit, initSiteVisit } from "./siteVisit";
import { StoredFile, initStoredFile } from "./storedFile";
import { User, initUser } from "./user";

/**
 * Binds every model to a connection pool, once. Names are given in each model: the build minifies class
 * names, so nothing may depend on them.
 */
export function initModels(sequelize: Sequelize): void {
  for (const init of [
    initCompany, initUser, initMembership, initJurisdiction, initJob, initJobMember, initLicense, initDrawing,
    initDrawingPatch, initRevision, initFindingAcceptance, initSeal, initSheetSet, initAuditEntry, initLibraryEntry, initLibraryVersion,
    initStoredFile, initSiteVisit,
  ]) init(sequelize);

  User.hasMany(Membership, { as: "memberships", foreignKey: "userId" });
  Membership.belongsTo(User, { as: "user", foreignKey: "userId" });
  Membership.belongsTo(Company, { as: "company", foreignKey: "companyId" });
  Job.hasMany(JobMember, { as: "members", foreignKey: "jobId" });
  JobMember.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  JobMember.belongsTo(User, { as: "user", foreignKey: "userId" });
  Job.belongsTo(Jurisdiction, { as: "jurisdiction", foreignKey: "jurisdictionId" });
  Job.hasOne(Drawing, { as: "drawing", foreignKey: "jobId" });
  Job.hasMany(Revision, { as: "revisions", foreignKey: "jobId" });
  DrawingPatch.belongsTo(User, { as: "author", foreignKey: "authorId" });
  Revision.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  Revision.belongsTo(User, { as: "issuer", foreignKey: "issuedBy" });
  Revision.belongsTo(User, { as: "returner", foreignKey: "returnedBy" });
  Revision.hasOne(Seal, { as: "seal", foreignKey: "revisionId" });
  Revision.hasMany(SheetSet, { as: "sheetSets", foreignKey: "revisionId" });
  Revision.hasMany(FindingAcceptance, { as: "acceptances", foreignKey: "revisionId" });
  LibraryEntry.hasMany(LibraryVersion, { as: "versions", foreignKey: "entryId" });
  StoredFile.belongsTo(User, { as: "uploader", foreignKey: "uploadedBy" });
  SiteVisit.belongsTo(User, { as: "creator", foreignKey: "createdBy" });
  SiteVisit.belongsTo(User, { as: "updater", foreignKey: "updatedBy" });
  LibraryVersion.belongsTo(User, { as: "maker", foreignKey: "madeBy" });
}

export { AuditEntry, Company, Drawing, DrawingPatch, FindingAcceptance, Job, JobMember, Jurisdiction, LibraryEntry, LibraryVersion, License, Membership, Revision, Seal, SheetSet, SiteVisit, StoredFile, User };
