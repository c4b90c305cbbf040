import type { GivenRow } from "../../src/audit/audit-list.ts";

/**
 * Perihelion and aphelion of the Earth 2020–2026, UT: U.S. Naval Observatory, Earth's Seasons (from memory); the instants in UTC seconds of the minute
 * were compared with JPL's DE405 when the reference file was made.
 */
export const OFFICE: readonly (readonly [kind: "perihelion" | "aphelion", when: string])[] = Object.freeze([
  ["perihelion", "2020-01-05 07:48"],
  ["aphelion", "2020-07-04 11:35"],
  ["perihelion", "2021-01-02 13:51"],
  ["aphelion", "2021-07-05 22:27"],
  ["perihelion", "2022-01-04 06:55"],
  ["aphelion", "2022-07-04 07:11"],
  ["perihelion", "2023-01-04 16:17"],
  ["aphelion", "2023-07-06 20:07"],
  ["perihelion", "2024-01-03 00:39"],
  ["aphelion", "2024-07-05 05:06"],
  ["perihelion", "2025-01-04 13:28"],
  ["aphelion", "2025-07-03 19:55"],
  ["perihelion", "2026-01-03 17:16"],
  ["aphelion", "2026-07-06 17:31"],
]);

/** Gives those rows with changes: of each time in milliseconds since 1970, and of single rows. */
export function office(
  shift: (ms: number, index: number) => number = (ms) => ms,
  change: (row: GivenRow, index: number) => GivenRow = (row) => row,
): GivenRow[] {
  return OFFICE.map(([kind, when], i) => {
    const at = shift(Date.parse(`${when.replace(" ", "T")}Z`), i);
    const text = new Date(at).toISOString().slice(0, 16).replace("T", " ");
    return change({ pair: "earth-sun", kind, when: text }, i);
  });
}

export const HOUR = 3_600_000;
export const DAY = 24 * HOUR;
