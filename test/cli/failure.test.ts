import { afterEach, expect, test, vi } from "vitest";
import { tellFailure } from "../../src/cli/failure.ts";
import { ApsidaryError } from "../../src/error.ts";

afterEach(() => vi.restoreAllMocks());

function told(error: unknown): { status: number; text: string } {
  let text = "";
  vi.spyOn(process.stderr, "write").mockImplementation((piece) => {
    text += piece;
    return true;
  });
  const status = tellFailure(error, "passages");
  return { status, text };
}

test("a fault of the input is told in its own words, with status 2", () => {
  expect(told(new ApsidaryError("bad-pair", "no such pair."))).toEqual({
    status: 2,
    text: "apsidary: no such pair.\n",
  });
});

test("an error of another copy of the library is known by its name", () => {
  const error = Object.assign(new Error("no such pair."), { name: "ApsidaryError", code: "bad-pair" });
  expect(told(error).status).toBe(2);
});

test("a defect of the program is owned up to, with its stack and status 70", () => {
  const { status, text } = told(new TypeError("x is not a function"));
  expect(status).toBe(70);
  expect(text).toMatch(/^apsidary: this is a defect of the program, not of your input\./);
  expect(text).toContain("TypeError: x is not a function\n    at ");
});
