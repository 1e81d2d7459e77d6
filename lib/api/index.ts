/** Shapes of what browser and server say to each other. */
export * from "./audit";
export * from "./drawings";
export * from "./files";
export * from "./jobs";
export * from "./jurisdictions";
export * from "./library";
export * from "./people";
export * from "./problem";
export * from "./revisions";
export * from "./text";
export * from "./visits";
