import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";

/** Words for the nearest and the farthest point of an orbit. */
export interface ApsisWords {
  readonly nearest: string;
  readonly farthest: string;
}

/** The words for a centre. Frozen. */
export interface ApsisTerms {
  readonly centre: Centre;
  /** The words in common use for this centre; `null` where the generic ones are used. */
  readonly common: ApsisWords | null;
  /** Words that are met with but rarely used. */
  readonly rare: readonly ApsisWords[];
  /** Words that fit any centre, the most usual first. */
  readonly generic: readonly ApsisWords[];
}

const words = (nearest: string, farthest: string): ApsisWords => Object.freeze({ nearest, farthest });

/** The words by centre: those in common use or `null`, then the rare ones. Common practice, no source. */
const TERMS = {
  sun: [["perihelion", "aphelion"]],
  mercury: [null, ["perihermion", "apohermion"]],
  venus: [null, ["pericytherion", "apocytherion"]],
  earth: [["perigee", "apogee"]],
  moon: [
    ["perilune", "apolune"],
    ["pericynthion", "apocynthion"],
    ["periselene", "aposelene"],
  ],
  mars: [null, ["periareion", "apoareion"]],
  jupiter: [
    ["perijove", "apojove"],
    ["perizene", "apozene"],
  ],
  saturn: [null, ["pericrone", "apocrone"], ["perisaturnium", "aposaturnium"]],
  uranus: [null, ["periuranion", "apouranion"]],
  neptune: [null, ["periposeideum", "apoposeideum"]],
  pluto: [null, ["perihadion", "apohadion"]],
  star: [["periastron", "apastron"]],
  galaxy: [["perigalacticon", "apogalacticon"]],
  "black-hole": [null, ["peribothron", "apobothron"], ["perinigricon", "aponigricon"], ["perimelasma", "apomelasma"]],
  barycentre: [null],
  other: [null],
} as const satisfies Record<string, readonly [readonly [string, string] | null, ...(readonly [string, string])[]]>;

/** A centre for which the trade's words are told. `galaxy` is the galactic centre; `other` is anything else. */
export type Centre = keyof typeof TERMS;

/** Other names of centres. */
const ALIASES: Readonly<Record<string, Centre>> = {
  ssb: "barycentre",
  emb: "barycentre",
  barycenter: "barycentre",
  "galactic-centre": "galaxy",
  "galactic-center": "galaxy",
};

/**
 * Gives the trade's words for the nearest and farthest point of an orbit about a centre.
 *
 * Those in common use are told apart from those rarely used; the generic ones, fit for any centre, are always there.
 *
 * @param centre sun, a planet, moon, star, galaxy, black-hole, barycentre (also ssb, emb) or other
 * @throws ApsidaryError `bad-input`, with the nearest name
 */
export function terms(centre: string): ApsisTerms {
  const name = centreOf(centre);
  const [common, ...rare] = TERMS[name] as readonly [
    readonly [string, string] | null,
    ...(readonly [string, string])[],
  ];
  return Object.freeze({
    centre: name,
    common: common && words(...common),
    rare: Object.freeze(rare.map((pair) => words(...pair))),
    generic: Object.freeze([words("periapsis", "apoapsis"), words("pericentre", "apocentre")]),
  });
}

function centreOf(given: string): Centre {
  const text = String(given).toLowerCase();
  if (Object.hasOwn(TERMS, text)) return text as Centre;
  if (Object.hasOwn(ALIASES, text)) return ALIASES[text] as Centre;
  const known = [...Object.keys(TERMS), ...Object.keys(ALIASES)];
  const near = nearestName(text, known);
  throw new ApsidaryError(
    "bad-input",
    `unknown centre ${JSON.stringify(String(given).slice(0, 60))}${near ? `; did you mean "${near}"?` : "."} ` +
      `Known are ${Object.keys(TERMS).join(", ")}.`,
  );
}
