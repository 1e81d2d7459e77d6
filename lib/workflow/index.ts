export * from "./letters";
export * from "./licenseExpiry";
export * from "./revision";
export * from "./seal";
export * from "./signing";
