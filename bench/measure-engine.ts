/**
 * Measures what astronomy-engine is worth, pair by pair, and prints the table that `src/ephemeris/engine-accuracy.ts` carries.
 *
 *     npx tsx bench/measure-engine.ts [pair …]
 *
 * 1960–2059: against JPL's DE405, at its passages. The error of the range rate is the error of the instant times the
 * range acceleration at the engine's passage, brought to the mean distance (see `engineAccuracy`). Pairs with 200 passages and
 * more: what 96 % of these errors keep. Fewer: the larger of the greatest of them and what 95 % of the errors at 4000
 * instants of the century keep. Distance: the same, but those 4000 instants always count, as distances are asked for
 * at any time.
 *
 * Other centuries: against the complete VSOP87B (P. Bretagnon and G. Francou, Astron. Astrophys. 202 (1988) 309) and
 * ELP/MPP02 (J. Chapront and G. Francou, Astron. Astrophys. 404 (2003) 735) of the package `astronomia`, at the engine's own
 * passages in windows of a century or twenty periods: what 95 % of the errors keep around 2010, where it is more than
 * 1.25 times the figure against DE405, and the least growth that covers the other epochs.
 *
 * Moons of Jupiter: against J. H. Lieske's theory E5 as given in J. Meeus, Astronomical Algorithms (2nd ed., 1998),
 * ch. 44, of the same package.
 *
 * It needs DE405 (see test/de405/fetch.ts) and some ten minutes.
 */
import { DAY_SECONDS } from "../src/bodies/constants.ts";
import { allPairs, type Pair } from "../src/bodies/pair.ts";
import { openEngine } from "../src/ephemeris/engine.ts";
import { ENGINE_FIGURES } from "../src/ephemeris/engine-accuracy.ts";
import { brentZero } from "../src/numeric/brent-zero.ts";
import { type RangeFunction, rangeFunction } from "../src/passages/range-function.ts";
import { type Extremum, scanExtrema } from "../src/passages/scan-extrema.ts";
import { openDe405 } from "../test/de405/read.ts";
import { TRUE_FROM, TRUE_TO, truePassages } from "../test/de405/true-passages.ts";

const AU = 149_597_870.7;
const CENTURY = 36_525 * DAY_SECONDS;
const MIDDLE = 0.1 * CENTURY;
/** By how much half-widths are widened at least where nothing holds them to DE405. */
const OUTSIDE = 1.25;
const OUTSIDE_PLUTO = 2;

/** Errors of distance (km) and of range rate (km/s, at the mean distance). */
interface Errors {
  readonly range: number[];
  readonly rate: number[];
}

const only = process.argv.slice(2);
const engine = await openEngine();
const de405 = openDe405();
const theory = await openTheories();

for (const pair of allPairs()) {
  if (only.length > 0 && !only.includes(pair.name)) continue;
  const began = performance.now();
  const range = rangeFunction(engine.motion(pair), pair.name);
  const figures = ENGINE_FIGURES[pair.name];
  const [first, last] = figures.years;
  const mean = meanDistance(pair, range);
  const jovian = pair.name.endsWith("-jupiter");
  const base = jovian ? againstE5(pair, range, mean) : againstDe405(pair, range, mean);
  const powers = figures.powers ?? [2, 2];
  const growth = { before: [0, 0], after: [0, 0] };
  const pluto = pair.name.startsWith("pluto"); // which no theory of the package reaches
  const widened = pluto ? OUTSIDE_PLUTO : OUTSIDE;
  const outside = [widened * base.range, widened * base.rate];
  if (!pluto) {
    const errors = atEpoch(pair, range, mean, MIDDLE);
    outside[0] = Math.max(outside[0] ?? 0, quantile(errors.range, 0.95));
    outside[1] = Math.max(outside[1] ?? 0, quantile(errors.rate, 0.95));
    for (let year = first; year <= last; year += jovian ? 50 : 250) {
      const centuries = Math.abs(year - 2010) / 100;
      if (centuries < 0.6) continue;
      const errors = atEpoch(pair, range, mean, (year - 2000) * 0.01 * CENTURY);
      const side = year < 2010 ? growth.before : growth.after;
      side[0] = Math.max(side[0] ?? 0, (quantile(errors.range, 0.95) - (outside[0] ?? 0)) / centuries ** powers[0]);
      side[1] = Math.max(side[1] ?? 0, (quantile(errors.rate, 0.95) - (outside[1] ?? 0)) / centuries ** powers[1]);
    }
  }
  const text = (value: number) => (value === 0 ? "0" : ceiling(value).toExponential(1).replace("+", ""));
  console.log(
    `  "${pair.name}": { years: [${first}, ${last}], mean: ${(mean / AU).toPrecision(4)}, range: ${ceiling(base.range)}, ` +
      `rate: ${text(base.rate)}, outside: [${text(outside[0] ?? 0)}, ${text(outside[1] ?? 0)}], before: [${growth.before.map(text).join(", ")}], after: [${growth.after.map(text).join(", ")}] },` +
      ` // ${base.note}, ${((performance.now() - began) / 1000).toFixed(0)} s`,
  );
}

