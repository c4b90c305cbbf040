import { readFileSync } from "node:fs";
import { addChebyshev } from "../../../numeric/chebyshev.ts";

/** The table's first row, TDB seconds past J2000 (JD 2436912.5), seconds in a row, and rows. */
export const TABLE_START = (2436912.5 - 2451545.0) * 86400;
const ROW_SECONDS = 32 * 86400;
const ROWS = 1143;
/** Seconds that the table covers: 1959-12-10 to 2060-01-30. */
export const TABLE_SECONDS = ROWS * ROW_SECONDS;

const ROW_DOUBLES = 1018;
const ROW_BYTES = 8160;
const FIRST_BYTE = 28;

/** Place of the first coefficient in a row, coefficients a component, sub-intervals a row. */
const COLUMNS = {
  mercury: [0, 14, 4],
  venus: [168, 10, 2],
  emb: [228, 13, 2],
  mars: [306, 11, 1],
  jupiter: [339, 8, 1],
  saturn: [363, 7, 1],
  uranus: [384, 6, 1],
  neptune: [402, 6, 1],
  pluto: [420, 6, 1],
  moon: [438, 13, 8],
  sun: [750, 11, 2],
} as const;

/** A series of the table: all about the solar-system barycentre, but the Moon about the Earth. */
export type TableSeries = keyof typeof COLUMNS;

/**
 * Writes x, y, z (km) and their rates (km/s) of a series at a time `from + offset` to `out[0 … 5]`.
 *
 * The time comes in two parts because one number would round it to half a microsecond, in which Mercury goes 2 cm.
 * @param from   whole seconds past the table's start
 * @param offset seconds past `from`
 */
export type TableReader = (series: TableSeries, from: number, offset: number, out: Float64Array) => void;

/**
 * Reads `table.f0i` of Debian's package casacore-data-jpl-de405: the Chebyshev series of JPL's DE405 as JPL gave them
 * out, in rows of 32 days (little-endian doubles; the usual layout of DE405 without its two leading dates).
 *
 * @throws Error where the file is too short for it
 */
export function readTable(path: string): TableReader {
  const bytes = readFileSync(path);
  if (bytes.length < FIRST_BYTE + (ROWS - 1) * ROW_BYTES + 8 * ROW_DOUBLES)
    throw new Error(`${path} is too short for the table of DE405.`);
  const words = new Float64Array(ROWS * ROW_DOUBLES);
  for (let row = 0; row < ROWS; row++) {
    for (let i = 0; i < ROW_DOUBLES; i++) {
      words[row * ROW_DOUBLES + i] = bytes.readDoubleLE(FIRST_BYTE + row * ROW_BYTES + 8 * i);
    }
  }
  return (series, from, offset, out) => {
    const [start, n, parts] = COLUMNS[series];
    const partSeconds = ROW_SECONDS / parts;
    const part = Math.min(Math.floor((from + offset) / partSeconds), ROWS * parts - 1);
    const s = (2 * (from - part * partSeconds + offset)) / partSeconds - 1;
    const first = Math.floor(part / parts) * ROW_DOUBLES + start + (part % parts) * 3 * n;
    out.fill(0, 0, 6);
    addChebyshev(words, first, n, s, 2 / partSeconds, 1, 1, out, 0);
  };
}
