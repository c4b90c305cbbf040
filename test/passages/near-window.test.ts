import { beforeAll, describe, expect, test } from "vitest";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { nearWindow } from "../../src/passages/near-window.ts";
import { nextPassage } from "../../src/passages/next-passage.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { formatUtc } from "../../src/time/format-utc.ts";
import { utcOf } from "../../src/time/utc-of.ts";
import { openDe405 } from "../de405/read.ts";

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

const utc = (tdb: number | null) => (tdb === null ? null : formatUtc(utcOf(tdb), 0));

/** The instant beyond a passage at which DE405's own distance passes a limit, by bisection. */
function edgeOnDe405(pair: string, from: number, to: number, limitKm: number): number {
  const de405 = openDe405();
  const beyond = (t: number) => {
    const [x = 0, y = 0, z = 0] = de405.pairState(pair, t);
    return Math.hypot(x, y, z) > limitKm;
  };
  let [low, high] = [from, to];
  const start = beyond(low);
  while (Math.abs(high - low) > 1e-3) {
    const middle = (low + high) / 2;
    if (beyond(middle) === start) low = middle;
    else high = middle;
  }
  return low;
}

describe("the near window", () => {
  test("of perihelion 2026 within 0.1 %: 2025-12-15 13:27:16 to 2026-01-22 23:33:42 UTC, to 1 s of a bisection on DE405", () => {
    const passage = nextPassage(ephemeris, "earth-sun", "2026-01-01", "periapsis") as Passage;
    const window = nearWindow(ephemeris, passage, { percent: 0.1 });
    // figures measured on DE405 before this code was written
    expect([utc(window.from), utc(window.to)]).toEqual(["2025-12-15T13:27:16Z", "2026-01-22T23:33:42Z"]);
    expect(((window.to ?? 0) - (window.from ?? 0)) / 86400).toBeCloseTo(38.42112, 4);
    for (const [edge, side] of [
      [window.from, -1],
      [window.to, 1],
    ] as const) {
      const true405 = edgeOnDe405(
        "earth-sun",
        passage.tdbSeconds,
        passage.tdbSeconds + side * 40 * 86400,
        window.limitKm,
      );
      expect(Math.abs((edge ?? 0) - true405)).toBeLessThan(1);
    }
  });

  test("of the perigee of 2026-01-01 within 0.1 %: from 05:57:08 to 13:17:58 on the 2nd", () => {
    const passage = nextPassage(ephemeris, "moon-earth", "2026-01-01", "periapsis") as Passage;
    const window = nearWindow(ephemeris, passage, { percent: 0.1 });
    expect([utc(window.from), utc(window.to)]).toEqual(["2026-01-01T05:57:08Z", "2026-01-02T13:17:58Z"]);
  });

  test("lies below an apoapsis, and takes kilometres as well as percent", () => {
    const passage = nextPassage(ephemeris, "moon-earth", "2026-01-05", "apoapsis") as Passage;
    const window = nearWindow(ephemeris, passage, { km: 1000 });
    expect(window.limitKm).toBeCloseTo(passage.distanceKm - 1000, 6);
    expect(window.from).toBeLessThan(passage.tdbSeconds);
    expect(window.to).toBeGreaterThan(passage.tdbSeconds);
  });

  test("goes on across the end of a source, and has no end where the last source ends first", async () => {
    const passage = nextPassage(ephemeris, "earth-sun", "1960-01-01", "periapsis") as Passage;
    const wide = nearWindow(ephemeris, passage, { percent: 1 });
    expect(wide.cut).toBe(false);
    expect(utc(wide.from)).toMatch(/^1959-10/);
    const alone = await openSources({ series: false, engine: false });
    const cut = nearWindow(alone, nextPassage(alone, "earth-sun", "1960-01-01", "periapsis") as Passage, {
      percent: 1,
    });
    expect(cut).toMatchObject({ from: null, cut: true });
    expect(cut.to).toBeCloseTo(wide.to as number, 2);
  });

  test("of no size is refused", () => {
    const passage = nextPassage(ephemeris, "moon-earth", "2026-01-05") as Passage;
    for (const nearness of [{ km: 0 }, { percent: -1 }, { km: Number.NaN }]) {
      expect(() => nearWindow(ephemeris, passage, nearness)).toThrow(/above zero/);
    }
  });
});
