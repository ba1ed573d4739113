import next from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";

/** Import directions of the house (DEVELOPERS.md): a guard, not a proof. */
const forbid = (files, patterns) => ({
  files,
  rules: {
    "no-restricted-imports": [
      "error",
      { patterns: patterns.map(([group, message]) => ({ group, message, allowTypeImports: false })) },
    ],
  },
});

const APP = [["@/app/*"], "Nothing imports app; move what is shared to components or lib."];
const DB = [["@/db", "@/db/*"], "Only lib/services, lib/auth, db and tests touch the database; call a service."];
const SERVER = [
  ["@/lib/services/*", "@/lib/auth/*", "@/lib/email/*", "@/lib/env", "@/lib/http/*"],
  "Components show what they are given; fetch in a page or through a route handler.",
];

const config = [
  ...next,
  ...nextTypescript,
  {
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/consistent-type-imports": "error",
      "no-console": ["error", { allow: ["error", "warn"] }],
      "no-restricted-properties": [
        "error",
        { object: "sql", property: "raw", message: "Use parameters: never build SQL from input." },
      ],
    },
  },
  {
    files: ["**/*.ts", "**/*.tsx"],
    ignores: ["lib/env.ts", "instrumentation.ts", "tests/**", "db/demo.mjs", "*.config.ts", "next.config.ts"],
    rules: {
      "no-restricted-syntax": [
        "error",
        {
          selector: "MemberExpression[object.name='process'][property.name='env']",
          message: "Only lib/env.ts reads the environment; import env from there.",
        },
      ],
    },
  },
  {
    files: ["lib/calc/**/*.ts"],
    rules: {
      "no-restricted-imports": [
        "error",
        {
          patterns: [
            { group: ["@/*", "!@/lib/calc", "!@/lib/calc/*"], message: "lib/calc imports nothing outside lib/calc." },
            { group: ["react", "zod", "next", "next/*", "node:*"], message: "lib/calc is pure TypeScript." },
          ],
        },
      ],
      "no-restricted-globals": ["error", "Date", "window", "document", "fetch", "setTimeout", "performance", "process"],
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "The calculation is deterministic." },
      ],
    },
  },
  forbid(["lib/domain/**/*.ts"], [APP, DB, SERVER, [["@/components/*"], "Rules know nothing of the screen."]]),
  forbid(
    ["lib/places/**/*.ts", "lib/gpx/**/*.ts"],
    [
      APP,
      DB,
      SERVER,
      [["@/components/*", "react", "zod"], "Places and GPX files are read and measured here, nothing else."],
    ],
  ),
  {
    files: ["**/*.{ts,tsx}"],
    ignores: ["lib/places/**", "lib/gpx/**", "tests/**"],
    rules: {
      "@typescript-eslint/no-restricted-imports": [
        "error",
        {
          paths: ["suncalc", "geomagnetism", "geographiclib-geodesic"].map((name) => ({
            name,
            message: "Only lib/places uses it; import its wrapper.",
          })),
        },
      ],
    },
  },
  forbid(["lib/format/**/*.ts"], [APP, DB, SERVER, [["@/components/*"], "Formatting knows nothing of the screen."]]),
  forbid(
    ["lib/pdf/**/*.{ts,tsx}", "lib/email/**/*.{ts,tsx}"],
    [APP, DB, [["@/lib/services/*", "@/lib/auth/*"], "Renderers get a typed view model; no queries inside."]],
  ),
  forbid(
    ["lib/services/**/*.ts", "lib/auth/**/*.ts", "lib/http/**/*.ts"],
    [APP, [["@/components/*"], "Services know nothing of the screen."]],
  ),
  forbid(["components/**/*.{ts,tsx}"], [APP, DB, SERVER]),
  forbid(["app/**/*.{ts,tsx}"], [DB]),
  forbid(["db/schema/**/*.ts"], [APP, SERVER, [["@/components/*"], "The schema knows nothing of the screen."]]),
  { files: ["**/*.mjs", "db/seed.ts", "db/migrate.ts", "tests/**"], rules: { "no-console": "off" } },
  { ignores: [".next/**", ".next-*/**", "node_modules/**", "drizzle/**", "coverage/**", "data/**", "next-env.d.ts"] },
];

export default config;
