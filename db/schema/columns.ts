import { integer, text } from "drizzle-orm/sqlite-core";

export const idColumn = () => text("id").primaryKey();
export const instant = (name: string) => integer(name, { mode: "timestamp_ms" });
export const flag = (name: string) => integer(name, { mode: "boolean" });
/** Counts up at each change of what two people can edit. */
export const versionColumn = () => integer("version").notNull().default(1);
