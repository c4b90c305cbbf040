/** A cell of a line: its value, and where its text stands in the line. */
export interface ListCell {
  readonly value: string;
  /** Of the text between the separators, quotes included. */
  readonly start: number;
  readonly end: number;
  readonly quoted: boolean;
}

/**
 * Splits a line into cells and remembers where each stands, so that one can be replaced and all else be kept to the byte.
 *
 * Quotes follow RFC 4180: a cell that begins with one ends at the next that is not doubled.
 *
 * @param line      without its line ending
 * @param separator one character; `"  "` for columns that are set apart by two blanks or more, or a tab
 * @param most      cells that are read; what follows is left out
 */
export function splitCells(line: string, separator: string, most = 2000): ListCell[] {
  const cells: ListCell[] = [];
  if (separator === "  ") {
    const word = /\S+(?:[ ]\S+)*/g;
    for (let m = word.exec(line); m && cells.length < most; m = word.exec(line)) {
      cells.push({ value: m[0], start: m.index, end: m.index + m[0].length, quoted: false });
    }
    return cells;
  }
  let at = 0;
  while (at <= line.length && cells.length < most) {
    let begin = at;
    while (line[begin] === " ") begin++;
    if (line[begin] === '"') {
      let close = begin + 1;
      for (;;) {
        close = line.indexOf('"', close);
        if (close < 0) close = line.length;
        else if (line[close + 1] === '"') {
          close += 2;
          continue;
        }
        break;
      }
      const after = line.indexOf(separator, close);
      const end = after < 0 ? line.length : after;
      cells.push({
        value: line
          .slice(begin + 1, close)
          .replaceAll('""', '"')
          .trim(),
        start: begin,
        end: Math.min(close + 1, line.length),
        quoted: true,
      });
      at = end + 1;
    } else {
      const after = line.indexOf(separator, at);
      const end = after < 0 ? line.length : after;
      cells.push({ value: line.slice(at, end).trim(), start: at, end, quoted: false });
      at = end + 1;
    }
  }
  return cells;
}
