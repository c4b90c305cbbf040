import { DeltaT_EspenakMeeus, SetDeltaTFunction } from "astronomy-engine";
import { describe, expect, it } from "vitest";
import { openSky } from "../../src/sky/open-sky.ts";

const sky = await openSky();
const DAY = 86_400;

describe("openSky", () => {
  it("gives a frozen object whose functions answer at once", () => {
    expect(Object.isFrozen(sky)).toBe(true);
    expect(typeof sky.nearestNewMoon(0).tdbSeconds).toBe("number");
  });

  it("refuses an instant outside the years −1000 to 4000, and what is no number", () => {
    const refused = expect.objectContaining({ code: "not-covered" });
    for (const instant of [-3001 * 365.25 * DAY, 2001 * 365.25 * DAY, Number.NaN]) {
      expect(() => sky.moonElongationDeg(instant)).toThrowError(refused);
      expect(() => sky.nearestNewMoon(instant)).toThrowError(refused);
      expect(() => sky.nearestFullMoon(instant)).toThrowError(refused);
      expect(() => sky.solsticeBefore(instant, "june")).toThrowError(refused);
    }
  });

  it("depends on terrestrial time alone: another ΔT in the package changes nothing", () => {
    // The package's own is 75.2 s in 2026, where 69.2 s are true.
    const answers = () => [
      sky.nearestNewMoon(8.4e8).tdbSeconds,
      sky.nearestFullMoon(8.4e8).tdbSeconds,
      sky.moonElongationDeg(8.4e8),
      sky.solsticeBefore(8.4e8, "december"),
    ];
    const before = answers();
    SetDeltaTFunction(() => 10_000);
    try {
      expect(answers()).toEqual(before);
    } finally {
      SetDeltaTFunction(DeltaT_EspenakMeeus);
    }
  });
});
