/**
 * Fits the mean lines of `src/drift/mean-line.ts` and the line of `src/drift/perihelion-longitude.ts` to DE405 as JPL made it.
 *
 *     npx tsx bench/fit-mean-lines.ts
 *
 * Prints the entries of the tables. One line per pair and kind, by least squares through all passages from 1960-01-01 to 2060-01-01
 * (TDB), found by the independent reader in `test/de405`; for Jupiter to Neptune through the principal passages of the years 1001 to 2998,
 * from the series. Passage number 0 is the one nearest to J2000.
 */
import type { PairName } from "../src/bodies/pair.ts";
import { meanEclipticLongitude } from "../src/drift/ecliptic.ts";
import { openSources } from "../src/node.ts";
import { passages } from "../src/passages/passages.ts";
import { openDe405 } from "../test/de405/read.ts";
import { truePassages } from "../test/de405/true-passages.ts";

const DAY = 86_400;
const CENTURY = 36_525 * DAY;
const PAIRS: readonly PairName[] = ["emb-sun", "moon-earth", "mercury-sun", "venus-sun", "mars-sun"];
const OUTER_PAIRS: readonly PairName[] = ["jupiter-sun", "saturn-sun", "uranus-sun", "neptune-sun"];
const KINDS = ["periapsis", "apoapsis"] as const;

/** Least squares: the intercept at x = 0 and the slope. */
function straightLine(points: readonly (readonly [number, number])[]): { intercept: number; slope: number } {
  const n = points.length;
  const meanX = points.reduce((sum, [x]) => sum + x, 0) / n;
  const meanY = points.reduce((sum, [, y]) => sum + y, 0) / n;
  const xx = points.reduce((sum, [x]) => sum + (x - meanX) ** 2, 0);
  const xy = points.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0);
  return { slope: xy / xx, intercept: meanY - (xy / xx) * meanX };
}

/** Gives an entry of the table. */
function meanLine(instants: readonly number[]): string {
  const nearest = instants.reduce(
    (best, tdb, k) => (Math.abs(tdb) < Math.abs(instants[best] ?? Infinity) ? k : best),
    0,
  );
  const { intercept, slope } = straightLine(instants.map((tdb, k) => [k - nearest, tdb]));
  return `[${(slope / DAY).toFixed(10)}, ${intercept.toFixed(3)}]`;
}

function entry(pair: PairName, [periapsis, apoapsis]: readonly (readonly number[])[]): void {
  process.stdout.write(
    `  "${pair}": { periapsis: ${meanLine(periapsis ?? [])}, apoapsis: ${meanLine(apoapsis ?? [])} },\n`,
  );
}

const de405 = openDe405();
for (const pair of PAIRS) {
  const found = truePassages(pair, de405);
  entry(
    pair,
    KINDS.map((kind) => found.filter((passage) => passage.kind === kind).map(({ tdb }) => tdb)),
  );
}
const ephemeris = await openSources();
for (const pair of OUTER_PAIRS) {
  const query = { from: "1001", to: "2999", rank: "principal", source: "series" } as const;
  const found = [...passages(ephemeris, pair, query)];
  entry(
    pair,
    KINDS.map((kind) => found.filter((passage) => passage.kind === kind).map(({ tdbSeconds }) => tdbSeconds)),
  );
}

const state = new Float64Array(9);
const longitudes = truePassages("emb-sun", de405).map(({ kind, tdb }): [number, number] => {
  de405.pairState("emb-sun", tdb, state);
  const [x = 0, y = 0, z = 0] = state;
  const towards = kind === "periapsis" ? -1 : 1; // the Sun's perigee as seen from the barycentre
  return [tdb / CENTURY, meanEclipticLongitude(towards * x, towards * y, towards * z, tdb)];
});
const { intercept, slope } = straightLine(longitudes);
process.stdout.write(
  `longitude of perihelion: ${intercept.toFixed(5)} + ${slope.toFixed(5)} T degrees, T in Julian centuries past J2000\n`,
);
