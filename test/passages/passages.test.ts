import fc from "fast-check";
import { beforeAll, describe, expect, test } from "vitest";
import { allPairs, type PairName } from "../../src/bodies/pair.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { ApsidaryError } from "../../src/error.ts";
import { mergedPassages } from "../../src/passages/merged-passages.ts";
import { nextPassage, previousPassage } from "../../src/passages/next-passage.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { type PassageQuery, passages } from "../../src/passages/passages.ts";
import { toRow } from "../../src/passages/to-row.ts";

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

const DAY = 86400;
const YEAR = 365.25 * DAY;

function list(pair: PairName, from: number, to: number, more: Partial<PassageQuery> = {}): Passage[] {
  return [...passages(ephemeris, pair, { from: { tdbSeconds: from }, to: { tdbSeconds: to }, ...more })];
}

function codeOf(call: () => unknown): string {
  try {
    call();
  } catch (error) {
    return (error as ApsidaryError).code;
  }
  return "none";
}

/** Pairs and the years, past 2000, over which their lists are cut: across the kernel's two ends where that is quick. */
const CUT: [PairName, number, number][] = [
  ["moon-earth", -42, -38],
  ["moon-earth", 58.5, 61.5],
  ["earth-sun", -60, 80],
  ["earth-ssb", -50, 70],
  ["venus-ssb", -50, -30],
  ["mercury-sun", 57, 63],
  ["mars-sun", -50, 70],
  ["jupiter-sun", -60, 90],
];

