import { afterEach, expect, test, vi } from "vitest";
import { withProgress } from "../../src/cli/progress.ts";

afterEach(() => vi.restoreAllMocks());

/** Passes so many rows through while each takes so many milliseconds; gives what was told. */
function told(rows: number, milliseconds: number, shown = true): string {
  let clock = 0;
  let text = "";
  vi.spyOn(performance, "now").mockImplementation(() => clock);
  vi.spyOn(process.stderr, "write").mockImplementation((piece) => {
    text += piece;
    return true;
  });
  const source = function* () {
    for (let i = 1; i <= rows; i++) {
      clock += milliseconds;
      yield i;
    }
  };
  expect([...withProgress(source(), (row) => row, 0, rows, shown)]).toHaveLength(rows);
  return text;
}

test("progress is not told of a run of less than two seconds", () => {
  expect(told(1000, 1.9)).toBe("");
});

test("progress is told of a longer run, at most twice a second, and wiped at its end", () => {
  const text = told(1000, 5);
  const lines = text.split("\r\u001b[K").slice(1);
  expect(lines[0]).toBe("448 rows, 44 % of the span");
  expect(lines.at(-1)).toBe("");
  expect(lines.length).toBeLessThan(9);
});

test("progress is not told where it may not be shown", () => {
  expect(told(1000, 5, false)).toBe("");
});
