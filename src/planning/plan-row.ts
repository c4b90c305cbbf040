import type { WhyNoEnd } from "../passages/near-window.ts";
import type { PassageRow } from "../passages/to-row.ts";

/** Why a body does not rise or set around a passage. */
export type WhyNoRise = "stays-up" | "stays-down" | "no-data";
/** Why it crosses no meridian. */
export type WhyNoTransit = "stays-down" | "pole" | "no-data";
/** Why there is no moment at which it can be observed. */
export type WhyNot = "never-up" | "never-dark" | "up-only-while-bright" | "no-data";

/** A stretch of time in which a body can be observed. */
export interface PlanWindow {
  readonly fromUtc: string;
  readonly toUtc: string;
}

/** A passage as a site sees it. Degrees to 1e-4, arcminutes to 1e-4; instants as in `utc`. Frozen. */
export interface PlanRow extends PassageRow {
  /** The site's name, or its coordinates. */
  readonly site: string;
  /** The site's zone, `null` where none is given. */
  readonly zone: string | null;
  /** The passage in that zone, ISO 8601 with offset. */
  readonly local: string | null;
  /** Altitude of the body's centre at the passage, as it is seen (light-time and aberration counted). */
  readonly altitudeDeg: number;
  /** From north through east. */
  readonly azimuthDeg: number;
  /** Of the Sun's centre, without refraction. */
  readonly sunAltitudeDeg: number;
  /** By how much the Earth may have turned farther or less far, which moves azimuth and altitude; half-width of 95 %. */
  readonly turnUncertaintyDeg: number;
  /** Whether the centre is above the least altitude. */
  readonly up: boolean;
  /** Whether the Sun is below the limit; `null` where the body is the Sun. */
  readonly dark: boolean | null;
  /** From the site to the body's centre at the passage, geometric. */
  readonly topocentricDistanceKm: number;
  /** From the Earth's centre to the body's: of the Moon and the Sun this is the distance that the passage belongs to. */
  readonly geocentricDistanceKm: number;
  /** The site's own moment of least distance, of a periapsis of the Moon or the Earth; else `null`. */
  readonly topocentricLeastUtc: string | null;
  /** The site's own moment of greatest distance, of an apoapsis of the Moon or the Earth; else `null`. */
  readonly topocentricGreatestUtc: string | null;
  /** The distance at that moment. */
  readonly topocentricExtremeKm: number | null;
  /** Of the equatorial diameter, from the site; `null` where no radius is known. */
  readonly diameterArcmin: number | null;
  readonly geocentricDiameterArcmin: number | null;
  /** Lit part of the disk, 0 … 1, from the site; `null` for the Sun. */
  readonly illuminatedFraction: number | null;
  /** From the body to the site. */
  readonly lightTimeSeconds: number;
  /** When the centre rises through altitude 0, of the stay above the horizon that holds the passage or is nearest to it. */
  readonly riseUtc: string | null;
  /** Its upper passage of the site's meridian in that stay. */
  readonly transitUtc: string | null;
  readonly setUtc: string | null;
  readonly whyNoRise: WhyNoRise | null;
  readonly whyNoTransit: WhyNoTransit | null;
  /** The highest up-and-dark moment within a day of the passage. */
  readonly bestUtc: string | null;
  readonly bestLocal: string | null;
  readonly bestAltitudeDeg: number | null;
  readonly bestDiameterArcmin: number | null;
  readonly whyNoBest: WhyNot | null;
  /** While the distance of the pair stays within the limit of its extreme. */
  readonly nearFromUtc: string | null;
  readonly nearToUtc: string | null;
  /** Whether one of these ends is not known. */
  readonly nearCut: boolean;
  readonly whyNoNear: WhyNoEnd | null;
  /** Near and up and dark. */
  readonly windows: readonly PlanWindow[];
  /** Whether the near interval reaches farther than windows are looked for. */
  readonly windowsCut: boolean;
  /** Why there is no window. */
  readonly whyNot: WhyNot | null;
}
