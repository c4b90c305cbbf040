import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import ICAL from "ical.js";
import { DateTime } from "luxon";
import { beforeAll, describe, expect, test } from "vitest";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { madeFile, pythonHas } from "./made.ts";

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

/** Years with passages known to the minute, the hour and the day. */
const QUERY = { years: [2026, 2033], zone: "Asia/Kathmandu" } as const;

function eventsOf(text: string) {
  const calendar = new ICAL.Component(ICAL.parse(text));
  return calendar.getAllSubcomponents("vevent").map((component) => new ICAL.Event(component));
}

describe("a calendar file", () => {
  test("read by ical.js has the instant of every row, rounded as printed, or its local day", () => {
    const { rows, text } = madeFile(ephemeris, QUERY);
    const events = new Map(eventsOf(text).map((event) => [event.uid, event]));
    expect(events.size).toBe(rows.length);
    for (const row of rows) {
      const event = events.get(`${row.pair}-${row.kind}-${row.tdb.slice(0, 10)}@apsidary`);
      if (row.printedUnit === "day") {
        expect(event?.startDate.isDate).toBe(true);
        expect(event?.startDate.toString()).toBe(row.printed);
        expect(event?.duration.toSeconds()).toBe(86_400);
      } else {
        expect(event?.startDate.zone.tzid).toBe("UTC");
        const unit = row.printedUnit === "minute" ? "minutes" : "hours";
        const start = DateTime.fromJSDate(event?.startDate.toJSDate() as Date);
        expect(start.setZone(QUERY.zone).toFormat("yyyy-MM-dd HH:mm").slice(0, row.printed.length)).toBe(row.printed);
        const off = Math.abs(start.diff(DateTime.fromISO(row.local)).as(unit));
        expect(off).toBeLessThanOrEqual(0.5);
      }
    }
    expect(new Set(rows.map(({ printedUnit }) => printedUnit))).toEqual(new Set(["minute", "hour", "day"]));
  });

  test.skipIf(!pythonHas("icalendar"))("read by Debian's python3-icalendar says the same as read by ical.js", () => {
    const { text } = madeFile(ephemeris, QUERY, { alarmMinutes: 45, stamp: new Date("2026-01-01T00:00:00Z") });
    const script = fileURLToPath(new URL("read-with-icalendar.py", import.meta.url));
    const { stdout, status } = spawnSync("/usr/bin/python3", [script], {
      input: text,
      encoding: "utf8",
      maxBuffer: 1e8,
    });
    expect(status).toBe(0);
    const read = JSON.parse(stdout);
    expect(read.errors).toEqual([]);
    const ours = eventsOf(text);
    expect(read.events).toHaveLength(ours.length);
    read.events.forEach((theirs: Record<string, string | string[]>, i: number) => {
      const event = ours[i];
      expect(theirs.uid).toBe(event?.uid);
      expect(theirs.summary).toBe(event?.summary);
      expect(theirs.description).toBe(event?.description);
      expect(theirs.stamp).toBe("2026-01-01T00:00:00+00:00");
      expect(theirs.alarms).toEqual(["-1 day, 23:15:00"]); // Python's way to write minus 45 minutes
      const start = event?.startDate;
      if (start?.isDate) expect(theirs.start).toBe(start.toString());
      else expect(Date.parse(theirs.start as string)).toBe(start?.toJSDate().getTime());
    });
  });

  test("has lines of 75 octets at most, ended by CR LF, and one each of the properties that RFC 5545 demands", () => {
    const { text, rows } = madeFile(ephemeris, { ...QUERY, style: { months: "names", language: "ar" } });
    expect(text.endsWith("END:VCALENDAR\r\n")).toBe(true);
    expect(text.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
    const octets = text.split("\r\n").map((line) => Buffer.byteLength(line));
    expect(Math.max(...octets)).toBeLessThanOrEqual(75);
    const unfolded = text.replaceAll("\r\n ", "").split("\r\n");
    const count = (start: string) => unfolded.filter((line) => line.startsWith(start)).length;
    expect([count("VERSION:2.0"), count("PRODID:"), count("BEGIN:VCALENDAR")]).toEqual([1, 1, 1]);
    for (const property of ["UID:", "DTSTAMP:", "DTSTART", "SUMMARY:"]) expect(count(property)).toBe(rows.length);
  });

  test("made twice is the same to the byte, and keeps its UIDs in another zone and style", () => {
    const { text } = madeFile(ephemeris, QUERY);
    expect(madeFile(ephemeris, QUERY).text).toBe(text);
    const elsewhere = madeFile(ephemeris, { ...QUERY, zone: "UTC", style: { finest: "day", rounding: "cut" } }).text;
    const uids = new Set(eventsOf(text).map((event) => event.uid));
    const inBoth = eventsOf(elsewhere).filter(({ uid }) => uids.has(uid));
    expect(inBoth.length).toBeGreaterThanOrEqual(uids.size - 2); // New Year falls elsewhere
  });

  test("keeps no time busy, rings only where it is asked to, and carries the cautions", () => {
    const { text } = madeFile(ephemeris, { years: 2026, zone: "UTC", pairs: ["earth-sun", "moon-earth"] });
    expect(text).not.toContain("VALARM");
    for (const event of eventsOf(text)) {
      expect(event.component.getFirstPropertyValue("transp")).toBe("TRANSPARENT");
      if (event.uid.startsWith("earth-sun")) expect(event.description).toContain("certified solar filter");
      const tide =
        event.uid.startsWith("moon-earth-periapsis") && /h (after|before) (new|full) Moon/i.test(event.description);
      expect(event.description.includes("raised tides")).toBe(tide);
    }
  });

  test("puts what is known to a month or a year on the whole of it", () => {
    // by astronomy-engine alone, whose Neptune is known to days or worse
    const { rows, text } = madeFile(ephemeris, {
      years: [1850, 2050],
      zone: "UTC",
      pairs: ["neptune-sun"],
      source: "engine",
    });
    const coarse = rows.find(({ printedUnit }) => printedUnit === "month" || printedUnit === "year");
    expect(coarse).toBeDefined();
    const event = eventsOf(text).find(({ uid }) => uid.endsWith(`${coarse?.tdb.slice(0, 10)}@apsidary`));
    expect(event?.startDate.isDate).toBe(true);
    expect(event?.duration.toSeconds()).toBeGreaterThanOrEqual(28 * 86_400);
  });

  test("is refused for years that RFC 5545 cannot write", () => {
    expect(() => madeFile(ephemeris, { years: -500, zone: "UTC", pairs: ["earth-sun"] })).toThrow(/years 1 to 9998/);
  });
});
