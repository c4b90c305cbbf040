import { planetelements } from "astronomia";
import { describe, expect, test } from "vitest";
import { meanPerihelionLongitude } from "../../src/drift/perihelion-longitude.ts";
import { seasonOf } from "../../src/drift/season-of.ts";
import { passages } from "../../src/passages/passages.ts";
import { openSky } from "../../src/sky/open-sky.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { builtIn, mean } from "./sources.ts";

const ephemeris = await builtIn();
const sky = await openSky();
const seasons = [...passages(ephemeris, "earth-sun", { from: "1960", to: "2060" })].map((passage) => ({
  ...seasonOf(sky, ephemeris, passage),
  kind: passage.kind,
}));
const daysOf = (kind: string) => seasons.filter((one) => one.kind === kind).map((one) => one.daysAfterSolstice);

describe("a passage among the seasons", () => {
  test("of perihelion comes about two weeks after the December solstice (common practice, no source)", () => {
    expect(seasons.filter((one) => one.kind === "periapsis").every((one) => one.solstice === "december")).toBe(true);
    const days = daysOf("periapsis");
    // 1960–2059, measured on DE405 and astronomy-engine's seasons
    expect(Math.min(...days)).toBeCloseTo(10.9, 1);
    expect(Math.max(...days)).toBeCloseTo(14.8, 1);
    expect(mean(days)).toBeCloseTo(12.9, 1);
  });

  test("of aphelion comes about two weeks after the June solstice (common practice, no source)", () => {
    expect(seasons.filter((one) => one.kind === "apoapsis").every((one) => one.solstice === "june")).toBe(true);
    const days = daysOf("apoapsis");
    expect(Math.min(...days)).toBeCloseTo(11.5, 1);
    expect(Math.max(...days)).toBeCloseTo(15.8, 1);
    expect(mean(days)).toBeCloseTo(13.8, 1);
  });

  test("names solstices of the almanac office within two minutes", () => {
    // U.S. Naval Observatory, Earth's Seasons (from memory): 2019-12-22 04:19, 2020-06-20 21:44, 2020-12-21 10:02
    const told = [...passages(ephemeris, "earth-sun", { from: "2020", to: "2021-02" })].map((passage) =>
      tdbOf(seasonOf(sky, ephemeris, passage).solsticeUtc),
    );
    ["2019-12-22T04:19", "2020-06-20T21:44", "2020-12-21T10:02"].forEach((published, i) => {
      expect(Math.abs((told[i] ?? 0) - tdbOf(published))).toBeLessThan(120);
    });
  });

  test("has the barycentre's osculating perihelion within 0.22° of the mean one", () => {
    for (const { osculatingPerihelionLongitudeDeg: osculating, meanPerihelionLongitudeDeg: line } of seasons) {
      expect(Math.abs((osculating ?? Number.NaN) - line)).toBeLessThan(0.22);
    }
    const differences = seasons.map(
      (one) => (one.osculatingPerihelionLongitudeDeg ?? 0) - one.meanPerihelionLongitudeDeg,
    );
    expect(Math.abs(mean(differences))).toBeLessThan(0.001);
  });

  test("is refused for another pair", () => {
    for (const passage of passages(ephemeris, "mars-sun", { from: "2020", to: "2021" })) {
      expect(() => seasonOf(sky, ephemeris, passage)).toThrow(/solstices are the Earth's/);
    }
  });
});

describe("the mean longitude of perihelion", () => {
  const in2000 = meanPerihelionLongitude(0);
  const in2010 = meanPerihelionLongitude(10 * 365.25 * 86400);

  test("is 282.937° in 2000 and 283.109° in 2010 within 0.005°", () => {
    // J. L. Simon et al., Astron. Astrophys. 282 (1994) 663, mean elements of date (from memory)
    expect(Math.abs(in2000 - 282.937)).toBeLessThan(0.005);
    expect(Math.abs(in2010 - 283.109)).toBeLessThan(0.005);
  });

  test("is that of the mean elements in Meeus, Astronomical Algorithms, table 31.A, within 0.005° from 1960 to 2059", () => {
    // as the package astronomia has them; the Earth's longitude of perihelion is 180° from the Sun's
    for (let year = 1960; year <= 2060; year += 10) {
      const jde = 2_451_545 + (year - 2000) * 365.25;
      const elements = planetelements.mean(planetelements.earth, jde);
      const published = (elements.peri * 180) / Math.PI + 180;
      expect(Math.abs(meanPerihelionLongitude((jde - 2_451_545) * 86_400) - published)).toBeLessThan(0.005);
    }
  });

  test("lies 0.042° above the trade's pair of 282.895° and 283.067°, at the same rate", () => {
    // The pair is common practice and comes from A. Berger's trigonometric series (J. Atmos. Sci. 35 (1978) 2362), made for climates of a
    // million years and good to hundredths of a degree today; DE405 and Simon's elements agree with each other against it.
    expect(Math.abs(in2000 - 282.895)).toBeLessThan(0.05);
    expect(Math.abs(in2010 - 283.067)).toBeLessThan(0.05);
    expect(in2010 - in2000).toBeCloseTo(283.067 - 282.895, 2);
  });
});
