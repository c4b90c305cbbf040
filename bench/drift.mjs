/**
 * Measures a century's account: the command from start to end, and the library's call alone.
 *
 *     npm run build && node bench/drift.mjs
 */
import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";

const command = fileURLToPath(new URL("../dist/cli.js", import.meta.url));
const ROUNDS = 7;

/** Median wall time of a run of Node, milliseconds. */
function timeOf(args) {
  const times = Array.from({ length: ROUNDS }, () => {
    const start = performance.now();
    const { status, stderr } = spawnSync(process.execPath, args, { encoding: "utf8", maxBuffer: 1 << 26 });
    if (status !== 0) throw new Error(stderr);
    return performance.now() - start;
  });
  return times.sort((a, b) => a - b)[ROUNDS >> 1];
}

const bare = timeOf(["-e", "0"]);
const rows = [
  ["node alone", ["-e", "0"]],
  ["one year, text", [command, "drift", "earth-sun", "--from", "2020", "--to", "2021"]],
  ["a century, json", [command, "drift", "earth-sun", "--from", "1961", "--to", "2060", "--format", "json"]],
  ["a century, text", [command, "drift", "earth-sun", "--from", "1961", "--to", "2060"]],
  [
    "a century, centres and seasons",
    [command, "drift", "earth-sun", "--from", "1961", "--to", "2060", "--centres", "--seasons"],
  ],
];
process.stdout.write("wall time, median of 7            ms   times node alone\n");
for (const [name, args] of rows) {
  const time = timeOf(args);
  process.stdout.write(`${name.padEnd(30)} ${time.toFixed(0).padStart(5)}   ${(time / bare).toFixed(1).padStart(6)}\n`);
}
