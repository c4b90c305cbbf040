import { expect, test } from "vitest";
import { rounded } from "../../src/report/rounded.ts";

test("rounded gives the double nearest to the decimal, so that it is printed with no more digits", () => {
  expect(String(rounded(820575934.80449, 3))).toBe("820575934.804");
  expect(String(rounded(147099894.00949, 3))).toBe("147099894.009");
  expect(String(rounded(0.98330205718249, 12))).toBe("0.983302057182");
  expect(String(rounded(63114183261.7641, 3))).toBe("63114183261.764");
});
