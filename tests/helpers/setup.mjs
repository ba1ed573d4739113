/** `npm run setup`: packages and the browser for the tests. */
import { fileURLToPath } from "node:url";
import { ensureChromium, ensurePackages, requireNode } from "../../lib/setup/install.mjs";

requireNode();
ensurePackages(fileURLToPath(new URL("../..", import.meta.url)));
console.log(`Ready; browser for the tests: ${ensureChromium()}`);
