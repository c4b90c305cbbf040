export { type CentrePassage, compareCentres } from "./compare-centres.ts";
export { type DriftQuery, driftAccount } from "./drift-account.ts";
export type { DriftRow } from "./drift-row.ts";
export { type MeanLine, meanLineOf } from "./mean-line.ts";
export { type MoonShift, moonShift } from "./moon-shift.ts";
export { meanPerihelionLongitude } from "./perihelion-longitude.ts";
export { type Season, seasonOf } from "./season-of.ts";
export { whyNoSplit } from "./why-no-split.ts";
