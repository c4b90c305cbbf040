import type { Pair } from "../bodies/pair.ts";
import type { ListRow, UnreadRow } from "./list-row.ts";
import { type ReadSettings, readCells } from "./read-cells.ts";
import { distanceUnit, readDistance } from "./read-distance.ts";
import type { ColumnRole } from "./read-header.ts";
import { readKind } from "./read-kind.ts";
import { readPair } from "./read-pair.ts";
import { isUnread, readWhen } from "./read-when.ts";
import type { ListCell } from "./split-cells.ts";

/**
 * Reads a line of loose columns, as pasted from a page.
 *
 * Where a heading says what the columns are and the line has as many, it serves; else each piece is known by what it looks like: a body,
 * a kind, a time, an offset, a distance. Lines without a time and a kind are prose, and no rows.
 *
 * @param context the body that a line of its own has named; renewed here
 */
export function readLooseLine(
  line: number,
  text: string,
  cells: readonly ListCell[],
  values: readonly string[],
  columns: readonly (ColumnRole | null)[] | null,
  settings: ReadSettings,
  context: { pair: Pair | null },
): readonly (ListRow | UnreadRow)[] {
  const only = values.length === 1 ? readPair((values[0] ?? "").replace(/ about the .*$| *:$/, "")) : null;
  if (only) {
    context.pair = only;
    return [];
  }
  const pieces = values.length > 1 ? { cells, values } : piecesOf(text);
  const known = columns && columns.length === pieces.values.length ? columns : null;
  if (known?.some((column) => column !== null && "kind" in column && column.kind !== null)) {
    return readCells(line, pieces.cells, pieces.values, known, withPair(settings, context));
  }
  const year = known ? (pieces.values[known.findIndex((column) => column?.role === "year")] ?? "") : "";
  let seen = 0;
  const roles = pieces.values.map((value, i): ColumnRole | null => {
    if (value === "") return null;
    const told = known?.[i];
    if (told && told.role !== "distance") {
      if (told.role === "when" || told.role === "date") seen++;
      return told;
    }
    if (readPair(value)) return { role: "pair" };
    if (/^[+-]\d\d:\d\d$/.test(value)) return { role: "offset" };
    if (!/\d/.test(value)) return readKind(value) ? { role: "kind" } : null;
    if (seen === 0 && looksLikeTime(value, year)) {
      seen++;
      return { role: "when", kind: null, scale: null, rank: 0 };
    }
    if (seen === 1 && /^\d{1,2}(?::\d\d|\s?h|\.\d+\s?h|h\d\d)/.test(value))
      return { role: "time", kind: null, scale: null };
    const bare = /^[\d ,.'’\u00a0\u202f]+$/.test(value);
    const size = Number(value.replace(/[^\d.]/g, ""));
    const unit =
      distanceUnit(value) ??
      (bare && told?.role === "distance" ? told.unit : null) ??
      (bare && size > 10_000 ? "km" : null);
    return unit !== null && readDistance(value, unit) ? { role: "distance", kind: null, unit, rank: 0 } : null;
  });
  const kindSeen = roles.some((role) => role?.role === "kind");
  if (seen === 0 || !kindSeen) {
    const tells = kindSeen && /\d{4}/.test(text) && /\d:\d\d|\d\d-\d\d/.test(text) && values.length > 1;
    if (!tells) return [];
    return [{ line, when: values.join("  "), problem: "has no time that can be read; write it as 2026-01-03 17:16" }];
  }
  return readCells(line, pieces.cells, pieces.values, roles, withPair(settings, context));
}

function withPair(settings: ReadSettings, { pair }: { pair: Pair | null }): ReadSettings {
  return settings.pair === null && pair ? { ...settings, pair } : settings;
}

function looksLikeTime(value: string, year: string): boolean {
  if (/^[+-]?\d{4}$/.test(value)) return false;
  return !isUnread(readWhen(value, { year: /^\d{4}$/.test(year) ? Number(year) : null }));
}

/** A line of single blanks: the time is sought by its shape, the kind and the body by their words. */
function piecesOf(text: string): { cells: ListCell[]; values: string[] } {
  const cells: ListCell[] = [];
  const take = (pattern: RegExp) => {
    const m = pattern.exec(text);
    if (m?.[0]) {
      const value = m[0].trim();
      const start = m.index + m[0].indexOf(value);
      cells.push({ value, start, end: start + value.length, quoted: false });
    }
  };
  take(/\b(?:perihelion|aphelion|perigee|apogee|periapsis|apoapsis)\b/i);
  take(
    /\b(?:moon-earth|(?:earth|emb|mercury|venus|mars|jupiter|saturn|uranus|neptune|pluto)(?:-sun|-ssb)?|moon|(?:io|europa|ganymede|callisto)(?:-jupiter)?)\b/i,
  );
  const month = "(?:jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)[a-z]*\\.?";
  take(
    new RegExp(
      `(?:[+-]?\\d{4}[-/.]\\d{1,2}[-/.]\\d{1,2}(?:\\.\\d+)?|\\d{4}\\s+${month}\\s+\\d{1,2}(?:\\.\\d+)?|\\d{1,2}\\s+${month}\\s+\\d{4}|${month}\\s+\\d{1,2},?\\s+\\d{4})` +
        "(?:[T ,]+\\d{1,2}(?::\\d\\d(?::\\d\\d(?:\\.\\d+)?)?|(?:\\.\\d+)?\\s?h(?:\\s?\\d\\d\\s?m)?|\\b(?!\\s*\\d))(?:\\s?[ap]\\.?m\\.?)?)?(?:\\s?(?:UTC|UT1|UT|GMT|TT|TDT|TD|TDB|TAI|Z|[+-]\\d\\d:?\\d\\d))?",
      "i",
    ),
  );
  take(
    /(?<![\d:-])(?:\d{1,3}(?:[ ,]\d{3})+|\d{5,})(?:\.\d+)?(?:\s?(?:km|mi|miles))?\b|\b\d{1,2}\.\d{3,}\s?(?:au|AU)\b/,
  );
  return { cells, values: cells.map(({ value }) => value) };
}
