export * from "./audit/index.ts";
export { AU_KM } from "./bodies/constants.ts";
export { allPairs, type Pair, type PairName, pairOf } from "./bodies/pair.ts";
export { type ApsisKind, type ApsisRank, termOf } from "./bodies/term.ts";
export { isTrackPair, type TrackPair, trackPair } from "./bodies/track-pair.ts";
export * from "./calendar/index.ts";
export * from "./drift/index.ts";
export {
  type Coverage,
  type Ephemeris,
  type KernelGiven,
  openSources,
  type SourceOptions,
} from "./ephemeris/open-sources.ts";
export type { Accuracy, AccuracyBasis, Motion, Source, Span } from "./ephemeris/source.ts";
export type { KernelAccuracy } from "./ephemeris/user-kernel.ts";
export { ApsidaryError, type ErrorCode } from "./error.ts";
export { type Elements, type ElementsError, type ElementsGiven, readElements } from "./orbit/elements.ts";
export { elementsTrack } from "./orbit/elements-track.ts";
export { type FunctionGiven, functionTrack } from "./orbit/function-track.ts";
export type { MeanElements } from "./orbit/mean-elements.ts";
export { parseOmmFile } from "./orbit/omm-file.ts";
export type { Orbit, OrbitField } from "./orbit/orbit.ts";
export { orbitFrom } from "./orbit/orbit-from.ts";
export type { OrbitGiven } from "./orbit/orbit-given.ts";
export { perturbedTrack } from "./orbit/perturbed-track.ts";
export { parseQuantity, type Quantity } from "./orbit/quantity.ts";
export { type SatelliteTrack, satelliteTrack } from "./orbit/satellite-track.ts";
export { readStar, type Star, type StarField, type StarGiven } from "./orbit/star.ts";
export { parseStarFile } from "./orbit/star-file.ts";
export { starTrack } from "./orbit/star-track.ts";
export type { StateTable } from "./orbit/table-interpolation.ts";
export { type TableGiven, tableTrack } from "./orbit/table-track.ts";
export { type ApsisTerms, type ApsisWords, type Centre, terms } from "./orbit/terms.ts";
export { parseTleFile } from "./orbit/tle-file.ts";
export type { Track } from "./orbit/track.ts";
export type { TrackScale, TrackTime } from "./orbit/track-time.ts";
export { type BodyShare, type TwoBodyShares, twoBodyShares } from "./orbit/two-body-shares.ts";
export { mergedPassages } from "./passages/merged-passages.ts";
export { type Nearness, type NearWindow, nearWindow, type WhyNoEnd } from "./passages/near-window.ts";
export { type NeighbourOptions, nextPassage, previousPassage } from "./passages/next-passage.ts";
export { isTrackPassage, type Passage, type TrackPassage } from "./passages/passage.ts";
export { type PassageQuery, passages } from "./passages/passages.ts";
export { type Range, rangeAt } from "./passages/range-at.ts";
export { rangeTrack, type TrackedRange, type TrackQuery } from "./passages/range-track.ts";
export type { SourceChoice } from "./passages/timeline-for.ts";
export { type PassageRow, type TrackRow, toRow } from "./passages/to-row.ts";
export * from "./planning/index.ts";
export { openSky, type Sky } from "./sky/open-sky.ts";
export type { Site } from "./sky/topocentric-frame.ts";
export { builtInLeapSeconds, type LeapSecondList, parseLeapSeconds } from "./time/leap-seconds.ts";
export { dateTimeOfMoment as dateTimeOf, type TimeScales, utcOfMoment as utcOf } from "./time/of-moment.ts";
export { type Moment, tdbOf } from "./time/tdb-of.ts";
export type { Utc, UtcBasis } from "./time/utc-of.ts";
