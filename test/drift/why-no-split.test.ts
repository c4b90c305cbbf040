import { expect, test } from "vitest";
import { allPairs, pairOf } from "../../src/bodies/pair.ts";
import { whyNoSplit } from "../../src/drift/why-no-split.ts";

test("every pair but the Earth's about the Sun says in one short line why it has no split", () => {
  for (const pair of allPairs()) {
    const why = whyNoSplit(pair);
    if (pair === pairOf("earth-sun")) expect(why).toBeNull();
    else {
      expect(why).toMatch(new RegExp(`^${pair.name} has no split into calendar, planets, Moon: .*\\.$`));
      expect(why?.length).toBeLessThanOrEqual(100);
    }
  }
});
