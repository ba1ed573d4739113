/** For scripts that Next.js doesn't start: the same .env files that it reads. */
import nextEnv from "@next/env";

nextEnv.loadEnvConfig(process.cwd(), true, { info: () => undefined, error: console.error });
