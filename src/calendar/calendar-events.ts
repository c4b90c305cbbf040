import { DateTime } from "luxon";
import { ApsidaryError } from "../error.ts";
import type { CalendarEvent } from "../report/calendar-file.ts";
import { pairWords, pointName } from "./body-names.ts";
import type { CalendarRow } from "./calendar-row.ts";
import type { CompleteStyle } from "./house-style.ts";
import { seenBody } from "./mean-distance.ts";
import { calendarCautions, noteWords } from "./note-words.ts";
import { printedLocal } from "./printed-local.ts";
import { shownNumber, shownTime } from "./shown.ts";
import { yearBlocks } from "./year-blocks.ts";

/**
 * Gives rows as entries of a calendar file.
 *
 * What is known to the minute or hour stands at the instant that is printed; what is known to the day, month or year takes whole local
 * days. A UID is made of pair, kind and the date in TDB, so that zone, style and leap seconds do not change it.
 *
 * @param rows  in order of time
 * @param style the style in which they were made
 * @throws ApsidaryError `bad-span` for years that a calendar file cannot hold (before 1, after 9998)
 */
export function* calendarEvents(
  rows: Iterable<CalendarRow>,
  style: CompleteStyle,
): Generator<CalendarEvent, void, undefined> {
  for (const { rows: block } of yearBlocks(rows)) {
    for (const row of block) {
      const onlyOfYear = block.filter(({ kind }) => kind === row.kind).length === 1;
      yield eventOf(row, style, noteWords(row, { onlyOfYear }));
    }
  }
}

function eventOf(row: CalendarRow, style: CompleteStyle, notes: readonly string[]): CalendarEvent {
  if (![row.tdb, row.local].every((iso) => /^\d{4}-/.test(iso) && !iso.startsWith("0000"))) {
    throw new ApsidaryError("bad-span", `a calendar file holds the years 1 to 9998; ${row.local} cannot stand in it.`);
  }
  const when = whenOf(row, style);
  return {
    ...("at" in when ? (row.printedUnit === "hour" ? { unit: "hour" } : {}) : { offset: row.local.slice(-6) }),
    uid: `${row.pair}-${row.kind}-${row.tdb.slice(0, row.tdb.indexOf("T"))}@apsidary`,
    when,
    summary: summaryOf(row, notes),
    description: descriptionOf(row, style, notes).join("\n"),
  };
}

function whenOf(row: CalendarRow, style: CompleteStyle): CalendarEvent["when"] {
  const exact = DateTime.fromISO(row.local, { setZone: true });
  if (exact.isValid && (row.printedUnit === "minute" || row.printedUnit === "hour")) {
    return { at: printedLocal(exact, row.utcUncertaintySeconds, style).at.toJSDate() };
  }
  const first = DateTime.fromISO(row.printed, { zone: "UTC" });
  return { firstDay: first.toJSDate(), dayAfter: first.plus({ [row.printedUnit]: 1 }).toJSDate() };
}

/** `Perihelion of the Earth`, `Perigee of the Moon, nearest of the year`. */
function summaryOf(row: CalendarRow, notes: readonly string[]): string {
  const [target = ""] = row.pair.split("-");
  const name =
    target === "earth" || target === "moon" || target === "emb" ? `the ${pointName(target)}` : pointName(target);
  const of = row.pair.endsWith("-ssb") ? `${name} from the ${pointName("ssb")}` : name;
  const words = notes.filter((note) => /^(nearest|farthest) of the year$/.test(note));
  return [`${row.term.slice(0, 1).toUpperCase()}${row.term.slice(1)} of ${of}`, ...words].join(", ");
}

function descriptionOf(row: CalendarRow, style: CompleteStyle, notes: readonly string[]): string[] {
  const basis = row.utcBasis === "delta-t" ? "UT" : "UTC";
  const digits = row.printedAu.length - row.printedAu.indexOf(".") - 1;
  const seen = seenBody({ name: row.pair });
  const across =
    seen && row.diameterArcmin !== null
      ? `${pointName(seen.name)} ${shownNumber(row.diameterArcmin, 1, style)}′ across, `
      : "";
  return [
    `${pairWords(row.pair)}: ${shownTime(row.printed, row.printedUnit, style, true)} (${row.local.slice(-6)}), ` +
      `${shownTime(row.printedUtc, row.printedUnit, style)} ${basis}.`,
    ...(row.besides ?? []).map(({ zone, printed }) => `${zone}: ${shownTime(printed, row.printedUnit, style)}.`),
    `Distance ${shownNumber(Number(row.printedKm), 0, style)} km, ${shownNumber(Number(row.printedAu), digits, style)} au. ` +
      `${across}size ${shownNumber(row.sizePercent, 1, style, true)} %, light ${shownNumber(row.lightPercent, 1, style, true)} % ` +
      `against the mean; ${shownNumber(row.speedKmS, 2, style)} km/s.`,
    ...notes.map((words) => `${words.slice(0, 1).toUpperCase()}${words.slice(1)}.`),
    ...calendarCautions(row),
    `Source: ${row.source}.`,
  ];
}
