const esm =
  "node_modules/(?!(react-native(-[a-z-]+)?|@react-native|@react-native-community|expo|expo-.*|@expo|react-navigation|@react-navigation|pitchy|fft.js)/)";
const alias = { "^@/(.*)$": "<rootDir>/$1" };
const client = {
  moduleNameMapper: { "\\.woff2?$": "<rootDir>/__tests__/client/fontFile.js", ...alias },
  transformIgnorePatterns: [`/${esm}`],
};
const swc = (importInterop) => [
  "@swc/jest",
  {
    jsc: {
      target: "es2022",
      parser: { syntax: "typescript", decorators: true },
      transform: { legacyDecorator: true, decoratorMetadata: false, useDefineForClassFields: false },
    },
    module: { type: "commonjs", importInterop },
  },
];
/** Packages that come as ES modules only. */
const modules = [
  ...["pitchy", "fft\\.js", "@tus", "srvx", "file-type", "strtok3", "token-types", "@tokenizer", "@borewit"],
  ...["uint8array-extras", "set-cookie-parser"],
];
const node = {
  testEnvironment: "node",
  // Their entries bear names ("import", "module-sync") that Node knows and Jest's require does not.
  moduleNameMapper: {
    "^file-type$": "file-type/node",
    ...alias,
  },
  // Packages take what CommonJS gives as Node gives it to them, our own files as TypeScript does.
  transform: { "/node_modules/.+\\.[cm]?js$": swc("node"), "^.+\\.[cm]?[jt]s$": swc("swc") },
  transformIgnorePatterns: [`/node_modules/(?!(${modules.join("|")})/)`],
};

/** @type {import('jest').Config} */
module.exports = {
  testTimeout: 30_000,
  projects: [
    {
      ...node,
      displayName: "engine",
      testMatch: ["<rootDir>/shared/**/*.test.ts", "<rootDir>/__tests__/engine/**/*.test.ts"],
    },
    {
      ...client,
      displayName: "client",
      preset: "jest-expo/web",
      testMatch: ["<rootDir>/features/**/*.test.ts?(x)", "<rootDir>/__tests__/client/**/*.test.ts?(x)"],
    },
    {
      ...node,
      displayName: "server",
      testMatch: ["<rootDir>/server/**/*.test.ts", "<rootDir>/__tests__/server/**/*.test.ts"],
    },
    { ...node, displayName: "journeys", testMatch: ["<rootDir>/__tests__/journeys/**/*.test.ts"] },
    { ...node, displayName: "house", testMatch: ["<rootDir>/__tests__/house/**/*.test.ts"] },
  ],
};
