import type { DistanceJudgement } from "./judge-distance.ts";
import type { TimeJudgement } from "./judge-row.ts";
import type { CellPlace, ListRow } from "./list-row.ts";
import { otherKindWord } from "./read-kind.ts";

/** A cell that is to be written anew. */
export interface Mend {
  readonly place: CellPlace;
  readonly text: string;
}

/** Verdicts whose value is wrong. */
const WRONG: ReadonlySet<string> = new Set(["last-digit", "explained", "disagrees"]);

/** Gives what has to be written anew in a row: its time, or the word for its kind where the kinds were swapped, and its distance. */
export function mendsOf(
  row: ListRow,
  time: TimeJudgement,
  distance: DistanceJudgement | null,
  rightWhen: string,
  rightDistance: string,
): readonly Mend[] {
  const mends: Mend[] = [];
  const { when, kind, distance: distancePlace } = row.places;
  let kindMended = false;
  if (WRONG.has(time.verdict)) {
    const word = kind ? otherKindWord(kind.text) : "";
    if (time.cause?.name === "kind-swapped" && kind && word !== kind.text) {
      mends.push({ place: kind.place, text: word });
      kindMended = true;
    } else {
      const texts = splitLike(
        when.map(({ text }) => text),
        rightWhen,
      );
      when.forEach(({ place, text }, i) => {
        const right = texts[i] ?? "";
        if (right !== text) mends.push({ place, text: right });
      });
    }
  }
  const ofThatPassage = kindMended && distance?.cause === "kind-swapped";
  if (distance && distancePlace && WRONG.has(distance.verdict) && !ofThatPassage) {
    mends.push({ place: distancePlace, text: rightDistance });
  }
  return mends;
}

/** Splits a time over the cells that held it: each gets as many words as it had. */
function splitLike(cells: readonly string[], text: string): string[] {
  const words = text.split(" ");
  return cells.map((cell, i) => {
    const count = i === cells.length - 1 ? words.length : cell.split(" ").length;
    return words.splice(0, count).join(" ");
  });
}

/**
 * Writes a record with its cells mended and everything else as it stood.
 *
 * @param text  the record, each character a byte
 * @param mends from one or more of its rows
 * @returns text whose characters are bytes as well
 */
export function mendedRecord(text: string, mends: readonly Mend[]): string {
  let written = text;
  const done = [...mends].sort((a, b) => b.place.start - a.place.start);
  for (const { place, text: cell } of done) {
    if (place.end <= place.start) continue;
    const before = written.slice(place.start, place.end);
    written = written.slice(0, place.start) + cellText(bytes(cell), before, place) + written.slice(place.end);
  }
  return written;
}

function cellText(cell: string, before: string, { form }: CellPlace): string {
  if (form === "quoted") return `"${cell.replaceAll('"', '""')}"`;
  if (form === "json") return before.startsWith('"') ? JSON.stringify(cell) : cell;
  const lead = /^\s*/.exec(before)?.[0] ?? "";
  const trail = /\s*$/.exec(before.slice(lead.length))?.[0] ?? "";
  const bare = lead + cell + trail;
  // loose columns keep their width where they can
  return bare.length < before.length && lead === "" && trail === "" ? bare.padEnd(before.length) : bare;
}

/** UTF-8 as one character a byte. */
function bytes(text: string): string {
  let out = "";
  for (const byte of new TextEncoder().encode(text)) out += String.fromCharCode(byte);
  return out;
}
