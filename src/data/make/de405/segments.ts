/** How one segment of the built-in kernel is made. */
export interface SegmentPlan {
  readonly body:
    | "mercury"
    | "venus"
    | "emb"
    | "mars"
    | "jupiter"
    | "saturn"
    | "uranus"
    | "neptune"
    | "pluto"
    | "sun"
    | "moon"
    | "earth";
  /** SPK ids. */
  readonly target: number;
  readonly centre: number;
  /** Records in the whole span; each is a whole number of seconds long. */
  readonly records: number;
  /** Coefficients a component. */
  readonly coefficients: number;
  /** Coefficients are rounded to 2 to this power, km: bits that carry nothing are zero, and the package compresses. */
  readonly roundTo: number;
}

/**
 * The segments of the built-in kernel.
 *
 * Chosen by searching all record lengths (whole seconds that divide the span) and numbers of coefficients for the set
 * that keeps the largest errors of passages, 1960–2059, least within 4 000 000 bytes. Longer records take fewer bytes
 * and more time; the Moon's are short for speed. The Sun and the outer planets are rounded more finely: at Neptune's range
 * acceleration of 0.2 km/d² an error of 3·10⁻⁵ mm/s moves a passage by a second.
 */
export const SEGMENTS: readonly SegmentPlan[] = [
  { body: "mercury", target: 1, centre: 0, records: 972, coefficients: 27, roundTo: -22 },
  { body: "venus", target: 2, centre: 0, records: 381, coefficients: 29, roundTo: -23 },
  { body: "emb", target: 3, centre: 0, records: 540, coefficients: 26, roundTo: -22 },
  { body: "mars", target: 4, centre: 0, records: 216, coefficients: 23, roundTo: -22 },
  { body: "jupiter", target: 5, centre: 0, records: 90, coefficients: 21, roundTo: -28 },
  { body: "saturn", target: 6, centre: 0, records: 45, coefficients: 27, roundTo: -28 },
  { body: "uranus", target: 7, centre: 0, records: 40, coefficients: 27, roundTo: -28 },
  { body: "neptune", target: 8, centre: 0, records: 32, coefficients: 22, roundTo: -28 },
  { body: "pluto", target: 9, centre: 0, records: 20, coefficients: 16, roundTo: -28 },
  { body: "sun", target: 10, centre: 0, records: 405, coefficients: 25, roundTo: -28 },
  { body: "earth", target: 399, centre: 3, records: 1016, coefficients: 32, roundTo: -22 },
  { body: "moon", target: 301, centre: 399, records: 4064, coefficients: 14, roundTo: -22 },
];
