import { ICalCalendar } from "ical-generator";
import type { PlanRow } from "./plan-row.ts";

/**
 * Writes a plan as an iCalendar file (RFC 5545): an event for each near interval whose ends are known, and one without duration for each best moment.
 *
 * The same rows give the same text: no clock is read, the stamp of an event is the passage itself.
 *
 * @param rows held in memory until the file is written
 * @param name of the calendar
 */
export function planIcs(rows: Iterable<PlanRow>, name: string): string {
  const calendar = new ICalCalendar({ name, prodId: { company: "apsidary", product: "plan", language: "EN" } });
  for (const row of rows) {
    const body = bodyName(row);
    const stamp = dateOf(row.utc);
    const id = `${row.pair}-${row.kind}-${Math.round(row.tdbSeconds / 86_400)}-${encodeURIComponent(row.site)}@plan.apsidary`;
    const location = row.site;
    const description = descriptionOf(row, body);
    if (row.nearFromUtc !== null && row.nearToUtc !== null) {
      calendar.createEvent({
        id: `near-${id}`,
        stamp,
        start: dateOf(row.nearFromUtc),
        end: dateOf(row.nearToUtc),
        summary: `${body} near ${row.term}`,
        location,
        description,
      });
    }
    if (row.bestUtc !== null && row.bestAltitudeDeg !== null) {
      calendar.createEvent({
        id: `best-${id}`,
        stamp,
        start: dateOf(row.bestUtc),
        summary: `${body} best seen, ${row.bestAltitudeDeg.toFixed(1)}° up, near ${row.term}`,
        location,
        description,
      });
    }
  }
  return calendar.toString();
}

/** An instant of a calendar file has no leap seconds: the 60th counts as the one before. */
function dateOf(utc: string): Date {
  return new Date(utc.replace(/:60(\.\d+)?Z$/, ":59Z"));
}

function bodyName({ pair }: PlanRow): string {
  if (/^(earth|emb)-/.test(pair)) return "Sun";
  const word = pair.slice(0, pair.indexOf("-"));
  return word.charAt(0).toUpperCase() + word.slice(1);
}

function descriptionOf(row: PlanRow, body: string): string {
  const caution = body === "Sun" ? " Never point optics at or near the Sun without a certified solar filter." : "";
  return (
    `${row.term} of ${row.pair} at ${row.utc}, ${Math.round(row.distanceKm)} km from centre to centre, ` +
    `${Math.round(row.topocentricDistanceKm)} km from the site.${caution} The rules of the observatory decide.`
  );
}
