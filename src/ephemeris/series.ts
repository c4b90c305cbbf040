import type { Pair } from "../bodies/pair.ts";
import { POINTS, pointLabel } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
import { seriesAccuracy } from "./series-accuracy.ts";
import { embFromSun } from "./series-emb.ts";
import { type PoissonSeries, readSeriesFile } from "./series-file.ts";
import { moonFromEarth } from "./series-moon.ts";
import { planetFromSun } from "./series-planet.ts";
import type { StateWriter } from "./series-spherical.ts";
import { sunFromBarycentre } from "./series-sun.ts";
import { sha256 } from "./sha256.ts";
import type { Motion, Source, Span } from "./source.ts";

/** The bytes of the two files of series. */
export interface SeriesBytes {
  /** `planets.series.bin`: VSOP87, version B. */
  readonly planets: Uint8Array;
  /** `moon.series.bin`: ELP/MPP02. */
  readonly moon: Uint8Array;
}

/**
 * TDB seconds past J2000 of 999-12-31T00:00 and 3001-01-02T00:00 (proleptic Gregorian): the years 1000 to 3000 on any
 * clock, UT and zones included.
 */
const SPAN: Span = Object.freeze({ from: -31_557_038_400, to: 31_588_574_400 });

const PLANETS = ["mercury", "venus", "earth", "mars", "jupiter", "saturn", "uranus", "neptune"] as const;

/**
 * Opens the published theories VSOP87 and ELP/MPP02 as a source for the years 1000 to 3000.
 *
 * Supplied are `moon-earth` and Mercury to Neptune, the Earth and the Earth–Moon barycentre from the Sun and from the
 * solar-system barycentre, with analytic velocities. `earth` is VSOP87's own Earth; `emb` is that and the Moon's
 * place divided by 1 + 81.30056, DE405's ratio of masses. Not supplied: Pluto, which the theories do not hold, and
 * the moons of Jupiter.
 *
 * @param bytes the two files, as the package carries them
 * @throws ApsidaryError `bad-kernel` where they are not what they should be
 *
 * Sources: see `planetFromSun`, `moonFromEarth`, `sunFromBarycentre`; how far they are trusted: `seriesAccuracy`.
 */
export function openSeries(bytes: SeriesBytes): Source {
  const planets = readSeriesFile(bytes.planets, "the series of the planets");
  const moon = readSeriesFile(bytes.moon, "the series of the Moon").get("moon");
  for (const name of PLANETS) if (!planets.has(name)) throw missing("planets", name);
  if (!moon) throw missing("moon", "moon");
  const writers = writersOf(planets, moon);
  const none: readonly Span[] = Object.freeze([]);
  const whole: readonly Span[] = Object.freeze([SPAN]);
  return Object.freeze({
    id: "series",
    kind: "series",
    title: "the series VSOP87 and ELP/MPP02",
    spans: (pair: Pair) => (writers.has(pair.name) ? whole : none),
    motion(pair: Pair) {
      const make = writers.get(pair.name);
      if (make) return motionOf(make());
      throw new ApsidaryError(
        "not-supplied",
        `the series do not hold ${pointLabel(pair.target)} as seen from ${pointLabel(pair.centre)}; ` +
          "they hold moon-earth and Mercury to Neptune, the Earth and the EMB from the Sun or the SSB.",
      );
    },
    accuracy: seriesAccuracy,
    checksum: () => sha256(bytes.planets, bytes.moon),
    describe: () => descriptionOf(planets, moon),
  });
}

function missing(file: string, name: string): ApsidaryError {
  return new ApsidaryError(
    "bad-kernel",
    `${file}.series.bin holds no series "${name}"; give the file as the package carries it.`,
  );
}

/** By name of the pair, what makes a writer of its states with working space of its own. */
function writersOf(
  planets: ReadonlyMap<string, PoissonSeries>,
  moon: PoissonSeries,
): ReadonlyMap<string, () => StateWriter> {
  const fromSun = new Map<string, () => StateWriter>();
  for (const name of PLANETS) {
    const series = planets.get(name);
    if (series) fromSun.set(name, () => planetFromSun(series));
  }
  const earth = planets.get("earth");
  if (earth) fromSun.set("emb", () => embFromSun(earth, moon));
  const writers = new Map<string, () => StateWriter>([["moon-earth", () => moonFromEarth(moon)]]);
  for (const [name, make] of fromSun) {
    writers.set(`${name}-sun`, make);
    writers.set(`${name}-ssb`, () => sumOf(make(), sunFromBarycentre(planets)));
  }
  return writers;
}

function sumOf(a: StateWriter, b: StateWriter): StateWriter {
  const second = new Float64Array(6);
  return (tdb, out) => {
    a(tdb, out);
    b(tdb, second);
    for (let i = 0; i < 6; i++) out[i] = (out[i] as number) + (second[i] as number);
  };
}

function motionOf(write: StateWriter): Motion {
  return { givesVelocity: true, state: write };
}

function descriptionOf(planets: ReadonlyMap<string, PoissonSeries>, moon: PoissonSeries): string {
  const row = (series: PoissonSeries, centre: number) => {
    const terms = series.blocks.reduce((n, block) => n + block.places.length, 0);
    return `  ${series.name} about ${pointLabel(centre)}: ${terms} terms in ${series.bases - 1 + series.first.length} arguments`;
  };
  return [
    "the series VSOP87 (version B, all terms) and ELP/MPP02 (constants fitted to DE405), years 1000 to 3000",
    ...[...planets.values()].map((series) => row(series, POINTS.sun)),
    row(moon, POINTS.earth),
  ].join("\n");
}
