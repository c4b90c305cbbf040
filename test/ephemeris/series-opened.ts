import { readFileSync } from "node:fs";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { openSeries, type SeriesBytes } from "../../src/ephemeris/series.ts";
import type { Source } from "../../src/ephemeris/source.ts";

/** Reads the files of series as the package carries them. */
export function seriesBytes(): SeriesBytes {
  const read = (name: string) =>
    new Uint8Array(readFileSync(new URL(`../../src/data/${name}.series.bin`, import.meta.url)));
  return { planets: read("planets"), moon: read("moon") };
}

let series: Source | undefined;

/** Opens the series once. */
export function openedSeries(): Source {
  series ??= openSeries(seriesBytes());
  return series;
}

/** Opens an ephemeris that has the series and nothing else. */
export function seriesAlone(): Promise<Ephemeris> {
  return openSources({ builtIn: false, engine: false, tracks: [openedSeries()] });
}
