import { spawn } from "node:child_process";
import { once } from "node:events";
import {
  chmodSync,
  existsSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  symlinkSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { apsidary, COMMAND } from "./command.ts";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-out-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const MOON = ["passages", "moon-earth", "--from", "2026", "--to", "2027"];
/** Long enough to be interrupted. */
const LONG = ["range", "moon-earth", "--from", "1960", "--to", "2060", "--step", "10min"];

describe("--out", () => {
  test("writes what standard output would have had, and nothing else", async () => {
    const shown = await apsidary([...MOON, "--format", "csv"], folder);
    const written = await apsidary([...MOON, "--format", "csv", "--out", "moon.csv"], folder);
    expect(written).toEqual({ status: 0, stdout: "", stderr: "" });
    expect(readFileSync(join(folder, "moon.csv"), "utf8")).toBe(shown.stdout);
    expect(readdirSync(folder)).toEqual(["moon.csv"]);
  });

  test("replaces a file whole, keeps its permissions and follows a link to it", async () => {
    const target = join(folder, "target.txt");
    writeFileSync(target, "old");
    chmodSync(target, 0o640);
    symlinkSync(target, join(folder, "link.txt"));
    expect((await apsidary([...MOON, "--out", "link.txt"], folder)).status).toBe(0);
    expect(readFileSync(target, "utf8")).toMatch(/^Passages of moon-earth/);
    expect(statSync(target).mode & 0o777).toBe(0o640);
    expect(readdirSync(folder).sort()).toEqual(["link.txt", "target.txt"]);
  });

  test("leaves an old file as it was where the input is bad", async () => {
    writeFileSync(join(folder, "moon.txt"), "old");
    const bad = await apsidary(
      ["passages", "moon-earth", "--from", "2027", "--to", "2026", "--out", "moon.txt"],
      folder,
    );
    expect(bad.status).toBe(2);
    expect(readFileSync(join(folder, "moon.txt"), "utf8")).toBe("old");
  });

  test.each(["SIGINT", "SIGTERM"] as const)("leaves nothing behind after %s", async (signal) => {
    const child = spawn(process.execPath, [COMMAND, ...LONG, "--out", "long.txt"], { cwd: folder, stdio: "ignore" });
    while (readdirSync(folder).length === 0) await new Promise((later) => setTimeout(later, 20));
    expect(existsSync(join(folder, "long.txt"))).toBe(false);
    child.kill(signal);
    const [status, by] = await once(child, "close");
    expect([status, by]).toEqual([null, signal]);
    expect(readdirSync(folder)).toEqual([]);
  });
});

describe("standard output", () => {
  test.each(["text", "json", "ndjson", "csv"])("ends quietly where the reader of %s has gone", async (format) => {
    const child = spawn(process.execPath, [COMMAND, ...LONG, "--format", format], {
      stdio: ["ignore", "pipe", "pipe"],
    });
    let stderr = "";
    child.stderr.setEncoding("utf8").on("data", (text: string) => {
      stderr += text;
    });
    await once(child.stdout, "data");
    child.stdout.destroy();
    const [status] = await once(child, "close");
    expect({ status, stderr }).toEqual({ status: 0, stderr: "" });
  });

  test("ends quietly where the reader of the help has gone before it comes", async () => {
    const child = spawn(process.execPath, [COMMAND, "--help"], { stdio: ["ignore", "pipe", "pipe"] });
    child.stdout.destroy();
    let stderr = "";
    child.stderr.setEncoding("utf8").on("data", (text: string) => {
      stderr += text;
    });
    const [status] = await once(child, "close");
    expect({ status, stderr }).toEqual({ status: 0, stderr: "" });
  });

  test("waits for a slow reader instead of filling memory", async () => {
    const args = ["--max-old-space-size=24", COMMAND, "range", "moon-earth", "--from", "2000", "--to", "2010"];
    const child = spawn(process.execPath, [...args, "--step", "1h", "--format", "json"], {
      stdio: ["ignore", "pipe", "inherit"],
    });
    let bytes = 0;
    let pauses = 0;
    for await (const piece of child.stdout) {
      bytes += (piece as Buffer).length;
      if (pauses++ < 5) await new Promise((later) => setTimeout(later, 20));
    }
    if (child.exitCode === null) await once(child, "close");
    expect(child.exitCode).toBe(0);
    expect(bytes).toBeGreaterThan(87_000 * 150);
  });

  test("tells no progress where standard error is no terminal", async () => {
    const { stderr } = await apsidary(["passages", "moon-earth", "--from", "1960", "--to", "2060"], folder);
    expect(stderr).toBe("");
  });
});
