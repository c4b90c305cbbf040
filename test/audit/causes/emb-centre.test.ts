import { beforeAll, expect, test } from "vitest";
import { embCentre } from "../../../src/audit/causes/emb-centre.ts";
import { caseMaker, fitting } from "../case-of.ts";

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory); the slip is planted by hand.
let caseOf: Awaited<ReturnType<typeof caseMaker>>;
beforeAll(async () => {
  caseOf = await caseMaker();
});

test("embCentre says nothing of the Moon, and does not give the office's minute of the Earth's centre", () => {
  expect(embCentre.predict(caseOf("moon-earth", "periapsis", "2026-01-03 17:16"))).toEqual([]);
  expect(fitting(embCentre, caseOf("earth-sun", "periapsis", "2026-01-03 17:16"))).toEqual([]);
});

test("embCentre gives the passage of the barycentre, up to 1.4 days from the Earth's (DE405)", () => {
  const row = caseOf("earth-sun", "periapsis", "2026-01-03 17:16");
  const [found] = embCentre.predict(row);
  expect(Math.abs(found?.residual ?? 0)).toBeGreaterThan(60);
  expect(Math.abs(found?.residual ?? 0)).toBeLessThan(1.4 * 86_400);
});
