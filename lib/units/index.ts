export * from "./check";
export * from "./conductor-size";
export * from "./convert";
export * from "./errors";
export * from "./format";
export * from "./quantity";
export * from "./system-voltage";
export * from "./trade-size";
