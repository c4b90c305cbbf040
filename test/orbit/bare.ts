import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { ApsidaryError } from "../../src/error.ts";
import type { Track } from "../../src/orbit/track.ts";
import type { TrackPassage } from "../../src/passages/passage.ts";
import { passages } from "../../src/passages/passages.ts";

/** Opens tracks and nothing else. */
export function openTracks(...tracks: Track[]): Promise<Ephemeris> {
  return openSources({ builtIn: false, series: false, engine: false, tracks });
}

/** The passages of a track between two instants, TDB seconds past J2000. */
export async function passagesOf(track: Track, from: number, to: number): Promise<TrackPassage[]> {
  const ephemeris = await openTracks(track);
  return [...passages(ephemeris, track.pair, { from: { tdbSeconds: from }, to: { tdbSeconds: to } })];
}

/** The message of an ApsidaryError, which must be one line. */
export function messageOf(call: () => unknown): string {
  try {
    call();
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    if (error.message.includes("\n")) throw new Error(`more than one line: ${error.message}`);
    return error.message;
  }
  return "accepted";
}
