import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { expect, test } from "vitest";

const root = fileURLToPath(new URL("../..", import.meta.url));
const path = join(root, "examples", "observing-queue.ts");
const face = join(root, "test", "planning", "face.ts");

test("the example of an observing queue is 30 lines and fills a queue in order", () => {
  const text = readFileSync(path, "utf8");
  expect(text.split("\n").filter((line) => line.trim() !== "").length).toBeLessThanOrEqual(32);
  const folder = mkdtempSync(join(tmpdir(), "apsidary-example-"));
  try {
    const copy = join(folder, "queue.mts");
    writeFileSync(copy, text.replace('from "apsidary"', `from ${JSON.stringify(face)}`));
    const out = execFileSync(process.execPath, ["--import", "tsx", copy], { cwd: root, encoding: "utf8" });
    const queue: { priority: number; exposeAt: string; notBefore: string; notAfter: string; target: string }[] =
      JSON.parse(out);
    expect(queue.length).toBeGreaterThan(10);
    for (const { exposeAt, notBefore, notAfter, target } of queue) {
      expect(notBefore <= exposeAt && exposeAt <= notAfter).toBe(true);
      expect(target).toMatch(/^Moon at (perigee|apogee), \d{6} km$/);
    }
    const order = queue.map(({ priority, exposeAt }) => `${priority} ${exposeAt}`);
    expect(order).toEqual([...order].sort());
  } finally {
    rmSync(folder, { recursive: true });
  }
}, 60_000);
