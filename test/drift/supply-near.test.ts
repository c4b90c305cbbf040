import { describe, expect, test } from "vitest";
import { extremumNear, supplyOf } from "../../src/drift/supply-near.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { builtIn } from "./sources.ts";

const ephemeris = await builtIn();

describe("what is held against a passage", () => {
  test("comes from the source that is named, where that reaches", () => {
    const tdb = tdbOf("2020-01-05T07:48");
    expect(supplyOf(ephemeris, "earth-sun", "engine", tdb, "auto")?.source.id).toBe("engine");
    expect(supplyOf(ephemeris, "earth-sun", "no-such-source", tdb, "auto")?.source.id).toBe("de405");
    expect(extremumNear(ephemeris, "emb-sun", "periapsis", tdb, "engine", "auto")?.supply.source.id).toBe("engine");
    expect(
      extremumNear(ephemeris, "emb-sun", "periapsis", tdbOf("1900-01-02"), "de405", "auto")?.supply.source.id,
    ).not.toBe("de405");
  });

  test("is null where nothing lies within ten days", () => {
    expect(extremumNear(ephemeris, "emb-sun", "periapsis", tdbOf("2020-03-01"), "de405", "auto")).toBeNull();
    expect(supplyOf(ephemeris, "emb-sun", "de405", tdbOf("9000"), "auto")).toBeNull();
  });
});
