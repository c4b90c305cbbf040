import { execFileSync } from "node:child_process";
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { PairName } from "../../src/bodies/pair.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { Passage } from "../../src/passages/passage.ts";
import { passages } from "../../src/passages/passages.ts";
import type { SourceChoice } from "../../src/passages/timeline-for.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { seriesBytes } from "../ephemeris/series-opened.ts";

/**
 * Anomalistic months and years in days, from which follows how many passages there are: the Moon's (Chapront's mean elements,
 * in J. Meeus, *Astronomical Algorithms*, ch. 50), the Earth's (the same, ch. 38), and sidereal periods of the others, whose
 * perihelia move by less than 0.02 periods in these years (NASA planetary fact sheets; all from memory).
 */
const PERIOD_DAYS = {
  "moon-earth": 27.554_55,
  "earth-sun": 365.2596,
  "emb-sun": 365.2596,
  "mercury-sun": 87.969,
  "venus-sun": 224.701,
  "mars-sun": 686.98,
  "jupiter-sun": 4332.6,
  "saturn-sun": 10_759,
  "uranus-sun": 30_687,
  "mercury-ssb": 87.969,
  "mars-ssb": 686.98,
  "jupiter-ssb": 4332.6,
  "saturn-ssb": 10_759,
  "uranus-ssb": 30_687,
  "neptune-ssb": 60_190,
  "earth-ssb": 365.2596,
  "emb-ssb": 365.2596,
} as const satisfies Partial<Record<PairName, number>>;

/** Venus from the barycentre has fewer passages than half-years, Neptune about the Sun more: counted against the engine. */
const UNEVEN = ["venus-ssb", "neptune-sun"] as const;
/** The series have no Pluto: the kernel meets the engine. */
const PLUTO = ["pluto-sun", "pluto-ssb"] as const;
const EVEN = Object.keys(PERIOD_DAYS) as readonly (keyof typeof PERIOD_DAYS)[];

/** Where the built-in kernel begins and ends. */
const SEAMS = ["1959-12-10", "2060-01-30"].map((day) => tdbOf(day));
const YEAR = 365.25 * 86_400;

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

const lists = new Map<string, readonly Passage[]>();
function listOf(pair: PairName, source: SourceChoice, from = "1950", to = "2070"): readonly Passage[] {
  const key = `${pair} ${source} ${from} ${to}`;
  const list = lists.get(key) ?? [...passages(ephemeris, pair, { from, to, source })];
  lists.set(key, list);
  return list;
}

function expectOrder(list: readonly Passage[]): void {
  list.forEach((passage, i) => {
    const before = list[i - 1];
    if (!before) return;
    expect(passage.tdbSeconds).toBeGreaterThan(before.tdbSeconds);
    expect(passage.kind).not.toBe(before.kind);
  });
}

/** The passage of the same kind that is nearest in time. */
function twinOf(passage: Passage, list: readonly Passage[]): Passage | undefined {
  const off = (other: Passage) => Math.abs(other.tdbSeconds - passage.tdbSeconds);
  return list
    .filter(({ kind }) => kind === passage.kind)
    .reduce<Passage | undefined>((best, other) => (best && off(best) <= off(other) ? best : other), undefined);
}

/** How far two instants of one passage are apart, in half-widths. */
function apart(one: Passage, other: Passage | undefined, halfWidth: number): number {
  return other ? Math.abs(one.tdbSeconds - other.tdbSeconds) / halfWidth : Infinity;
}

