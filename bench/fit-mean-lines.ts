/**
 * Fits the mean lines of `src/drift/mean-line.ts` and the line of `src/drift/perihelion-longitude.ts` to DE405 as JPL made it.
 *
 *     npx tsx bench/fit-mean-lines.ts
 *
 * Prints the entries of the tables. One line per pair and kind, by least squares through all passages from 1960-01-01 to 2060-01-01
 * (TDB), found by the independent reader in `test/de405`; passage number 0 is the one nearest to J2000.
 */
import { meanEclipticLongitude } from "../src/drift/ecliptic.ts";
import { openDe405 } from "../test/de405/read.ts";
import { type TruePassage, truePassages } from "../test/de405/true-passages.ts";

const DAY = 86_400;
const CENTURY = 36_525 * DAY;
const PAIRS = ["emb-sun", "moon-earth", "mercury-sun", "venus-sun", "mars-sun", "jupiter-sun"];

/** Least squares: the intercept at x = 0 and the slope. */
function straightLine(points: readonly (readonly [number, number])[]): { intercept: number; slope: number } {
  const n = points.length;
  const meanX = points.reduce((sum, [x]) => sum + x, 0) / n;
  const meanY = points.reduce((sum, [, y]) => sum + y, 0) / n;
  const xx = points.reduce((sum, [x]) => sum + (x - meanX) ** 2, 0);
  const xy = points.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0);
  return { slope: xy / xx, intercept: meanY - (xy / xx) * meanX };
}

function meanLine(passages: readonly TruePassage[]): { slopeDays: number; interceptSeconds: number } {
  const nearest = passages.reduce(
    (best, { tdb }, k) => (Math.abs(tdb) < Math.abs(passages[best]?.tdb ?? Infinity) ? k : best),
    0,
  );
  const { intercept, slope } = straightLine(passages.map(({ tdb }, k) => [k - nearest, tdb]));
  return { slopeDays: slope / DAY, interceptSeconds: intercept };
}

const de405 = openDe405();
for (const pair of PAIRS) {
  const [periapsis, apoapsis] = (["periapsis", "apoapsis"] as const).map((kind) => {
    const { slopeDays, interceptSeconds } = meanLine(
      truePassages(pair, de405).filter((passage) => passage.kind === kind),
    );
    return `[${slopeDays.toFixed(10)}, ${interceptSeconds.toFixed(3)}]`;
  });
  process.stdout.write(`  "${pair}": { periapsis: ${periapsis}, apoapsis: ${apoapsis} },\n`);
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
