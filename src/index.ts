export { ApsidaryError, type ErrorCode } from "./error.ts";
export { AU_KM } from "./bodies/constants.ts";
export { type Pair, type PairName, allPairs, pairOf } from "./bodies/pair.ts";
export { type ApsisKind, type ApsisRank, termOf } from "./bodies/term.ts";
export type { Accuracy, AccuracyBasis, Motion, Source, Span } from "./ephemeris/source.ts";
export {
  type Coverage,
  type Ephemeris,
  type KernelGiven,
  type SourceOptions,
  openSources,
} from "./ephemeris/open-sources.ts";
export type { KernelAccuracy } from "./ephemeris/user-kernel.ts";
export type { Passage } from "./passages/passage.ts";
export { type PassageQuery, passages } from "./passages/passages.ts";
export type { SourceChoice } from "./passages/timeline-for.ts";
export { mergedPassages } from "./passages/merged-passages.ts";
export { type NeighbourOptions, nextPassage, previousPassage } from "./passages/next-passage.ts";
export { type Range, rangeAt } from "./passages/range-at.ts";
export { type TrackQuery, type TrackedRange, rangeTrack } from "./passages/range-track.ts";
export { type NearWindow, type Nearness, nearWindow } from "./passages/near-window.ts";
export { type PassageRow, toRow } from "./passages/to-row.ts";
