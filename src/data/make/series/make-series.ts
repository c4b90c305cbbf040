/**
 * Makes `planets.series.bin` and `moon.series.bin` from the theories that the npm package `astronomia` carries.
 *
 *     npx tsx src/data/make/series/make-series.ts [folder]
 *
 * All terms of VSOP87B are kept. Of ELP/MPP02 those are kept that reach, anywhere in ±10 centuries,
 * `MOON_DISTANCE_KM` in the distance (those faster than once a month sooner, slower ones later, since passages hang
 * on the rate) or `MOON_DIRECTION_KM` across it.
 */
import { writeFileSync } from "node:fs";
import { argumentChain } from "./argument-chain.ts";
import { type Argument, elpMpp02Terms, PLANETS, vsop87Terms } from "./theories.ts";
import { type SeriesToWrite, writeSeriesFile } from "./write-series-file.ts";

const MOON_DISTANCE_KM = 0.0005;
const MOON_DIRECTION_KM = 0.01;
const MEAN_DISTANCE_KM = 385_000;

/** Mean motion of the Moon, rad a century, by which terms of the distance are weighed. */
const MOON_RATE = 8399.7;

/**
 * Rates of the mean longitudes of Mercury … Neptune and of D, F, l, rad per thousand Julian years: P. Bretagnon and
 * G. Francou, Astron. Astrophys. 202 (1988) 309, as the frequencies of the theory's own terms have them.
 */
const VSOP87_RATES = [
  26087.9031415742, 10213.285546211, 6283.0758499914, 3340.6124266998, 529.6909650946, 213.299095438, 74.7815985673,
  38.1330356378, 77713.7714681205, 84334.6615813083, 83286.9142695536,
];

/**
 * Rates of D, F, l, l′ (rad per powers of a century), as the theory's own terms have them, and of the mean longitudes
 * of Mercury … Neptune (arcseconds a century): M. Chapront-Touzé and J. Chapront, Astron. Astrophys. 190 (1988) 342.
 * They only help to find sums: each argument is kept to the tolerance given.
 */
const ELP_RATES = [
  [7771.377144990897, -0.000033091588061916815, 3.105886125976076e-8, -2.0400959701089275e-10],
  [8433.4661574916, -0.00006400616537648361, -5.345216278336967e-9, -2.942819044334885e-11],
  [8328.69142462345, 0.00015229240776232618, 2.507188741546547e-7, -1.2359839986206508e-9],
  [628.3019552140604, -0.0000026638814929085117, 6.163921141626641e-10, -5.44397282517898e-11],
];
const ELP_PLANET_RATES = [
  538101628.68898, 210664136.43355, 129597742.2758, 68905077.59284, 10925660.42861, 4399609.65932, 1542481.19393,
  786550.32074,
];

function series(
  name: string,
  theory: readonly Argument[],
  seeds: readonly { rates: readonly number[]; multiples: number }[],
  reach: number,
  /** Greatest error that the joining of arguments may make, in the unit of each variable. */
  slack: readonly number[],
  wideAbove: readonly number[],
): SeriesToWrite {
  const size = (a: Argument) =>
    Math.max(...a.entries.map((e) => (Math.hypot(e.cosine, e.sine) * reach ** e.power) / (slack[e.variable] ?? 1)));
  const sorted = [...theory].sort((a, b) => size(b) - size(a));
  const wanted = sorted.map((a) => ({ rates: a.rates, tolerance: Math.min(1e-4, 1 / size(a)) }));
  const { points, places } = argumentChain(wanted, seeds, reach);
  const entries = sorted.flatMap((a, i) => a.entries.map((e) => ({ ...e, place: places[i] ?? 0 })));
  const bases = points.filter((point) => "rates" in point).length;
  process.stdout.write(
    `${name}: ${theory.length} arguments, ${entries.length} entries; ${bases} bases, ${points.length - bases} sums\n`,
  );
  return { name, degree: sorted[0]?.rates.length ?? 1, points, entries, wideAbove };
}

function keptOfMoon(theory: readonly Argument[]): Argument[] {
  const weigh = (a: Argument) => Math.min(Math.max((a.rates[0] ?? 0) / MOON_RATE, 0.3), 3);
  return theory.flatMap((a) => {
    const entries = a.entries.filter((e) => {
      const amplitude = Math.hypot(e.cosine, e.sine) * 10 ** e.power;
      return e.variable === 2
        ? amplitude * weigh(a) > MOON_DISTANCE_KM
        : amplitude * MEAN_DISTANCE_KM > MOON_DIRECTION_KM;
    });
    return entries.length > 0 ? [{ rates: a.rates, entries }] : [];
  });
}

const folder = process.argv[2] ?? new URL("../../", import.meta.url).pathname;
const vsopSeeds = VSOP87_RATES.map((rate, i) => ({ rates: [rate], multiples: i < 8 ? 30 : 4 }));
const planets: SeriesToWrite[] = [];
for (const planet of PLANETS) {
  planets.push(series(planet, await vsop87Terms(planet), vsopSeeds, 1, [1e-12, 1e-12, 1e-12], [1e-5, 1e-5, 1e-5]));
}
const elpSeeds = [
  ...ELP_RATES.map((rates) => ({ rates, multiples: 10 })),
  ...ELP_PLANET_RATES.map((rate) => ({ rates: [(rate * Math.PI) / 648_000, 0, 0, 0], multiples: 24 })),
];
const moon = series("moon", keptOfMoon(await elpMpp02Terms()), elpSeeds, 10, [1e-10, 1e-10, 1e-5], [1e-5, 1e-5, 10]);
for (const [file, bytes] of [
  ["planets.series.bin", writeSeriesFile(planets)],
  ["moon.series.bin", writeSeriesFile([moon])],
] as const) {
  writeFileSync(`${folder}/${file}`, bytes);
  process.stdout.write(`${file}: ${bytes.length} bytes\n`);
}
