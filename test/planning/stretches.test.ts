import { describe, expect, test } from "vitest";
import { stretchesAbove } from "../../src/planning/stretches.ts";

const DAY = 86_400;
/** Height of a wave of one day above a level, and the half-width of its part above zero: arccos of the level. */
const wave = (level: number) => (t: number) => Math.cos((2 * Math.PI * t) / DAY) - level;
const half = (level: number) => (Math.acos(level) / (2 * Math.PI)) * DAY;

describe("stretchesAbove", () => {
  test.each([0.5, 0, -0.7, 0.99999, -0.99999])(
    "finds every day's stretch above %f of a wave, however short",
    (level) => {
      const found = stretchesAbove(wave(level), -10_000, 3 * DAY + 10_000, 3600, 0.01);
      const days = [0, 1, 2, 3].map((day) => [day * DAY - half(level), day * DAY + half(level)] as const);
      const inside = days.map(([from, to]) => [Math.max(from, -10_000), Math.min(to, 3 * DAY + 10_000)] as const);
      expect(found).toHaveLength(4);
      found.forEach(({ from, to }, i) => {
        expect(Math.abs(from - (inside[i]?.[0] as number))).toBeLessThan(0.05);
        expect(Math.abs(to - (inside[i]?.[1] as number))).toBeLessThan(0.05);
      });
    },
  );

  test("gives the whole span of what is always above, and nothing of what never is, of a touch or of an empty span", () => {
    expect(stretchesAbove(wave(-2), 0, 100_000, 3600, 0.01)).toEqual([{ from: 0, to: 100_000 }]);
    expect(stretchesAbove(wave(2), 0, 100_000, 3600, 0.01)).toEqual([]);
    expect(stretchesAbove(wave(1), 0, 100_000, 3600, 0.01)).toEqual([]);
    expect(stretchesAbove(wave(0), 5, 5, 3600, 0.01)).toEqual([]);
  });
});
