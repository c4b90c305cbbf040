import { PASSAGE_FIELDS } from "../passages/passage-fields.ts";
import type { PassageRow } from "../passages/to-row.ts";
import type { PrintedUnit } from "../report/printed-unit.ts";

/** What is worth a word beside a passage; the list is closed. */
export const NOTE_CODES = [
  "nearest-of-year",
  "farthest-of-year",
  "nearest-since",
  "farthest-since",
  "near-new-moon",
  "near-full-moon",
  "date-differs-from-utc",
  "predicted-utc",
  "secondary",
  "later-than-last-year",
  "earlier-than-last-year",
] as const;

/** One of `NOTE_CODES`. */
export type NoteCode = (typeof NOTE_CODES)[number];

/** A time in a zone beside the calendar's own. */
export interface BesideTime {
  readonly zone: string;
  readonly local: string;
  readonly printed: string;
}

/** A passage in a calendar. Frozen. Numbers are rounded as in `PassageRow`, and to 1e-6 km/s, 1e-6 ′ and 1e-4 %. */
export interface CalendarRow extends PassageRow {
  /** ISO 8601 with its offset, to the millisecond. */
  readonly local: string;
  /** The local time as it may be printed; see `printedUnit`. */
  readonly printed: string;
  readonly printedUnit: PrintedUnit;
  readonly notes: readonly NoteCode[];
  /** UTC (where the basis is `delta-t`, UT1), as it may be printed. */
  readonly printedUtc: string;
  /** The distance as it may be printed, plain decimals. */
  readonly printedKm: string;
  readonly printedAu: string;
  /** Apparent diameter of the disc that the distance sets (the Moon's, the Sun's, Jupiter's), seen from centre to centre; `null` where there is none. */
  readonly diameterArcmin: number | null;
  /** By how much the disc is larger than at the mean distance, percent. */
  readonly sizePercent: number;
  /** By how much light is stronger than at the mean distance (1/r²), percent. */
  readonly lightPercent: number;
  /** Relative speed of the two points at the passage. */
  readonly speedKmS: number;
  /** Hours from the new or full Moon that the notes name to the passage; below zero before it. */
  readonly phaseHours: number | null;
  /** Of the Earth about the Sun: how much later the date is than that of the passage before, hours; below zero for earlier. */
  readonly dateStepHours: number | null;
  /** The last passage before this one, and the first after it, that may be more extreme; `null` without such a note, or where none was found. */
  readonly sinceUtc: string | null;
  readonly untilUtc: string | null;
  /** Whether that passage is more extreme beyond doubt; the sources cannot tell where it is `false`. */
  readonly sinceCertain: boolean | null;
  readonly untilCertain: boolean | null;
  /** How far was looked, as years; `null` without such a note. */
  readonly lookedFromYear: number | null;
  readonly lookedToYear: number | null;
  /** Only where zones beside the calendar's own were asked for. */
  readonly besides?: readonly BesideTime[];
}

/** The fields of a row, in order: the header of its CSV. */
export const CALENDAR_FIELDS = [
  ...PASSAGE_FIELDS,
  "local",
  "printed",
  "printedUnit",
  "notes",
  "printedUtc",
  "printedKm",
  "printedAu",
  "diameterArcmin",
  "sizePercent",
  "lightPercent",
  "speedKmS",
  "phaseHours",
  "dateStepHours",
  "sinceUtc",
  "untilUtc",
  "sinceCertain",
  "untilCertain",
  "lookedFromYear",
  "lookedToYear",
] as const satisfies readonly (keyof CalendarRow)[];
