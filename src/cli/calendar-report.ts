import type { Pair } from "../bodies/pair.ts";
import { type CalendarPage, calendarPage } from "../calendar/calendar-page.ts";
import type { CalendarRow } from "../calendar/calendar-row.ts";
import { calendarText } from "../calendar/calendar-text.ts";
import type { CompleteStyle } from "../calendar/house-style.ts";
import { calendarCautions } from "../calendar/note-words.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { wrapped } from "../report/wrapped.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import type { Provenance } from "./provenance.ts";

/** What a report says besides its rows. */
export interface CalendarReport {
  readonly title: string;
  readonly style: CompleteStyle;
  /** Whether the zone is UTC itself. */
  readonly inUtc: boolean;
  readonly made: Provenance;
}

/**
 * Writes a calendar as a report for people, line by line: a title, a block for each body, and a foot that explains what stands in them.
 *
 * @param rows in order of time, taken one at a time
 */
export function* calendarReport(
  rows: Iterable<CalendarRow>,
  { title, style, inUtc, made }: CalendarReport,
): Generator<string, void, undefined> {
  const foot = new CalendarFoot();
  yield `${title}\n\n`;
  yield* calendarText(foot.watch(rows), style, !inUtc);
  yield foot.count === 0 ? "No passage in this span.\n" : "\n";
  for (const line of [...foot.cautions(), ...foot.remarks(made)]) yield wrapped(line);
  yield footOf(made, { deltaT: foot.byDeltaT, zones: true });
}

/** Gives the pieces of the page of a calendar. */
export function calendarHtml(
  ephemeris: Ephemeris,
  rows: Iterable<CalendarRow>,
  page: Omit<CalendarPage, "cautions" | "foot">,
  pairs: readonly Pair[],
  made: Provenance,
): Generator<string, void, undefined> {
  const foot = new CalendarFoot();
  const cautions = pairs.flatMap(({ name }) =>
    calendarCautions({ pair: name, kind: "periapsis", notes: name === "moon-earth" ? ["near-full-moon"] : [] }),
  );
  return calendarPage(ephemeris, foot.watch(rows), {
    ...page,
    cautions: [...new Set(cautions)],
    foot: () => [
      ...foot.remarks(made),
      ...foot.cautions().filter((line) => !cautions.includes(line)),
      ...footOf(made, { deltaT: foot.byDeltaT, zones: true })
        .trimEnd()
        .split(/\n(?! )/),
    ],
  });
}

/** Gathers from passing rows what the foot must explain. */
export class CalendarFoot {
  count = 0;
  byDeltaT = false;
  #predicted = false;
  readonly #cautions = new Set<string>();

  *watch(rows: Iterable<CalendarRow>): Generator<CalendarRow, void, undefined> {
    for (const row of rows) {
      this.count++;
      this.#predicted ||= row.utcBasis === "predicted";
      this.byDeltaT ||= row.utcBasis === "delta-t";
      for (const caution of [...calendarCautions(row), ...cautionsOf(row)]) this.#cautions.add(caution);
      yield row;
    }
  }

  cautions(): string[] {
    return [...this.#cautions];
  }

  /** What the rows need explained. */
  remarks(made: Provenance): string[] {
    const lines: string[] = [];
    if (this.count > 0) {
      lines.push(
        "Times are printed to the minute, hour, day, month or year, distances to the place, that their uncertainty defends: at " +
          "least 95 % of the printed values are right. Distances and sizes are geometric, from centre to centre; size and light " +
          "are against those at the mean distance.",
      );
    }
    if (this.#predicted) {
      lines.push(
        `From ${made.leapSeconds.expires.slice(0, 10)} on UTC is predicted: leap seconds that are not yet announced are not ` +
          "counted; the uncertainty includes them.",
      );
    }
    if (this.byDeltaT) lines.push("Before 1972 times are UT1, by ΔT, in the offset that the zone had from it.");
    return lines;
  }
}
