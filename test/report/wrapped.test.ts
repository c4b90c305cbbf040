import { expect, test } from "vitest";
import { wrapped } from "../../src/report/wrapped.ts";

test("wrapped breaks between words, counts its indents and lets a long word stand alone", () => {
  expect(wrapped("one two three", 9, "  ")).toBe("one two\n  three\n");
  expect(wrapped("one two", 7)).toBe("one two\n");
  expect(wrapped("a-very-long-word x", 5, "", "> ")).toBe("> a-very-long-word\nx\n");
});
