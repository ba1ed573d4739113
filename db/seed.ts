/** `npm run db:seed`: demo data into an empty database, never over existing data. */
import "./load-env";
import { closeDb } from "./client";
import { DEMO_PASSWORD } from "./demo/people";
import { seedDemo } from "./demo/seed-demo";

const report = await seedDemo();
if (report) {
  console.log("Demo data is in. Log in with:");
  for (const { email, role } of report.logIns) console.log(`  ${email.padEnd(26)} ${role}`);
  console.log(`  password of all: ${DEMO_PASSWORD}`);
} else {
  console.log("There are accounts already: no demo data was added.");
}
await closeDb();