/** Half the sum of the mean distances at periapses and at apoapses of a century or more. */
function meanDistance(pair: Pair, range: RangeFunction): number {
  const sums = { periapsis: [0, 0], apoapsis: [0, 0] };
  const half = Math.max(2 * pair.halfPeriodSeconds, Math.min(CENTURY / 2, 400 * pair.halfPeriodSeconds));
  const next = scanExtrema(range, { from: MIDDLE - half, to: MIDDLE + half }, pair, MIDDLE - half);
  for (let found = next(); found; found = next()) {
    const sum = sums[found.kind];
    sum[0] = (sum[0] ?? 0) + range.distance(found.tdb);
    sum[1] = (sum[1] ?? 0) + 1;
  }
  const of = ([total = 0, count = 0]: number[]) => total / count;
  return (of(sums.periapsis) + of(sums.apoapsis)) / 2;
}

/** Errors against DE405 from 1960 to 2059, and how they bear on time and distance. */
function againstDe405(pair: Pair, range: RangeFunction, mean: number): { range: number; rate: number; note: string } {
  const truths = truePassages(pair.name, de405);
  const errors: Errors = { range: [], rate: [] };
  const seconds: number[] = [];
  const widths: number[] = []; // for a rate of one
  const measures = new Float64Array(2);
  for (const truth of truths) {
    const tdb = passageNear(range, truth.tdb, truth.kind === "periapsis");
    range.measure(tdb, measures);
    const [distance = 0, acceleration = 0] = measures;
    const scale = (distance / mean) ** 2;
    errors.range.push(Math.abs(distance - truth.distanceKm));
    errors.rate.push(Math.abs((tdb - truth.tdb) * acceleration) * scale);
    seconds.push(Math.abs(tdb - truth.tdb));
    widths.push(1 / Math.abs(acceleration) / scale);
  }
  const everywhere: Errors = { range: [], rate: [] };
  const s = new Float64Array(9);
  for (let i = 0; i < 4000; i++) {
    const tdb = TRUE_FROM + ((i + 0.5) / 4000) * (TRUE_TO - TRUE_FROM);
    de405.pairState(pair.name, tdb, s);
    const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0] = s;
    const distance = Math.hypot(x, y, z);
    everywhere.range.push(Math.abs(range.distance(tdb) - distance));
    everywhere.rate.push(Math.abs(range.rate(tdb) - (x * vx + y * vy + z * vz) / distance) * (distance / mean) ** 2);
  }
  const many = truths.length >= 200;
  const rangeKm = Math.max(quantile(errors.range, many ? 0.96 : 1), quantile(everywhere.range, 0.95));
  const rate = many ? quantile(errors.rate, 0.96) : Math.max(...errors.rate, quantile(everywhere.rate, 0.95));
  const rms = (values: number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
  const median = quantile(widths, 0.5) * rate;
  const note =
    `${truths.length} passages: time rms ${(rms(seconds) / 3600).toPrecision(3)} h, max ${(Math.max(...seconds) / 3600).toPrecision(3)} h, ` +
    `median width ${(median / rms(seconds)).toPrecision(3)} rms; distance rms ${rms(errors.range).toPrecision(3)} km, ` +
    `width ${(rangeKm / rms(errors.range)).toPrecision(3)} rms`;
  return { range: rangeKm, rate, note };
}

