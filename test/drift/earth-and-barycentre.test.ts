import { expect, test } from "vitest";
import { openDe405 } from "../de405/read.ts";

test("the Earth's centre is about 4 700 km from the barycentre, three quarters of its radius (common practice, no source; here by DE405)", () => {
  const de405 = openDe405();
  let sum = 0;
  const days = 36_000;
  for (let day = 0; day < days; day++) {
    const [x = 0, y = 0, z = 0] = de405.pairState("earth-emb", -39 * 365.25 * 86400 + day * 86400);
    sum += Math.hypot(x, y, z);
  }
  const km = sum / days;
  expect(Math.abs(km - 4700)).toBeLessThan(50); // "about": to the hundred
  expect(Math.abs(km / 6378.137 - 0.75)).toBeLessThan(0.02); // "three quarters": DE405's mean is 0.733
});
