/**
 * Measures how far passages by the series lie from those of an integration carried on from DE405, by pair and century.
 *
 *     npx tsx src/data/make/series/measure-accuracy.ts FOLDER [pair,pair …]
 *
 * The states of the integration (190 MB, some minutes) are kept in FOLDER and found there the next time. The Moon's
 * part of the way from the Earth–Moon barycentre to the Earth is taken from ELP/MPP02, since the integration knows no
 * tides. What is printed is the ground of the figures in `src/ephemeris/series-accuracy.ts`.
 */
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { allPairs, pairOf } from "../../../bodies/pair.ts";
import { openSeries } from "../../../ephemeris/series.ts";
import type { Accuracy } from "../../../ephemeris/source.ts";
import { brentZero } from "../../../numeric/brent-zero.ts";
import { BODIES, GM, integratePlanets, STATE_SIZE } from "./integrate-planets.ts";

const STEP_DAYS = 4;
const STEP = STEP_DAYS * 86_400;
const STEPS = 91_500;
const YEAR = 365.25 * 86_400;
const EARTH_OVER_MOON = 81.30056;

const folder = process.argv[2] ?? ".";
const [past, future] = [statesOf("past", -STEP_DAYS), statesOf("future", STEP_DAYS)];
const read = (file: string) => readFileSync(new URL(`../../${file}`, import.meta.url));
const series = openSeries({ planets: read("planets.series.bin"), moon: read("moon.series.bin") });
const moon = series.motion(pairOf("moon-earth"));
const lunar = new Float64Array(6);

function statesOf(name: string, stepDays: number): Float64Array {
  const file = `${folder}/integration-${name}.f64`;
  if (existsSync(file)) {
    const bytes = readFileSync(file);
    return new Float64Array(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.length));
  }
  process.stderr.write(`integrating into the ${name} …\n`);
  const states = integratePlanets(stepDays, STEPS);
  writeFileSync(file, new Uint8Array(states.buffer));
  return states;
}

/** Adds `weight` times a body's state at step `index` to `out`. */
function addBody(index: number, name: string, weight: number, out: Float64Array): void {
  if (name === "ssb") {
    // not the origin: the momentum of the asteroids, which are in DE405's states and not here, carries it off by 10 km in 30 years
    const whole = GM.reduce((sum, gm) => sum + gm, 0);
    for (const [i, body] of BODIES.entries()) addBody(index, body, (weight * (GM[i] as number)) / whole, out);
    return;
  }
  if (name === "emb") {
    addBody(index, "earth", (weight * EARTH_OVER_MOON) / (1 + EARTH_OVER_MOON), out);
    addBody(index, "moon", weight / (1 + EARTH_OVER_MOON), out);
    return;
  }
  const states = index < 0 ? past : future;
  const at = Math.abs(index) * STATE_SIZE + 3 * (BODIES as readonly string[]).indexOf(name);
  for (let k = 0; k < 3; k++) {
    out[k] = (out[k] as number) + weight * (states[at + k] as number);
    out[3 + k] = (out[3 + k] as number) + weight * (states[at + STATE_SIZE / 2 + k] as number);
  }
}

function rangeOf(s: Float64Array): readonly [range: number, rate: number] {
  const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = s;
  const range = Math.hypot(x, y, z);
  return [range, (x * vx + y * vy + z * vz) / range];
}

