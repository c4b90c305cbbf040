import { describe, expect, test } from "vitest";
import { daysInWords, hoursInWords } from "../../src/drift/hours-in-words.ts";

describe("hours in words", () => {
  test("have days and whole hours, and no sign", () => {
    expect([0, 0.4, 0.6, -6, 23.4, 23.6, 24, 25, -45, 48, 665].map(hoursInWords)).toEqual([
      "less than 1 h",
      "less than 1 h",
      "1 h",
      "6 h",
      "23 h",
      "1 day",
      "1 day",
      "1 day 1 h",
      "1 day 21 h",
      "2 days",
      "27 days 17 h",
    ]);
    expect(daysInWords(10_755)).toBe("10 755 days");
  });
});
