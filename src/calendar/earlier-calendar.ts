import { pairOf } from "../bodies/pair.ts";
import { ApsidaryError } from "../error.ts";
import type { EarlierRow } from "./calendar-changes.ts";

/** A calendar that was made before, as far as it is held against another. */
export interface EarlierCalendar {
  readonly years: readonly [first: number, last: number];
  readonly zone: string;
  readonly rows: readonly EarlierRow[];
}

/**
 * Reads the JSON of a calendar that was made before.
 *
 * @param text the JSON
 * @param name what messages call it
 * @throws ApsidaryError `bad-input` for anything else
 */
export function earlierCalendar(text: string, name: string): EarlierCalendar {
  const refuse = (why: string): never => {
    throw new ApsidaryError(
      "bad-input",
      `${name} ${why}; give what \`apsidary calendar YEAR --zone ZONE --format json\` wrote.`,
    );
  };
  let answer: unknown;
  try {
    answer = JSON.parse(text);
  } catch {
    refuse("is no JSON");
  }
  if (!isRecord(answer) || answer.schema !== "apsidary/calendar/1" || "list" in answer)
    refuse("is no calendar in JSON");
  const { years, zone, rows } = answer as Record<string, unknown>;
  const isYears = Array.isArray(years) && years.length === 2 && years.every((year) => Number.isInteger(year));
  if (!isYears || typeof zone !== "string" || !Array.isArray(rows)) return refuse("lacks its years, zone or rows");
  rows.forEach((row: unknown, i) => {
    if (!isRow(row)) refuse(`has a row that is none (number ${i + 1})`);
  });
  return { years: years as unknown as readonly [number, number], zone, rows };
}

function isRow(row: unknown): row is EarlierRow {
  if (!isRecord(row) || typeof row.pair !== "string") return false;
  try {
    pairOf(row.pair);
  } catch {
    return false;
  }
  return (
    (row.kind === "periapsis" || row.kind === "apoapsis") &&
    ["tdbSeconds", "distanceKm"].every((field) => Number.isFinite(row[field])) &&
    ["term", "local", "printed", "printedKm"].every((field) => typeof row[field] === "string")
  );
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
