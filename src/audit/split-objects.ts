import { ApsidaryError } from "../error.ts";
import { type ListRecord, LONGEST_RECORD } from "./split-records.ts";

/** How far an object is looked into for the array of rows that it may hold. */
const HEAD = 65_536;

/**
 * Splits JSON into its rows as they come: the objects of the outermost array, of an array named `rows`, or one after another.
 *
 * What stands between them comes as records of its own, so that all records joined are the input.
 *
 * @param chunks text, each character a byte; an object's head must stand in one chunk with the `"rows"` that it holds
 * @throws ApsidaryError `bad-input` where an object is longer than `LONGEST_RECORD`
 */
export async function* splitObjects(
  chunks: AsyncIterable<string> | Iterable<string>,
): AsyncGenerator<readonly ListRecord[], void, undefined> {
  let text = "";
  let at = 0;
  let line = 1;
  let begin = -1; // of the object that is open
  let beginLine = 1;
  let depth = 0; // braces
  let brackets = 0; // outside objects
  let inString = false;
  let inRows = false;
  let ended = false; // the array of rows is over
  for await (const chunk of chunks) {
    if (chunk.includes("\0")) throw new ApsidaryError("bad-input", "the list holds zero bytes: it is no text.");
    text += chunk;
    const block: ListRecord[] = [];
    let done = 0;
    while (at < text.length && !ended) {
      const c = text.charCodeAt(at);
      if (c === 10) line++;
      if (inString) {
        if (c === 92) at++;
        else if (c === 34) inString = false;
      } else if (c === 34) inString = true;
      else if (c === 123) {
        if (depth === 0) {
          const rows = inRows ? -1 : rowsOf(text, at);
          if (rows >= 0) {
            for (let i = at + 1; i <= rows; i++) if (text.charCodeAt(i) === 10) line++;
            at = rows + 1;
            inRows = true;
            brackets = 1;
            continue;
          }
          if (at > done) block.push({ line: beginLine, text: text.slice(done, at) });
          begin = at;
          beginLine = line;
          done = at;
        }
        depth++;
      } else if (c === 125 && depth > 0) {
        depth--;
        if (depth === 0) {
          block.push({ line: beginLine, text: text.slice(begin, at + 1) });
          done = at + 1;
          begin = -1;
          beginLine = line;
        }
      } else if (depth === 0 && c === 91) brackets++;
      else if (depth === 0 && c === 93) {
        brackets--;
        ended = inRows && brackets === 0;
      }
      at++;
    }
    if (ended) at = text.length;
    text = text.slice(done);
    at -= done;
    if (begin >= 0) begin -= done;
    if (ended && text.length > 0) {
      block.push({ line: beginLine, text });
      text = "";
      at = 0;
    }
    if (text.length > LONGEST_RECORD) {
      throw new ApsidaryError(
        "bad-input",
        `line ${beginLine}: a JSON value is longer than ${LONGEST_RECORD} characters.`,
      );
    }
    if (block.length > 0) yield block;
  }
  if (text.length > 0) yield [{ line: beginLine, text }];
}

/** Where the array named `rows` opens in the object that begins at `at`; −1 where that object has none. */
function rowsOf(text: string, at: number): number {
  const found = /"rows"\s*:\s*\[/.exec(text.slice(at, at + HEAD));
  return found ? at + found.index + found[0].length - 1 : -1;
}
