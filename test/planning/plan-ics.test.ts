import ICAL from "ical.js";
import { beforeAll, expect, test } from "vitest";
import { openSources } from "../../src/ephemeris/open-sources.ts";
import { planIcs } from "../../src/planning/plan-ics.ts";
import type { PlanRow } from "../../src/planning/plan-row.ts";
import { planSeason } from "../../src/planning/plan-season.ts";
import { openSky } from "../../src/sky/open-sky.ts";

let rows: PlanRow[];
beforeAll(async () => {
  const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
  const site = { name: "Low; Basin, East", latitudeDeg: 31.5, longitudeDeg: 35.5, heightM: -430 };
  rows = [...planSeason(ephemeris, { pair: "moon-earth", site, from: "2026", to: "2027", sky })];
});

test("a calendar file holds each near interval and each best moment once, to the second, as another library reads it", () => {
  const calendar = new ICAL.Component(ICAL.parse(planIcs(rows, "Plan")));
  const events = calendar.getAllSubcomponents("vevent").map((part) => new ICAL.Event(part));
  const near = rows.filter((row) => row.nearFromUtc !== null && row.nearToUtc !== null);
  const best = rows.filter((row) => row.bestUtc !== null);
  expect(events).toHaveLength(near.length + best.length);
  expect(new Set(events.map((event) => event.uid)).size).toBe(events.length);
  const second = (utc: string | null) => Math.floor(Date.parse(utc as string) / 1000);
  const of = (which: string) => events.filter((event) => event.uid.startsWith(which));
  expect(of("near-").map((it) => [it.startDate.toUnixTime(), it.endDate.toUnixTime()])).toEqual(
    near.map((row) => [second(row.nearFromUtc), second(row.nearToUtc)]),
  );
  expect(of("best-").map((it) => it.startDate.toUnixTime())).toEqual(best.map((row) => second(row.bestUtc)));
  for (const event of events) expect(event.location).toBe("Low; Basin, East");
});

test("the same plan gives the same bytes, in lines of 75 octets at most that end in CR LF", () => {
  const text = planIcs(rows, "Plan");
  expect(planIcs(rows, "Plan")).toBe(text);
  for (const line of text.split("\r\n")) expect(Buffer.byteLength(line)).toBeLessThanOrEqual(75);
  expect(text.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
});
