import { expect, test } from "vitest";
import { durationText } from "../../src/report/duration-text.ts";

test.each([
  [0.3, "0.3 s"],
  [7.5, "8 s"],
  [119, "120 s"],
  [121, "3 min"],
  [900, "15 min"],
  [7200, "2 h"],
  [23_400, "7 h"],
  [362_880, "5 d"],
])("durationText tells %d seconds as %s, never as less", (seconds, text) => {
  expect(durationText(seconds)).toBe(text);
});