/** Differences from E5 from 1960 to 2059. */
function againstE5(pair: Pair, range: RangeFunction, mean: number): { range: number; rate: number; note: string } {
  const worst = { range: 0, rate: 0 };
  for (let year = 1960; year <= 2060; year += 10) {
    const errors = atEpoch(pair, range, mean, (year - 2000) * 0.01 * CENTURY);
    worst.range = Math.max(worst.range, quantile(errors.range, 0.95));
    worst.rate = Math.max(worst.rate, quantile(errors.rate, 0.95));
  }
  const everywhere: number[] = [];
  for (let i = 0; i < 4000; i++) {
    const tdb = TRUE_FROM + ((i + 0.5) / 4000) * (TRUE_TO - TRUE_FROM);
    everywhere.push(Math.abs(theory(pair, tdb)[0] - range.distance(tdb)));
  }
  worst.range = Math.max(worst.range, quantile(everywhere, 0.95));
  return { ...worst, note: "against E5" };
}

/** Errors against the theories at up to 80 of the engine's passages around an epoch. */
function atEpoch(pair: Pair, range: RangeFunction, mean: number, epoch: number): Errors {
  const errors: Errors = { range: [], rate: [] };
  const measures = new Float64Array(2);
  for (const { tdb } of passagesAround(pair, range, epoch)) {
    const [distance, rate] = theory(pair, tdb);
    range.measure(tdb, measures);
    errors.range.push(Math.abs(distance - (measures[0] ?? 0)));
    errors.rate.push(Math.abs(rate) * (distance / mean) ** 2);
  }
  return errors;
}

/** Patches of two passages each, spread over half a century either side, or over ten periods where that is more. */
function passagesAround(pair: Pair, range: RangeFunction, epoch: number): Extremum[] {
  const half = Math.max(CENTURY / 2, 20 * pair.halfPeriodSeconds);
  const found: Extremum[] = [];
  for (let i = 0; i < 40; i++) {
    const from = epoch - half + ((2 * i) / 40) * half;
    const next = scanExtrema(range, { from, to: from + 12 * pair.halfPeriodSeconds }, pair, from);
    for (let j = 0; j < 2; j++) {
      const extremum = next();
      if (extremum) found.push(extremum);
    }
  }
  return found;
}

/** The engine's passage of a kind nearest to an instant: where its range rate changes sign the right way. */
function passageNear(range: RangeFunction, tdb: number, periapsis: boolean): number {
  const sign = periapsis ? 1 : -1;
  const rate = (t: number) => sign * range.rate(t);
  for (let reach = 1800; reach < 4 * CENTURY; reach *= 1.5) {
    const before = rate(tdb - reach);
    const after = rate(tdb + reach);
    if (before < 0 && after > 0) return brentZero(rate, tdb - reach, before, tdb + reach, after, 0.01);
  }
  throw new Error("the engine has no such passage");
}

function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.ceil(share * sorted.length) - 1] ?? Number.NaN;
}

/** Rounds up to two figures. */
function ceiling(value: number): number {
  const unit = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Number((Math.ceil(value / unit - 1e-9) * unit).toPrecision(2));
}

