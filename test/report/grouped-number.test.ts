import { expect, test } from "vitest";
import { groupedNumber } from "../../src/report/grouped-number.ts";

test("groupedNumber sets thousands apart and keeps the decimals asked for", () => {
  expect(groupedNumber(4459633123.4, 0)).toBe("4 459 633 123");
  expect(groupedNumber(362312.449, 2)).toBe("362 312.45");
  expect(groupedNumber(999, 0)).toBe("999");
  expect(groupedNumber(1000, 0)).toBe("1 000");
});

test("groupedNumber rounds to tens, hundreds and thousands for digits below zero", () => {
  expect(groupedNumber(4459633123.4, -3)).toBe("4 459 633 000");
  expect(groupedNumber(740708568, -1)).toBe("740 708 570");
});

test("groupedNumber never prints a negative zero", () => {
  expect(groupedNumber(-0.02, 1)).toBe("0.0");
  expect(groupedNumber(-0, 0)).toBe("0");
  expect(groupedNumber(-0.02, 2)).toBe("-0.02");
});
