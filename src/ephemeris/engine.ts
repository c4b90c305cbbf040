import type { Pair } from "../bodies/pair.ts";
import { ApsidaryError } from "../error.ts";
import { ENGINE_FIGURES, engineAccuracy, engineSpan } from "./engine-accuracy.ts";
import { engineLibrary } from "./engine-library.ts";
import { engineMotion } from "./engine-motion.ts";
import type { Motion, Source, Span } from "./source.ts";

/**
 * Opens astronomy-engine as a source: the net under the kernels, for other centuries, Pluto and the moons of Jupiter.
 * The package is loaded here and not before.
 *
 * What stands behind it, as its documentation says:
 *
 * - Sun and planets: VSOP87 (P. Bretagnon and G. Francou, Astron. Astrophys. 202 (1988) 309), cut short. For Jupiter to Neptune the
 *   theory was made with the mass of the whole system, so it gives the system's barycentre, as the pairs mean; where that lies
 *   (up to 300 km from Saturn's own centre, less for the others) is far inside the error of the short series.
 * - The solar-system barycentre: Sun, Jupiter, Saturn, Uranus and Neptune, without the inner planets.
 * - Moon: E. W. Brown's theory as in the Improved Lunar Ephemeris (1954), cut short. EMB: the Earth and 1/82.3 of the Moon.
 * - Pluto: barycentric positions tabulated every 80 years from 2 to 3998, between them two integrations, one forward and one
 *   backward, blended; past its ends it integrates on without limit, which is left unused here.
 * - Moons of Jupiter: L1.2 of V. Lainey, L. Duriez and A. Vienne (Astron. Astrophys. 456 (2006) 783), cut short, about
 *   Jupiter's own centre.
 *
 * Each pair has the span for which an accuracy can be stated (`ENGINE_FIGURES`); the package itself answers for any year.
 *
 * @throws ApsidaryError `unreadable` where the package cannot be loaded
 */
export async function openEngine(): Promise<Source> {
  const library = await engineLibrary();
  const motions = new Map<string, Motion>();
  const supplied = (pair: Pair): boolean => Object.hasOwn(ENGINE_FIGURES, pair.name);
  const motion = (pair: Pair): Motion => {
    let made = motions.get(pair.name);
    if (!made) {
      if (!supplied(pair)) {
        throw new ApsidaryError(
          "not-supplied",
          `astronomy-engine does not supply ${pair.name}; it has ${Object.keys(ENGINE_FIGURES).join(", ")}.`,
        );
      }
      made = engineMotion(library, pair);
      motions.set(pair.name, made);
    }
    return made;
  };
  const place = new Float64Array(6);
  return Object.freeze({
    id: "engine",
    kind: "engine",
    title: "astronomy-engine (short analytical series)",
    spans: (pair: Pair): readonly Span[] => (supplied(pair) ? [engineSpan(pair.name)] : []),
    motion,
    accuracy(pair: Pair, tdb: number) {
      motion(pair).state(tdb, place);
      const [x = 0, y = 0, z = 0] = place;
      return engineAccuracy(pair.name, tdb, Math.hypot(x, y, z));
    },
    checksum: async () => null,
    describe,
  });
}

function describe(): string {
  const rows = Object.entries(ENGINE_FIGURES).map(
    ([pair, { years, range, rate }]) =>
      `  ${pair}: years ${years[0]} to ${years[1]}; from 1960 to 2059 distance ± ${range} km, range rate ± ${rate} km/s`,
  );
  return ["astronomy-engine: VSOP87, Brown's Moon, Pluto integrated, L1.2, all cut short", ...rows].join("\n");
}
