// Feeds a season's perigees and apogees into the queue of observing requests of an invented observatory.
import { openSky, openSources, planSeason } from "apsidary";

const site = { name: "North Ridge", latitudeDeg: 46.5, longitudeDeg: 8, heightM: 2100, zone: "Europe/Zurich" };

/** What the observatory's scheduler takes. */
interface ObservingRequest {
  readonly target: string;
  readonly priority: number;
  readonly exposeAt: string;
  readonly notBefore: string;
  readonly notAfter: string;
}

const [ephemeris, sky] = await Promise.all([openSources(), openSky()]);
const season = { from: "2027-01-01", to: "2027-07-01", sky, minAltitudeDeg: 25, darkBelowDeg: -12 } as const;
const queue: ObservingRequest[] = [];
for (const row of planSeason(ephemeris, { pair: "moon-earth", site, within: { percent: 0.5 }, ...season })) {
  for (const { fromUtc, toUtc } of row.windows) {
    const holdsBest = row.bestUtc !== null && fromUtc <= row.bestUtc && row.bestUtc <= toUtc;
    queue.push({
      target: `Moon at ${row.term}, ${Math.round(row.topocentricDistanceKm)} km`,
      priority: holdsBest ? 1 : 2,
      exposeAt: holdsBest && row.bestUtc !== null ? row.bestUtc : fromUtc,
      notBefore: fromUtc,
      notAfter: toUtc,
    });
  }
}
queue.sort((a, b) => a.priority - b.priority || a.exposeAt.localeCompare(b.exposeAt));
console.log(JSON.stringify(queue, null, 2));
