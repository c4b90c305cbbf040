import type { Pair } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import { ApsidaryError } from "../error.ts";
import { type AuditScale, auditScale } from "./audit-scale.ts";
import type { CellPlace, ListRow, UnreadRow } from "./list-row.ts";
import type { PublishedWhen } from "./published-when.ts";
import { type DistanceUnit, distanceUnit, type PublishedDistance, readDistance } from "./read-distance.ts";
import type { ColumnRole } from "./read-header.ts";
import { readKind } from "./read-kind.ts";
import { nearPair, readPair } from "./read-pair.ts";
import { isUnread, readWhen } from "./read-when.ts";
import type { ListCell } from "./split-cells.ts";

/** What a list leaves unsaid, settled. */
export interface ReadSettings {
  readonly scale: AuditScale;
  readonly pair: Pair | null;
  /** Stated precision, or `null` for that of the last digit. */
  readonly unitSeconds: number | null;
  /** Whether 03/04/2026 begins with the day; `null` where the list does not tell. */
  dayFirst: boolean | null;
}

const PRECISIONS: Readonly<Record<string, number>> = {
  second: 1,
  minute: 60,
  hour: 3600,
  day: 86_400,
  min: 60,
  h: 3600,
  d: 86_400,
  s: 1,
};

/**
 * Reads the row, or the two rows of a wide list, that stand in the cells of a line.
 *
 * @param line    number of the line
 * @param cells   where they stand
 * @param values  their text, decoded
 * @param columns what each column holds
 */
export function readCells(
  line: number,
  cells: readonly ListCell[],
  values: readonly string[],
  columns: readonly (ColumnRole | null)[],
  settings: ReadSettings,
): readonly (ListRow | UnreadRow)[] {
  const wide = columns.some((column) => column && "kind" in column && column.kind !== null);
  if (!wide) return [readOne(line, cells, values, columns, settings, null)];
  const rows: (ListRow | UnreadRow)[] = [];
  for (const kind of ["periapsis", "apoapsis"] as const) {
    const some = columns.some(
      (column, i) =>
        column && "kind" in column && column.kind === kind && column.role !== "distance" && (values[i] ?? "") !== "",
    );
    if (some) rows.push(readOne(line, cells, values, columns, settings, kind));
  }
  return rows;
}

