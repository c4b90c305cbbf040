import type { Case } from "../case.ts";
import type { DistanceCause, DistancePrediction } from "../distance-cause.ts";
import { DISTANCE_UNITS, type PublishedDistance } from "../read-distance.ts";

/** Two neighbouring digits have changed places. */
export const distanceDigits: DistanceCause = Object.freeze({
  name: "distance-digits",
  share: 0.3,
  predict(row: Case, distance: PublishedDistance): DistancePrediction[] {
    const digits = distance.text.slice(distance.digits.start, distance.digits.end);
    const found: DistancePrediction[] = [];
    const places = [...digits].flatMap((c, i) => (/\d/.test(c) ? [i] : []));
    for (let i = 0; i + 1 < places.length; i++) {
      const a = places[i] ?? 0;
      const b = places[i + 1] ?? 0;
      if (digits[a] === digits[b]) continue;
      const swapped = [...digits];
      [swapped[a], swapped[b]] = [digits[b] ?? "", digits[a] ?? ""];
      const plain = swapped
        .join("")
        .replaceAll(distance.digits.grouping || "\u0000", "")
        .replace(",", ".");
      const value = Number(plain) * distance.factor * DISTANCE_UNITS[distance.unit];
      if (!Number.isFinite(value)) continue;
      // what would have been printed in the place of this row's text, so that published minus printed is right minus true
      found.push({
        detail: `${digits[a]} and ${digits[b]}`,
        share: 1 / (places.length - 1),
        km: row.at.passage.distanceKm - value + distance.km,
        unitKm: distance.unitKm,
        boundKm: row.at.kmBound,
      });
    }
    return found;
  },
  say: (detail: string) => `the digits ${detail} have changed places`,
});
