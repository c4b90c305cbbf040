import type { Pair } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { AuditScale } from "./audit-scale.ts";
import type { PublishedWhen } from "./published-when.ts";
import type { Sky, SkyPassage } from "./sky.ts";
import { boundOf, tdbNear, wallOf } from "./wall-of.ts";

/** A row held against the sky: what causes are asked about. */
export interface Case {
  readonly pair: Pair;
  readonly kind: ApsisKind;
  readonly when: PublishedWhen;
  readonly scale: AuditScale;
  readonly sky: Sky;
  /** The coarse model's passages; `null` where there is none. */
  readonly coarse: Sky | null;
  /** The passage that the row is taken for. */
  readonly at: SkyPassage;
  /** Published minus computed, seconds. */
  readonly residual: number;
  /** How far the computed time may be off, 99.9 %, seconds. */
  readonly bound: number;
}

/** What a cause says of a row. */
export interface Prediction {
  /** Which variant of the cause: `+05:30`, `1 day late`; the same word means the same variant in every row. */
  readonly detail: string;
  /** How likely this variant is among the cause's own, 0 … 1. */
  readonly share: number;
  /** Published minus what the slip would have printed, seconds. */
  readonly residual: number;
  /** How far that may be off, seconds. */
  readonly bound: number;
}

/** What is read otherwise than the row says. */
export interface Otherwise {
  readonly pair?: Pair;
  readonly kind?: ApsisKind;
  readonly scale?: AuditScale;
  readonly sky?: Sky;
  /** Reading of the clock before the slip. */
  readonly wallSeconds?: number;
}

/**
 * Gives what a row would be off by if it were read otherwise, held against the nearest passage of that reading.
 *
 * @returns `null` where the sources do not reach it
 */
export function readOtherwise(
  one: Case,
  otherwise: Otherwise,
): { residual: number; bound: number; at: SkyPassage } | null {
  const {
    pair = one.pair,
    kind = one.kind,
    scale = one.scale,
    sky = one.sky,
    wallSeconds = one.when.wallSeconds,
  } = otherwise;
  const at = sky.nearest(pair, kind, tdbNear(scale, wallSeconds));
  if (!at) return null;
  return { residual: wallSeconds - wallOf(scale, at), bound: boundOf(scale, at), at };
}
