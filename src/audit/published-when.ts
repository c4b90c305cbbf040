import type { AuditScale } from "./audit-scale.ts";

/**
 * A time as it was printed: the reading of a clock and calendar, and the size of its last digit. Frozen.
 *
 * A minute or an hour stands for itself; a day, a month or a year stands for its middle, as half of `unitSeconds` on either side.
 */
export interface PublishedWhen {
  /** The text, as given. */
  readonly text: string;
  /** Seconds since Modified Julian day 0 on the printed clock, days of 86 400 s. */
  readonly wallSeconds: number;
  /** What the last digit is worth, seconds. */
  readonly unitSeconds: number;
  /** Whether the text names a whole day, month or year and no moment in it. */
  readonly whole: "day" | "month" | "year" | null;
  /** Scale or offset that stands in the text itself. */
  readonly scale: AuditScale | null;
  /** How the text is laid out, for writing another time in its place; `null` where it cannot be imitated. */
  readonly style: WhenStyle | null;
}

/** How a time was written. Between the parts stands what stood there. */
export interface WhenStyle {
  readonly parts: readonly WhenPart[];
}

/** A piece of a printed time: literal text, or a field of so many characters at least. */
export type WhenPart =
  | { readonly text: string }
  | {
      readonly field: "year" | "month" | "monthName" | "day" | "hour" | "hour12" | "meridiem" | "minute" | "second";
      readonly width: number;
      /** Decimals of the last field. */
      readonly decimals: number;
      /** An example of the word, where the field is one. */
      readonly like?: string;
    };
