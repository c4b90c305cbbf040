import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Accuracy } from "../ephemeris/source.ts";
import type { Column } from "../report/column.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import { utcOf } from "../time/utc-of.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import type { Provenance } from "./provenance.ts";

/** A row of `range` as it is given out. Numbers are rounded to 1 ms, 1 m, and a share to 1e-9. */
export interface RangeRow {
  /** ISO 8601; UT1 before 1972. */
  readonly utc: string;
  readonly tdbSeconds: number;
  readonly distanceKm: number;
  readonly rangeRateKmPerDay: number;
  readonly rangeAccelerationKmPerDay2: number;
  /** 0 at the periapsis before or after, 1 at the apoapsis, by distance; `null` where the sources end before one. */
  readonly share: number | null;
  readonly source: string;
  /** `utc` in the Julian calendar, `null` from 1582-10-15 on; only where that calendar was asked for. */
  readonly utcJulian?: string | null;
}

/**
 * Writes distances as a report for people, line by line. Distance and rate are printed to the place of their uncertainty,
 * with what they change in the time by which UTC, or before 1972 UT1, may be off.
 *
 * @param title     what was asked
 * @param pair      the pair
 * @param rows      taken one at a time
 * @param ephemeris the sources that the rows name
 * @param made      the provenance
 */
export function* rangeReport(
  title: string,
  pair: Pair,
  rows: Iterable<RangeRow>,
  ephemeris: Ephemeris,
  made: Provenance,
): Generator<string, void, undefined> {
  let before1972 = false;
  let julian = false;
  const watched = function* () {
    for (const row of rows) {
      before1972 ||= isBefore1972(row);
      julian ||= typeof row.utcJulian === "string";
      yield row;
    }
  };
  yield `${title}\n\n`;
  yield* textTable(columnsFor(pair, ephemeris), watched());
  yield "\nDistances are geometric, from centre to centre at one instant, to the place of their uncertainty,\n";
  yield "  what they change in the time by which UTC is uncertain included.\n";
  yield "share: 0 at the periapsis, 1 at the apoapsis on either side, by distance.\n";
  if (julian)
    yield "J: a date of the Julian calendar; dates of rows without it, and in the lines below, are Gregorian.\n";
  if (before1972) yield "Before 1972 times are UT1, reckoned with ΔT.\n";
  for (const note of cautionsOf({ targetPoint: pair.target, centrePoint: pair.centre })) yield wrapped(note, 100, "  ");
  yield footOf(made, { deltaT: before1972, zones: false });
}

function columnsFor(pair: Pair, ephemeris: Ephemeris): Column<RangeRow>[] {
  const accuracyOf = ({ source, tdbSeconds }: RangeRow): Accuracy | undefined =>
    ephemeris.sources.find(({ id }) => id === source)?.accuracy(pair, tdbSeconds);
  const daysOff = ({ tdbSeconds }: RangeRow) =>
    utcOf(tdbSeconds, ephemeris.leapSeconds).uncertaintySeconds / DAY_SECONDS;
  return [
    { title: "UTC", unit: "", values: printedTime, digits: 0 },
    {
      title: "distance",
      unit: "km",
      values: (row) => row.distanceKm,
      digits: (row) =>
        printedHalfWidth(Math.hypot(accuracyOf(row)?.rangeKm ?? 0, row.rangeRateKmPerDay * daysOff(row))).digits,
    },
    {
      title: "rate",
      unit: "km/d",
      values: (row) => row.rangeRateKmPerDay,
      digits: (row) => {
        const own = (accuracyOf(row)?.rangeRateKmS ?? 0) * DAY_SECONDS;
        return printedHalfWidth(Math.hypot(own, row.rangeAccelerationKmPerDay2 * daysOff(row))).digits;
      },
    },
    {
      title: "acceleration",
      unit: "km/d²",
      values: (row) => row.rangeAccelerationKmPerDay2,
      digits: (row) => fourFigures(row.rangeAccelerationKmPerDay2),
    },
    { title: "share", unit: "", values: (row) => row.share, digits: 4 },
    { title: "source", unit: "", values: (row) => row.source, digits: 0 },
  ];
}

/** To the millisecond where it has any; a Julian date bears a J. */
function printedTime({ utc, utcJulian }: RangeRow): string {
  const plain = (utcJulian ?? utc).replace("T", " ").replace(/(\.000)?Z?$/, "");
  return typeof utcJulian === "string" ? `${plain} J` : plain;
}

/** Decimals that show four figures, three decimals at most. */
function fourFigures(value: number): number {
  return Math.min(3, Math.max(0, 3 - Math.floor(Math.log10(Math.abs(value)))));
}

function isBefore1972({ utc }: RangeRow): boolean {
  return utc.startsWith("-") || (!utc.startsWith("+") && utc < "1972");
}
