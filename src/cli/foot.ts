import { wrapped } from "../report/wrapped.ts";
import type { Provenance } from "./provenance.ts";

/**
 * Gives the last lines of a report: the sources, and what else it was made from.
 *
 * @param made  the provenance
 * @param times what the times of the report were reckoned with, besides leap seconds
 */
export function footOf(made: Provenance, times: { readonly deltaT: boolean; readonly zones: boolean }): string {
  const sources = made.sources.map(({ id, title, tdbFrom, tdbTo }) => {
    return `Source ${id}: ${title}, ${dateOf(tdbFrom)} to ${dateOf(tdbTo)}.`;
  });
  const deltaT = times.deltaT ? [`ΔT: ${made.deltaT}.`] : [];
  const zones = times.zones ? `zone data ${made.zoneData ?? "of unknown version"}; ` : "";
  const last = `Leap seconds known until ${made.leapSeconds.expires}; ${zones}apsidary ${made.version}.`;
  return [...sources, ...deltaT, last].map((line) => wrapped(line, 100, "  ")).join("");
}

function dateOf(tdb: string): string {
  return tdb.slice(0, tdb.indexOf("T"));
}
