import { describe, expect, test } from "vitest";
import { pairOf } from "../../src/bodies/pair.ts";
import { openedSeries } from "./series-opened.ts";

// The complete theories as the npm package `astronomia` carries them, summed term by term: no code of the product.
type Tables = Readonly<Record<string, Readonly<Record<string, readonly (readonly number[])[]>>>> & {
  readonly W1: number[];
};

async function tablesOf(file: string): Promise<Tables> {
  const specifier = `astronomia/data/${file}`;
  const module: unknown = await import(specifier);
  return (module as { default: Tables }).default;
}

const rowsOf = (tables: Tables, letter: string) => Object.entries(tables[letter] ?? {});

/** Longitude, latitude (rad), distance (au) for a Julian date. */
function vsop87(tables: Tables, jd: number): number[] {
  const t = (jd - 2451545) / 365250;
  const sums = ["L", "B", "R"].map((letter) => {
    let sum = 0;
    for (const [power, rows] of rowsOf(tables, letter)) {
      // four rows of version D in the package are not numbers (their amplitudes lie below the printed digits)
      for (const [a = 0, b = 0, c = 0] of rows)
        if (!Number.isNaN(a)) sum += a * Math.cos(b + c * t) * t ** Number(power);
    }
    return sum;
  });
  const turn = 2 * Math.PI;
  return [(((sums[0] ?? 0) % turn) + turn) % turn, sums[1] ?? 0, sums[2] ?? 0];
}

/** x, y, z (km), inertial mean ecliptic and equinox J2000, and the distance. */
function elpMpp02(tables: Tables, jd: number): number[] {
  const t = (jd - 2451545) / 36525;
  const poly = (c: readonly number[]) => c.reduceRight((sum, x) => sum * t + x, 0);
  const [l = 0, b = 0, r = 0] = ["L", "B", "R"].map((letter) => {
    let sum = 0;
    for (const [power, rows] of rowsOf(tables, letter)) {
      for (const [a = 0, ...phase] of rows) sum += a * Math.sin(poly(phase)) * t ** Number(power);
    }
    return sum;
  });
  const arcsecond = Math.PI / 648000;
  const v = poly(tables.W1) + l * arcsecond;
  const u = b * arcsecond;
  const [x, y, z] = [r * Math.cos(v) * Math.cos(u), r * Math.sin(v) * Math.cos(u), r * Math.sin(u)];
  // J. Laskar (1986), as ELP/MPP02 has it
  const p = poly([0, 0.10180391e-4, 0.47020439e-6, -0.5417367e-9, -0.2507948e-11, 0.463486e-14]);
  const q = poly([0, -0.113469002e-3, 0.12372674e-6, 0.1265417e-8, -0.1371808e-11, -0.320334e-14]);
  const w = 2 * Math.sqrt(1 - p * p - q * q);
  return [
    (1 - 2 * p * p) * x + 2 * p * q * y + p * w * z,
    2 * p * q * x + (1 - 2 * q * q) * y - q * w * z,
    -p * w * x + q * w * y + (1 - 2 * p * p - 2 * q * q) * z,
    r,
  ];
}

const PLANETS = ["mercury", "venus", "earth", "mars", "jupiter", "saturn", "uranus", "neptune"] as const;
const seconds = (jd: number) => (jd - 2451545) * 86400;

