// Speed, as ratios taken in one run: two rivals in turn, round after round; the median of the rounds' ratios is what counts.
// npm run bench
import { execFileSync, spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import * as astronomy from "astronomy-engine";
import { openSources, passages } from "../dist/index.js";

const ROUNDS = 15;
const command = fileURLToPath(new URL("../dist/cli.js", import.meta.url));
const YEAR = 365.25 * 86400;
const from = -39 * YEAR;

const median = (values) => [...values].sort((a, b) => a - b)[values.length >> 1];

/** Seconds for one unit of work by two rivals, in turn; the first rounds warm up and do not count. */
function inTurn(ours, theirs, rounds = ROUNDS) {
  const pairs = [];
  for (let round = -5; round < rounds; round++) {
    const pair = [ours, theirs].map((work) => {
      const start = process.hrtime.bigint();
      const units = work();
      return Number(process.hrtime.bigint() - start) / 1e9 / units;
    });
    if (round >= 0) pairs.push(pair);
  }
  return {
    ours: median(pairs.map(([a]) => a)),
    theirs: median(pairs.map(([, b]) => b)),
    ratio: median(pairs.map(([a, b]) => b / a)),
  };
}

function walk(ephemeris, pair, years) {
  let count = 0;
  for (const _ of passages(ephemeris, pair, { from: { tdbSeconds: from }, to: { tdbSeconds: from + years * YEAR } }))
    count++;
  return count;
}

function engineMoon(count) {
  let apsis = astronomy.SearchLunarApsis(new Date("1961-01-01"));
  for (let i = 1; i < count; i++) apsis = astronomy.NextLunarApsis(apsis);
  return count;
}

function engineEarth(count) {
  let apsis = astronomy.SearchPlanetApsis(astronomy.Body.Earth, new Date("1961-01-01"));
  for (let i = 1; i < count; i++) apsis = astronomy.NextPlanetApsis(astronomy.Body.Earth, apsis);
  return count;
}

/** Evaluations of states for one passage: the kernel's motion, counted. */
async function evaluations(ephemeris, pair, years) {
  let count = 0;
  const kernel = ephemeris.sources.find((source) => source.kind === "kernel");
  const counted = {
    ...kernel,
    motion(which) {
      const motion = kernel.motion(which);
      return {
        givesVelocity: true,
        state(tdb, out) {
          count++;
          motion.state(tdb, out);
        },
        stateAndAcceleration(tdb, out) {
          count++;
          motion.stateAndAcceleration(tdb, out);
        },
      };
    },
  };
  const alone = await openSources({ builtIn: false, series: false, engine: false, tracks: [counted] });
  walk(alone, pair, 1); // the seam is searched once
  count = 0;
  return {
    passages: walk(alone, pair, years),
    get evaluations() {
      return count;
    },
  };
}

const micro = (seconds) => `${(seconds * 1e6).toFixed(2)} µs`;
const ephemeris = await openSources();

for (const [pair, years] of [
  ["moon-earth", 90],
  ["earth-sun", 90],
]) {
  const counted = await evaluations(ephemeris, pair, years);
  console.log(
    `${pair}: ${(counted.evaluations / counted.passages).toFixed(2)} evaluations of a state for a passage, all told`,
  );
}

const moon = inTurn(
  () => walk(ephemeris, "moon-earth", 90),
  () => engineMoon(200),
);
console.log(
  `moon-earth: ${micro(moon.ours)} a whole passage, astronomy-engine's search ${micro(moon.theirs)}: ${moon.ratio.toFixed(1)} × faster`,
);
const earth = inTurn(
  () => walk(ephemeris, "earth-sun", 90),
  () => engineEarth(100),
);
console.log(
  `earth-sun: ${micro(earth.ours)} a whole passage, astronomy-engine's search ${micro(earth.theirs)}: ${earth.ratio.toFixed(1)} × faster`,
);

const starts = inTurn(
  () => {
    execFileSync(process.execPath, [command, "passages", "moon-earth", "--from", "2027", "--to", "2028"], {
      stdio: "pipe",
    });
    return 1;
  },
  () => {
    spawnSync(process.execPath, ["-e", "0"]);
    return 1;
  },
  9,
);
console.log(
  `command, a year of the Moon: ${(starts.ours * 1e3).toFixed(0)} ms from start to end, node -e 0 ${(starts.theirs * 1e3).toFixed(0)} ms: ` +
    `${(1 / starts.ratio).toFixed(2)} × as long`,
);
