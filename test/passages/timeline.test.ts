import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type SuppliedExtremum, timelineOf } from "../../src/passages/timeline.ts";
import { cosineSource, MONTH, moon, syntheticSource } from "./synthetic.ts";

function list(sources: Parameters<typeof timelineOf>[1], from: number, to: number): SuppliedExtremum[] {
  const next = timelineOf(moon, sources).extremaFrom(from);
  const found: SuppliedExtremum[] = [];
  for (let e = next(); e && e.tdb < to; e = next()) if (e.tdb >= from) found.push(e);
  return found;
}

const wide = { from: -20 * MONTH, to: 20 * MONTH };
/** Seconds by which the two sources disagree: up to a twelfth of the period, more than any real pair of sources does. */
const disagreement = fc.double({ min: -MONTH / 12, max: MONTH / 12, noNaN: true });
const edge = fc.double({ min: -6 * MONTH, max: 6 * MONTH, noNaN: true });

describe("the timeline of a pair", () => {
  test("loses no passage and doubles none where sources that disagree meet, wherever the seams fall", () => {
    fc.assert(
      fc.property(edge, fc.double({ min: 1.1, max: 5, noNaN: true }), disagreement, (start, months, late) => {
        const better = { from: start, to: start + months * MONTH };
        const found = list(
          [cosineSource("better", better, 0), cosineSource("net", wide, late)],
          -15 * MONTH,
          15 * MONTH,
        );
        for (let i = 1; i < found.length; i++) {
          const [before, after] = [found[i - 1] as SuppliedExtremum, found[i] as SuppliedExtremum];
          expect(after.kind).not.toBe(before.kind);
          const gap = after.tdb - before.tdb;
          expect(gap).toBeGreaterThan(MONTH / 2 - Math.abs(late) - 1);
          expect(gap).toBeLessThan(MONTH / 2 + Math.abs(late) + 1);
        }
        for (const { supply, tdb } of found) {
          if (supply.source.id === "better") expect(tdb >= better.from && tdb <= better.to).toBe(true);
          // the net's own row stands only where the better source's instant lies outside its span, or on its very edge
          else expect(tdb - late < better.from + 1 || tdb - late > better.to - 1).toBe(true);
        }
      }),
    );
  });

  test("gives the same list, to the bit, when it is cut anywhere near a seam and joined", () => {
    const sources = [
      cosineSource("better", { from: 0.37 * MONTH, to: 4.1 * MONTH }, 0),
      cosineSource("net", wide, 0.06 * MONTH),
    ];
    const whole = list(sources, -3 * MONTH, 8 * MONTH).map((e) => [e.kind, e.tdb, e.supply.source.id]);
    fc.assert(
      fc.property(fc.double({ min: -3 * MONTH, max: 8 * MONTH, noNaN: true }), (cut) => {
        const parts = [...list(sources, -3 * MONTH, cut), ...list(sources, cut, 8 * MONTH)];
        expect(parts.map((e) => [e.kind, e.tdb, e.supply.source.id])).toEqual(whole);
      }),
    );
  });

  test("uses the next source where a better one is too short to hold an extremum", () => {
    const short = cosineSource("short", { from: 0.1 * MONTH, to: 0.3 * MONTH }, 0);
    expect(
      list([short, cosineSource("net", wide, 0)], -1.1 * MONTH, 0.9 * MONTH).map((e) => e.supply.source.id),
    ).toEqual(Array(4).fill("net"));
  });

  test("stops at a gap between sources and says what is covered", () => {
    const timeline = timelineOf(moon, [
      cosineSource("early", { from: -5.1 * MONTH, to: -2.1 * MONTH }, 0),
      cosineSource("late", { from: 2.1 * MONTH, to: 5.1 * MONTH }, 0),
    ]);
    expect(timeline.covered).toEqual([
      { from: -5.1 * MONTH, to: -2.1 * MONTH },
      { from: 2.1 * MONTH, to: 5.1 * MONTH },
    ]);
    const next = timeline.extremaFrom(-5.1 * MONTH);
    let last = next();
    for (let e = last; e; e = next()) last = e;
    expect(last?.tdb).toBeLessThan(-2.1 * MONTH);
    expect(timeline.supplyAt(0)).toBeNull();
  });

  test("refuses a pair that nobody supplies, saying so in one line", () => {
    expect(() => timelineOf(moon, [syntheticSource("empty", [], () => 1)])).toThrow(
      /^empty does not supply moon-earth .*\.$/,
    );
  });
});
