import { expect, test } from "vitest";
import { stepOf } from "../../src/cli/step-of.ts";
import { ApsidaryError } from "../../src/error.ts";

test("stepOf reads seconds, minutes, hours and days", () => {
  expect(["90s", "30min", "6h", "1.5d", "2 h"].map((text) => stepOf(text))).toEqual([90, 1800, 21_600, 129_600, 7200]);
});

test.each(["", "6", "h", "-6h", "6m", "0d", "1e3s", "6hours", undefined])("stepOf refuses %o", (text) => {
  expect(() => stepOf(text)).toThrow(ApsidaryError);
});
