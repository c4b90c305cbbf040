import { beforeAll, describe, expect, test } from "vitest";
import { pairOf } from "../../src/bodies/pair.ts";
import { PHYSICAL_BODIES } from "../../src/bodies/physical.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { ElementsGiven } from "../../src/orbit/elements.ts";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import { perturbedTrack } from "../../src/orbit/perturbed-track.ts";
import { passages } from "../../src/passages/passages.ts";
import { messageOf, passagesOf } from "./bare.ts";
import { elementsOfState } from "./state-elements.ts";

const YEAR = 365.25 * 86400;

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources({ series: false });
});

/** A planet of the built-in kernel (JPL DE405) as elements, osculating at a time. */
function planetAt(planet: "mercury" | "mars" | "jupiter", tdb: number): ElementsGiven {
  const pair = pairOf(`${planet}-sun`);
  const state = new Float64Array(6);
  ephemeris.sources[0]?.motion(pair).state(tdb, state);
  const gm = PHYSICAL_BODIES.sun.gmKm3S2 + PHYSICAL_BODIES[planet].gmKm3S2;
  return { name: `${planet}-copy`, about: "sun", companion: planet, ...elementsOfState(state, gm, tdb) };
}

describe("a track with the planets' pull", () => {
  test.each([
    ["mars", 10],
    ["mars", -10],
    ["mercury", 10],
    ["jupiter", 20],
  ] as const)(
    "of %s, started from its state in DE405 and carried %i years, is at least twenty times nearer to DE405's perihelion than two bodies are",
    async (planet, years) => {
      const epoch = 1e8;
      const given = planetAt(planet, epoch);
      const end = epoch + years * YEAR;
      const period = elementsTrack(given).pair.halfPeriodSeconds * 2;
      const window = [end - 0.6 * period, end + 0.6 * period] as const;
      const span = { from: Math.min(epoch, window[0]), to: Math.max(epoch, window[1]) };
      const perihelion = (found: readonly { readonly kind: string; readonly tdbSeconds: number }[]) =>
        found.filter(({ kind }) => kind === "periapsis").map(({ tdbSeconds }) => tdbSeconds);
      const query = { from: { tdbSeconds: window[0] }, to: { tdbSeconds: window[1] } };
      const [truth = 0] = perihelion([...passages(ephemeris, pairOf(`${planet}-sun`), query)]);
      const nearest = (list: readonly number[]) => Math.min(...list.map((tdb) => Math.abs(tdb - truth)));
      const twoBodies = nearest(
        perihelion(await passagesOf(elementsTrack(given), window[0] - period, window[1] + period)),
      );
      const track = perturbedTrack(ephemeris, given, span);
      const pulled = nearest(perihelion(await passagesOf(track, ...window)));
      expect(truth).not.toBe(0);
      expect(twoBodies / pulled).toBeGreaterThan(20);
    },
  );

  test("says what it is, and what two bodies alone are", () => {
    const given = planetAt("mars", 1e8);
    expect(perturbedTrack(ephemeris, given, { from: 1e8, to: 1.1e8 }).title).toContain("with the pull of the planets");
    expect(elementsTrack(given).title).toContain("two bodies alone");
  });

  test("is refused in one line without the orbit's place in space, about another body, and where the planets are not known", () => {
    const { inclinationDeg, nodeDeg, argumentDeg, ...flat } = planetAt("mars", 1e8);
    const span = { from: 1e8, to: 1.1e8 };
    expect(messageOf(() => perturbedTrack(ephemeris, flat, span))).toMatch(/needs the orbit's place in space/);
    const about = { ...planetAt("mars", 1e8), about: "earth" as const, companion: null };
    expect(messageOf(() => perturbedTrack(ephemeris, about, span))).toMatch(/about the sun alone, not about earth/);
    expect(messageOf(() => perturbedTrack(ephemeris, planetAt("mars", 1e8), { from: 1e8, to: 9e10 }))).toMatch(
      /no one source has mercury-sun from 2003-03-03/,
    );
  });
});
