import { execFileSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import { expect, test } from "vitest";

const library = new URL("../../dist/index.js", import.meta.url).href;

const SCRIPT = `
import { openSources, passages } from ${JSON.stringify(library)};
const ephemeris = await openSources();
const heap = [];
let count = 0;
for (const _ of passages(ephemeris, "moon-earth", { from: "1500", to: "2500" })) {
  if (count++ % 5000 === 1000) { gc(); heap.push(process.memoryUsage().heapUsed); }
}
console.log(JSON.stringify({ count, heap }));
`;

test("a thousand years of the Moon stream in flat memory", () => {
  const answer = execFileSync(process.execPath, ["--expose-gc", "--input-type=module", "-e", SCRIPT], {
    cwd: fileURLToPath(new URL("../..", import.meta.url)),
    encoding: "utf8",
  });
  const { count, heap } = JSON.parse(answer) as { count: number; heap: number[] };
  // 1000 years of 365.2425 d over 27.55455 d, two passages each
  expect(Math.abs(count - 26510)).toBeLessThan(5);
  expect(Math.max(...heap) - Math.min(...heap)).toBeLessThan(1e6);
}, 120_000);
