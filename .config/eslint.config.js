import hooks from "eslint-plugin-react-hooks";
import tseslint from "typescript-eslint";

/** A module pattern that a folder may not import, with the reason the reader is shown. */
const forbid = (...groups) => ["error", { patterns: groups.map(([group, message]) => ({ group, message })) }];

const ormOnly = [
  ["@mikro-orm/*", "#app/db/**", "**/db/**"],
  "Only services, db and the server's scope touch entities: call a service and pass on its DTO.",
];
const noServer = [
  ["**/*.server", "**/*.server.*", "#app/server/**", "#app/services/**", "#app/db/**"],
  "Components run in the browser too.",
];
const nodeModules = [["node:*"], "This code runs in the browser too."];

/** Packages that the engine does without. */
const packages = ["node:*", "react", "react-*", "react-router", "@*/*", "zod", "recharts", "papaparse"];

export default tseslint.config(
  { ignores: ["**/node_modules/**", "build/**", ".react-router/**", ".planeward/**", "test-results/**"] },
  ...tseslint.configs.recommended,
  {
    files: ["**/*.{ts,tsx}"],
    linterOptions: { reportUnusedDisableDirectives: "error" },
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/consistent-type-imports": "error",
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/ban-ts-comment": "error",
      eqeqeq: "error",
      "no-console": "error",
      "max-lines": ["error", { max: 400, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ["app/**/*.{ts,tsx}"],
    plugins: { "react-hooks": hooks },
    rules: hooks.configs.recommended.rules,
  },
  {
    // The engine is pure: the same code runs in the browser, on the server, in jobs and in tests.
    files: ["app/engine/**/*.ts"],
    rules: {
      "no-restricted-imports": forbid(
        [["#app/*", "!#app/engine", "!#app/engine/**"], "The engine imports nothing outside itself but mathjs."],
        [
          [...packages, "mathjs", "mathjs/**"],
          "The engine imports nothing outside itself but mathjs, and that only where the table of units is made.",
        ],
      ),
      "no-restricted-globals": [
        "error",
        "Date",
        "window",
        "document",
        "process",
        "fetch",
        "console",
        "setTimeout",
        "performance",
        "crypto",
      ],
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "The engine has no random source of its own: take a seed." },
      ],
    },
  },
  {
    files: ["app/engine/units/generator/*.ts"],
    rules: {
      "no-restricted-imports": forbid(
        [["#app/*", "!#app/engine", "!#app/engine/**"], "The engine imports nothing outside itself but mathjs."],
        [packages, "The table of units is made from mathjs and nothing else from outside."],
      ),
    },
  },
  {
    files: ["app/components/**/*.{ts,tsx}", "app/lib/**/*.{ts,tsx}", "app/schemas/**/*.ts"],
    rules: { "no-restricted-imports": forbid(noServer, ormOnly, nodeModules) },
  },
  {
    files: ["app/policies/**/*.ts"],
    rules: {
      "no-restricted-imports": forbid(noServer, ormOnly, nodeModules, [["react", "react-*"], "Policies are pure."]),
    },
  },
  {
    files: ["app/routes/**/*.{ts,tsx}"],
    rules: {
      "no-restricted-imports": forbid(ormOnly),
      "max-lines": ["error", { max: 250, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ["app/middleware/**/*.ts", "app/integrations/**/*.ts"],
    rules: { "no-restricted-imports": forbid(ormOnly) },
  },
  {
    files: ["app/cli/**/*.mjs"],
    rules: {
      // Nothing else reads these before they run: two imports of one name, as a merge can leave them, stop the start.
      "no-redeclare": "error",
      "no-console": "off",
    },
  },
);
