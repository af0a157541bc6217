export * from "./audit";
export * from "./card";
export * from "./programme";
export * from "./sortie";
export * from "./team";
