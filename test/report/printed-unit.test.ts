import { expect, test } from "vitest";
import { ApsidaryError } from "../../src/error.ts";
import { printedTime } from "../../src/report/printed-time.ts";
import { type PrintedUnit, printedUnit } from "../../src/report/printed-unit.ts";

test.each([
  [0, "minute"],
  [7.5, "minute"],
  [7.501, "hour"],
  [450, "hour"],
  [450.001, "day"],
  [3 * 3600, "day"],
  [3 * 3600 + 0.001, "month"],
  [4 * 86_400, "month"],
  [4 * 86_400 + 0.001, "year"],
] as [number, PrintedUnit][])("printedUnit lets %d seconds of uncertainty print the %s", (seconds, unit) => {
  expect(printedUnit(seconds)).toBe(unit);
});

test("printedUnit refuses what is no uncertainty", () => {
  expect(() => printedUnit(-1)).toThrow(ApsidaryError);
  expect(() => printedUnit(Number.NaN)).toThrow(ApsidaryError);
});

/** Share of printed values that are right for normal errors, over instants spread evenly through units of time. */
function shareRight(unit: PrintedUnit, unitMs: number, deviationMs: number): number {
  const start = Date.UTC(2026, 2, 10); // no rounding edge of a month is near
  const phases = 400;
  const errors = 161; // from −4 to +4 deviations
  let right = 0;
  let all = 0;
  for (let j = 0; j < errors; j++) {
    const z = -4 + (8 * j) / (errors - 1);
    const weight = Math.exp(-z * z * 0.5);
    for (let i = 0; i < phases; i++) {
      const truth = start + ((i + 0.5) / phases) * unitMs;
      all += weight;
      if (printedTime(truth, unit) === printedTime(truth + z * deviationMs, unit)) right += weight;
    }
  }
  return right / all;
}

// The figures are those of √(2/π) deviations of mean error; the grid above resolves them to 1e-3.
test("an eighth of the unit keeps 95 % of printed values right where the half-width is two deviations", () => {
  for (const [unit, ms, limit] of [
    ["minute", 60e3, 7.5e3],
    ["hour", 3600e3, 450e3],
    ["day", 86400e3, 10800e3],
  ] as [PrintedUnit, number, number][]) {
    expect(shareRight(unit, ms, limit / 2)).toBeGreaterThan(0.949);
    expect(shareRight(unit, ms, limit / 2)).toBeLessThan(0.951);
    expect(shareRight(unit, ms, limit / 4)).toBeGreaterThan(0.974);
  }
});
