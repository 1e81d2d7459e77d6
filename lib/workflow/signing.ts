/** Who has to answer for a set of drawings before an authority takes it. */
export const SIGNERS = ["licensed professional", "preparer declaration accepted"] as const;
export type Signer = (typeof SIGNERS)[number];

/** What a jurisdiction asked for on the day a revision was issued; kept with the revision. */
export interface IssuedJurisdiction {
  id: string; name: string; version: number; signs: Signer;
  fileNameTemplate: string; bookmarks: boolean;
}