describe("the theories as the package of data carries them", () => {
  // P. Bretagnon and G. Francou, file vsop87.chk of VSOP87, version D, JD 2451545.0 and 2415020.0 (from memory): ten decimals.
  test.each<[planet: string, ...values: number[]]>([
    ["mercury", 4.4293481036, -0.0527573409, 0.4664714751, 3.4851161911, 0.0565906173, 0.4183426275],
    ["venus", 3.1870221833, 0.0569782849, 0.7202129253, 5.9749622238, -0.0591260014, 0.7274719359],
    ["earth", 1.7519238681, -0.0000039656, 0.9833276819, 1.7391225563, -0.0000005679, 0.9832689778],
    ["mars", 6.2735389983, -0.0247779824, 1.3912076925, 4.9942005211, -0.0271965869, 1.4218777705],
    ["jupiter", 0.6334614186, -0.0205001039, 4.9653813154, 4.0927527024, 0.0161446618, 5.3850276671],
    ["saturn", 0.7980038761, -0.0401984149, 9.1838483715, 4.6512836347, 0.0192701409, 10.0668531997],
    ["uranus", 5.5225485803, -0.0119527838, 19.9240482667, 4.3397761173, 0.0011570307, 18.992716362],
    ["neptune", 5.3045629252, 0.0042236789, 30.1205328392, 1.4956195225, -0.021961003, 29.8710345051],
  ])("give VSOP87's own check values of %s to their last digit", async (planet, ...values) => {
    const tables = await tablesOf(`vsop87D${planet}`);
    const found = [...vsop87(tables, 2451545), ...vsop87(tables, 2415020)];
    // one unit of the last digit: half for its rounding, half for that of the terms and for the rows that are missing
    for (const [i, value] of values.entries()) expect(Math.abs((found[i] as number) - value)).toBeLessThan(1e-10);
  });

  // Versions B (used here) and D are cut off apart: the same distance within the precision of each planet, au. The published
  // one, relative to the distance, is 0.6, 2.5, 2.5, 10, 35, 70, 8 and 42e-8 (vsop87.doc, from memory).
  test.each<[planet: string, precision: number, at2000: number, at1900: number]>([
    ["mercury", 0.6e-8, 0.4664714751, 0.4183426275],
    ["venus", 2.5e-8, 0.7202129253, 0.7274719359],
    ["earth", 2.5e-8, 0.9833276819, 0.9832689778],
    ["mars", 10e-8, 1.3912076925, 1.4218777705],
    ["jupiter", 35e-8, 4.9653813154, 5.3850276671],
    ["saturn", 70e-8, 9.1838483715, 10.0668531997],
    ["uranus", 8e-8, 19.9240482667, 18.992716362],
    ["neptune", 42e-8, 30.1205328392, 29.8710345051],
  ])(
    "give the published distances of %s in version B too, within its precision",
    async (planet, precision, at2000, at1900) => {
      const tables = await tablesOf(`vsop87B${planet}`);
      expect(Math.abs((vsop87(tables, 2451545)[2] as number) / at2000 - 1)).toBeLessThan(precision);
      expect(Math.abs((vsop87(tables, 2415020)[2] as number) / at1900 - 1)).toBeLessThan(precision);
    },
  );

  // J. Chapront and G. Francou, ELP/MPP02, examples for the constants fitted to DE405 (from memory): five decimals of km.
  test.each([
    [2500000.5, 274034.59103, 252067.53689, -18998.75519],
    [2300000.5, 353104.31359, -195254.11808, 34943.54592],
    [2100000.5, -19851.27674, -385646.17717, -27597.66134],
    [1900000.5, -370342.79254, -37574.25533, -4527.9184],
    [1700000.5, -164673.0472, 367791.71329, 31603.98027],
  ])("give ELP/MPP02's own check values at JD %f to their last digit", async (jd, ...values) => {
    const found = elpMpp02(await tablesOf("elpMppDeFull"), jd);
    // one unit of the last digit of the cosine's argument shows there
    for (const [i, value] of values.entries()) expect(Math.abs((found[i] as number) - value)).toBeLessThan(2e-5);
  });

  test("are complete: as many terms as the published files have", async () => {
    // counts of VSOP87B.ear and of ELP_MAIN and ELP_PERT (main problem and perturbations together), from memory
    const earth = await tablesOf("vsop87Bearth");
    const counts = (tables: Tables, letter: string) => rowsOf(tables, letter).map(([, rows]) => rows.length);
    expect(counts(earth, "L")).toEqual([623, 379, 144, 23, 11, 4]);
    expect(counts(earth, "B")).toEqual([184, 134, 62, 14, 6, 2]);
    expect(counts(earth, "R")).toEqual([523, 290, 134, 20, 9, 2]);
    const moon = await tablesOf("elpMppDeFull");
    expect(counts(moon, "L")).toEqual([1023 + 11314, 1199, 219, 2]);
    expect(counts(moon, "B")).toEqual([918 + 6462, 516, 52, 0]);
    expect(counts(moon, "R")).toEqual([704 + 12115, 1165, 210, 2]);
  });
});

describe("the series that the package carries", () => {
  const state = new Float64Array(6);
  const days = Array.from({ length: 13 }, (_, i) => 2086303 + i * 60877.3); // 1000 to 3000

  test.each(PLANETS)("give the complete VSOP87 of %s within half a metre", async (planet) => {
    const tables = await tablesOf(`vsop87B${planet}`);
    const motion = openedSeries().motion(pairOf(`${planet}-sun`));
    for (const jd of days) {
      motion.state(seconds(jd), state);
      const distance = (vsop87(tables, jd)[2] as number) * 149597870.7;
      // the small terms have four bytes
      expect(Math.abs(Math.hypot(state[0] as number, state[1] as number, state[2] as number) - distance)).toBeLessThan(
        0.0005,
      );
    }
  });

  test("give the distance of the complete ELP/MPP02 within 40 m, and its place within 0.7 km", async () => {
    const tables = await tablesOf("elpMppDeFull");
    const motion = openedSeries().motion(pairOf("moon-earth"));
    const places = days.map((jd) => {
      motion.state(seconds(jd), state);
      return { is: [...state.subarray(0, 3)], should: elpMpp02(tables, jd) };
    });
    for (const { is, should } of places) {
      expect(Math.abs(Math.hypot(...is) - (should[3] as number))).toBeLessThan(0.04);
    }
    // angles between two places do not depend on the axes
    const dot = (a: number[], b: number[]) =>
      [0, 1, 2].reduce((sum, k) => sum + (a[k] as number) * (b[k] as number), 0);
    for (const [i, a] of places.entries()) {
      const b = places[(i + 1) % places.length] as typeof a;
      const gap = dot(a.is, b.is) - dot(a.should, b.should);
      expect(Math.abs(gap)).toBeLessThan(2 * 0.7 * 406_700);
    }
  });
});