/** Range and range rate of the integration between its steps: Hermite's polynomial of range and rate at seven steps. */
function truth(target: string, centre: string, tdb: number): readonly [range: number, rate: number] {
  const middle = Math.round(tdb / STEP);
  const nodes: number[] = [];
  const values: number[] = [];
  const slopes: number[] = [];
  for (let index = middle - 3; index <= middle + 3; index++) {
    const state = new Float64Array(6);
    addBody(index, target === "earth" ? "emb" : target, 1, state);
    addBody(index, centre, -1, state);
    if (target === "earth") {
      moon.state(index * STEP, lunar);
      for (let k = 0; k < 6; k++) state[k] = (state[k] as number) - (lunar[k] as number) / (1 + EARTH_OVER_MOON);
    }
    const [range, rate] = rangeOf(state);
    const x = index - tdb / STEP;
    nodes.push(x, x);
    values.push(range, range);
    slopes.push(rate * STEP, rate * STEP);
  }
  const offset = values[6] ?? 0;
  const node = (i: number) => nodes[i] as number;
  let differences = values.map((value) => value - offset);
  const newton = [differences[0] as number];
  for (let order = 1; order < nodes.length; order++) {
    differences = differences
      .slice(0, -1)
      .map((value, i) =>
        node(i + order) === node(i)
          ? (slopes[i] as number)
          : ((differences[i + 1] as number) - value) / (node(i + order) - node(i)),
      );
    newton.push(differences[0] as number);
  }
  let value = 0;
  let slope = 0;
  for (let k = newton.length - 1; k >= 0; k--) {
    slope = slope * -node(k) + value;
    value = value * -node(k) + (newton[k] as number);
  }
  return [value + offset, slope / STEP];
}

const wanted = process.argv[3]?.split(",") ?? allPairs().map((pair) => pair.name);
for (const pair of wanted.map(pairOf)) {
  const [target = "", centre = ""] = pair.name.split("-");
  if (target === "moon" || series.spans(pair).length === 0) continue;
  const motion = series.motion(pair);
  const state = new Float64Array(6);
  const rate = (t: number) => {
    motion.state(t, state);
    return rangeOf(state)[1];
  };
  const rows: { year: number; seconds: number; km: number; mmS: number; stated: Accuracy; acceleration: number }[] = [];
  const end = 1001 * YEAR;
  for (let t = -1000 * YEAR, before = rate(t); t < end; ) {
    const next = t + pair.sampleSeconds;
    const after = rate(next);
    if (before < 0 !== after < 0) {
      const found = brentZero(rate, t, before, next, after, 0.001);
      const acceleration = (rate(found + 600) - rate(found - 600)) / 1200;
      const [range, trueRate] = truth(target, centre, found);
      motion.state(found, state);
      rows.push({
        year: 2000 + found / YEAR,
        seconds: trueRate / acceleration,
        km: rangeOf(state)[0] - range,
        mmS: trueRate * 1e6,
        stated: series.accuracy(pair, found),
        acceleration,
      });
    }
    t = next;
    before = after;
  }
  process.stdout.write(
    `${pair.name}\n  years       n   s: rms     max   km: 95 %    max   mm/s: 95 %    max   kept: s  km   width/rms\n`,
  );
  for (let from = 1000; from < 3000; from += 100) {
    const own = rows.filter(({ year }) => year >= from && year < from + 100);
    if (own.length === 0) continue;
    const share = (numbers: number[], part: number) => {
      const sorted = numbers.map(Math.abs).sort((p, q) => p - q);
      return sorted[Math.ceil(part * sorted.length) - 1] ?? 0;
    };
    const seconds = own.map((row) => row.seconds);
    const rms = Math.sqrt(seconds.reduce((sum, x) => sum + x * x, 0) / own.length);
    const km = own.map((row) => row.km);
    const mmS = own.map((row) => row.mmS);
    const cells = [rms, share(seconds, 1), share(km, 0.95), share(km, 1), share(mmS, 0.95), share(mmS, 1)];
    const texts = cells.map((x) => x.toPrecision(4).padStart(9));
    const kept = (holds: (row: (typeof own)[number]) => boolean) => (own.filter(holds).length / own.length).toFixed(3);
    const width = share(
      own.map((row) => row.stated.rangeRateKmS / row.acceleration),
      0.5,
    );
    const statement = [
      kept((row) => Math.abs(row.mmS) <= row.stated.rangeRateKmS * 1e6),
      kept((row) => Math.abs(row.km) <= row.stated.rangeKm),
      (width / rms).toFixed(2).padStart(6),
    ];
    process.stdout.write(
      `  ${from}–${from + 99} ${String(own.length).padStart(4)} ${texts.join("")}   ${statement.join(" ")}\n`,
    );
  }
}
