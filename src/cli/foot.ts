import type { Provenance } from "./provenance.ts";

/**
 * Gives the last lines of a report: the sources, and what else it was made from.
 *
 * @param made     the provenance
 * @param byDeltaT whether a time in the report was reckoned with ΔT
 */
export function* footOf(made: Provenance, byDeltaT: boolean): Generator<string, void, undefined> {
  for (const { id, title, tdbFrom, tdbTo } of made.sources) {
    yield `Source ${id}: ${title}, ${tdbFrom.replace(/T.*/, "")} to ${tdbTo.replace(/T.*/, "")}.\n`;
  }
  if (byDeltaT) yield `ΔT: ${made.deltaT}.\n`;
  yield `Leap seconds known until ${made.leapSeconds.expires}; zone data ${made.zoneData ?? "unknown"}; apsidary ${made.version}.\n`;
}
