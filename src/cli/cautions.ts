import { POINTS } from "../bodies/point.ts";

/**
 * Gives the lines that a reader of a pair's distances must see: which centres are meant, and what is dangerous.
 *
 * @param points SPK ids of the moving point and the centre
 */
export function cautionsOf({
  targetPoint,
  centrePoint,
}: {
  readonly targetPoint: number | null;
  readonly centrePoint: number | null;
}): string[] {
  const notes: string[] = [];
  if (targetPoint !== null && targetPoint >= POINTS.jupiter && targetPoint <= POINTS.pluto) {
    notes.push(
      "jupiter to pluto stand for the barycentre of the planet and its moons, not for the planet's own centre.",
    );
  }
  if (targetPoint === POINTS.emb)
    notes.push("emb is the barycentre of the Earth and the Moon, not the Earth's centre.");
  if (centrePoint === POINTS.ssb) notes.push("ssb is the barycentre of the solar system, not the Sun.");
  if (targetPoint === POINTS.earth && centrePoint === POINTS.sun) {
    notes.push("Never look at the Sun through any optics without a certified solar filter.");
  }
  return notes;
}