describe("1950 to 2070, across both ends of the built-in kernel", () => {
  test.each([...EVEN, ...UNEVEN, ...PLUTO])("%s goes from nearest to farthest and back, in order", (pair) => {
    const list = listOf(pair, "auto");
    expectOrder(list);
    const sources = new Set(list.map(({ source }) => source));
    if (list.length > 3) expect([...sources].sort()).toEqual(["de405", "series"]);
  });

  test.each(EVEN)("%s has as many passages as its period says", (pair) => {
    const expected = (2 * (tdbOf("2070") - tdbOf("1950"))) / 86_400 / PERIOD_DAYS[pair];
    // the nearest number or the one beside it, as the first falls; seen from the barycentre, which the giants swing, one more
    expect(Math.abs(listOf(pair, "auto").length - expected)).toBeLessThan(pair.endsWith("ssb") ? 2 : 1);
  });

  test.each([...UNEVEN, ...PLUTO])("%s has as many passages as the engine alone finds", (pair) => {
    expect(listOf(pair, "auto").length).toBe(listOf(pair, "engine").length);
  });

  test.each([...EVEN, ...UNEVEN])(
    "%s has every certain passage by the series alone as well, and no other certain one",
    (pair) => {
      const [auto, alone] = [listOf(pair, "auto"), listOf(pair, "series")];
      expectOrder(alone);
      const certain = alone.filter(({ existence }) => existence === "certain");
      const far = auto.filter((row) => {
        const twin = twinOf(row, alone);
        return apart(row, twin, twin?.timeUncertaintySeconds ?? 0) > 1;
      });
      // the half-widths of the series, which 95 in 100 keep; where there are few passages, all (the 5 in 100 of three are none)
      expect(far.length).toBeLessThanOrEqual(0.05 * auto.length);
      // the rest: three half-widths, as six standard deviations, with the kernel's own
      for (const row of auto.filter((row) => row.existence === "certain")) {
        const twin = twinOf(row, alone);
        expect(apart(row, twin, 3 * ((twin?.timeUncertaintySeconds ?? 0) + row.timeUncertaintySeconds))).toBeLessThan(
          1,
        );
      }
      for (const row of certain) {
        const twin = twinOf(row, auto);
        expect(apart(row, twin, 3 * (row.timeUncertaintySeconds + (twin?.timeUncertaintySeconds ?? 0)))).toBeLessThan(
          1,
        );
      }
      if (pair !== "neptune-sun") {
        expect(certain.length).toBe(alone.length);
        expect(alone.length).toBe(auto.length);
      }
    },
  );

  test("Neptune about the Sun in 2049 and 2050 is certain by the kernel; small waves of the series are all marked uncertain", () => {
    const waves = listOf("neptune-sun", "series").filter(({ tdbSeconds }) => tdbSeconds > tdbOf("2049"));
    expect(waves.length).toBeGreaterThan(2);
    expect(waves.every(({ existence }) => existence === "uncertain")).toBe(true);
    const kernel = listOf("neptune-sun", "auto").filter(({ tdbSeconds }) => tdbSeconds > tdbOf("2049"));
    expect(kernel.map(({ kind, existence }) => [kind, existence])).toEqual([
      ["apoapsis", "certain"],
      ["periapsis", "certain"],
    ]);
  });

  test("passages within three years of a seam agree on both sides within the sum of their half-widths", () => {
    let count = 0;
    let far = 0;
    for (const pair of [...EVEN, ...UNEVEN]) {
      const kernel = listOf(pair, "auto").filter(({ source }) => source === "de405");
      for (const seam of SEAMS) {
        const byNearness = [...kernel].sort((a, b) => Math.abs(a.tdbSeconds - seam) - Math.abs(b.tdbSeconds - seam));
        for (const [i, row] of byNearness.entries()) {
          if (i > 0 && Math.abs(row.tdbSeconds - seam) > 3 * YEAR) break; // the nearest one, however far, and all these
          if (row.existence === "uncertain") continue;
          const twin = twinOf(row, listOf(pair, "series"));
          const time = apart(row, twin, row.timeUncertaintySeconds + (twin?.timeUncertaintySeconds ?? 0));
          const km = Math.abs(row.distanceKm - (twin?.distanceKm ?? 0));
          const distance = km / (row.distanceUncertaintyKm + (twin?.distanceUncertaintyKm ?? 0));
          count++;
          if (time > 1 || distance > 1) far++;
          // 5 in 100 may lie beyond; none beyond three times
          expect(Math.max(time, distance), `${pair} ${row.kind} ${row.tdbSeconds}`).toBeLessThan(3);
        }
      }
    }
    expect(count).toBeGreaterThan(250);
    expect(far / count).toBeLessThan(0.05);
  });
});

