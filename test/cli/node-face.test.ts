import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { openSources, passages } from "../../src/node.ts";
import { makeKernel } from "../ephemeris/make-kernel.ts";
import { fourSegments } from "../ephemeris/paths.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-node-"));
  for (const name of ["one", "two"]) mkdirSync(join(folder, name));
  writeFileSync(join(folder, "mine.bsp"), makeKernel(fourSegments()));
  writeFileSync(join(folder, "one", "same.bsp"), makeKernel(fourSegments()));
  writeFileSync(join(folder, "two", "same.bsp"), makeKernel(fourSegments()));
  writeFileSync(join(folder, "list"), "#@ 3991593600\n2272060800 10\n2287785600 11\n");
});
afterAll(() => rmSync(folder, { recursive: true }));

const without = { builtIn: false, series: false, engine: false } as const;

describe("openSources of apsidary/node", () => {
  test("takes a kernel by its path and calls it by its file name", async () => {
    const ephemeris = await openSources({ ...without, kernels: [join(folder, "mine.bsp")] });
    expect(ephemeris.sources.map(({ id }) => id)).toEqual(["user:mine.bsp"]);
    expect(ephemeris.covers("moon-earth")).toHaveLength(1);
  });

  test("takes a path with a name and an accuracy of the user's", async () => {
    const accuracy = { rangeKm: 7, rangeRateKmS: 1e-9 };
    const kernel = { data: join(folder, "mine.bsp"), name: "ours", accuracy };
    const ephemeris = await openSources({ ...without, kernels: [kernel] });
    const span = { from: "2000-01-05", to: "2000-02-25" };
    for (const passage of passages(ephemeris, "earth-sun", span)) {
      expect(passage).toMatchObject({ source: "user:ours", distanceUncertaintyKm: 7, accuracyBasis: "user" });
    }
    expect(ephemeris.sources[0]?.id).toBe("user:ours");
  });

  test("tells files of the same name apart by their paths, and puts the last one named first", async () => {
    const paths = [join(folder, "one", "same.bsp"), join(folder, "two", "same.bsp")];
    const ephemeris = await openSources({ ...without, kernels: paths });
    expect(ephemeris.sources.map(({ id }) => id)).toEqual([`user:${paths[1]}`, `user:${paths[0]}`]);
  });

  test("still takes bytes, and opens what the package carries where nothing is given", async () => {
    const bytes = makeKernel(fourSegments());
    expect((await openSources({ ...without, kernels: [bytes] })).sources).toHaveLength(1);
    expect((await openSources()).sources.map(({ id }) => id)).toContain("de405");
  });

  test("reads a leap-second list by its path, and names the path where it is none", async () => {
    const { leapSeconds } = await openSources({ leapSecondsFile: join(folder, "list"), builtIn: false });
    expect(leapSeconds.steps).toHaveLength(2);
    await expect(openSources({ leapSecondsFile: join(folder, "mine.bsp"), builtIn: false })).rejects.toMatchObject({
      code: "bad-leap-seconds",
      message: expect.stringContaining("mine.bsp"),
    });
  });

  test("says of a directory that it is one, and of a missing file that there is none", async () => {
    await expect(openSources({ kernels: [folder] })).rejects.toMatchObject({
      code: "unreadable",
      message: expect.stringContaining("is a directory"),
    });
    await expect(openSources({ leapSecondsFile: join(folder, "none") })).rejects.toMatchObject({
      code: "unreadable",
      message: expect.stringContaining("there is no file"),
    });
  });
});
