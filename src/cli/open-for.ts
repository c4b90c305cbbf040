import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { openSources } from "../node.ts";
import type { SharedOptions } from "./options.ts";

/** Opens the sources that the options name. @throws ApsidaryError as `openSources` */
export function openFor({ kernel = [], leapSeconds }: SharedOptions): Promise<Ephemeris> {
  return openSources({ kernels: kernel, ...(leapSeconds === undefined ? {} : { leapSecondsFile: leapSeconds }) });
}
