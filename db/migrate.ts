/** `npm run db:migrate` */
import "./load-env";
import { closeDb, getDb } from "./client";
import { migrateDatabase } from "./migrate-database";

await migrateDatabase(getDb());
await closeDb();
console.log("The database is up to date.");
