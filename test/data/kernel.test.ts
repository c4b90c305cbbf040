import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { makeKernel } from "../../src/data/make/de405/make-kernel.ts";
import { addSegmentState, readSpk } from "../../src/ephemeris/spk.ts";
import { findDe405 } from "../de405/fetch.ts";
import { type De405Point, openDe405 } from "../de405/read.ts";

const SHA256 = "776fbc2b41b54221d88f76612bbd1ed0784c1a00ca9ce9d1e72d93ccda694d18";
const url = new URL("../../src/data/de405.bsp", import.meta.url);
const bytes = new Uint8Array(readFileSync(url));
const sha256 = (file: Uint8Array) => createHash("sha256").update(file).digest("hex");
const table = findDe405();

describe("the built-in kernel", () => {
  it("is the file that its provenance page describes, to the bit, and no longer than 4 000 000 bytes", () => {
    expect(sha256(bytes)).toBe(SHA256);
    expect(bytes.length).toBeLessThanOrEqual(4_000_000);
    const page = readFileSync(new URL("PROVENANCE.md", url), "utf8");
    expect(page).toContain(SHA256);
    expect(page).toContain(`${bytes.length} bytes`);
  });

  it("holds the Sun, the planets' systems, the Earth and the Moon from 1959-12-10 to 2060-01-30 without a gap", () => {
    const { segments } = readSpk(bytes, "the built-in kernel");
    const routes = segments.map(({ target, centre }) => `${target}/${centre}`).sort();
    expect(routes).toEqual(
      ["1/0", "2/0", "3/0", "4/0", "5/0", "6/0", "7/0", "8/0", "9/0", "10/0", "399/3", "301/399"].sort(),
    );
    for (const segment of segments) {
      // JD 2436912.5 and 2473488.5.
      expect(segment.from).toBe(-14632.5 * 86400);
      expect(segment.to).toBe(21943.5 * 86400);
      expect(segment.type).toBe(2);
    }
  });

  it("tells in its comments where it comes from and that U.S. Government material is included", () => {
    const { comments } = readSpk(bytes, "the built-in kernel").daf;
    expect(comments).toContain("DE405");
    expect(comments).toContain("81.30056");
    expect(comments).toContain("149597870.691");
    expect(comments.replaceAll("\n", " ")).toContain("includes U.S. Government material");
    expect(comments).toContain("public domain");
  });

  it("joins its records without a step that a search for extrema could trip over", () => {
    // Near planets and Moon: coefficients are rounded to 2⁻²² km, so a step is the sum of some 50 errors of 0.07 mm (rms), and in
    // velocity of as many of 2·10⁻⁷ mm/s by up to n². Far planets: a double holds their distances to 0.5 mm.
    const before = new Float64Array(6);
    const after = new Float64Array(6);
    for (const segment of readSpk(bytes, "the built-in kernel").segments) {
      for (let i = 1; i < segment.records; i++) {
        const edge = segment.firstStart + i * segment.recordSeconds;
        before.fill(0);
        after.fill(0);
        addSegmentState({ ...segment, records: i }, edge, 1, 1, before);
        addSegmentState(segment, edge, 1, 1, after);
        for (let axis = 0; axis < 3; axis++) {
          const km = (after[axis] as number) - (before[axis] as number);
          const kmPerSecond = (after[axis + 3] as number) - (before[axis + 3] as number);
          expect(Math.abs(km), `${segment.name}, record ${i}`).toBeLessThan(7e-6);
          expect(Math.abs(kmPerSecond), `${segment.name}, record ${i}`).toBeLessThan(1e-9);
        }
      }
    }
  });
});

describe.skipIf(!table)(
  "the built-in kernel, where DE405's own table is at hand (npm run verify:de405 fetches it)",
  () => {
    it("stays within 1.5 m of DE405, Moon and Earth included, at 2 000 times over its span", () => {
      const de405 = openDe405(table as string);
      const state = new Float64Array(3);
      const names: Record<number, De405Point> = {
        1: "mercury",
        2: "venus",
        3: "emb",
        4: "mars",
        5: "jupiter",
        6: "saturn",
        7: "uranus",
        8: "neptune",
        9: "pluto",
        10: "sun",
        301: "moon-geocentric",
      };
      for (const segment of readSpk(bytes, "the built-in kernel").segments) {
        for (let i = 0; i <= 2000; i++) {
          const tdb = de405.from + ((de405.to - de405.from) * i) / 2000;
          state.fill(0);
          addSegmentState(segment, tdb, 1, 0, state);
          const truth =
            segment.target === 399
              ? de405.state("earth", tdb).map((x, k) => x - (de405.state("emb", tdb)[k] as number))
              : de405.state(names[segment.target] as De405Point, tdb);
          const off = [0, 1, 2].map((k) => (state[k] as number) - (truth[k] as number));
          expect(Math.hypot(...off), segment.name).toBeLessThan(1.5e-3);
        }
      }
    });

    it("is what the script makes, to the bit", () => {
      expect(sha256(makeKernel(table as string).file)).toBe(SHA256);
    });
  },
);