function readOne(
  line: number,
  cells: readonly ListCell[],
  values: readonly string[],
  columns: readonly (ColumnRole | null)[],
  settings: ReadSettings,
  kindOfColumns: ApsisKind | null,
): ListRow | UnreadRow {
  const of = (role: ColumnRole["role"]) => columns.findIndex((column) => column?.role === role);
  const valueAt = (index: number) => (index < 0 ? "" : (values[index] ?? ""));
  const mine = <R extends "when" | "date" | "time" | "distance">(role: R) => {
    let best = -1;
    columns.forEach((column, i) => {
      if (column?.role !== role || column.kind !== kindOfColumns || (values[i] ?? "") === "") return;
      const before = columns[best];
      if (best < 0 || (before && "rank" in before && "rank" in column && column.rank < before.rank)) best = i;
    });
    return best;
  };
  const whenAt = mine("when");
  const dateAt = whenAt >= 0 ? -1 : mine("date");
  // in a wide list the date column may be shared by a column of years, and a column of times may follow its date
  const timeAt = mine("time");
  // a whole date under a heading such as UT is the same instant on another clock, not the time of day of the date before it
  const another = (whenAt >= 0 || dateAt >= 0) && /\d{4}-\d\d-\d\d/.test(valueAt(timeAt));
  const whenCells = [whenAt, dateAt, another ? -1 : timeAt].filter((i) => i >= 0);
  const whenText = whenCells.map((i) => valueAt(i)).join(" ");
  const unread = (problem: string): UnreadRow => ({
    line,
    when: whenText || (values.find((v) => v !== "") ?? ""),
    problem,
  });
  if (whenCells.length === 0 || whenText === "")
    return unread("has no time; write it as 2026-01-03 17:16, 2026-01-03 17 or 2026-01-03");

  const pairText = valueAt(of("pair"));
  const kindText = valueAt(of("kind"));
  const named = kindText === "" ? null : readKind(kindText);
  const kind = kindOfColumns ?? named?.kind ?? null;
  if (kind === null) {
    return unread(
      `names no kind of passage (${JSON.stringify(kindText.slice(0, 40))}); write periapsis or apoapsis, perihelion or aphelion, perigee or apogee`,
    );
  }
  const pair =
    pairText !== ""
      ? readPair(pairText)
      : (settings.pair ?? bodyIn(kindText) ?? impliedPair(named?.about ?? aboutOf(columns, kindOfColumns)));
  if (!pair) {
    const near = pairText === "" ? null : nearPair(pairText);
    return unread(
      pairText === ""
        ? "names no pair; add a column named pair (moon-earth, earth-sun, mars-sun …) or give --pair"
        : `names the pair ${JSON.stringify(pairText.slice(0, 40))}, which is unknown${near ? `; did you mean ${near}?` : ""}`,
    );
  }
  const yearText = valueAt(of("year"));
  const year = /^[+-]?\d{1,5}$/.test(yearText) ? Number(yearText) : null;
  const found = readWhen(whenText, { year, order: settings.dayFirst === false ? "month-first" : "day-first" });
  if (isUnread(found)) return unread(found.problem);
  const when = withUnit(found, PRECISIONS[valueAt(of("precision")).toLowerCase()] ?? settings.unitSeconds);
  let scale: AuditScale;
  try {
    const scaleText = valueAt(of("scale"));
    const offsetText = valueAt(of("offset"));
    const ofColumn = whenCells
      .map((i) => columns[i])
      .find((column) => column && "scale" in column && column.scale !== null);
    scale =
      when.scale ??
      (scaleText !== ""
        ? auditScale(scaleText)
        : offsetText !== ""
          ? auditScale(offsetText)
          : ofColumn && "scale" in ofColumn && ofColumn.scale
            ? ofColumn.scale
            : (localOffset(columns, values) ?? settings.scale));
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    return unread(error.message);
  }
  const distanceAt = mine("distance");
  let distance: PublishedDistance | null = null;
  if (distanceAt >= 0 && !/^(?:[-–—]|null|n\/?a)$/i.test(valueAt(distanceAt))) {
    const column = columns[distanceAt];
    const unit: DistanceUnit | null =
      distanceUnit(valueAt(of("unit"))) ??
      (column && column.role === "distance" ? column.unit : null) ??
      guessedUnit(valueAt(distanceAt));
    distance = readDistance(valueAt(distanceAt), unit);
    if (!distance)
      return unread(
        `has the distance ${JSON.stringify(valueAt(distanceAt).slice(0, 40))}, which cannot be read; write 147099894 km or 0.98330 au`,
      );
  }
  const kindAt = kindOfColumns === null ? of("kind") : -1;
  return {
    line,
    pair,
    kind,
    when,
    scale,
    distance,
    places: {
      when: whenCells.map((i) => ({ place: placeOf(cells[i]), text: valueAt(i) })),
      kind: kindAt < 0 ? null : { place: placeOf(cells[kindAt]), text: kindText },
      distance: distance ? placeOf(cells[distanceAt]) : null,
    },
  };
}

/** A list of our own gives the local time with its offset beside the printed one. */
function localOffset(columns: readonly (ColumnRole | null)[], values: readonly string[]): AuditScale | null {
  for (let i = 0; i < columns.length; i++) {
    if (columns[i]?.role !== "when") continue;
    const offset = /T\d\d:\d\d.*?([+-]\d\d:\d\d)$/.exec(values[i] ?? "")?.[1];
    if (offset !== undefined) return auditScale(offset);
  }
  return null;
}

function aboutOf(columns: readonly (ColumnRole | null)[], kind: ApsisKind | null): "sun" | "earth" | null {
  return kind && columns.some((column) => column !== null && "kind" in column && column.kind !== null) ? "sun" : null;
}

/** Perihelion alone means the Earth's, perigee the Moon's. */
function impliedPair(about: "sun" | "earth" | null): Pair | null {
  return about === null ? null : readPair(about === "sun" ? "earth" : "moon");
}

function bodyIn(text: string): Pair | null {
  for (const word of text.split(/[^\w-]+/)) {
    const pair = word === "" ? null : readPair(word);
    if (pair) return pair;
  }
  return null;
}

/** A number below 100 with decimals can only be au, one above a thousand only km. */
function guessedUnit(text: string): DistanceUnit | null {
  const value = Number(text.replace(/[ ,'’\u00a0\u202f]/g, ""));
  if (!(value > 0)) return null;
  return value < 100 ? "au" : value > 1000 ? "km" : null;
}

function withUnit(when: PublishedWhen, unitSeconds: number | null): PublishedWhen {
  if (unitSeconds === null || unitSeconds <= when.unitSeconds) return when;
  if (unitSeconds === 86_400) {
    return { ...when, unitSeconds, whole: "day", wallSeconds: Math.floor(when.wallSeconds / 86_400) * 86_400 + 43_200 };
  }
  return { ...when, unitSeconds };
}

function placeOf(cell: ListCell | undefined): CellPlace {
  return { start: cell?.start ?? 0, end: cell?.end ?? 0, form: cell?.quoted ? "quoted" : "bare" };
}
