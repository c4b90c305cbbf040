import type { Pair } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Source, Span } from "../ephemeris/source.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { DELTA_T_MODEL } from "../time/delta-t.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { version } from "./version.ts";

/** What an answer was made from. No clock is read: the same call gives the same bytes. */
export interface Provenance {
  readonly program: string;
  readonly version: string;
  readonly sources: readonly UsedSource[];
  readonly leapSeconds: { readonly source: string; readonly expires: string };
  readonly deltaT: string;
  /** Version of the zone data that the run-time carries, `null` where it does not say. */
  readonly zoneData: string | null;
}

/** A source that could supply a row of the answer. */
export interface UsedSource {
  readonly id: string;
  readonly title: string;
  /** Hexadecimal SHA-256 of the data; `null` where the source is arithmetic. */
  readonly sha256: string | null;
  /** TDB between which it supplies the pairs asked for. */
  readonly tdbFrom: string;
  readonly tdbTo: string;
}

/** What was asked, as far as it decides which sources serve. */
export interface Asked {
  readonly pairs: readonly Pair<string>[];
  /** TDB seconds past J2000. */
  readonly span: Span;
  readonly source: SourceChoice;
}

/** Gives the provenance of an answer. */
export async function provenanceOf(ephemeris: Ephemeris, asked: Asked): Promise<Provenance> {
  return {
    program: "apsidary",
    version,
    sources: await Promise.all(usedSources(ephemeris, asked).map((source) => told(source, asked))),
    leapSeconds: { source: ephemeris.leapSeconds.source, expires: ephemeris.leapSeconds.expiresUtc },
    deltaT: DELTA_T_MODEL,
    zoneData: process.versions.tz ?? null,
  };
}

/** The sources that supply or rank a passage of the span: those that are the best at some time in it or within half a period of it. */
function usedSources(ephemeris: Ephemeris, { pairs, span, source: choice }: Asked): Source[] {
  const allowed = ephemeris.sources.filter((source) => choice === "auto" || source.kind === choice);
  const used = new Set<Source>();
  for (const pair of pairs) {
    let open: Span[] = [{ from: span.from - pair.halfPeriodSeconds, to: span.to + pair.halfPeriodSeconds }];
    for (const source of allowed) {
      for (const own of source.spans(pair)) {
        const left = open.flatMap((part) => without(part, own));
        if (left.length !== open.length || left.some((part, i) => part !== open[i])) used.add(source);
        open = left;
      }
    }
  }
  return allowed.filter((source) => used.has(source));
}

/** What is left of a part when a span is taken out; the part itself where they do not meet. */
function without(part: Span, taken: Span): Span[] {
  if (taken.to <= part.from || taken.from >= part.to) return [part];
  const left: Span[] = [];
  if (part.from < taken.from) left.push({ from: part.from, to: taken.from });
  if (taken.to < part.to) left.push({ from: taken.to, to: part.to });
  return left;
}

async function told(source: Source, { pairs }: Asked): Promise<UsedSource> {
  const spans = pairs.flatMap((pair) => source.spans(pair));
  return {
    id: source.id,
    title: source.title,
    sha256: await source.checksum(),
    tdbFrom: formatTdb(Math.min(...spans.map((span) => span.from))),
    tdbTo: formatTdb(Math.max(...spans.map((span) => span.to))),
  };
}
