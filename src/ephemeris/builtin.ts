import { ApsidaryError } from "../error.ts";
import { openKernel } from "./kernel.ts";
import { kernelAccuracy } from "./kernel-accuracy.ts";
import { openSeries, type SeriesBytes } from "./series.ts";
import type { Source } from "./source.ts";

/**
 * Opens the built-in kernel, DE405 refitted, 1959-12-10 to 2060-01-30.
 *
 * @param where its bytes or URL; left out, the file that the package carries
 * @throws ApsidaryError `kernel-not-found` where the file cannot be had, `bad-kernel` where it is not what it should be
 */
export async function openBuiltInKernel(where?: Uint8Array | URL, signal?: AbortSignal): Promise<Source> {
  const bytes = where instanceof Uint8Array ? where : await fetchBytes(where, signal);
  return openKernel(bytes, {
    id: "de405",
    title: "the built-in kernel (JPL DE405, refitted)",
    accuracy: (pair) => kernelAccuracy(pair, "measured"),
  });
}

/**
 * Opens the series for the years 1000 to 3000.
 *
 * @param where their bytes; `true` for the files that the package carries; left out, those files where they are there: a bundle may
 *   leave them behind, and the library works without
 * @returns `null` only where nothing was asked for and the files are not there
 * @throws ApsidaryError `kernel-not-found` where they were asked for and cannot be had, `bad-kernel` where they are not what they should be
 */
export async function openBuiltInSeries(where?: true | SeriesBytes, signal?: AbortSignal): Promise<Source | null> {
  if (where !== undefined && where !== true) return openSeries(where);
  const { readBytes, planetsSeries, moonSeries } = await import("#kernel-bytes");
  try {
    const [planets, moon] = await Promise.all([readBytes(planetsSeries, signal), readBytes(moonSeries, signal)]);
    return openSeries({ planets, moon });
  } catch (error) {
    if (signal?.aborted || error instanceof ApsidaryError) throw error;
    if (where === undefined) return null;
    throw notFound("the files of the series were", planetsSeries, error, "Give their bytes as `series`");
  }
}

async function fetchBytes(where: URL | undefined, signal: AbortSignal | undefined): Promise<Uint8Array> {
  // Loaded here, not at the top: Node and browsers have a reader each, chosen by the package's `imports`.
  const { builtInKernel, readBytes } = await import("#kernel-bytes");
  const url = where ?? builtInKernel;
  try {
    return await readBytes(url, signal);
  } catch (error) {
    if (signal?.aborted) throw error;
    throw notFound(
      "the built-in kernel was",
      url,
      error,
      "Give its URL or bytes as `builtIn`, or `builtIn: false` to do without",
    );
  }
}

function notFound(what: string, url: URL, error: unknown, remedy: string): ApsidaryError {
  const why = error instanceof Error ? error.message : String(error);
  return new ApsidaryError("kernel-not-found", `${what} not found at ${url.href} (${why}). ${remedy}.`);
}
