import { ApsidaryError } from "../error.ts";
import type { Nearness } from "../passages/near-window.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import type { Sky } from "../sky/open-sky.ts";
import type { Site } from "../sky/topocentric-frame.ts";

/** A site with what it is called. */
export interface PlanSite extends Site {
  readonly name?: string;
  /** IANA name or offset in which local times are told. */
  readonly zone?: string;
}

/** How a passage is planned. */
export interface PlanOptions {
  /** What `openSky` gave. */
  readonly sky: Sky;
  /** How near to its extreme the distance counts as near (default 1 %). */
  readonly within?: Nearness;
  /** A body counts as up when its centre is higher, degrees (default 0). */
  readonly minAltitudeDeg?: number;
  /** The sky counts as dark when the Sun's centre, without refraction, is lower, degrees (default −18). */
  readonly darkBelowDeg?: number;
  /** Whether the air lifts bodies (default: not). */
  readonly refraction?: boolean;
  /** How far from a passage windows are looked for, days (default 60), at most one period: the near interval of a slow planet lasts for years. */
  readonly windowDays?: number;
  /** Which sources may serve (default: the best at each time). */
  readonly source?: SourceChoice;
}

/** Options with all their defaults. */
export type CompletePlanOptions = Required<PlanOptions>;

/**
 * Gives options with their defaults, once they are sound.
 *
 * @throws ApsidaryError `bad-option`
 */
export function completePlanOptions(options: PlanOptions): CompletePlanOptions {
  const complete = {
    within: { percent: 1 },
    minAltitudeDeg: 0,
    darkBelowDeg: -18,
    refraction: false,
    windowDays: 60,
    source: "auto" as const,
    ...options,
  };
  within("least altitude", complete.minAltitudeDeg, -90, 90, "degrees");
  within("limit of darkness", complete.darkBelowDeg, -90, 90, "degrees of the Sun's altitude, such as -18, -12 or -6");
  within("reach of the windows", complete.windowDays, 0, 3660, "days");
  return Object.freeze(complete);
}

function within(what: string, value: number, least: number, most: number, unit: string): void {
  if (value >= least && value <= most) return;
  throw new ApsidaryError("bad-option", `the ${what} ${value} is not within ${least} and ${most} ${unit}.`);
}

/** Gives the name of a site: its own, or its coordinates. */
export function siteLabel({ name, latitudeDeg, longitudeDeg, heightM }: PlanSite): string {
  return name ?? `${latitudeDeg},${longitudeDeg},${heightM}`;
}
