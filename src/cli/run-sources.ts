import { allPairs } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Source } from "../ephemeris/source.ts";
import { wrapped } from "../report/wrapped.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { openFor } from "./open-for.ts";
import type { SharedOptions } from "./options.ts";
import { writeAnswer } from "./write-answer.ts";

/** Answers `apsidary sources`. @throws ApsidaryError for a file that cannot be used */
export async function runSources(options: SharedOptions): Promise<void> {
  const ephemeris = await openFor(options);
  const checksums = new Map<Source, string | null>();
  for (const source of ephemeris.sources) checksums.set(source, await source.checksum());
  await writeAnswer(told(ephemeris, checksums), options.out);
}

function* told(
  ephemeris: Ephemeris,
  checksums: ReadonlyMap<Source, string | null>,
): Generator<string, void, undefined> {
  for (const source of ephemeris.sources) {
    const checksum = checksums.get(source);
    yield `${source.id} (${source.kind}): ${source.title}\n`;
    if (checksum) yield `  sha256 ${checksum}\n`;
    for (const line of suppliedBy(source)) yield wrapped(line, 100, "    ", "  ");
    const description = source.describe();
    if (description && description !== source.title) yield `${description}\n`;
    yield "\n";
  }
  const { leapSeconds } = ephemeris;
  yield `Leap seconds: ${leapSeconds.source}, known until ${leapSeconds.expiresUtc}.\n`;
}

/** Pairs that are supplied in the same span stand together. */
function suppliedBy(source: Source): string[] {
  const pairsOf = new Map<string, string[]>();
  for (const pair of allPairs()) {
    for (const { from, to } of source.spans(pair)) {
      const span = `${formatTdb(from, 0)} to ${formatTdb(to, 0)} TDB`;
      pairsOf.set(span, [...(pairsOf.get(span) ?? []), pair.name]);
    }
  }
  return [...pairsOf].map(([span, pairs]) => `${span}: ${pairs.join(" ")}`);
}
