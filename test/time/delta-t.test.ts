import { deltat } from "astronomia";
import data from "astronomia/data/deltat";
import { describe, expect, it } from "vitest";
import { decimalYear, deltaT } from "../../src/time/delta-t.ts";
import { DELTA_T_FIRST_YEAR, DELTA_T_LAST_YEAR, DELTA_T_TABLE } from "../../src/time/delta-t-table.ts";
import { predictedHalfWidth } from "../../src/time/predicted-half-width.ts";

describe("deltaT", () => {
  it("gives the values that almanacs print for the turns of the years from 1955 on", () => {
    // Astronomical Almanac, table of ΔT, page K9 (from memory): two decimals, so half a unit, and half a unit of our table
    const printed = {
      1955: 31.07,
      1960: 33.15,
      1970: 40.18,
      1972: 42.23,
      1980: 50.54,
      1990: 56.86,
      2000: 63.83,
      2010: 66.07,
    };
    for (const [year, seconds] of Object.entries(printed)) {
      expect(Math.abs(deltaT(Number(year)).seconds - seconds), year).toBeLessThanOrEqual(0.0101);
    }
  });

  it("gives for the turn of 1900 what the almanac gives, within its stated uncertainty", () => {
    // Astronomical Almanac, page K8: -2.72 (from memory); USNO's file has -2.70
    const { seconds, uncertaintySeconds } = deltaT(1900);
    expect(Math.abs(seconds + 2.72)).toBeLessThan(0.03);
    expect(uncertaintySeconds).toBeGreaterThan(0.02);
  });

  it("holds the published values of antiquity and the Middle Ages within their published standard errors", () => {
    // Morrison and Stephenson 2004, table 1 (from memory): year, ΔT, standard error
    const table = [
      [-1000, 25_400, 640],
      [-500, 17_190, 430],
      [0, 10_580, 260],
      [500, 5710, 140],
      [1000, 1570, 55],
      [1300, 490, 20],
      [1500, 200, 20],
      [1600, 120, 20],
    ] as const;
    for (const [year, seconds, error] of table) {
      const ours = deltaT(year);
      expect(Math.abs(ours.seconds - seconds), `${year}`).toBeLessThan(error);
      expect(Math.abs(ours.uncertaintySeconds / (2 * error) - 1), `${year}`).toBeLessThan(0.05);
    }
    // the same table gives 9 ± 5 s for 1700 and 13 ± 2 s for 1750
    for (const [year, seconds] of [
      [1700, 9],
      [1750, 13],
      [1800, 14],
      [1850, 7],
    ] as const) {
      const ours = deltaT(year);
      expect(Math.abs(ours.seconds - seconds), `${year}`).toBeLessThan(ours.uncertaintySeconds);
    }
  });

  it("is what the package astronomia has for the years before 1600, and within the uncertainty from there to 1972", () => {
    for (let year = -2000; year < 1600; year += 7) expect(deltaT(year).seconds).toBeCloseTo(deltat.deltaT(year), 6);
    for (let year = 1600.25; year < 1973; year += 3) {
      const { seconds, uncertaintySeconds } = deltaT(year);
      expect(Math.abs(seconds - deltat.deltaT(year)), `${year}`).toBeLessThan(uncertaintySeconds);
    }
  });

  it("follows the monthly determinations of the USNO from 1973 to 2023 within its stated uncertainty", () => {
    const { table, firstYM } = data.data;
    for (const [k, seconds] of table.entries()) {
      const year = firstYM[0] + (firstYM[1] - 1 + k) / 12;
      const ours = deltaT(year);
      expect(Math.abs(ours.seconds - seconds), `${year}`).toBeLessThan(ours.uncertaintySeconds);
    }
  });

  it("gives for the turns of recent years what the IERS rapid service measured", () => {
    // IERS finals2000A, Bulletin A: UT1 - UTC at 0h UTC of 1 January; ΔT = 32.184 s + (TAI - UTC) - (UT1 - UTC)
    const measured = [
      [2020, 37, -0.1771554],
      [2024, 37, 0.0087837],
      [2025, 37, 0.0462673],
      [2026, 37, 0.0740677],
    ] as const;
    for (const [year, taiMinusUtc, ut1MinusUtc] of measured) {
      const seconds = 32.184 + taiMinusUtc - ut1MinusUtc;
      // two decimals, and up to 0.75 d between 1 January and the turn of the mean year
      expect(Math.abs(deltaT(year).seconds - seconds), `${year}`).toBeLessThan(0.007);
    }
  });

  it("has no jump where one source follows another, nor inside the table", () => {
    for (const year of [-500, 500, 1600, 1657, 1657.5, 1962, 2000.5, 2026, 2026.5]) {
      const step = Math.abs(deltaT(year + 1e-7).seconds - deltaT(year - 1e-7).seconds);
      // the polynomials of Espenak and Meeus meet only to 0.2 s at their own joints
      expect(step, `${year}`).toBeLessThan(year <= 1600 ? 0.3 : 1e-5);
    }
  });

  it("covers, in the centuries ahead, the published long-term parabolas", () => {
    for (const year of [2200, 2500, 3000, 3500]) {
      const { seconds, uncertaintySeconds } = deltaT(year);
      // Morrison and Stephenson 2004; Stephenson, Morrison and Hohenkerk, Proc. R. Soc. A 472 (2016) 20160404, eq. 4.1 (from memory)
      for (const published of [-20 + 32 * ((year - 1820) / 100) ** 2, -320 + 32.5 * ((year - 1825) / 100) ** 2]) {
        expect(Math.abs(published - seconds), `${year}`).toBeLessThan(uncertaintySeconds);
      }
    }
  });
});

it("places J2000.0 half a day into the year 2000", () => {
  expect(decimalYear(0)).toBeCloseTo(2000 + 0.5 / 365.2425, 12);
});

it("predictedHalfWidth would have held the Earth's turning in 95 of 100 cases from 1850 on, had the rate of five years before been carried on", () => {
  const at = (k: number): number => DELTA_T_TABLE[k] ?? Number.NaN;
  const first = 2 * (1850 - DELTA_T_FIRST_YEAR);
  expect(DELTA_T_TABLE).toHaveLength(2 * (DELTA_T_LAST_YEAR - DELTA_T_FIRST_YEAR) + 1);
  for (const years of [1, 2, 3, 5, 7, 10, 15, 20, 30, 50]) {
    let held = 0;
    let all = 0;
    for (let k = first; k + 2 * years < DELTA_T_TABLE.length; k++, all++) {
      const rate = (at(k) - at(k - 10)) / 5;
      if (Math.abs(at(k + 2 * years) - at(k) - rate * years) <= predictedHalfWidth(years)) held++;
    }
    expect(held / all, `${years} years`).toBeGreaterThanOrEqual(0.95);
  }
  expect(predictedHalfWidth(-1)).toBe(0);
});

it("predictedHalfWidth, about the 69.2 s that are held, reaches the long-term parabola of Stephenson, Morrison and Hohenkerk to 3500", () => {
  // Proc. R. Soc. A 472 (2016) 20160404, eq. 4.1 (from memory)
  for (let year = 2030; year <= 3500; year += 10) {
    const published = -320 + 32.5 * ((year - 1825) / 100) ** 2;
    if (published > 69.2) expect(published - 69.2, `${year}`).toBeLessThan(predictedHalfWidth(year - 2027.5));
  }
});
