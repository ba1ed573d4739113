export * from "./auth";
export * from "./trip";
export * from "./shelter";
export * from "./plan";
export * from "./post";
export * from "./pull-test";
export * from "./people";
export * from "./messages";
