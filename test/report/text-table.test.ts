import { expect, test } from "vitest";
import type { Column } from "../../src/report/column.ts";
import { textTable } from "../../src/report/text-table.ts";

interface Row {
  readonly word: string | null;
  readonly km: number;
}

const COLUMNS: readonly Column<Row>[] = [
  { title: "word", unit: "", values: (row) => row.word, digits: 0 },
  { title: "distance", unit: "km", values: (row) => row.km, digits: (row) => (row.km > 1e4 ? 0 : 2) },
  { title: "end", unit: "", values: () => "x", digits: 0 },
];

test("textTable sets decimal points under each other, words at the left, and a dash for null", () => {
  const rows = [
    { word: "near", km: 1.5 },
    { word: null, km: 1234567 },
    { word: "a long word", km: -3.456 },
  ];
  expect([...textTable(COLUMNS, rows)].join("")).toBe(
    [
      "word             distance  end",
      "                       km",
      "near                 1.50  x",
      "-            1 234 567     x",
      "a long word         -3.46  x",
      "",
    ].join("\n"),
  );
});

test("textTable gives nothing for no rows", () => {
  expect([...textTable(COLUMNS, [])]).toEqual([]);
});

test("textTable draws rows only as lines are asked for, block by block, and widths never shrink", () => {
  let drawn = 0;
  const rows = function* () {
    for (let i = 0; ; i++) {
      drawn++;
      yield { word: "w".repeat(i < 2 ? 8 : 1), km: 1 };
    }
  };
  const lines = textTable(COLUMNS, rows(), 2);
  for (let i = 0; i < 5; i++) lines.next(); // two lines of header, three rows
  expect(drawn).toBe(4);
  expect(lines.next().value).toMatch(/^w {9} /);
});
