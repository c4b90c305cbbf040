import { describe, expect, test } from "vitest";
import { type ElementsGiven, readElements } from "../../src/orbit/elements.ts";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import { toRow } from "../../src/passages/to-row.ts";
import { messageOf, passagesOf } from "./bare.ts";

const T = 7.5e8 + 1234.567;
const EXACT = { eccentricity: 0, semiMajorAxisKm: 0, periapsisAt: 0 };
const probe = (more: Partial<ElementsGiven>): ElementsGiven => ({ name: "probe-earth", about: "earth", ...more });

describe("a track from osculating elements", () => {
  test.each([
    [1e-6, "60000km", "earth"],
    [1e-6, "2.7au", "sun"],
    [1e-3, "6800km", "earth"],
    [0.0549, "384748km", "earth"],
    [0.3, "2.7au", "sun"],
    [0.9, "17.8au", "sun"],
    [0.99, "60000km", "earth"],
    [0.999, "60au", "sun"],
    [0.9999, "60000km", "earth"],
  ] as const)("of e = %f and a = %s about the %s passes its apsides at T + k·P/2 within 1 ms", async (e, a, about) => {
    const track = elementsTrack({
      name: "probe-x",
      about,
      semiMajorAxisKm: a,
      eccentricity: e,
      periapsisAt: T,
      uncertainty: EXACT,
    });
    const half = track.pair.halfPeriodSeconds;
    const found = await passagesOf(track, T - 20.4 * half, T + 20.4 * half);
    expect(found).toHaveLength(41);
    found.forEach((passage, i) => {
      const k = i - 20;
      expect(Math.abs(passage.tdbSeconds - (T + k * half))).toBeLessThan(1e-3);
      expect(passage.kind).toBe(k % 2 === 0 ? "periapsis" : "apoapsis");
      expect(passage.rank).toBe("principal");
      expect(passage.existence).toBe("certain");
    });
  });

  test("of a shape that its digits do not tell from a circle says that the passage is uncertain, and by how much", async () => {
    const track = elementsTrack(probe({ semiMajorAxisKm: "60000.00km", eccentricity: "0.000001", periapsisAt: T }));
    const [passage] = await passagesOf(track, T - 100, T + 100_000);
    // δe = 5e-7 of 1e-6: the line of apsides is known to half a radian, the time to P/(4π)
    const expected = (2 * track.pair.halfPeriodSeconds) / (4 * Math.PI);
    expect(passage?.timeUncertaintySeconds).toBeGreaterThan(0.99 * expected);
    expect(passage?.timeUncertaintySeconds).toBeLessThan(1.2 * expected);
    const blunt = elementsTrack(
      probe({ semiMajorAxisKm: 60000, eccentricity: 1e-6, periapsisAt: T, uncertainty: { eccentricity: 2e-6 } }),
    );
    const [merged] = await passagesOf(blunt, T - 100, T + 100_000);
    expect(merged?.existence).toBe("uncertain");
  });

  test("grows less sure as the period's error adds up, and says whose word the errors are", async () => {
    const given = probe({
      periodSeconds: "86400s",
      eccentricity: 0.1,
      periapsisAt: T,
      uncertainty: { periodSeconds: "3s", eccentricity: 1e-9, periapsisAt: "4s" },
    });
    const found = await passagesOf(elementsTrack(given), T - 10, T + 100.5 * 86400);
    expect(found[0]?.timeUncertaintySeconds).toBeCloseTo(4, 3);
    expect(found[200]?.timeUncertaintySeconds).toBeCloseTo(Math.hypot(4, 300), 2);
    expect(found[0]?.accuracyBasis).toBe("user");
    const [bare] = await passagesOf(elementsTrack({ ...given, uncertainty: null }), T - 10, T + 10);
    expect(bare?.accuracyBasis).toBe("assumed");
  });

  test("holds its stated uncertainty against elements drawn at random within theirs", async () => {
    // the half-widths are two deviations; so the spread of T + 50 P over draws is half of what is stated
    const widths = { semiMajorAxisKm: 2, eccentricity: 1e-5, periapsisAt: 5 };
    const stated = elementsTrack(
      probe({ semiMajorAxisKm: 42164, eccentricity: 0.2, periapsisAt: T, uncertainty: widths }),
    );
    const span = [T + 49.9 * 86164, T + 50.1 * 86164] as const;
    const [passage] = await passagesOf(stated, ...span);
    let seed = 7;
    const uniform = () => {
      seed = (seed * 48271) % 2147483647;
      return seed / 2147483647;
    };
    const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    let sum = 0;
    const draws = 1500;
    for (let i = 0; i < draws; i++) {
      const drawn = readElements(
        probe({
          semiMajorAxisKm: 42164 + normal(),
          eccentricity: 0.2 + 5e-6 * normal(),
          periapsisAt: T + 2.5 * normal(),
        }),
      );
      const late = drawn.periapsisTdb + 50 * (drawn.orbit.periodSeconds ?? 0) - (passage?.tdbSeconds ?? 0);
      sum += late * late;
    }
    const deviation = Math.sqrt(sum / draws);
    expect((passage?.timeUncertaintySeconds ?? 0) / (2 * deviation)).toBeGreaterThan(0.95); // 1500 draws tell it to 2 %
    expect((passage?.timeUncertaintySeconds ?? 0) / (2 * deviation)).toBeLessThan(1.05);
  });

  test("of an open orbit passes its periapsis once, and never again in all time", async () => {
    for (const e of [1, 1.2, 5]) {
      const track = elementsTrack(
        probe({
          about: "sun",
          name: "comet-sun",
          periapsisKm: "0.9au",
          eccentricity: e,
          periapsisAt: "2026-03-01T12:00:00",
        }),
      );
      const found = await passagesOf(track, -3e11, 2.5e11);
      expect(found.map((passage) => passage.kind)).toEqual(["periapsis"]);
      const row = toRow(found[0] as (typeof found)[0]);
      expect(row.term).toBe("perihelion");
      expect(row.tdb).toBe("2026-03-01T12:00:00.000");
      expect(row.heightKm).toBeCloseTo(0.9 * 149597870.7 - 695700, 2);
      expect(row.targetPoint).toBeNull();
      expect(row.pair).toBe("comet-sun");
    }
  });

  test("finds the same passage from a mean anomaly at an epoch, and from Julian days", async () => {
    const size = probe({ semiMajorAxisKm: 60000, eccentricity: 0.3, uncertainty: null });
    const period = elementsTrack({ ...size, periapsisAt: T }).pair.halfPeriodSeconds * 2;
    const byAnomaly = elementsTrack({ ...size, epoch: T + 0.125 * period, meanAnomalyDeg: 45 });
    const [one] = await passagesOf(byAnomaly, T - 1000, T + 1000);
    expect(Math.abs((one?.tdbSeconds ?? 0) - T)).toBeLessThan(1e-5);
    const [two] = await passagesOf(elementsTrack({ ...size, periapsisAt: "JD 2461101.25" }), 8.2565e8, 8.2567e8);
    expect(two && toRow(two).tdb).toBe("2026-03-01T18:00:00.000");
  });

  test.each([
    ["no time", { semiMajorAxisKm: 7000, eccentricity: 0 }, /when is missing: give periapsisAt, or epoch and mean/],
    ["half a time", { semiMajorAxisKm: 7000, eccentricity: 0, epoch: 0 }, /only epoch is given/],
    [
      "two times",
      { semiMajorAxisKm: 7e3, eccentricity: 0.1, periapsisAt: 0, meanAnomalyDeg: 3 },
      /too many: periapsisAt/,
    ],
    [
      "a circle",
      { semiMajorAxisKm: 7e3, eccentricity: 0, periapsisAt: T },
      /is a circle to rounding .* no nearest and no farthest/,
    ],
    ["no size", { eccentricity: 0.1, periapsisAt: 0 }, /too few: only eccentricity/],
    ["an unknown element", { semiMajorAxis: 7e3, eccentricity: 0.1, periapsisAt: 0 }, /did you mean "semiMajorAxisKm"/],
    ["a time that is none", { semiMajorAxisKm: 7e3, eccentricity: 0, periapsisAt: "soon" }, /"soon", which is no time/],
    [
      "one angle of three",
      { semiMajorAxisKm: 7e3, eccentricity: 0.1, periapsisAt: 0, nodeDeg: 3 },
      /inclinationDeg is missing/,
    ],
    [
      "an uncertainty of nothing",
      { semiMajorAxisKm: 7e3, eccentricity: 0.1, periapsisAt: 0, uncertainty: { excentricity: 1 } },
      /no such element; did you mean "eccentricity"/,
    ],
    [
      "an uncertainty below zero",
      { semiMajorAxisKm: 7e3, eccentricity: 0.1, periapsisAt: 0, uncertainty: { eccentricity: -1 } },
      /must be zero or above/,
    ],
    [
      "the name of a pair that is known",
      { name: "moon-earth", semiMajorAxisKm: 7e3, eccentricity: 0.1, periapsisAt: 0 },
      /moon-earth is a pair that the library knows/,
    ],
  ])("is refused for %s, in one line that names it", (_, more, says) => {
    expect(messageOf(() => elementsTrack(probe(more as Partial<ElementsGiven>)))).toMatch(says);
  });
});
