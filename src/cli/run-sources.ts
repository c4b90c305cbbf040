import { allPairs } from "../bodies/pair.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Source } from "../ephemeris/source.ts";
import type { Column } from "../report/column.ts";
import { textTable } from "../report/text-table.ts";
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

interface Supplied {
  readonly pairs: string;
  readonly from: string;
  readonly to: string;
}

const COLUMNS: readonly Column<Supplied>[] = [
  { title: "  from (TDB)", unit: "", values: (row) => `  ${row.from}`, digits: 0 },
  { title: "to (TDB)", unit: "", values: (row) => row.to, digits: 0 },
  { title: "pairs", unit: "", values: (row) => row.pairs, digits: 0 },
];

function* told(
  ephemeris: Ephemeris,
  checksums: ReadonlyMap<Source, string | null>,
): Generator<string, void, undefined> {
  for (const source of ephemeris.sources) {
    const checksum = checksums.get(source);
    yield `${source.id} (${source.kind}): ${source.title}\n`;
    if (checksum) yield `  sha256 ${checksum}\n`;
    yield* textTable(COLUMNS, suppliedBy(source));
    yield `${source.describe()}\n\n`;
  }
  const { leapSeconds } = ephemeris;
  yield `Leap seconds: ${leapSeconds.source}, known until ${leapSeconds.expiresUtc}.\n`;
}

/** Pairs that are supplied in the same span stand together. */
function suppliedBy(source: Source): Supplied[] {
  const rows = new Map<string, { from: string; to: string; pairs: string[] }>();
  for (const pair of allPairs()) {
    for (const span of source.spans(pair)) {
      const from = formatTdb(span.from, 0);
      const to = formatTdb(span.to, 0);
      const row = rows.get(from + to) ?? { from, to, pairs: [] };
      row.pairs.push(pair.name);
      rows.set(from + to, row);
    }
  }
  return [...rows.values()].map(({ from, to, pairs }) => ({ from, to, pairs: pairs.join(" ") }));
}
