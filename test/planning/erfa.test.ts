import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import { pairOf } from "../../src/bodies/pair.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { bodyInSky } from "../../src/planning/body-in-sky.ts";
import { stretchesAbove } from "../../src/planning/stretches.ts";
import { LOOK } from "../../src/sky/horizon.ts";
import { openSky, type Sky } from "../../src/sky/open-sky.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";

// ERFA 2.0.0.1 (the IAU's SOFA routines, Debian's python3-erfa) and JPL DE405, by make-erfa-cases.py beside this file.
const cases: {
  places: { body: string; site: [number, number, number]; utc: string; altitudeDeg: number; azimuthDeg: number }[];
  crossings: { body: string; site: [number, number, number]; utc: string; what: "rise" | "set" }[];
} = JSON.parse(readFileSync(new URL("erfa-cases.json", import.meta.url), "utf8"));

const PAIRS = {
  moon: "moon-earth",
  venus: "venus-sun",
  mars: "mars-sun",
  jupiter: "jupiter-sun",
  sun: "earth-sun",
} as const;

let ephemeris: Ephemeris;
let sky: Sky;
beforeAll(async () => {
  [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
});

const siteOf = ([latitudeDeg, longitudeDeg, heightM]: [number, number, number]) => ({
  latitudeDeg,
  longitudeDeg,
  heightM,
});

const inSky = (body: string) => bodyInSky(ephemeris, pairOf(PAIRS[body as keyof typeof PAIRS]), "auto");

describe("a body over a site", () => {
  // Demanded is 0.01°. What is left: UTC for UT1 after 2026 is the same here and there; before, the half-yearly table of ΔT (0.05 s, 0.0002°);
  // the observer's own aberration (0.0001°), five terms of nutation (0.1″).
  test("stands within 0.0005° of ERFA, for 50 cases from pole to equator", () => {
    expect(cases.places).toHaveLength(50);
    const place = new Float64Array(9);
    const seen = new Float64Array(4);
    let worst = 0;
    for (const { body, site, utc, altitudeDeg, azimuthDeg } of cases.places) {
      const tdb = tdbOf(utc);
      const horizon = sky.horizon(siteOf(site));
      const { apparent, apparentNearby } = inSky(body);
      for (const where of [apparent, apparentNearby]) {
        where(tdb, place);
        horizon.look(tdb, place, seen);
        const across = (((seen[LOOK.azimuth] as number) - azimuthDeg + 540) % 360) - 180;
        worst = Math.max(
          worst,
          Math.abs((seen[LOOK.altitude] as number) - altitudeDeg),
          Math.abs(across) * Math.cos((altitudeDeg * Math.PI) / 180),
        );
      }
    }
    expect(worst).toBeLessThan(0.0005);
  });

  // Demanded are 10 s.
  test("rises and sets within 0.5 s of ERFA where it does not graze", () => {
    expect(cases.crossings.length).toBeGreaterThan(25);
    let worst = 0;
    for (const { body, site, utc, what } of cases.crossings) {
      const tdb = tdbOf(utc);
      const horizon = sky.horizon(siteOf(site));
      const { apparentNearby } = inSky(body);
      const place = new Float64Array(9);
      const seen = new Float64Array(4);
      const altitude = (t: number) => {
        apparentNearby(t, place);
        horizon.look(t, place, seen);
        return seen[LOOK.altitude] as number;
      };
      const ends = stretchesAbove(altitude, tdb - 7000, tdb + 7100, 7200, 0.5).map((up) =>
        what === "rise" ? up.from : up.to,
      );
      worst = Math.max(worst, Math.min(...ends.map((end) => Math.abs(end - tdb))));
    }
    expect(worst).toBeLessThan(0.5);
  });
});
