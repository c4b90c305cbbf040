import { describe, expect, test } from "vitest";
import { roundedParts } from "../../src/drift/rounded-parts.ts";

describe("parts rounded to a sum", () => {
  test("move the part that was rounded furthest the other way", () => {
    expect(roundedParts([6.233, 0.667, 43.566])).toEqual([6, 1, 43]);
    expect(roundedParts([0.4, 0.4, 0.4])).toEqual([1, 0, 0]);
    expect(roundedParts([-17.77, -3.43, 10.6])).toEqual([-18, -4, 11]);
    expect(roundedParts([1, 2, 3])).toEqual([1, 2, 3]);
  });

  test("stay within one of their values and keep the sum", () => {
    for (let i = 0; i < 1000; i++) {
      const parts = [(i * 0.37) % 10, ((i * 0.73) % 20) - 10, ((i * 1.19) % 90) - 45];
      const whole = roundedParts(parts);
      expect(whole.reduce((a, b) => a + b, 0)).toBe(Math.round(parts.reduce((a, b) => a + b, 0)) + 0);
      expect(whole.every((value, k) => Math.abs(value - (parts[k] ?? 0)) < 1.0001)).toBe(true);
    }
  });
});
