import { beforeAll, describe, expect, test } from "vitest";
import { allPairs, type Pair, pairOf } from "../../src/bodies/pair.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { Source } from "../../src/ephemeris/source.ts";
import { passages } from "../../src/passages/passages.ts";

const HOUR = 3600;
let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

/** Kinds of the extrema that sampling every `step` seconds sees, each with the sample after it. */
function seenBySampling(source: Source, pair: Pair, from: number, to: number, step: number): [string, number][] {
  const motion = source.motion(pair);
  const s = new Float64Array(9);
  const toward = (t: number) => {
    motion.state(t, s);
    return (s[0] ?? 0) * (s[3] ?? 0) + (s[1] ?? 0) * (s[4] ?? 0) + (s[2] ?? 0) * (s[5] ?? 0);
  };
  const seen: [string, number][] = [];
  let before = toward(from);
  for (let t = from + step; t < to; t += step) {
    const after = toward(t);
    if (before < 0 !== after < 0) seen.push([before < 0 ? "periapsis" : "apoapsis", t]);
    before = after;
  }
  return seen;
}

function expectSame(source: Source, pair: Pair, from: number, to: number, step: number): void {
  const seen = seenBySampling(source, pair, from, to, step);
  const query = { from: { tdbSeconds: from }, to: { tdbSeconds: to }, source: source.kind as "kernel" | "engine" };
  const found = [...passages(ephemeris, pair, query)].filter((p) => p.tdbSeconds < (seen.at(-1)?.[1] ?? from));
  expect(found.map((p) => p.kind)).toEqual(seen.map(([kind]) => kind));
  found.forEach((p, i) => {
    const [, after] = seen[i] as [string, number];
    expect(p.tdbSeconds).toBeGreaterThan(after - step - 1e-3);
    expect(p.tdbSeconds).toBeLessThan(after + 1e-3);
  });
}

describe("against dense sampling", () => {
  test.each(
    allPairs()
      .filter((pair) => !pair.name.endsWith("-jupiter"))
      .map((pair) => pair.name),
  )("%s: the finder misses no extremum over the kernel's whole span", (name) => {
    const pair = pairOf(name);
    const kernel = ephemeris.sources.find((source) => source.kind === "kernel") as Source;
    const span = kernel.spans(pair)[0] as { from: number; to: number };
    expectSame(kernel, pair, span.from, span.to, name === "moon-earth" ? HOUR : 6 * HOUR);
  });

  test.each(["io-jupiter", "europa-jupiter", "ganymede-jupiter", "callisto-jupiter"])(
    "%s: the finder misses no extremum in a year",
    (name) => {
      const engine = ephemeris.sources.find((source) => source.kind === "engine") as Source;
      expectSame(engine, pairOf(name), 26 * 365.25 * 86400, 27 * 365.25 * 86400, HOUR);
    },
  );
});
