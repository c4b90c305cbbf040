// How long one state by the series takes, beside astronomy-engine's own position in the same run.
//     npm run build is not needed:  npx tsx bench/series.mjs
// Least of many short bursts, so that other work on the machine shows as little as it can.
import { readFileSync } from "node:fs";
import * as engine from "astronomy-engine";
import { allPairs } from "../src/bodies/pair.ts";
import { openSeries } from "../src/ephemeris/series.ts";

const read = (name) => readFileSync(new URL(`../src/data/${name}.series.bin`, import.meta.url));
const opening = performance.now();
const series = openSeries({ planets: read("planets"), moon: read("moon") });
console.log(`opening: ${(performance.now() - opening).toFixed(1)} ms`);

function microseconds(call) {
  const burst = 40;
  let least = Infinity;
  for (let round = 0; round < 300; round++) {
    const start = performance.now();
    for (let i = 0; i < burst; i++) call(i * 86_400 * 9.7 + round * 3e6);
    least = Math.min(least, performance.now() - start);
  }
  return (least / burst) * 1000;
}

const day = 86_400;
const ofEngine = {
  moon: microseconds((t) => engine.GeoMoon(new engine.AstroTime(t / day))),
  earth: microseconds((t) => engine.HelioVector("Earth", new engine.AstroTime(t / day))),
};
console.log(
  `astronomy-engine: Moon ${ofEngine.moon.toFixed(1)} µs, Earth ${ofEngine.earth.toFixed(1)} µs (position alone)`,
);
const out = new Float64Array(6);
for (const pair of allPairs()) {
  if (series.spans(pair).length === 0) continue;
  const motion = series.motion(pair);
  const time = microseconds((t) => motion.state(t, out));
  console.log(
    `${pair.name.padEnd(12)} ${time.toFixed(1).padStart(6)} µs, ${(time / ofEngine.moon).toFixed(1)} × the engine's Moon`,
  );
}
