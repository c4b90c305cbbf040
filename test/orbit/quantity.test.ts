import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ApsidaryError } from "../../src/error.ts";
import { type Dimension, parseQuantity } from "../../src/orbit/quantity.ts";

const read = (given: string | number, dimension: Dimension = "length", radius: number | null = null) =>
  parseQuantity(given, dimension, "the height", radius);

describe("parseQuantity", () => {
  test.each([
    ["250km", "length", 250],
    ["250", "length", 250],
    [" 250 km ", "length", 250],
    ["-1.5e3 m", "length", -1.5],
    ["2au", "length", 299_195_741.4], // IAU 2012 Resolution B2: 149 597 870.7 km
    [".5AU", "length", 74_798_935.35],
    ["7.5km/s", "speed", 7.5],
    ["7500 m/s", "speed", 7.5],
    ["2h", "time", 7200],
    ["90min", "time", 5400],
    ["1.5d", "time", 129_600],
    ["0.0167", "number", 0.0167],
    ["-29.8km²/s²", "energy", -29.8],
    ["1e6m^2/s^2", "energy", 1],
    ["52500km2/s", "momentum", 52_500],
    ["3.986e14m3/s2", "gm", 398_600],
  ] as const)("reads %s as a %s", (given, dimension, value) => {
    expect(read(given, dimension)).toBeCloseTo(value, 9);
  });

  test("reads R as the radius of the central body, and asks for it where there is none", () => {
    expect(read("1.5R", "length", 6000)).toBe(9000);
    expect(() => read("1.5R")).toThrow("the height is in R, the radius of the central body, and none is known");
  });

  test.each([
    ["250 kms", "length", 'the height is in an unknown unit, "kms". Write km, m, au, R, as in 250km.'],
    ["5km", "speed", 'the height is in an unknown unit, "km". Write km/s, m/s, as in 7.5km/s.'],
    ["1y", "time", 'the height is in an unknown unit, "y". Write s, min, h, d, as in 2h.'],
    ["0.1km", "number", 'the height is in an unknown unit, "km". It takes no unit, as in 0.0167.'],
    ["", "length", 'the height is "", which is no finite number. Write it as 250km.'],
    ["7,000km", "length", 'the height is "7,000km", which is no finite number. Write it as 250km.'],
    ["1.2.3km", "length", "no finite number"],
    ["0x10km", "length", "unknown unit"],
    ["1e999km", "length", "no finite number"],
    ["Infinity", "length", "no finite number"],
    ["km", "length", "no finite number"],
  ] as const)("refuses %j as a %s, showing what is right", (given, dimension, words) => {
    expect(() => read(given, dimension)).toThrow(words);
  });

  test("refuses what is neither number nor text, and numbers that are not finite", () => {
    for (const given of [Number.NaN, Infinity, null, undefined, {}, [], true, 5n]) {
      expect(() => read(given as number)).toThrow(ApsidaryError);
    }
  });

  test("reads any finite number back, and answers any text with a finite number or one short line", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        expect(read(`${x}km`)).toBe(x + 0); // minus zero is written as 0
      }),
    );
    fc.assert(
      fc.property(fc.string({ unit: "binary", maxLength: 300 }), (text) => {
        try {
          expect(Number.isFinite(read(text))).toBe(true);
        } catch (error) {
          expect((error as ApsidaryError).code).toBe("bad-input");
          expect((error as ApsidaryError).message).not.toMatch(/[\n\r]/);
          expect((error as ApsidaryError).message.length).toBeLessThan(600);
        }
      }),
    );
  });
});
