import { expect, test } from "vitest";
import { csvLines } from "../../src/report/csv-lines.ts";

interface Row {
  readonly a: string | number | null;
  readonly b: string | number | null;
}
const csv = (rows: Row[]) => [...csvLines<Row>(["a", "b"], rows)].join("");

test("csvLines writes a header, CR LF after every line, and nothing for null", () => {
  expect(csv([{ a: 1, b: null }])).toBe("a,b\r\n1,\r\n");
  expect(csv([])).toBe("a,b\r\n");
});

test("csvLines quotes commas, quotes and line feeds (RFC 4180)", () => {
  expect(csv([{ a: 'x,"y"', b: "two\nlines" }])).toBe('a,b\r\n"x,""y""","two\nlines"\r\n');
});

test("csvLines defuses what a spreadsheet would run, and leaves numbers and early years alone", () => {
  expect(csv([{ a: "=1+1", b: "@x" }])).toBe(`a,b\r\n"'=1+1","'@x"\r\n`);
  expect(csv([{ a: -3.5, b: "-000499-01-01T00:00:00.000Z" }])).toBe("a,b\r\n-3.5,-000499-01-01T00:00:00.000Z\r\n");
});

test("csvLines writes many rows as it writes few", () => {
  const rows = Array.from({ length: 1001 }, (_, i) => ({ a: i, b: "x" }));
  expect(csv(rows)).toBe(`a,b\r\n${rows.map(({ a }) => `${a},x\r\n`).join("")}`);
});
