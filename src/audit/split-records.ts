import { ApsidaryError } from "../error.ts";

/** A stretch of the input that belongs together: a line, or a line whose quotes run over several; with its line ending. */
export interface ListRecord {
  /** Number of its first line, from 1. */
  readonly line: number;
  /** Each character is a byte of the input, so that what is not touched can be written again to the byte. */
  readonly text: string;
}

/** Longest record, characters: a list's lines have a hundredth of it. */
export const LONGEST_RECORD = 1 << 20;
/** Lines over which quotes may run; a quote that is never closed thus cannot swallow a list. */
const MOST_LINES = 50;

/**
 * Splits chunks of text into records, as they come; at most one record is held.
 *
 * @param chunks text, each character a byte (Latin-1)
 * @param quotes whether a quote may keep a record open past the end of a line
 * @throws ApsidaryError `bad-input` where a line is longer than `LONGEST_RECORD` or the bytes are no text
 */
export async function* splitRecords(
  chunks: AsyncIterable<string> | Iterable<string>,
  quotes: () => boolean,
): AsyncGenerator<readonly ListRecord[], void, undefined> {
  let rest = "";
  let line = 1;
  for await (const chunk of chunks) {
    refuseBinary(chunk, line);
    rest += chunk;
    const block: ListRecord[] = [];
    let from = 0;
    const endOf = recordEnds(rest, false);
    for (;;) {
      const end = endOf(from, quotes());
      if (end < 0) break;
      const text = rest.slice(from, end);
      block.push({ line, text });
      line += linesOf(text);
      from = end;
    }
    rest = rest.slice(from);
    if (rest.length > LONGEST_RECORD) {
      throw new ApsidaryError(
        "bad-input",
        `line ${line} is longer than ${LONGEST_RECORD} characters: this is no list. Give one passage a line.`,
      );
    }
    if (block.length > 0) yield block;
  }
  const block: ListRecord[] = [];
  let from = 0;
  const endOf = recordEnds(rest, true);
  while (from < rest.length) {
    const end = endOf(from, quotes());
    const text = rest.slice(from, end);
    block.push({ line, text });
    line += linesOf(text);
    from = end;
  }
  if (block.length > 0) yield block;
}

/** Where the next of a character stands, looked for once and not once a line: a list without quotes costs one search a chunk. */
function finder(text: string, character: string): (from: number) => number {
  let found = -2;
  return (from) => {
    if (found === -2 || (found >= 0 && found < from)) found = text.indexOf(character, from);
    return found;
  };
}

/** Gives a function that tells where the record that begins at `from` ends, its line ending included; −1 where more text is needed. */
function recordEnds(text: string, last: boolean): (from: number, quotes: boolean) => number {
  const nextReturn = finder(text, "\r");
  const nextQuote = finder(text, '"');
  const lineEnd = (from: number): number => {
    const feed = text.indexOf("\n", from);
    const carriage = nextReturn(from);
    // a carriage return alone ends a line as well
    if (carriage >= 0 && (feed < 0 || carriage < feed - 1) && (last || carriage < text.length - 1)) {
      return text[carriage + 1] === "\n" ? carriage + 2 : carriage + 1;
    }
    if (feed >= 0) return feed + 1;
    return last ? text.length : -1;
  };
  return (from, quotes) => {
    const first = lineEnd(from);
    if (first < 0 || !quotes) return first;
    let end = first;
    let open = false;
    let counted = from;
    for (let lines = 1; lines < MOST_LINES; lines++) {
      for (let at = nextQuote(counted); at >= 0 && at < end; at = nextQuote(at + 1)) {
        open = !open;
        counted = at + 1;
      }
      if (!open) return end;
      if (end >= text.length) return last ? first : -1;
      const next = lineEnd(end);
      if (next < 0) return -1;
      end = next;
    }
    return first;
  };
}

function linesOf(text: string): number {
  let count = 0;
  for (let at = text.indexOf("\n"); at >= 0; at = text.indexOf("\n", at + 1)) count++;
  return Math.max(1, count);
}

function refuseBinary(chunk: string, line: number): void {
  if (chunk.startsWith("ÿþ") || chunk.startsWith("þÿ")) {
    if (line === 1) throw new ApsidaryError("bad-input", "the list is written in UTF-16; save it as UTF-8.");
  }
  if (chunk.includes("\0")) {
    throw new ApsidaryError("bad-input", "the list holds zero bytes: it is no text. Give CSV, JSON or plain text.");
  }
}