describe("passages", () => {
  test.each(CUT)("of %s alternate in kind across the sources' seams, years %i to %i", (pair, from, to) => {
    const found = list(pair, from * YEAR, to * YEAR);
    expect(found.length).toBeGreaterThan(4);
    for (let i = 1; i < found.length; i++) {
      expect(found[i]?.kind).not.toBe(found[i - 1]?.kind);
      expect((found[i] as Passage).tdbSeconds).toBeGreaterThan((found[i - 1] as Passage).tdbSeconds);
    }
  });

  test.each(CUT)("of %s are the same, to the bit, when the span is cut anywhere and joined", (pair, from, to) => {
    const whole = list(pair, from * YEAR, to * YEAR);
    fc.assert(
      fc.property(fc.double({ min: from * YEAR + 1, max: to * YEAR - 1, noNaN: true }), (cut) => {
        expect([...list(pair, from * YEAR, cut), ...list(pair, cut, to * YEAR)]).toEqual(whole);
      }),
      { numRuns: pair === "jupiter-sun" || pair === "earth-sun" ? 6 : 15 },
    );
  });

  test("belong to a span that includes its first moment and excludes its last", () => {
    const one = nextPassage(ephemeris, "moon-earth", "2026-05-01") as Passage;
    expect(list("moon-earth", one.tdbSeconds, one.tdbSeconds + 1)).toHaveLength(1);
    expect(list("moon-earth", one.tdbSeconds - 1, one.tdbSeconds)).toHaveLength(0);
  });

  test("of Neptune about the Sun: the Sun's own swing makes lesser extrema, which are ranked secondary", () => {
    const found = list("neptune-sun", -40 * YEAR, 60 * YEAR).map((p) => {
      const row = toRow(p);
      return [row.tdb.slice(0, 10), p.kind, p.rank, row.term];
    });
    // Found on JPL DE405 by a scan of its own (2026-12): the last three are the extrema of 2042–2050.
    expect(found.map((row) => row.slice(1, 3))).toEqual([
      ["periapsis", "secondary"],
      ["apoapsis", "secondary"],
      ["periapsis", "principal"],
      ["apoapsis", "secondary"],
      ["periapsis", "secondary"],
    ]);
    expect(found[0]?.[0]?.slice(0, 4)).toBe("1965");
    expect(found[1]?.[0]?.slice(0, 4)).toBe("1968");
    expect(found.slice(2).map((row) => row[0])).toEqual(["2042-09-03", "2049-10-31", "2050-06-29"]);
    expect(found.map((row) => row[3]).filter((term) => term?.startsWith("local"))).toHaveLength(4);
  });

  test("of Neptune about the barycentre: one extremum near 2045.6", () => {
    const found = list("neptune-ssb", 20 * YEAR, 60 * YEAR);
    expect(found.map((p) => p.kind)).toEqual(["periapsis"]);
    expect(Math.abs((found[0] as Passage).tdbSeconds / YEAR - 45.6)).toBeLessThan(0.1);
  });

  test.each(["venus-ssb", "earth-ssb", "mars-ssb"] as const)("of %s are never secondary", (pair) => {
    expect(list(pair, -40 * YEAR, 60 * YEAR).filter((p) => p.rank !== "principal")).toEqual([]);
  });

  test("of Ganymede are never secondary", () => {
    expect(list("ganymede-jupiter", 26 * YEAR, 27 * YEAR).filter((p) => p.rank !== "principal")).toEqual([]);
  });

  test("have no rank where no source reaches half a period away", async () => {
    const kernel = await openSources({ series: false, engine: false });
    const query = { from: "2047-01-01", to: "2048-01-01" };
    expect([...passages(kernel, "saturn-sun", query)].map((p) => p.rank)).toEqual([null]);
  });

  test("merge by time over several pairs", () => {
    const pairs = ["moon-earth", "earth-sun", "mercury-sun"] as const;
    const query = { from: "2026-01-01", to: "2027-01-01" };
    const merged = [...mergedPassages(ephemeris, pairs, query)];
    expect(merged).toEqual([...merged].sort((a, b) => a.tdbSeconds - b.tdbSeconds));
    expect(merged).toHaveLength(pairs.reduce((sum, pair) => sum + [...passages(ephemeris, pair, query)].length, 0));
  });

  test("are found one at a time: the next and the previous of a moment are neighbours in the list", () => {
    const all = list("moon-earth", 0, YEAR);
    fc.assert(
      fc.property(fc.integer({ min: 1, max: all.length - 2 }), (i) => {
        const it = all[i] as Passage;
        expect(nextPassage(ephemeris, "moon-earth", it)).toEqual(it);
        expect(previousPassage(ephemeris, "moon-earth", it)).toEqual(all[i - 1]);
        expect(nextPassage(ephemeris, "moon-earth", it, it.kind === "periapsis" ? "apoapsis" : "periapsis")).toEqual(
          all[i + 1],
        );
      }),
      { numRuns: 15 },
    );
  });

  test("can be asked for by kind and by rank", () => {
    expect(new Set(list("earth-sun", 0, 5 * YEAR, { kind: "apoapsis" }).map((p) => p.kind))).toEqual(
      new Set(["apoapsis"]),
    );
    expect(list("neptune-sun", -40 * YEAR, 60 * YEAR, { rank: "principal" }).length).toBeLessThan(5);
  });

  test("are frozen plain values that survive a structured clone", () => {
    const passage = nextPassage(ephemeris, "venus-sun", "2026-01-01") as Passage;
    expect(Object.isFrozen(passage)).toBe(true);
    expect(structuredClone(passage)).toEqual(passage);
    expect(Object.isFrozen(toRow(passage))).toBe(true);
  });

  test("come from the kernel inside its span and from another source outside, each row saying so", () => {
    expect(new Set(list("earth-sun", 20 * YEAR, 30 * YEAR).map((p) => p.source))).toEqual(new Set(["de405"]));
    expect(list("earth-sun", 70 * YEAR, 71 * YEAR).map((p) => p.source)).not.toContain("de405");
  });

  test("are refused for a span that is reversed, empty, outside the named source, or a pair that nobody supplies", () => {
    const ask = (pair: PairName, from: string, to: string, more: Partial<PassageQuery> = {}) =>
      codeOf(() => passages(ephemeris, pair, { from, to, ...more }));
    expect(ask("moon-earth", "2027", "2026")).toBe("bad-span");
    expect(ask("moon-earth", "2026", "2026")).toBe("bad-span");
    expect(ask("moon-earth", "2026-02-30", "2027")).toBe("bad-date");
    expect(ask("moon-earth", "2070", "2071", { source: "kernel" })).toBe("not-covered");
    expect(ask("moon-earth", "2059", "2071", { source: "kernel" })).toBe("not-covered");
    expect(ask("io-jupiter", "2026", "2027", { source: "kernel" })).toBe("not-supplied");
    expect(ask("mon-earth" as PairName, "2026", "2027")).toBe("bad-pair");
  });

  test("are found for every pair that the library knows", () => {
    for (const pair of allPairs()) {
      expect(nextPassage(ephemeris, pair, "2026-01-01"), pair.name).not.toBeNull();
    }
  });
});