describe("across the years 1000 and 3000, where the series meet the engine", () => {
  const near = [
    ["0995", "1005"],
    ["2996", "3006"],
  ] as const;
  const cases = near.flatMap(([from, to]) =>
    (["moon-earth", "mercury-sun", "venus-sun", "earth-sun", "mars-sun", "emb-ssb"] as const).map(
      (pair) => [pair, from, to] as const,
    ),
  );
  test.each(cases)(
    "%s from %s to %s is one list, in order, with every passage of the engine once, and says who supplied each",
    (pair, from, to) => {
      const list = listOf(pair, "auto", from, to);
      const engine = listOf(pair, "engine", from, to);
      expectOrder(list);
      expect(list.length).toBe(engine.length);
      for (const row of engine) {
        const twin = twinOf(row, list);
        const sum = row.timeUncertaintySeconds + (twin?.timeUncertaintySeconds ?? 0);
        expect(apart(row, twin, sum)).toBeLessThan(3); // 5 in 100 may lie beyond one
      }
      const [begin, end] = [tdbOf("0999-12-31T00:00Z"), tdbOf("3001-01-02T00:00Z")];
      for (const { tdbSeconds, source } of list) {
        if (tdbSeconds > begin + YEAR / 100 && tdbSeconds < end - YEAR / 100) expect(source).toBe("series");
        if (tdbSeconds < begin - YEAR / 100 || tdbSeconds > end + YEAR / 100) expect(source).toBe("engine");
      }
      expect(new Set(list.map(({ source }) => source)).size).toBe(2);
    },
  );

  test.each(["0999", "3001"])(
    "with the series alone year %s is refused, in one line that says what they span",
    (year) => {
      const ask = () =>
        passages(ephemeris, "moon-earth", {
          from: year,
          to: String(Number(year) + 1).padStart(4, "0"),
          source: "series",
        });
      expect(ask).toThrow(
        expect.objectContaining({
          code: "not-covered",
          message: expect.stringMatching(
            /^[^\n]*0999-12-31T00:00:00 to 3001-01-02T00:00:00[^\n]*allow another source\.$/,
          ),
        }),
      );
    },
  );
});

describe("without the files of the series", () => {
  const kinds = (opened: Ephemeris) => opened.sources.map(({ kind }) => kind);

  test("the library works where a caller leaves them out", async () => {
    const builtIn = readFileSync(new URL("../../src/data/de405.bsp", import.meta.url));
    const opened = await openSources({ builtIn: new Uint8Array(builtIn), series: false });
    expect(kinds(opened)).toEqual(["kernel", "engine"]);
    const list = [...passages(opened, "moon-earth", { from: "1959", to: "1961" })];
    expectOrder(list);
    expect(new Set(list.map(({ source }) => source))).toEqual(new Set(["engine", "de405"]));
    expect(() => passages(opened, "moon-earth", { from: "1900", to: "1901", source: "series" })).toThrow(
      expect.objectContaining({
        code: "not-supplied",
        message: 'no source of kind "series" is open; open are: kernel, engine.',
      }),
    );
  });

  test("they may be given as bytes", async () => {
    expect(kinds(await openSources({ builtIn: false, engine: false, series: seriesBytes() }))).toEqual(["series"]);
  });

  const folder = mkdtempSync(join(tmpdir(), "apsidary-no-series-"));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  test("a package from which they were taken works, and refuses only who asks for them", () => {
    const root = fileURLToPath(new URL("../..", import.meta.url));
    mkdirSync(join(folder, "src/data"), { recursive: true });
    mkdirSync(join(folder, "src/ephemeris"));
    cpSync(join(root, "dist"), join(folder, "dist"), { recursive: true });
    cpSync(join(root, "package.json"), join(folder, "package.json"));
    symlinkSync(join(root, "node_modules"), join(folder, "node_modules"));
    symlinkSync(join(root, "src/data/de405.bsp"), join(folder, "src/data/de405.bsp"));
    for (const way of ["node", "web"]) {
      const reader = `src/ephemeris/kernel-bytes.${way}.mjs`;
      cpSync(join(root, reader), join(folder, reader));
    }
    writeFileSync(
      join(folder, "try.mjs"),
      `import { openSources, passages } from "./dist/index.js";
       const ephemeris = await openSources();
       const list = [...passages(ephemeris, "moon-earth", { from: "1959", to: "1961" })];
       const refused = await openSources({ series: true }).catch((error) => error.code);
       console.log(JSON.stringify([ephemeris.sources.map(({ kind }) => kind), list.length, refused]));`,
    );
    const answer = execFileSync(process.execPath, ["try.mjs"], { cwd: folder, encoding: "utf8" });
    // 731 days over 27.55455, twice
    expect(JSON.parse(answer)).toEqual([["kernel", "engine"], 53, "kernel-not-found"]);
  });
});
