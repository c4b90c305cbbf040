import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, test } from "vitest";

const root = fileURLToPath(new URL("..", import.meta.url));
const folder = mkdtempSync(join(tmpdir(), "apsidary-package-"));
const run = (command: string, args: string[], cwd = folder) => execFileSync(command, args, { cwd, encoding: "utf8" });

/** The first perigee of 2026, to the second: 2026-01-01 21:44 UTC (the same by every way in). */
const PROGRAM = `
const { openSources, nextPassage, toRow } = APSIDARY;
openSources().then((ephemeris) => console.log(toRow(nextPassage(ephemeris, "moon-earth", "2026-01-01"), ephemeris).utc));
`;

let tarball = "";
beforeAll(() => {
  const [packed] = JSON.parse(run("npm", ["pack", "--json", "--pack-destination", folder], root)) as [
    { filename: string },
  ];
  tarball = join(folder, packed.filename);
  writeFileSync(join(folder, "package.json"), '{ "private": true }');
  run("npm", ["install", "--no-audit", "--no-fund", "--prefer-offline", tarball]);
}, 120_000);
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe("the packed tarball, installed in an empty folder", () => {
  test("is no larger than 5 MB", () => {
    expect(statSync(tarball).size).toBeLessThan(5e6);
  });

  test("works by import", () => {
    writeFileSync(join(folder, "way.mjs"), `import * as APSIDARY from "apsidary";${PROGRAM}`);
    expect(run("node", ["way.mjs"])).toMatch(/^2026-01-01T21:44:/);
  });

  test("works by require", () => {
    writeFileSync(join(folder, "way.cjs"), `const APSIDARY = require("apsidary");${PROGRAM}`);
    expect(run("node", ["way.cjs"])).toMatch(/^2026-01-01T21:44:/);
  });

  test("works in a worker", () => {
    writeFileSync(
      join(folder, "worker.mjs"),
      `import { Worker } from "node:worker_threads"; new Worker(new URL("./way.mjs", import.meta.url));`,
    );
    expect(run("node", ["worker.mjs"])).toMatch(/^2026-01-01T21:44:/);
  });

  test("works as a command", () => {
    const answer = run("npx", [
      "apsidary",
      "passages",
      "moon-earth",
      "--from",
      "2026",
      "--next",
      "1",
      "--format",
      "json",
    ]);
    expect(JSON.parse(answer).rows[0].utc).toMatch(/^2026-01-01T21:44:/);
  });

  test("opens kernels by path through apsidary/node, and carries its own kernel as a file", () => {
    writeFileSync(
      join(folder, "path.mjs"),
      `import { openSources } from "apsidary/node"; import { fileURLToPath } from "node:url";
       const path = fileURLToPath(import.meta.resolve("apsidary/de405.bsp"));
       const ephemeris = await openSources({ kernels: [path], builtIn: false, series: false, engine: false });
       console.log(ephemeris.sources.map((source) => source.id).join());`,
    );
    expect(run("node", ["path.mjs"]).trim()).toBe("user:de405.bsp");
  });

  test("has types for both module systems", () => {
    const { exports } = JSON.parse(readFileSync(join(root, "package.json"), "utf8"));
    for (const way of [".", "./node"]) {
      for (const kind of ["import", "require"]) {
        expect(statSync(join(folder, "node_modules/apsidary", exports[way][kind].types)).size).toBeGreaterThan(100);
      }
    }
  });
});
