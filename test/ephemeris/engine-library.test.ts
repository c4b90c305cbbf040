import { expect, test, vi } from "vitest";

const state = vi.hoisted(() => ({ loads: 0 }));
vi.mock("astronomy-engine", async (original) => {
  state.loads++;
  return await original();
});

test("astronomy-engine is loaded when the engine is opened, and not by importing the library's modules", async () => {
  const { openEngine } = await import("../../src/ephemeris/engine.ts");
  const { openSky } = await import("../../src/sky/open-sky.ts");
  expect(state.loads).toBe(0);
  await openEngine();
  expect(state.loads).toBe(1);
  await openSky();
  expect(state.loads).toBe(1);
});
