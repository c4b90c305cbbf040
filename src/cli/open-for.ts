import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Source } from "../ephemeris/source.ts";
import { openSources } from "../node.ts";
import type { SharedOptions } from "./options.ts";

/** Opens the sources that the options name, and tracks before them. @throws ApsidaryError as `openSources` */
export function openFor(
  { kernel = [], leapSeconds }: SharedOptions,
  tracks: readonly Source[] = [],
): Promise<Ephemeris> {
  return openSources({
    kernels: kernel,
    tracks,
    ...(leapSeconds === undefined ? {} : { leapSecondsFile: leapSeconds }),
  });
}
