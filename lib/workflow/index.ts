export * from "./letters";
export * from "./revision";
export * from "./seal";
export * from "./signing";
