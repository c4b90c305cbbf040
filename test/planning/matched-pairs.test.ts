import { expect, test } from "vitest";
import { openSources } from "../../src/ephemeris/open-sources.ts";
import { matchedPairs } from "../../src/planning/matched-pairs.ts";
import { planSeason } from "../../src/planning/plan-season.ts";
import { openSky } from "../../src/sky/open-sky.ts";

const site = { latitudeDeg: 46.5, longitudeDeg: 8, heightM: 2100 };

test("near and far pictures of a year are matched each to the most alike, the greatest ratio of widths first", async () => {
  const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
  const query = { pair: "moon-earth", site, from: "2026", to: "2027", sky } as const;
  const rows = [...planSeason(ephemeris, query)];
  const pairs = matchedPairs(rows, ephemeris, sky);
  expect(pairs.length).toBe(rows.filter((row) => row.kind === "periapsis" && row.bestUtc !== null).length);
  let last = Infinity;
  for (const it of pairs) {
    const near = rows.find((row) => row.utc === it.periapsisUtc);
    const far = rows.find((row) => row.utc === it.apoapsisUtc);
    expect([near?.kind, far?.kind]).toEqual(["periapsis", "apoapsis"]);
    expect(it.diameterRatio).toBeCloseTo((near?.bestDiameterArcmin ?? 0) / (far?.bestDiameterArcmin ?? 1), 4);
    expect(it.diameterRatio).toBeLessThanOrEqual(last);
    // the Moon's distance goes from 356 400 to 406 700 km, less or more by the site's 6 400 km at most
    expect(it.diameterRatio).toBeGreaterThan(1);
    expect(it.diameterRatio).toBeLessThan(413_200 / 350_000);
    last = it.diameterRatio;
    expect(it.altitudeDifferenceDeg).toBeCloseTo(Math.abs(it.nearAltitudeDeg - it.farAltitudeDeg), 3);
    // the lit part follows from the phase: (1 − cos elongation) / 2 within a percent and a half, the Sun being 390 times as far
    expect((near?.illuminatedFraction ?? 0) >= 0).toBe(true);
    expect(it.phaseDifferenceDeg).toBeLessThanOrEqual(180);
  }
});

test("pictures of the Sun are matched by altitude alone, and those of a planet are refused", async () => {
  const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
  const season = (pair: "earth-sun" | "mars-sun") =>
    planSeason(ephemeris, { pair, site, from: "2026", to: "2028", sky });
  const [first] = matchedPairs(season("earth-sun"), ephemeris, sky);
  // nearest to farthest: (1 + 0.0167) / (1 − 0.0167), the eccentricity of the Earth's orbit
  expect(first?.diameterRatio).toBeCloseTo(1.0167 / 0.9833, 2);
  expect(first?.phaseDifferenceDeg).toBeNull();
  expect(() => matchedPairs(season("mars-sun"), ephemeris, sky)).toThrow(/cannot be matched/);
});