/** Opens the theories: distance (km) and range rate (km/s) of a pair. */
async function openTheories(): Promise<(pair: Pair, tdb: number) => readonly [number, number]> {
  // biome-ignore lint/suspicious/noExplicitAny: the package has no types
  const load = async (name: string): Promise<any> => import(name);
  const { base, elp, jupitermoons } = await load("astronomia");
  const { default: planets } = await load("astronomia/data");
  const { default: moonTerms } = await load("astronomia/data/elpMppDeFull");
  const { default: moonTermsShort } = await load("astronomia/data/elpMppDe"); // for the EMB, which has 1/82 of its error
  type Vector = [number, number, number];

  /** Sun's mass over the planet's with its moons: those of DE405, from memory. */
  const MASSES = {
    mercury: 6_023_600,
    venus: 408_523.71,
    earth: 328_900.56,
    mars: 3_098_708,
    jupiter: 1047.3486,
    saturn: 3497.898,
    uranus: 22_902.98,
    neptune: 19_412.24,
  };
  type Planet = keyof typeof MASSES;
  const series = new Map<string, Float64Array[]>();
  const sum = (planet: Planet, letter: "L" | "B" | "R", t: number): number => {
    const key = planet + letter;
    let powers = series.get(key);
    if (!powers) {
      const tables: Record<string, number[][]> = planets[`vsop87B${planet}`][letter];
      powers = Object.values(tables).map((rows) => Float64Array.from(rows.flat()));
      series.set(key, powers);
    }
    let total = 0;
    let power = 1;
    for (const terms of powers) {
      for (let i = 0; i < terms.length; i += 3) {
        total += power * (terms[i] as number) * Math.cos((terms[i + 1] as number) + (terms[i + 2] as number) * t);
      }
      power *= t;
    }
    return total;
  };
  const fromSun = (planet: Planet, days: number): Vector => {
    const t = days / 365_250;
    const l = sum(planet, "L", t);
    const b = sum(planet, "B", t);
    const r = sum(planet, "R", t) * AU;
    return [r * Math.cos(b) * Math.cos(l), r * Math.cos(b) * Math.sin(l), r * Math.sin(b)];
  };
  const barycentre = (days: number): Vector => {
    const out: Vector = [0, 0, 0];
    let mass = 1;
    for (const [planet, ratio] of Object.entries(MASSES)) {
      const at = fromSun(planet as Planet, days);
      for (const i of [0, 1, 2] as const) out[i] += at[i] / ratio;
      mass += 1 / ratio;
    }
    return [out[0] / mass, out[1] / mass, out[2] / mass];
  };
  const moonTheory = new elp.Moon(moonTerms);
  const moonTheoryShort = new elp.Moon(moonTermsShort);
  const moon = (from: typeof moonTheory, days: number): Vector => {
    const { x, y, z } = from.positionXYZ(2_451_545 + days);
    return [x, y, z];
  };

  // E5 gives what is seen from the Earth, in Jupiter's radii. Seen from 10⁵ au, perspective is gone; what light takes across the
  // system is taken out again, and what is left is a turned copy of the positions about Jupiter.
  const FAR = 1e5;
  const observer = { position: () => ({ lon: 0, lat: 0, range: 0 }) };
  const jupiter = { position: () => ({ lon: 0, lat: 0, range: FAR }) };
  const lightDays: number = base.lightTime(FAR);
  const JOVIAN = ["io", "europa", "ganymede", "callisto"];
  const LIGHT = [17_295, 21_819, 27_558, 36_548];
  const e5 = (index: number, days: number): number => {
    const { x, y, z } = jupitermoons.e5(2_451_545 + days + lightDays, observer, jupiter)[index];
    let radius = Math.hypot(x, y, z);
    for (let i = 0; i < 3; i++) {
      const across = x - (Math.abs(z) / (LIGHT[index] ?? 1)) * Math.sqrt(Math.max(0, 1 - (x / radius) ** 2));
      radius = Math.hypot(across, y, z);
    }
    return radius;
  };
  const radii = new Map<string, number>();

  const distanceOf = (pair: Pair): ((days: number) => number) => {
    const [target = "", centre] = pair.name.split("-");
    const norm = ([x, y, z]: Vector) => Math.hypot(x, y, z);
    if (centre === "jupiter") {
      const index = JOVIAN.indexOf(target);
      let radius = radii.get(target); // E5's unit of length, so that both theories have the same mean distance
      if (radius === undefined) {
        let total = 0;
        for (let i = 0; i < 5000; i++) total += e5(index, 3652 - 18_262 + i * 7.3053);
        let own = 0;
        const range = rangeFunction(engine.motion(pair), pair.name);
        for (let i = 0; i < 5000; i++) own += range.distance((3652 - 18_262 + i * 7.3053) * DAY_SECONDS);
        radius = own / total;
        radii.set(target, radius);
      }
      const unit = radius;
      return (days) => e5(index, days) * unit;
    }
    if (target === "moon") return (days) => norm(moon(moonTheory, days));
    return (days) => {
      const at = fromSun(target === "emb" ? "earth" : (target as Planet), days);
      if (target === "emb") {
        const m = moon(moonTheoryShort, days);
        for (const i of [0, 1, 2] as const) at[i] += m[i] / 82.30056;
      }
      if (centre === "ssb") {
        const ssb = barycentre(days);
        for (const i of [0, 1, 2] as const) at[i] -= ssb[i];
      }
      return norm(at);
    };
  };
  return (pair, tdb) => {
    const distance = distanceOf(pair);
    const days = tdb / DAY_SECONDS;
    const h = pair.halfPeriodSeconds / DAY_SECONDS / 600;
    const rate =
      (distance(days - 2 * h) - 8 * distance(days - h) + 8 * distance(days + h) - distance(days + 2 * h)) /
      (12 * h * DAY_SECONDS);
    return [distance(days), rate];
  };
}
