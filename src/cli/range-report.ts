import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Accuracy } from "../ephemeris/source.ts";
import type { Column } from "../report/column.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
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
}

/**
 * Writes distances as a report for people, line by line. Distance and rate are printed to the place of their uncertainty.
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
  const watched = function* () {
    for (const row of rows) {
      before1972 ||= isBefore1972(row);
      yield row;
    }
  };
  yield `${title}\n\n`;
  yield* textTable(columnsFor(pair, ephemeris), watched());
  yield "\nDistances are geometric, from centre to centre at one instant, to the place of their uncertainty.\n";
  yield "share: 0 at the periapsis, 1 at the apoapsis on either side, by distance.\n";
  if (before1972) yield "Before 1972 times are UT1, reckoned with ΔT.\n";
  for (const note of cautionsOf({ targetPoint: pair.target, centrePoint: pair.centre })) yield wrapped(note, 100, "  ");
  yield footOf(made, { deltaT: before1972, zones: false });
}

function columnsFor(pair: Pair, ephemeris: Ephemeris): Column<RangeRow>[] {
  const accuracyOf = ({ source, tdbSeconds }: RangeRow): Accuracy | undefined =>
    ephemeris.sources.find(({ id }) => id === source)?.accuracy(pair, tdbSeconds);
  return [
    { title: "UTC", unit: "", values: (row) => row.utc.replace("T", " ").replace(/(\.000)?Z$/, ""), digits: 0 },
    {
      title: "distance",
      unit: "km",
      values: (row) => row.distanceKm,
      digits: (row) => printedHalfWidth(accuracyOf(row)?.rangeKm ?? 0).digits,
    },
    {
      title: "rate",
      unit: "km/d",
      values: (row) => row.rangeRateKmPerDay,
      digits: (row) => printedHalfWidth((accuracyOf(row)?.rangeRateKmS ?? 0) * DAY_SECONDS).digits,
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

/** Decimals that show four figures, three decimals at most. */
function fourFigures(value: number): number {
  return Math.min(3, Math.max(0, 3 - Math.floor(Math.log10(Math.abs(value)))));
}

function isBefore1972({ utc }: RangeRow): boolean {
  return utc.startsWith("-") || (!utc.startsWith("+") && utc < "1972");
}
