import { readdirSync, readFileSync } from "node:fs";
import { dirname, join, relative, sep } from "node:path";
import { fileURLToPath } from "node:url";
import { describe, expect, test } from "vitest";

const src = fileURLToPath(new URL("../src", import.meta.url));

/** Floors from the ground up; a folder may import from floors below its own, never from a sibling. */
const FLOORS = [
  ["numeric", "time", "bodies"],
  ["ephemeris", "report"],
  ["passages", "orbit", "sky"],
  ["planning", "audit", "drift", "calendar"],
  ["cli"],
];
/** Files at the root of src that everyone may use. */
const COMMON = new Set(["error.ts", "nearest-name.ts"]);

function floorOf(folder: string): number {
  return FLOORS.findIndex((floor) => floor.includes(folder));
}

const files = readdirSync(src, { recursive: true, encoding: "utf8" })
  .filter((file) => file.endsWith(".ts") && !file.endsWith(".d.ts") && !file.startsWith("data"))
  .map((file) => file.split(sep).join("/"));

const imports = files.flatMap((file) => {
  const text = readFileSync(join(src, file), "utf8");
  const found = [...text.matchAll(/(?:from|import)\s*\(?\s*"([^"]+)"/g)].map((match) => match[1] as string);
  return found.map((target) => ({ file, target }));
});

describe("the house", () => {
  test("has imports that only point downwards and never to a sibling folder", () => {
    const wrong = imports.filter(({ file, target }) => {
      if (!target.startsWith(".")) return false;
      const to = relative(src, join(src, dirname(file), target))
        .split(sep)
        .join("/");
      const [fromFolder = "", toFolder = ""] = [file.split("/")[0], to.split("/")[0]];
      if (!file.includes("/")) return false; // index.ts and node.ts are faces
      if (!to.includes("/")) return !COMMON.has(to) && fromFolder !== "cli";
      return fromFolder !== toFolder && floorOf(toFolder) >= floorOf(fromFolder);
    });
    expect(wrong).toEqual([]);
  });

  test("knows every folder of src", () => {
    const folders = new Set(files.filter((file) => file.includes("/")).map((file) => file.split("/")[0]));
    expect([...folders].filter((folder) => floorOf(folder as string) < 0)).toEqual([]);
  });

  test("lets only the engine source and sky/ import astronomy-engine", () => {
    const users = imports.filter(({ target }) => target === "astronomy-engine").map(({ file }) => file);
    expect(users.filter((file) => !file.startsWith("sky/") && !file.startsWith("ephemeris/engine"))).toEqual([]);
  });

  test("lets only the command and the node face touch the file system and the process", () => {
    const users = imports.filter(({ target }) => target.startsWith("node:")).map(({ file }) => file);
    expect(users.filter((file) => !file.startsWith("cli/") && file !== "node.ts")).toEqual([]);
  });

  test("keeps index.ts to re-exports", () => {
    const text = readFileSync(join(src, "index.ts"), "utf8").replaceAll(/\/\*[\s\S]*?\*\//g, "");
    expect(text.replaceAll(/export ((type )?\{[^}]*\}|\*) from "[^"]+";/g, "").trim()).toBe("");
  });
});
