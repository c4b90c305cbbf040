import { beforeAll, describe, expect, test } from "vitest";
import { AU_KM } from "../../src/bodies/constants.ts";
import { completeStyle } from "../../src/calendar/house-style.ts";
import { localTimeOf } from "../../src/calendar/local-time-of.ts";
import { printedDistance } from "../../src/calendar/printed-distance.ts";
import { printedLocal } from "../../src/calendar/printed-local.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { passages } from "../../src/passages/passages.ts";
import { toRow } from "../../src/passages/to-row.ts";

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

/** Some of the passages of the kernel's span: more than a thousand in all, the Moon's from a part of it to save time. */
const PARTS = [
  ["moon-earth", "1990", "2015"],
  ["earth-sun", "1961", "2059"],
  ["mercury-sun", "1980", "2020"],
  ["venus-sun", "1980", "2020"],
  ["mars-sun", "1970", "2050"],
] as const;

describe.each(["series", "engine"] as const)("by the %s alone", (source) => {
  // Both are checked against the kernel, which is JPL's DE405 to a fraction of a second and some metres.
  test("at least 95 % of more than 1000 printed times and distances are those that the kernel gives", () => {
    let rows = 0;
    const wrong = { nearest: 0, cut: 0, km: 0, au: 0 };
    for (const [pair, from, to] of PARTS) {
      const truths = [...passages(ephemeris, pair, { from, to, source: "kernel" })];
      for (const passage of passages(ephemeris, pair, { from, to, source })) {
        const truth = nearestOf(truths, passage);
        if (!truth) continue;
        rows++;
        const { utcUncertaintySeconds } = toRow(passage, ephemeris);
        for (const rounding of ["nearest", "cut"] as const) {
          const style = completeStyle({ rounding });
          const printed = (tdb: number) =>
            printedLocal(localTimeOf(tdb, "Pacific/Chatham", ephemeris.leapSeconds), utcUncertaintySeconds, style).text;
          if (printed(passage.tdbSeconds) !== printed(truth.tdbSeconds)) wrong[rounding]++;
        }
        const ours = printedDistance(passage.distanceKm, passage.distanceUncertaintyKm);
        const step = 10 ** -ours.kmDigits;
        if (ours.km !== (Math.round(truth.distanceKm / step) * step).toFixed(0)) wrong.km++;
        if (ours.au !== (truth.distanceKm / AU_KM).toFixed(ours.auDigits)) wrong.au++;
      }
    }
    expect(rows).toBeGreaterThan(1000);
    for (const count of Object.values(wrong))
      expect(count / rows, JSON.stringify({ wrong, rows })).toBeLessThanOrEqual(0.05);
  });
});

function nearestOf(truths: readonly Passage[], { kind, tdbSeconds }: Passage): Passage | null {
  const same = truths.filter((truth) => truth.kind === kind);
  const nearest = same.reduce<Passage | null>((best, truth) => {
    return !best || Math.abs(truth.tdbSeconds - tdbSeconds) < Math.abs(best.tdbSeconds - tdbSeconds) ? truth : best;
  }, null);
  // at the ends of a part one of the two may lie outside
  return nearest && Math.abs(nearest.tdbSeconds - tdbSeconds) < 5 * 86_400 ? nearest : null;
}
