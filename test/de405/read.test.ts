import { describe, expect, it } from "vitest";
import { findDe405 } from "./fetch.ts";
import { openDe405 } from "./read.ts";

const path = findDe405();

describe.skipIf(!path)("the reader of DE405 that the checks use", () => {
  it("joins neighbouring records: positions meet within 1 m at record ends", () => {
    const de = openDe405(path as string);
    const points = [
      "mercury",
      "venus",
      "emb",
      "mars",
      "jupiter",
      "saturn",
      "uranus",
      "neptune",
      "pluto",
      "moon-geocentric",
      "sun",
    ] as const;
    for (const point of points) {
      for (let row = 1; row < 1143; row += 57) {
        const edge = de.from + row * 32 * 86400;
        const step = 1e-3;
        const before = de.state(point, edge - step);
        const after = de.state(point, edge);
        for (let i = 0; i < 3; i++) {
          const jump = (after[i] as number) - (before[i] as number) - step * (after[i + 3] as number);
          expect(Math.abs(jump), `${point}, row ${row}`).toBeLessThan(1e-3);
        }
      }
    }
  });

  it("puts the Earth's perihelion of 2026 at 2026-01-03 17:16 UTC, as the national almanac office prints it", () => {
    const de = openDe405(path as string);
    // 2026-01-03T17:16 UTC is 69.184 s less in UTC than in TT. Source: US Naval Observatory, "Earth's Seasons", from memory.
    const minute = (Date.UTC(2026, 0, 3, 17, 16) - Date.UTC(2000, 0, 1, 12)) / 1000 + 69.184;
    const rate = (tdb: number) => {
      const s = de.pairState("earth-sun", tdb);
      const x = (i: number) => s[i] as number;
      return x(0) * x(3) + x(1) * x(4) + x(2) * x(5);
    };
    expect(rate(minute - 30)).toBeLessThan(0);
    expect(rate(minute + 30)).toBeGreaterThan(0);
  });
});
