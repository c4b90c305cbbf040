import { readFileSync } from "node:fs";
import { fetchDe405 } from "./fetch.ts";

/** Points of DE405; `moon-geocentric` is the Moon as seen from the Earth's centre, all others are seen from the solar-system barycentre. */
export type De405Point =
  | "mercury"
  | "venus"
  | "earth"
  | "emb"
  | "moon"
  | "moon-geocentric"
  | "mars"
  | "jupiter"
  | "saturn"
  | "uranus"
  | "neptune"
  | "pluto"
  | "sun"
  | "ssb";

/** The original DE405, evaluated. Times in TDB seconds past J2000; states are x, y, z (km), rates (km/s), second derivatives (km/s²). */
export interface De405 {
  /** Span of the table. */
  readonly from: number;
  readonly to: number;
  /** Gives a point's state from the solar-system barycentre (`moon-geocentric`: from the Earth). */
  state(point: De405Point, tdb: number, out?: Float64Array): Float64Array;
  /** Gives the state of the moving point of a pair from its centre: `earth-sun`, `moon-earth`, `neptune-ssb` … */
  pairState(pair: string, tdb: number, out?: Float64Array): Float64Array;
}

/** JPL's AU in DE405, km, and its ratio of the masses of the Earth and the Moon. */
export const DE405_AU_KM = 149597870.691;
export const DE405_EARTH_MOON_RATIO = 81.30056;

// Layout of Debian's table.f0i: rows of 32 days, each 1018 little-endian doubles, from JD 2436912.5 (TDB) on.
const ROWS = 1143;
const ROW_DOUBLES = 1018;
const ROW_BYTES = 8160;
const FIRST_ROW_BYTE = 28;
const ROW_SECONDS = 32 * 86400;
const FROM = (2436912.5 - 2451545.0) * 86400;
const TO = FROM + ROWS * ROW_SECONDS;

/** By series: place of the first coefficient in a row, coefficients a component, sub-intervals a row (the usual layout of DE405). */
const LAYOUT = {
  mercury: [0, 14, 4],
  venus: [168, 10, 2],
  emb: [228, 13, 2],
  mars: [306, 11, 1],
  jupiter: [339, 8, 1],
  saturn: [363, 7, 1],
  uranus: [384, 6, 1],
  neptune: [402, 6, 1],
  pluto: [420, 6, 1],
  "moon-geocentric": [438, 13, 8],
  sun: [750, 11, 2],
} as const satisfies Partial<Record<De405Point, readonly [number, number, number]>>;

type Series = keyof typeof LAYOUT;

/**
 * Opens DE405 as JPL made it, from Debian's package `casacore-data-jpl-de405`.
 *
 * It shares no code with the product: rows are decoded here, and the series are summed from the polynomials themselves
 * (forward recurrence for T, T′ and T″).
 *
 * @param path of `table.f0i`; left out, it is found or downloaded
 * @throws Error where the file is not that table; RangeError for a time outside its span
 */
export function openDe405(path: string = fetchDe405()): De405 {
  const bytes = readFileSync(path);
  if (bytes.length < FIRST_ROW_BYTE + ROWS * ROW_BYTES - (ROW_BYTES - 8 * ROW_DOUBLES)) {
    throw new Error(`${path} has ${bytes.length} bytes and is not the table of DE405.`);
  }
  const coefficients = new Float64Array(ROWS * ROW_DOUBLES);
  for (let row = 0; row < ROWS; row++) {
    for (let i = 0; i < ROW_DOUBLES; i++) {
      coefficients[row * ROW_DOUBLES + i] = bytes.readDoubleLE(FIRST_ROW_BYTE + row * ROW_BYTES + 8 * i);
    }
  }
  const t0 = new Float64Array(14);
  const t1 = new Float64Array(14);
  const t2 = new Float64Array(14);
  const other = new Float64Array(9);

  /** Adds `weight` times a series to `out`. */
  const add = (series: Series, tdb: number, weight: number, out: Float64Array): void => {
    if (!(tdb >= FROM && tdb <= TO))
      throw new RangeError(`DE405's table covers ${FROM} to ${TO} s past J2000, not ${tdb}.`);
    const [start, n, parts] = LAYOUT[series];
    const partSeconds = ROW_SECONDS / parts;
    const index = Math.min(Math.floor((tdb - FROM) / partSeconds), ROWS * parts - 1);
    const s = (2 * (tdb - FROM - index * partSeconds)) / partSeconds - 1;
    const rate = 2 / partSeconds;
    const row = Math.floor(index / parts);
    const first = row * ROW_DOUBLES + start + (index - row * parts) * 3 * n;
    t0[0] = 1;
    t0[1] = s;
    t1[0] = 0;
    t1[1] = 1;
    t2[0] = 0;
    t2[1] = 0;
    for (let k = 2; k < n; k++) {
      t0[k] = 2 * s * (t0[k - 1] as number) - (t0[k - 2] as number);
      t1[k] = 2 * s * (t1[k - 1] as number) + 2 * (t0[k - 1] as number) - (t1[k - 2] as number);
      t2[k] = 2 * s * (t2[k - 1] as number) + 4 * (t1[k - 1] as number) - (t2[k - 2] as number);
    }
    for (let axis = 0; axis < 3; axis++) {
      let x = 0;
      let v = 0;
      let a = 0;
      for (let k = n - 1; k >= 0; k--) {
        const c = coefficients[first + axis * n + k] as number;
        x += c * (t0[k] as number);
        v += c * (t1[k] as number);
        a += c * (t2[k] as number);
      }
      out[axis] = (out[axis] as number) + weight * x;
      out[axis + 3] = (out[axis + 3] as number) + weight * v * rate;
      out[axis + 6] = (out[axis + 6] as number) + weight * a * rate * rate;
    }
  };
  const state = (point: De405Point, tdb: number, out: Float64Array = new Float64Array(9)): Float64Array => {
    out.fill(0, 0, 9);
    if (point === "ssb") return out;
    if (point === "earth" || point === "moon") {
      // The barycentre splits the line between the two in the ratio of the masses.
      const share =
        point === "earth" ? -1 / (1 + DE405_EARTH_MOON_RATIO) : DE405_EARTH_MOON_RATIO / (1 + DE405_EARTH_MOON_RATIO);
      add("moon-geocentric", tdb, share, out);
      add("emb", tdb, 1, out);
    } else {
      add(point, tdb, 1, out);
    }
    return out;
  };
  const pairState = (pair: string, tdb: number, out: Float64Array = new Float64Array(9)): Float64Array => {
    const [target, centre] = pair.split("-") as [De405Point, De405Point];
    if (target === "moon" && centre === "earth") return state("moon-geocentric", tdb, out);
    state(target, tdb, out);
    if (centre === "ssb") return out;
    state(centre, tdb, other);
    for (let i = 0; i < 9; i++) out[i] = (out[i] as number) - (other[i] as number);
    return out;
  };
  return Object.freeze({ from: FROM, to: TO, state, pairState });
}
