export * from "./atmosphere";
export * from "./calibration";
export * from "./card";
export * from "./check-range";
export * from "./cooling";
export * from "./units";
export * from "./verdict";
export * from "./words";
