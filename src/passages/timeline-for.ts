import type { Pair } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { type Timeline, timelineOf } from "./timeline.ts";

/** Which sources may serve: all in their order, or one kind alone, which then never falls back. */
export type SourceChoice = "auto" | "kernel" | "series" | "engine";

/**
 * Gives the timeline of a pair over an ephemeris' sources, made once for each choice.
 *
 * @throws ApsidaryError `not-supplied`
 */
export function timelineFor(ephemeris: Ephemeris, pair: Pair<string>, choice: SourceChoice): Timeline {
  let known = timelines.get(ephemeris);
  if (!known) {
    known = new Map();
    timelines.set(ephemeris, known);
  }
  const key = `${pair.name} ${choice}`;
  let timeline = known.get(key);
  if (!timeline) {
    const sources = ephemeris.sources.filter((source) => choice === "auto" || source.kind === choice);
    if (sources.length === 0) {
      throw new ApsidaryError(
        "not-supplied",
        `no source of kind "${choice}" is open; open are: ${openKinds(ephemeris)}.`,
      );
    }
    timeline = timelineOf(pair, sources);
    known.set(key, timeline);
  }
  return timeline;
}

/** Only remembers what can be worked out again: seams are searched once for an ephemeris, not once a call. */
const timelines = new WeakMap<Ephemeris, Map<string, Timeline>>();

function openKinds(ephemeris: Ephemeris): string {
  return [...new Set(ephemeris.sources.map((source) => source.kind))].join(", ");
}
