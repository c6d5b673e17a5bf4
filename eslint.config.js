const { defineConfig } = require("eslint/config");
const expo = require("eslint-config-expo/flat");
const prettier = require("eslint-config-prettier/flat");
const jsdoc = require("eslint-plugin-jsdoc");
const query = require("@tanstack/eslint-plugin-query");
const globals = require("globals");

module.exports = defineConfig([
  {
    ignores: [
      "dist*/**",
      "build/**",
      ".expo/**",
      ".data/**",
      "node_modules/**",
      "public/worklets/*Worker.js",
      "expo-env.d.ts",
    ],
  },
  { linterOptions: { reportUnusedDisableDirectives: "error" } },
  expo,
  ...query.configs["flat/recommended"],
  {
    rules: {
      "no-console": "error",
      eqeqeq: ["error", "always"],
      "max-lines": ["error", { max: 300 }],
      // fast-check is used as fc.property(…), as its own documentation does.
      "import/no-named-as-default-member": "off",
      "no-restricted-syntax": [
        "error",
        {
          selector: "ExportAllDeclaration",
          message: "No barrel files: import from the file that owns the name.",
        },
      ],
    },
  },
  { files: ["app/**/*.tsx"], rules: { "max-lines": ["error", { max: 80 }] } },
  {
    files: ["{features,server,shared}/**/*.{ts,tsx}"],
    ignores: ["**/*.d.ts"],
    rules: {
      "no-restricted-syntax": [
        "error",
        { selector: "ExportDefaultDeclaration", message: "Default exports are for routes only." },
        { selector: "ExportAllDeclaration", message: "No barrel files: import from the file that owns the name." },
      ],
    },
  },
  {
    files: ["server/**/*.ts"],
    ignores: ["server/env.ts", "server/setup/**", "server/**/*.test.ts"],
    rules: {
      "no-restricted-properties": [
        "error",
        { object: "process", property: "env", message: "Only server/env.ts reads the environment." },
      ],
    },
  },
  {
    files: ["shared/**/*.ts"],
    ignores: ["**/*.test.ts"],
    plugins: { jsdoc },
    rules: {
      "jsdoc/require-jsdoc": [
        "error",
        {
          publicOnly: true,
          require: { FunctionDeclaration: true },
          contexts: ["TSInterfaceDeclaration", "TSTypeAliasDeclaration"],
        },
      ],
      "no-restricted-globals": ["error", "window", "document", "process", "setTimeout", "fetch"],
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "The engine takes a seed." },
        { object: "Date", property: "now", message: "The engine knows no clock." },
      ],
    },
  },
  { files: ["shared/contract/**/*.ts"], rules: { "jsdoc/require-jsdoc": "off" } },
  {
    files: ["**/*.{js,cjs,mjs}", "server/setup/**", "server/cli/**", "__tests__/**"],
    languageOptions: { globals: globals.node },
  },
  { files: ["server/setup/**", "__tests__/journeys/**"], rules: { "no-console": "off" } },
  { files: ["**/*.test.{ts,tsx}", "__tests__/**"], languageOptions: { globals: globals.jest } },
  {
    files: ["public/worklets/**"],
    languageOptions: {
      globals: {
        AudioWorkletProcessor: "readonly",
        registerProcessor: "readonly",
        sampleRate: "readonly",
        currentTime: "readonly",
      },
    },
  },
  prettier,
]);
