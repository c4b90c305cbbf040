/**
 * Breaks a text between words into lines of limited width.
 *
 * @param text  words between single spaces; one that is too long gets a line of its own
 * @param width characters of a line
 * @param later put before every line but the first, and counted
 * @param first put before the first line, and counted
 * @returns the lines, each with its line feed
 */
export function wrapped(text: string, width = 100, later = "", first = ""): string {
  const lines: string[] = [];
  let line: string | null = null;
  for (const word of text.split(" ")) {
    if (line === null) line = first + word;
    else if (line.length + 1 + word.length <= width) line += ` ${word}`;
    else {
      lines.push(line);
      line = later + word;
    }
  }
  return [...lines, line].map((each) => `${each}\n`).join("");
}
