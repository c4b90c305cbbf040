import { describe, expect, test } from "vitest";
import { signedDegrees } from "../../src/drift/ecliptic.ts";
import { elongationOf, nearestSyzygy } from "../../src/drift/moon-phase.ts";
import { supplyOf } from "../../src/drift/supply-near.ts";
import { openSky } from "../../src/sky/open-sky.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { builtIn } from "./sources.ts";

const ephemeris = await builtIn();

describe("the Moon's phase", () => {
  const tdb = tdbOf("2020-01-05T07:48");
  const earth = supplyOf(ephemeris, "earth-sun", "de405", tdb, "auto");
  const moon = supplyOf(ephemeris, "moon-earth", "de405", tdb, "auto");
  if (!earth || !moon) throw new Error("the kernel supplies both");
  const elongation = elongationOf(earth, moon);

  test("agrees with the sky's elongation within 0.01°, light time apart", async () => {
    const sky = await openSky();
    for (let i = 0; i < 30; i++) {
      const at = tdb + i * 86_400;
      expect(Math.abs(signedDegrees(elongation(at) - sky.moonElongationDeg(at)))).toBeLessThan(0.01);
    }
  });

  test("is reckoned from the nearer of new and full Moon, on either side", () => {
    // phases of 2019-2020 from published tables (from memory), to the minute in UTC
    const day = 86_400;
    const full = tdbOf("2020-01-10T19:21");
    const fresh = tdbOf("2019-12-26T05:13");
    expect(nearestSyzygy(elongation, full - 5 * day, earth.span)).toMatchObject({ phase: "full" });
    expect(nearestSyzygy(elongation, full - 5 * day, earth.span).daysPast).toBeCloseTo(-5, 2);
    expect(nearestSyzygy(elongation, full + 6 * day, earth.span).daysPast).toBeCloseTo(6, 2);
    expect(nearestSyzygy(elongation, fresh + 6 * day, earth.span)).toMatchObject({ phase: "new" });
    expect(nearestSyzygy(elongation, fresh + 6 * day, earth.span).daysPast).toBeCloseTo(6, 2);
    expect(nearestSyzygy(elongation, fresh - 7 * day, earth.span).daysPast).toBeCloseTo(-7, 2);
  });

  test("falls back on the mean motion where the sources end", () => {
    const { phase, daysPast } = nearestSyzygy(elongation, tdb, { from: tdb, to: tdb });
    expect(phase).toBe("full");
    expect(Math.abs(daysPast + 5.5)).toBeLessThan(1);
  });
});
