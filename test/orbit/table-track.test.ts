import { describe, expect, test } from "vitest";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import type { StateTable } from "../../src/orbit/table-interpolation.ts";
import { tableTrack } from "../../src/orbit/table-track.ts";
import { messageOf, passagesOf } from "./bare.ts";

const T = 7.5e8 + 1234.567;

function keplerTable(e: number, rowsPerPeriod: number, withVelocity: boolean) {
  const kepler = elementsTrack({
    name: "kepler-earth",
    about: "earth",
    semiMajorAxisKm: 60000,
    eccentricity: e,
    periapsisAt: T,
    inclinationDeg: 33,
    nodeDeg: 20,
    argumentDeg: 70,
  });
  const half = kepler.pair.halfPeriodSeconds;
  const motion = kepler.motion(kepler.pair);
  const count = 5 * rowsPerPeriod;
  const [times, positions, velocities] = [
    new Float64Array(count),
    new Float64Array(3 * count),
    new Float64Array(3 * count),
  ];
  const out = new Float64Array(6);
  for (let i = 0; i < count; i++) {
    times[i] = T + 0.274 * half + (2 * half * i) / rowsPerPeriod;
    motion.state(times[i] as number, out);
    positions.set(out.subarray(0, 3), 3 * i);
    velocities.set(out.subarray(3), 3 * i);
  }
  return { half, table: { times, positions, velocities: withVelocity ? velocities : null } satisfies StateTable };
}

describe("a track from a table of states", () => {
  test.each([
    [0.01, 40, true],
    [0.01, 40, false],
    [0.1, 80, true],
    [0.1, 80, false],
    [0.5, 100, true],
    [0.5, 100, false],
    [0.7, 400, true],
    [0.7, 400, false],
  ])(
    "of e = %f, %i rows a period, velocities %s, keeps its stated uncertainty, which is of a second at most where rows are dense",
    async (e, rows, withVelocity) => {
      const { half, table } = keplerTable(e, rows, withVelocity);
      const track = tableTrack({ name: "probe-earth", about: "earth", ...table });
      const found = await passagesOf(track, table.times[0] as number, table.times.at(-1) as number);
      expect(found).toHaveLength(10);
      found.forEach((passage, i) => {
        const error = Math.abs(passage.tdbSeconds - (T + (i + 1) * half));
        expect(error).toBeLessThanOrEqual(passage.timeUncertaintySeconds);
        expect(passage.timeUncertaintySeconds).toBeLessThan(withVelocity ? 0.3 : 6);
      });
      expect(track.pair.halfPeriodSeconds / half).toBeCloseTo(1, 1);
    },
  );

  test("counts the digits that its states are written with", async () => {
    const { half, table } = keplerTable(0.1, 80, true);
    const rounded = {
      times: table.times,
      positions: table.positions.map((x) => Math.round(x)),
      velocities: (table.velocities ?? new Float64Array()).map((v) => Math.round(v * 1e3) / 1e3),
    };
    const track = tableTrack({ name: "probe-earth", ...rounded, digits: { km: 0.5, kmS: 0.0005 } });
    for (const [i, passage] of (await passagesOf(track, T + 0.3 * half, T + 9.9 * half)).entries()) {
      expect(Math.abs(passage.tdbSeconds - (T + (i + 1) * half))).toBeLessThan(passage.timeUncertaintySeconds);
      expect(passage.distanceUncertaintyKm).toBeGreaterThan(0.5);
    }
  });

  const good = () => keplerTable(0.1, 40, true).table;
  const changed = (change: (table: ReturnType<typeof good>) => void) => {
    const table = good();
    change(table);
    return () => tableTrack({ name: "probe-earth", ...table });
  };
  const rewrite = (values: Float64Array, change: (value: number, i: number) => number) =>
    values.set(values.map(change));
  const far = () => keplerTable(0.7, 6, false).table;
  const two = { times: new Float64Array(2), positions: new Float64Array(6), velocities: null };
  test.each([
    [
      "a jump",
      changed((it) => rewrite(it.positions, (x, i) => (i > 300 ? x + 2000 : x))),
      /after 20\d\d-.*jumps there/,
    ],
    [
      "velocities in m/s",
      changed((it) => rewrite(it.velocities ?? new Float64Array(), (v) => 1000 * v)),
      /contradict its positions/,
    ],
    [
      "times that do not grow",
      changed((it) => rewrite(it.times, (t, i) => (i === 7 ? (it.times[6] ?? 0) : t))),
      /times of probe-earth must grow; row 8/,
    ],
    [
      "what is no number",
      changed((it) => rewrite(it.positions, (x, i) => (i === 30 ? Number.NaN : x))),
      /row 11 of probe-earth, 20\d\d-.* no number/,
    ],
    ["too few rows", () => tableTrack({ name: "probe-earth", ...two }), /has 2 rows; it needs 4/],
    ["rows too far apart", () => tableTrack({ name: "probe-earth", ...far() }), /too far apart/],
  ])("is refused for %s", (_, call, says) => {
    expect(messageOf(call)).toMatch(says);
  });
});
