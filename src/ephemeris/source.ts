import type { Pair } from "../bodies/pair.ts";

/** A stretch of time, TDB seconds past J2000: `from ≤ t ≤ to`. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** Where an accuracy statement comes from. */
export type AccuracyBasis = "measured" | "published" | "user" | "assumed";

/**
 * The error that a source admits for a pair at a time: half-widths that at least 95 % of true errors keep.
 */
export interface Accuracy {
  /** Of the distance, km. */
  readonly rangeKm: number;
  /** Of the range rate, km/s. */
  readonly rangeRateKmS: number;
  readonly basis: AccuracyBasis;
  /**
   * Of the instant of a passage at that time, seconds, where the source knows it directly: a period and an epoch with
   * their errors, say. Left out, it follows from the range rate's.
   */
  readonly timeSeconds?: number;
  /** Whether the error could undo that passage; goes with `timeSeconds`. */
  readonly existence?: "certain" | "uncertain";
}

/**
 * The motion of a pair's moving point as seen from its centre, ICRF axes.
 *
 * All methods write into an array of the caller's and allocate nothing.
 */
export interface Motion {
  /** Whether `state` gives velocities; where not, passages are found on the distance alone. */
  readonly givesVelocity: boolean;
  /**
   * Writes x, y, z (km) and, where `givesVelocity`, their rates (km/s) to `out[0 … 5]`.
   * @param tdb TDB seconds past J2000, inside one of the source's spans for the pair
   */
  state(tdb: number, out: Float64Array): void;
  /** Writes position, velocity and acceleration (km/s²) to `out[0 … 8]`; a source without it is differenced. */
  stateAndAcceleration?(tdb: number, out: Float64Array): void;
}

/** Something that yields states. */
export interface Source {
  /** What rows say: `de405`, `series`, `engine`, `user:FILE`, or the caller's own word for a track. */
  readonly id: string;
  readonly kind: "kernel" | "series" | "engine" | "track";
  /** One line for people. */
  readonly title: string;
  /** Stretches of time for which the pair's states are supplied, in order, not overlapping; empty where never. */
  spans(pair: Pair<string>): readonly Span[];
  /** Gives the pair's motion. @throws ApsidaryError `not-supplied` where `spans(pair)` is empty */
  motion(pair: Pair<string>): Motion;
  /** Gives the accuracy that the source admits for the pair at a time. */
  accuracy(pair: Pair<string>, tdb: number): Accuracy;
  /** Hexadecimal SHA-256 of the data, `null` for a source without data of its own. */
  checksum(): Promise<string | null>;
  /** Tells in several lines what the source holds. */
  describe(): string;
}
