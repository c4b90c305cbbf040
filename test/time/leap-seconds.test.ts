import { existsSync, readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { builtInLeapSeconds, parseLeapSeconds } from "../../src/time/leap-seconds.ts";

const DEBIAN = "/usr/share/zoneinfo/leap-seconds.list";
const TEXT = "#@ 4023129600\n2272060800 10 # 1 Jan 1972\n2287785600 11 # 1 Jul 1972\n";

it("carries 27 leap seconds, from 10 s at 1972-01-01 to 37 s at 2017-01-01, valid until 2027-06-28", () => {
  const { steps, expiresUtc, expiresDay } = builtInLeapSeconds();
  expect(steps).toHaveLength(28);
  expect(steps[0]).toEqual({ utcDay: 41_317, taiMinusUtc: 10 });
  expect(steps.at(-1)).toEqual({ utcDay: 57_754, taiMinusUtc: 37 });
  expect([expiresUtc, expiresDay]).toEqual(["2027-06-28", 61_584]);
});

it.skipIf(!existsSync(DEBIAN))("is the list that Debian's tzdata carries (skipped where the file is missing)", () => {
  const debian = parseLeapSeconds(readFileSync(DEBIAN, "utf8"));
  const ours = builtInLeapSeconds();
  const common = Math.min(debian.expiresDay, ours.expiresDay);
  expect(ours.steps.filter((s) => s.utcDay <= common)).toEqual(debian.steps.filter((s) => s.utcDay <= common));
  if (debian.expiresDay === ours.expiresDay) expect(ours.expiresUtc).toBe(debian.expiresUtc);
});

it("reads a list in the IERS form, with any line ends, and freezes it", () => {
  const list = parseLeapSeconds(TEXT.replaceAll("\n", "\r\n"), "mine");
  expect(list.steps).toEqual([
    { utcDay: 41_317, taiMinusUtc: 10 },
    { utcDay: 41_499, taiMinusUtc: 11 },
  ]);
  expect([list.expiresUtc, list.source]).toEqual(["2027-06-28", "mine"]);
  expect(Object.isFrozen(list) && Object.isFrozen(list.steps) && list.steps.every(Object.isFrozen)).toBe(true);
});

it.each([
  ["nothing at all", "", /no step/],
  ["a page that is something else", "<html>\n", /line 1 reads "<html>"/],
  ["no expiry", TEXT.replace(/^#@.*\n/, ""), /no line "#@ SECONDS"/],
  ["a list that begins later", "#@ 4023129600\n2287785600 11\n", /first step/],
  [
    "a step that is not at midnight",
    TEXT.replace("2287785600", "2287785601"),
    /line 3: 2287785601 is not the beginning of a day/,
  ],
  ["a step of two seconds", TEXT.replace(" 11 ", " 12 "), /from 10 s to 12 s/],
  ["steps out of order", `${TEXT}2287785600 12\n`, /line 4.*not later/],
  [
    "an expiry before the last step",
    TEXT.replace("4023129600", "2272147200"),
    /expires on 1972-01-02, before its own last step of 1972-07-01/,
  ],
])("refuses %s and says what is wrong", (_what, text, message) => {
  expect(() => parseLeapSeconds(text)).toThrowError(
    expect.objectContaining({ code: "bad-leap-seconds", message: expect.stringMatching(message) }),
  );
});
