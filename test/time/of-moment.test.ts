import { DateTime } from "luxon";
import { expect, test } from "vitest";
import { dateTimeOfMoment, utcOfMoment } from "../../src/time/of-moment.ts";

test("a moment is told in UTC and in any zone, in whatever form it was given", () => {
  for (const moment of [
    "2026-01-03T17:15:37.939Z",
    new Date("2026-01-03T17:15:37.939Z"),
    DateTime.fromISO("2026-01-04T06:15:37.939+13:00"),
    { epochNanoseconds: 1767460537939000000n },
  ]) {
    expect(dateTimeOfMoment(moment, "Pacific/Auckland").toISO()).toBe("2026-01-04T06:15:37.939+13:00");
    expect(utcOfMoment(moment).secondsOfDay).toBeCloseTo(62137.939, 6);
    expect(utcOfMoment(moment).basis).toBe("leap-seconds");
  }
});
