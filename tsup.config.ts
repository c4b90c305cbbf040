import { defineConfig } from "tsup";

// The command and the library are built apart so that the library's CommonJS build carries no command.
export default defineConfig([
  {
    entry: { index: "src/index.ts", node: "src/node.ts" },
    format: ["esm", "cjs"],
    dts: true,
    external: [/^#/],
    target: "es2022",
  },
  {
    entry: { cli: "src/cli/main.ts" },
    format: ["esm"],
    external: [/^#/],
    target: "es2022",
    banner: { js: "#!/usr/bin/env node" },
  },
]);
