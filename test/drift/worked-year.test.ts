import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { driftAccount } from "../../src/drift/drift-account.ts";
import { passages } from "../../src/passages/passages.ts";
import { rangeAt } from "../../src/passages/range-at.ts";
import { toRow } from "../../src/passages/to-row.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { builtIn } from "./sources.ts";

/** The year that docs/drift.md works by hand, from the numbers that stand there. */
const EARTH_2019 = "2019-01-03T05:21:08.582";
const BARYCENTRE_2019 = "2019-01-03T22:21:18.830";
const EARTH_2020 = "2020-01-05T07:49:03.540";
const BARYCENTRE_2020 = "2020-01-04T05:15:17.103";
const SLOPE_DAYS = 365.2596969706;

/** Seconds between two TDB texts; TDB knows no leap seconds, so plain calendar arithmetic serves. */
const between = (from: string, to: string) => (Date.parse(`${to}Z`) - Date.parse(`${from}Z`)) / 1000;

const ephemeris = await builtIn();
const [row] = driftAccount(ephemeris, { from: "2020", to: "2020-02" });

test("the instants of the worked year are those of the finder", () => {
  const found = (pair: "earth-sun" | "emb-sun") =>
    [...passages(ephemeris, pair, { from: "2019", to: "2021", kind: "periapsis" })].map(
      (one) => toRow(one, ephemeris).tdb,
    );
  expect(found("earth-sun")).toEqual([EARTH_2019, EARTH_2020]);
  expect(found("emb-sun")).toEqual([BARYCENTRE_2019, BARYCENTRE_2020]);
});

test("the perihelion of the worked year is the almanac office's, to the minute", () => {
  // U.S. Naval Observatory, Earth's Seasons (from memory): 2020-01-05 07:48
  expect(Math.abs(tdbOf(row?.utc ?? "") - tdbOf("2020-01-05T07:48"))).toBeLessThanOrEqual(30);
});

test("the worked year comes out step for step", () => {
  const step = between(EARTH_2019, EARTH_2020) / 86_400;
  expect(step).toBeCloseTo(367.1027194, 7);
  expect(row?.stepDays).toBeCloseTo(step, 7);

  const date = (step - 365) * 24;
  expect(date).toBeCloseTo(50.46527, 5);
  expect(row?.dateStepHours).toBeCloseTo(date, 5);

  const calendar = (SLOPE_DAYS - 365) * 24;
  expect(calendar).toBeCloseTo(6.23273, 5);
  expect(row?.calendarHours).toBeCloseTo(calendar, 5);

  const planets = (between(BARYCENTRE_2019, BARYCENTRE_2020) / 86_400 - SLOPE_DAYS) * 24;
  expect(planets).toBeCloseTo(0.66679, 5);
  expect(row?.planetsHours).toBeCloseTo(planets, 5);

  const moon = (between(BARYCENTRE_2020, EARTH_2020) - between(BARYCENTRE_2019, EARTH_2019)) / 3600;
  expect(moon).toBeCloseTo(43.56575, 5);
  expect(row?.moonHours).toBeCloseTo(moon, 5);

  expect(calendar + planets + moon).toBeCloseTo(date, 9);
});

test("the first order of the worked year is rate over acceleration at the barycentre's passage", () => {
  const { rangeRateKmPerDay, rangeAccelerationKmPerDay2 } = rangeAt(ephemeris, "earth-sun", "2020-01-04T05:14:07.919");
  expect(rangeRateKmPerDay).toBeCloseTo(-910.809, 3);
  expect(rangeAccelerationKmPerDay2).toBeCloseTo(803.1, 1);
  expect(910.809 / 803.1).toBeCloseTo(1.134, 3);
  expect(row?.firstOrderHours).toBeCloseTo((910.809 / 803.1) * 24, 1);
  expect(row?.bodyMinusBarycentreHours).toBeCloseTo(26.5629, 4);
});

test("the page prints these numbers", () => {
  const page = readFileSync(new URL("../../docs/drift.md", import.meta.url), "utf8");
  const printed = [EARTH_2019, BARYCENTRE_2019, EARTH_2020, BARYCENTRE_2020].map((text) => text.replace("T", " "));
  for (const text of [
    ...printed,
    "367.1027194",
    "50.46527 h",
    "6.23273 h",
    "0.66679 h",
    "43.56575 h",
    "−910.809",
    "803.1 km",
  ]) {
    expect(page).toContain(text);
  }
  expect(page).toContain(row?.sentence);
});
