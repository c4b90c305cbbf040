// Speed and memory of planning: a year of one pair at one site, first call and after warming up; then 1 000 sites.
// npx tsx bench/plan.mjs [sites]
import { openSources } from "../src/node.ts";
import { planSeason } from "../src/planning/plan-season.ts";
import { openSky } from "../src/sky/open-sky.ts";

const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
const year = { from: "2026", to: "2027", sky };
const site = { latitudeDeg: 46.5, longitudeDeg: 8, heightM: 2100 };
const median = (values) => [...values].sort((a, b) => a - b)[values.length >> 1];

function walk(pair, where) {
  let rows = 0;
  for (const _ of planSeason(ephemeris, { ...year, pair, site: where })) rows++;
  return rows;
}

/** Milliseconds of this process's own time, so that other work on the machine counts little. */
function milliseconds(work) {
  const { user, system } = process.cpuUsage();
  const start = performance.now();
  const result = work();
  const used = process.cpuUsage();
  return { wall: performance.now() - start, cpu: (used.user + used.system - user - system) / 1000, result };
}

for (const pair of ["moon-earth", "earth-sun", "venus-sun", "mars-sun", "mercury-sun", "callisto-jupiter"]) {
  const first = milliseconds(() => walk(pair, site));
  const later = Array.from({ length: 15 }, () => milliseconds(() => walk(pair, site)));
  console.log(
    `${pair}: ${first.result} passages; first call ${first.wall.toFixed(0)} ms (cpu ${first.cpu.toFixed(0)}), ` +
      `then ${median(later.map((it) => it.wall)).toFixed(1)} ms (cpu ${median(later.map((it) => it.cpu)).toFixed(1)})`,
  );
}

const sites = Number(process.argv[2] ?? 1000);
let most = 0;
let early = 0;
const { wall, result } = milliseconds(() => {
  let rows = 0;
  for (let i = 0; i < sites; i++) {
    rows += walk("moon-earth", { latitudeDeg: -89 + (178 * i) / sites, longitudeDeg: (i * 137.5) % 360, heightM: 0 });
    if (i % 20 === 19) {
      globalThis.gc?.();
      const used = process.memoryUsage().heapUsed / 1e6;
      most = Math.max(most, used);
      if (i === 19) early = used;
    }
  }
  return rows;
});
console.log(
  `${sites} sites × a year of the Moon: ${result} rows in ${(wall / 1000).toFixed(1)} s; ` +
    `heap ${early.toFixed(0)} MB after 20 sites, ${most.toFixed(0)} MB at most${globalThis.gc ? "" : " (run with --expose-gc to count live memory alone)"}`,
);
