import { expect, test } from "vitest";
import { printedTime, roundedClock } from "../../src/report/printed-time.ts";

const clock = (iso: string) => Date.parse(`${iso}Z`);

test("printedTime rounds minutes and hours to nearest, halves up, and carries into the date", () => {
  expect(printedTime(clock("2026-01-03T17:15:37.939"), "minute")).toBe("2026-01-03 17:16");
  expect(printedTime(clock("2026-01-03T17:15:29.999"), "minute")).toBe("2026-01-03 17:15");
  expect(printedTime(clock("2026-01-03T17:15:30"), "minute")).toBe("2026-01-03 17:16");
  expect(printedTime(clock("2026-12-31T23:59:30"), "minute")).toBe("2027-01-01 00:00");
  expect(printedTime(clock("2026-12-31T23:30:00"), "hour")).toBe("2027-01-01 00");
  expect(printedTime(clock("2028-02-28T23:40:00"), "hour")).toBe("2028-02-29 00");
  expect(printedTime(clock("2026-01-03T17:29:59.999"), "hour")).toBe("2026-01-03 17");
});

test("printedTime gives the day, month and year that hold the instant", () => {
  const late = clock("2026-12-31T23:59:59.999");
  expect(printedTime(late, "day")).toBe("2026-12-31");
  expect(printedTime(late, "month")).toBe("2026-12");
  expect(printedTime(late, "year")).toBe("2026");
});

test("printedTime writes years outside 0 to 9999 with a sign and six digits", () => {
  expect(printedTime(clock("-000499-03-05T10:30:00"), "minute")).toBe("-000499-03-05 10:30");
  expect(printedTime(clock("-000499-03-05T10:30:00"), "year")).toBe("-000499");
});

test("roundedClock rounds times before 1970 to nearest as well", () => {
  expect(roundedClock(clock("1968-05-05T05:05:29"), "minute")).toBe(clock("1968-05-05T05:05:00"));
  expect(roundedClock(clock("1968-05-05T05:05:31"), "minute")).toBe(clock("1968-05-05T05:06:00"));
});
