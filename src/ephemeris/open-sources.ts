import { type Pair, type PairName, pairOf } from "../bodies/pair.ts";
import type { TrackPair } from "../bodies/track-pair.ts";
import { ApsidaryError } from "../error.ts";
import { builtInLeapSeconds, type LeapSecondList, parseLeapSeconds } from "../time/leap-seconds.ts";
import { openBuiltInKernel, openBuiltInSeries } from "./builtin.ts";
import { openEngine } from "./engine.ts";
import type { SeriesBytes } from "./series.ts";
import type { Source, Span } from "./source.ts";
import { type KernelAccuracy, openUserKernel } from "./user-kernel.ts";

/** A kernel of the user's: its bytes, a URL or a Blob, alone or with a name and an accuracy statement. */
export type KernelGiven =
  | Uint8Array
  | URL
  | Blob
  | {
      readonly data: Uint8Array | URL | Blob;
      /** What rows and messages call it; left out, the last part of its URL or its file name. */
      readonly name?: string;
      readonly accuracy?: KernelAccuracy;
    };

/** What to open. */
export interface SourceOptions {
  /** Kernels that come before the built-in one; the last one counts most. */
  readonly kernels?: readonly KernelGiven[];
  /** The built-in kernel: where it is, or `false` to do without. */
  readonly builtIn?: boolean | URL | Uint8Array;
  /** The series for 1000 to 3000: their bytes, or `false` to do without; left out, they are opened where their files are there. */
  readonly series?: boolean | SeriesBytes;
  /** `false` to do without astronomy-engine. */
  readonly engine?: boolean;
  /** The text of a `leap-seconds.list`, instead of the list that the package carries. */
  readonly leapSeconds?: string;
  /** Sources of the caller's own, before all others. */
  readonly tracks?: readonly Source[];
  readonly signal?: AbortSignal;
}

/** A stretch of time and the source that supplies it. */
export interface Coverage extends Span {
  readonly source: string;
}

/** Sources in order, the best first, and the leap-second list by which UTC is told. Frozen. */
export interface Ephemeris {
  readonly sources: readonly Source[];
  readonly leapSeconds: LeapSecondList;
  /** Gives the stretches of TDB seconds past J2000 in which each source supplies a pair, the best source first. */
  covers(pair: PairName | Pair | TrackPair): readonly Coverage[];
  /** Tells what each source holds. */
  describe(): string;
}

/**
 * Opens the sources; the one step that waits. Everything after it is synchronous.
 *
 * Order: tracks, the user's kernels (the last named first), the built-in kernel, the series, astronomy-engine.
 *
 * @param options what to open; left out, the built-in kernel, the series and astronomy-engine
 * @throws ApsidaryError `kernel-not-found`, `bad-kernel`, `bad-leap-seconds`, `unreadable`; a source that was asked for and fails is
 *   never stepped over in silence
 */
export async function openSources(options: SourceOptions = {}): Promise<Ephemeris> {
  const { kernels = [], builtIn = true, series, engine = true, signal } = options;
  const leapSeconds = options.leapSeconds === undefined ? builtInLeapSeconds() : parseLeapSeconds(options.leapSeconds);
  const [users, own, theories, net] = await Promise.all([
    Promise.all(kernels.map((given, index) => openUserKernel(given, index, signal))),
    builtIn === false
      ? []
      : openBuiltInKernel(builtIn === true ? undefined : builtIn, signal).then((source) => [source]),
    series === false ? null : openBuiltInSeries(series, signal),
    engine ? openEngine().then((source) => [source]) : [],
  ]);
  const sources = Object.freeze([
    ...(options.tracks ?? []),
    ...users.reverse(),
    ...own,
    ...(theories ? [theories] : []),
    ...net,
  ]);
  if (sources.length === 0)
    throw new ApsidaryError("bad-option", "no source is open; leave out `builtIn: false` or give a kernel.");
  return Object.freeze({
    sources,
    leapSeconds,
    covers(pair: PairName | Pair | TrackPair) {
      const known = pairOf(pair);
      return sources.flatMap((source) => source.spans(known).map(({ from, to }) => ({ from, to, source: source.id })));
    },
    describe: () => sources.map((source) => source.describe()).join("\n\n"),
  });
}
