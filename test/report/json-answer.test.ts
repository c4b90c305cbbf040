import { expect, test } from "vitest";
import { jsonAnswer } from "../../src/report/json-answer.ts";
import { jsonLines } from "../../src/report/json-lines.ts";

test("jsonAnswer gives one object with its head first and a row on each line", () => {
  const text = [...jsonAnswer({ schema: "s/1", made: { a: null } }, [{ b: 1 }, { b: "x" }])].join("");
  expect(JSON.parse(text)).toEqual({ schema: "s/1", made: { a: null }, rows: [{ b: 1 }, { b: "x" }] });
  expect(text.split("\n").slice(2, 6)).toEqual(['"rows": [', '{"b":1},', '{"b":"x"}', "]}"]);
});

test("jsonAnswer without rows is whole as well", () => {
  expect(JSON.parse([...jsonAnswer({ schema: "s/1" }, [])].join(""))).toEqual({ schema: "s/1", rows: [] });
});

test("jsonAnswer draws a row only when its piece is asked for", () => {
  let drawn = 0;
  const rows = function* () {
    for (;;) yield { n: ++drawn };
  };
  const pieces = jsonAnswer({}, rows());
  pieces.next();
  expect(drawn).toBe(0);
  pieces.next();
  expect(drawn).toBe(1);
});

test("jsonLines gives a row a line", () => {
  expect([...jsonLines([{ b: 1 }, { b: null }])].join("")).toBe('{"b":1}\n{"b":null}\n');
});
