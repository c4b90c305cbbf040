import { createHash } from "node:crypto";
import { readFile, stat } from "node:fs/promises";
import { basename, extname } from "node:path";
import { type BodyName, physicalBody } from "../bodies/physical.ts";
import { ApsidaryError } from "../error.ts";
import type { ElementsGiven } from "../orbit/elements.ts";
import type { MeanElements } from "../orbit/mean-elements.ts";
import type { SatelliteTrack } from "../orbit/satellite-track.ts";
import type { Track } from "../orbit/track.ts";
import { utcText } from "../time/format-utc.ts";
import { shown } from "./choice-of.ts";

/** The options that name files of tracks, as given. */
export interface TrackOptions {
  readonly elements?: string;
  readonly table?: string;
  readonly omm?: string;
  readonly tle?: string;
  readonly star?: string;
  readonly perturbed?: boolean;
  readonly about?: string;
}

/** Bytes of a file of tracks at the most. */
const MOST_BYTES = 200e6;

/**
 * Reads the tracks that the options name. Each is called after its file in the rows, and carries the file's checksum.
 *
 * @param perturbed makes the track of elements where the planets' pull is asked for
 * @throws ApsidaryError `unreadable` for a file that cannot be read; whatever is wrong in it, with its name
 */
export async function tracksOf(
  { elements, table, omm, tle, star, about }: TrackOptions,
  perturbed: ((given: ElementsGiven) => Track) | null = null,
): Promise<Track[]> {
  if (about !== undefined && table === undefined) {
    throw new ApsidaryError("bad-option", "--about goes with --table; elements name their central body themselves.");
  }
  const tracks: Track[] = [];
  if (elements !== undefined) {
    tracks.push(
      ...(await readTracks("--elements", elements, async (text) => {
        const { parseElementsFile } = await import("../orbit/elements-file.ts");
        const { elementsTrack } = await import("../orbit/elements-track.ts");
        return parseElementsFile(text).map((given) => perturbed?.(given) ?? elementsTrack(given));
      })),
    );
  }
  if (table !== undefined) {
    const centre = about === undefined ? {} : { about: bodyOf(about) };
    tracks.push(
      ...(await readTracks("--table", table, async (text) => {
        const { parseTableFile } = await import("../orbit/table-file.ts");
        const { tableTrack } = await import("../orbit/table-track.ts");
        const name = basename(table, extname(table)).replace(/[^\p{L}\p{N}._-]+/gu, "-");
        return [tableTrack({ name, ...parseTableFile(text), ...centre })];
      })),
    );
  }
  if (omm !== undefined) {
    tracks.push(
      ...(await readTracks("--omm", omm, async (text) => {
        const { parseOmmFile } = await import("../orbit/omm-file.ts");
        return satellites(parseOmmFile(text));
      })),
    );
  }
  if (tle !== undefined) {
    tracks.push(
      ...(await readTracks("--tle", tle, async (text) => {
        const { parseTleFile } = await import("../orbit/tle-file.ts");
        return satellites(parseTleFile(text));
      })),
    );
  }
  if (star !== undefined) {
    tracks.push(
      ...(await readTracks("--star", star, async (text) => {
        const { parseStarFile } = await import("../orbit/star-file.ts");
        const { starTrack } = await import("../orbit/star-track.ts");
        return parseStarFile(text).map((given) => starTrack(given));
      })),
    );
  }
  const names = new Set<string>();
  for (const { pair } of tracks) {
    if (names.has(pair.name)) throw new ApsidaryError("bad-input", `two tracks are called ${pair.name}; rename one.`);
    names.add(pair.name);
  }
  return tracks;
}

async function satellites(sets: readonly MeanElements[]): Promise<Track[]> {
  const { satelliteTrack } = await import("../orbit/satellite-track.ts");
  const tracks: Track[] = [];
  for (const set of sets) tracks.push(await satelliteTrack(set));
  return tracks;
}

/**
 * Refuses a span that goes on after a satellite has come down.
 *
 * @param tracks as `tracksOf` gave them
 * @param to     end of the span, TDB seconds past J2000
 * @throws ApsidaryError `not-covered` with the date
 */
export function refuseDecayed(tracks: readonly Track[], to: number): void {
  for (const track of tracks) {
    const decay = (track as Partial<SatelliteTrack>).decayTdb ?? null;
    if (decay === null || to <= decay) continue;
    throw new ApsidaryError(
      "not-covered",
      `${track.pair.name} has decayed: by its elements it comes down on ${utcText(decay, 0)}. Ask for a span that ends before.`,
    );
  }
}

function bodyOf(about: string): BodyName {
  physicalBody(about); // refuses a name that it does not know
  return about as BodyName;
}

async function readTracks(
  option: string,
  path: string,
  make: (text: string) => Promise<readonly Track[]>,
): Promise<Track[]> {
  const bytes = await readWhole(option, path);
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  const id = `user:${basename(path)}`;
  try {
    const tracks = await make(new TextDecoder().decode(bytes));
    return tracks.map((track) => Object.freeze({ ...track, id, checksum: async () => sha256 }));
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw new ApsidaryError(error.code, `${option} ${shown(path)}: ${error.message}`);
  }
}

async function readWhole(option: string, path: string): Promise<Uint8Array> {
  try {
    const { size } = await stat(path);
    if (size > MOST_BYTES) {
      throw new ApsidaryError("bad-input", `${option} ${shown(path)} has ${size} bytes; ${MOST_BYTES} at the most.`);
    }
    return await readFile(path);
  } catch (error) {
    if (error instanceof ApsidaryError) throw error;
    const { code, message } = error as NodeJS.ErrnoException;
    const why =
      code === "ENOENT" || code === "ENOTDIR"
        ? "there is no such file"
        : code === "EISDIR"
          ? "it is a directory"
          : code === "EACCES" || code === "EPERM"
            ? "it may not be read"
            : message;
    throw new ApsidaryError("unreadable", `${option} ${shown(path)} cannot be read: ${why}.`);
  }
}
