export * from "./roles";
export * from "./table";
