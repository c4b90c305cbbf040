import { readFileSync } from "node:fs";
import { addChebyshev } from "../../../numeric/chebyshev.ts";

/** Days from J2000 (JD 2451545.0, TDB) to the table's first row, days in a row, and rows. */
export const TABLE_START_DAYS = 2436912.5 - 2451545.0;
const ROW_DAYS = 32;
const ROWS = 1143;
/** Days that the table covers: 1959-12-10 to 2060-01-30. */
export const TABLE_DAYS = ROWS * ROW_DAYS;

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
 * Writes x, y, z (km) and their rates (km a day) of a series to `out[0 … 5]`.
 * @param days days past the table's start, 0 … 36576
 */
export type TableReader = (series: TableSeries, days: number, out: Float64Array) => void;

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
  return (series, days, out) => {
    const [start, n, parts] = COLUMNS[series];
    const partDays = ROW_DAYS / parts;
    const part = Math.min(Math.floor(days / partDays), ROWS * parts - 1);
    const s = (2 * (days - part * partDays)) / partDays - 1;
    const first = Math.floor(part / parts) * ROW_DOUBLES + start + (part % parts) * 3 * n;
    out.fill(0, 0, 6);
    for (let axis = 0; axis < 3; axis++) {
      addChebyshev(words, first + axis * n, n, s, 2 / partDays, 1, out, axis, 3, 1);
    }
  };
}
