/** All tables, for the client and for the migration generator. */
export * from "./as-cut";
export * from "./blank";
export * from "./board";
export * from "./history";
export * from "./job";
export * from "./layout";
export * from "./movement";
export * from "./order";
export * from "./photo";
export * from "./rate-limit";
export * from "./saw";
export * from "./session";
export * from "./shop";
export * from "./species";
export * from "./straightening";
export * from "./task";
export * from "./user";
