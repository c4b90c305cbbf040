import { describe, expect, test } from "vitest";
import { pairOf } from "../../src/bodies/pair.ts";
import { termOf } from "../../src/bodies/term.ts";
import { type Centre, terms } from "../../src/orbit/terms.ts";

// The trade's words: common practice, no source.
describe("terms", () => {
  test.each([
    ["sun", "perihelion", "aphelion"],
    ["earth", "perigee", "apogee"],
    ["moon", "perilune", "apolune"],
    ["jupiter", "perijove", "apojove"],
    ["star", "periastron", "apastron"],
    ["galaxy", "perigalacticon", "apogalacticon"],
  ])("about %s are %s and %s in common use", (centre, nearest, farthest) => {
    expect(terms(centre).common).toEqual({ nearest, farthest });
  });

  test("keep the rarely used words apart from the common ones", () => {
    expect(terms("moon").rare).toEqual([
      { nearest: "pericynthion", farthest: "apocynthion" },
      { nearest: "periselene", farthest: "aposelene" },
    ]);
    expect(terms("mars")).toMatchObject({ common: null, rare: [{ nearest: "periareion", farthest: "apoareion" }] });
    expect(terms("black-hole").rare[0]).toEqual({ nearest: "peribothron", farthest: "apobothron" });
  });

  test("always have the generic words at hand, and only those about a barycentre or anything else", () => {
    for (const centre of ["sun", "venus", "barycentre", "other"]) {
      expect(terms(centre).generic).toEqual([
        { nearest: "periapsis", farthest: "apoapsis" },
        { nearest: "pericentre", farthest: "apocentre" },
      ]);
    }
    for (const centre of ["barycentre", "other"]) expect(terms(centre)).toMatchObject({ common: null, rare: [] });
  });

  test("know other names of a centre, in any case", () => {
    for (const name of ["ssb", "EMB", "barycenter"]) expect(terms(name).centre satisfies Centre).toBe("barycentre");
    expect(terms("Galactic-Centre").centre).toBe("galaxy");
  });

  test("agree with the words that passages carry about Sun, Earth and barycentre", () => {
    for (const [centre, pair] of [
      ["sun", "earth-sun"],
      ["earth", "moon-earth"],
      ["ssb", "earth-ssb"],
    ] as const) {
      const { common, generic } = terms(centre);
      expect((common ?? generic[0])?.nearest).toBe(termOf(pairOf(pair), "periapsis", "principal"));
      expect((common ?? generic[0])?.farthest).toBe(termOf(pairOf(pair), "apoapsis", "principal"));
    }
  });

  test.each(["jupitre", "sunn", "", "toString", "__proto__"])(
    "refuse the unknown centre %j, naming those known",
    (centre) => {
      expect(() => terms(centre)).toThrow(/^unknown centre ".*Known are sun, mercury, .* other\.$/);
    },
  );

  test("suggest the nearest centre", () => {
    expect(() => terms("jupitre")).toThrow('unknown centre "jupitre"; did you mean "jupiter"?');
  });

  test("are frozen, words and all", () => {
    const { common, rare, generic } = terms("moon");
    for (const part of [terms("moon"), common, rare, rare[0], generic, generic[0]])
      expect(Object.isFrozen(part)).toBe(true);
  });
});
