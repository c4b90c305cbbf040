import { beforeAll, describe, expect, test } from "vitest";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { passages } from "../../src/passages/passages.ts";
import { planPassage } from "../../src/planning/plan-passage.ts";
import type { PlanRow } from "../../src/planning/plan-row.ts";
import { planSeason, type SeasonQuery } from "../../src/planning/plan-season.ts";
import { openSky, type Sky } from "../../src/sky/open-sky.ts";

let ephemeris: Ephemeris;
let sky: Sky;
beforeAll(async () => {
  [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
});

type Place = readonly [latitude: number, longitude: number, height: number];
function plan(
  pair: SeasonQuery["pair"],
  [latitudeDeg, longitudeDeg, heightM]: Place,
  from: string,
  to: string,
  options: Partial<SeasonQuery> = {},
): PlanRow[] {
  return [...planSeason(ephemeris, { pair, site: { latitudeDeg, longitudeDeg, heightM }, from, to, sky, ...options })];
}

describe("at the poles", () => {
  test.each([90, -90])(
    "a body at %d° has no meridian, and rises, sets or is best only as the seasons let it",
    (latitude) => {
      for (const row of plan("moon-earth", [latitude, 0, 0], "2026", "2027")) {
        expect(row.transitUtc).toBeNull();
        expect(row.whyNoTransit).toBe(row.whyNoRise === "stays-down" ? "stays-down" : "pole");
        expect(Number.isFinite(row.altitudeDeg) && Number.isFinite(row.azimuthDeg)).toBe(true);
        expect(row.bestUtc === null).toBe(row.whyNoBest !== null);
        expect(row.windows.length === 0).toBe(row.whyNot !== null);
        // at a pole the plane of the horizon is the equator: the Moon's declination changes by less than 8° a day
        expect(Math.abs(row.altitudeDeg)).toBeLessThan(29.8);
      }
    },
  );

  test("the Sun of aphelion 2026 stays up at the north pole at its declination, and down at the south pole", () => {
    const [north] = plan("earth-sun", [90, 0, 0], "2026-07", "2026-08");
    const [south] = plan("earth-sun", [-90, 0, 2835], "2026-07", "2026-08");
    // the Sun's declination on 2026-07-06: 22.6°, whatever almanac (from memory)
    expect(north?.altitudeDeg).toBeCloseTo(22.6, 0);
    expect(south?.altitudeDeg).toBeCloseTo(-22.6, 0);
    expect(north).toMatchObject({
      up: true,
      dark: null,
      riseUtc: null,
      setUtc: null,
      whyNoRise: "stays-up",
      whyNoBest: null,
    });
    expect(south).toMatchObject({
      up: false,
      riseUtc: null,
      whyNoRise: "stays-down",
      bestUtc: null,
      whyNoBest: "never-up",
    });
  });

  test("the whole year's seasons reach the right pole: no sky is dark at the north pole in June", () => {
    for (const row of plan("moon-earth", [90, 0, 0], "2026-05-20", "2026-07-20")) {
      expect(row.dark).toBe(false);
      expect(row.bestUtc).toBeNull();
      expect(["never-dark", "never-up"]).toContain(row.whyNoBest);
    }
  });
});

test("the midnight sun gives no best moment and no window, and says why", () => {
  const rows = plan("moon-earth", [69.6, 18.9, 20], "2026-06", "2026-07");
  expect(rows.map((row) => row.bestUtc)).toEqual([null, null, null]);
  expect(new Set(rows.map((row) => row.whyNot))).toEqual(new Set(["never-up", "never-dark"]));
  const [sun] = plan("earth-sun", [69.6, 18.9, 20], "2026-07", "2026-08");
  expect(sun).toMatchObject({ riseUtc: null, setUtc: null, whyNoRise: "stays-up" });
  expect(sun?.transitUtc).not.toBeNull();
});

test("the polar night gives the Sun no rise, no transit above the horizon, no best moment", () => {
  const [row] = plan("earth-sun", [78.2, 15.6, 50], "2026-01", "2026-02", { within: { percent: 0.1 } });
  expect(row).toMatchObject({
    up: false,
    riseUtc: null,
    transitUtc: null,
    setUtc: null,
    whyNoRise: "stays-down",
    whyNoTransit: "stays-down",
    bestUtc: null,
    bestAltitudeDeg: null,
    whyNoBest: "never-up",
    windows: [],
    whyNot: "never-up",
  });
});

test("a Moon that stays down for days has no rise and no window", () => {
  const rows = plan("moon-earth", [75, 0, 0], "2026", "2027", { within: { km: 1000 } });
  const down = rows.filter((row) => row.whyNoRise === "stays-down");
  expect(down.length).toBeGreaterThan(3);
  for (const row of down) {
    expect(row).toMatchObject({ up: false, riseUtc: null, setUtc: null, bestUtc: null, whyNoBest: "never-up" });
    expect(row.topocentricDistanceKm).toBeGreaterThan(row.distanceKm);
  }
});

test("rise, transit and set are of one stay, in this order, which holds the passage where the body is up", () => {
  let [whole, high] = [0, 0];
  for (const latitude of [-64, -50, 0, 35, 58, 62, 64, 65.5]) {
    for (const { riseUtc, transitUtc, setUtc, whyNoRise, utc, altitudeDeg } of plan(
      "moon-earth",
      [latitude, 40, 0],
      "2025",
      "2027",
    )) {
      expect(whyNoRise === null).toBe(riseUtc !== null && setUtc !== null);
      if (riseUtc === null || setUtc === null || transitUtc === null) continue;
      whole++;
      expect(riseUtc < transitUtc && transitUtc < setUtc).toBe(true);
      if (Math.abs(altitudeDeg) > 0.001) expect(altitudeDeg > 0).toBe(riseUtc < utc && utc < setUtc);
      if (Date.parse(setUtc) - Date.parse(riseUtc) > 20 * 3.6e6) high++;
    }
  }
  expect(whole).toBeGreaterThan(350);
  expect(high).toBeGreaterThan(0); // stays of more than 20 h are among them
});

test("0°N 180°E is the same place as 180°W, to the byte but for its name", () => {
  const at = (longitude: number) =>
    plan("moon-earth", [0, longitude, 0], "2026", "2026-04").map((row) => ({ ...row, site: "" }));
  expect(at(180)).toEqual(at(-180));
});

test("a site 430 m below the sea has no dip of its horizon, one at 8 849 m has 3.0°, and both can be planned", () => {
  expect(sky.horizon({ latitudeDeg: 31.5, longitudeDeg: 35.5, heightM: -430 }).dipDeg).toBeNull();
  // 1.76′ √h without refraction's share: 1.93′ √8849 = 181′ (geometry, √(2h/R))
  const high = sky.horizon({ latitudeDeg: 28, longitudeDeg: 86.9, heightM: 8849 }).dipDeg as number;
  expect(high).toBeCloseTo((Math.sqrt((2 * 8.849) / 6378.137) * 180) / Math.PI, 2);
  for (const place of [
    [31.5, 35.5, -430],
    [28, 86.9, 8849],
  ] as const) {
    const rows = plan("moon-earth", place, "2026", "2026-03");
    expect(rows).toHaveLength(5);
    for (const row of rows) expect([row.riseUtc, row.transitUtc, row.setUtc]).not.toContain(null);
  }
});

describe("options", () => {
  const place = [46.5, 8, 0] as const;

  test("refraction lifts by 29′ at altitude 0 and changes nothing of the Sun's altitude", () => {
    // T. Sæmundsson's formula: 28.98′ at true altitude 0 (J. Meeus, Astronomical Algorithms, 2nd ed., ch. 16; from memory)
    const { refraction } = sky.horizon({ latitudeDeg: 0, longitudeDeg: 0, heightM: 0 });
    expect(60 * refraction(0)).toBeCloseTo(28.98, 1);
    expect(sky.horizon({ latitudeDeg: 0, longitudeDeg: 0, heightM: 5500 }).refraction(0) / refraction(0)).toBeCloseTo(
      0.57,
      1,
    );
    const [plain] = plan("earth-sun", place, "2026", "2026-02");
    const [lifted] = plan("earth-sun", place, "2026", "2026-02", { refraction: true });
    const minutes = (Date.parse(plain?.riseUtc as string) - Date.parse(lifted?.riseUtc as string)) / 60_000;
    expect(minutes).toBeGreaterThan(2.5);
    expect(minutes).toBeLessThan(5.5);
    expect(lifted?.sunAltitudeDeg).toBe(plain?.sunAltitudeDeg);
  });

  test("a higher least altitude and a darker sky only take windows away", () => {
    const hours = (rows: PlanRow[]) =>
      rows
        .flatMap((row) => row.windows)
        .reduce((sum, { fromUtc, toUtc }) => sum + (Date.parse(toUtc) - Date.parse(fromUtc)) / 3.6e6, 0);
    const plain = hours(plan("moon-earth", place, "2026", "2026-04", { darkBelowDeg: -6 }));
    const dark = hours(plan("moon-earth", place, "2026", "2026-04"));
    const high = hours(plan("moon-earth", place, "2026", "2026-04", { minAltitudeDeg: 30 }));
    expect(dark).toBeLessThan(plain);
    expect(high).toBeLessThan(dark);
    expect(high).toBeGreaterThan(0);
  });

  test("planPassage gives what planSeason gives", () => {
    const [latitudeDeg, longitudeDeg, heightM] = place;
    const found = passages(ephemeris, "mars-sun", { from: "2026", to: "2028" });
    const one = [...found].map((it) => planPassage(ephemeris, it, { latitudeDeg, longitudeDeg, heightM }, { sky }));
    expect(one).toEqual(plan("mars-sun", place, "2026", "2028"));
  });

  test("names what is wrong with a pair, a site or an option", () => {
    expect(() => plan("earth-ssb", place, "2026", "2027")).toThrow(/nobody sees the barycentre/);
    expect(() => plan("moon-earth", [91, 0, 0], "2026", "2027")).toThrow(/latitude 91 is not within -90 and 90/);
    expect(() => plan("moon-earth", [139.7, 35.6, 0], "2026", "2027")).toThrow(/did you mean 35.6,139.7\?/);
    expect(() => plan("moon-earth", [0, 400, 0], "2026", "2027")).toThrow(/longitude 400/);
    expect(() => plan("moon-earth", [0, 0, 1e6], "2026", "2027")).toThrow(/height 1000000/);
    expect(() => plan("moon-earth", place, "2026", "2027", { darkBelowDeg: -100 })).toThrow(/darkness/);
    expect(() => plan("moon-earth", place, "2026", "2027", { within: { km: -1 } }).length).toThrow(/nearness/);
  });
});

describe("where the sources end", () => {
  test("the near interval is cut, not invented, and windows are looked for in what is left", async () => {
    const kernelOnly = await openSources({ engine: false, series: false });
    const site = { latitudeDeg: 46.5, longitudeDeg: 8, heightM: 0 };
    const query = { pair: "earth-sun", site, from: "2060-01-01", to: "2060-01-20", sky } as const;
    const [row] = planSeason(kernelOnly, query);
    expect(row).toMatchObject({ nearToUtc: null, nearCut: true, whyNoNear: "no-data" });
    expect(row?.nearFromUtc).toMatch(/^2059-/);
    expect(row?.windows.length).toBeGreaterThan(0);
  });

  test("a distance that never leaves the limit has no near interval's ends, says so, and is not followed for ever", () => {
    // the orbit of Venus has an eccentricity of 0.0068: its distance changes by 1.4 %
    for (const row of plan("venus-sun", [46.5, 8, 0], "2026", "2028", { within: { percent: 5 } })) {
      expect(row).toMatchObject({
        nearFromUtc: null,
        nearToUtc: null,
        nearCut: true,
        whyNoNear: "stays-near",
        windowsCut: true,
      });
    }
    // 14 % above some perigees lie only the farther apogees: an end may be there on one side alone
    for (const row of plan("moon-earth", [46.5, 8, 0], "2026", "2027", { within: { km: 49_300 } })) {
      expect(row.whyNoNear === null).toBe(row.nearFromUtc !== null && row.nearToUtc !== null);
      if (row.nearToUtc !== null) expect(row.nearToUtc > row.utc).toBe(true);
    }
  });

  test("a source named alone serves for the sky as well", () => {
    const [row] = plan("mars-sun", [46.5, 8, 0], "2026", "2027", { source: "engine" });
    const [best] = plan("mars-sun", [46.5, 8, 0], "2026", "2027");
    expect(row?.source).toBe("engine");
    expect(Math.abs((row?.geocentricDistanceKm ?? 0) - (best?.geocentricDistanceKm ?? 0))).toBeGreaterThan(1);
  });

  test("far centuries say how far the Earth may have turned, and the uncertain turning is not hidden", () => {
    const [ancient] = plan("moon-earth", [30, 31, 0], "-000500-01", "-000500-02");
    const [now] = plan("moon-earth", [30, 31, 0], "2026-01", "2026-02");
    const [later] = plan("moon-earth", [30, 31, 0], "2055-01", "2055-02");
    expect(ancient?.turnUncertaintyDeg).toBeGreaterThan(1);
    expect(now?.turnUncertaintyDeg).toBeLessThan(0.001);
    expect(later?.turnUncertaintyDeg).toBeGreaterThan(0.003);
  });
});
