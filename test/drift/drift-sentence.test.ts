import { describe, expect, test } from "vitest";
import { dateStepSentence, plainStepSentence } from "../../src/drift/drift-sentence.ts";

const KERNEL = { source: "de405", timeUncertaintySeconds: 1 };
const ENGINE = { source: "engine", timeUncertaintySeconds: 4000 };
const both = { now: KERNEL, before: KERNEL };

function told(
  calendarHours: number,
  planetsHours: number,
  moonHours: number,
  daysPast: number,
  phase: "new" | "full" = "new",
) {
  return dateStepSentence({
    dateStepHours: calendarHours + planetsHours + moonHours,
    parts: { calendarHours, planetsHours, moonHours },
    moon: { phase, daysPast },
    ...both,
  });
}

describe("the sentence of a step of the Earth's date", () => {
  test("names step, parts and the Moon's phase, and leaves the direction away where all go one way", () => {
    expect(told(6.2, 2.1, 36.8, 6.2)).toBe(
      "1 day 21 h later than last year: 6 h from the calendar, 2 h from the planets, 1 day 13 h from the Moon, now six days past new",
    );
    expect(told(-17.8, -0.2, -48.1, 3.1, "full")).toBe(
      "2 days 18 h earlier than last year: 18 h from the calendar, less than 1 h from the planets, 2 days from the Moon, now three days past full",
    );
  });

  test("says of each part which way it goes where they go both ways", () => {
    expect(told(-17.8, -1.6, 58.8, -2.4, "full")).toBe(
      "1 day 15 h later than last year: 18 h earlier from the calendar, 2 h earlier from the planets, 2 days 11 h later from the Moon, now two days before full",
    );
    expect(told(6.2, 2.2, -8.7, -3)).toBe(
      "within half an hour of last year: 6 h later from the calendar, 2 h later from the planets, 8 h earlier from the Moon, now three days before new",
    );
  });

  test("uses one day and the phase itself where they fit", () => {
    expect(told(6, 1, 17, 1.2)).toContain("1 day later than last year: 6 h");
    expect(told(6, 1, 17, 1.2)).toContain("now one day past new");
    expect(told(6, 1, 17, -0.4, "full")).toContain("now at full Moon");
  });

  test("has parts that add up to the step, whatever the fractions", () => {
    for (let i = 0; i < 500; i++) {
      const sentence = told(6.23, ((i * 37) % 100) / 10 - 5, ((i * 61) % 1000) / 10 - 50, 3);
      const hours = (text: string | undefined) => {
        const [, days = "0", rest = "0"] = /^(?:(\d+) days? ?)?(?:(\d+) h)?/.exec(text ?? "") ?? [];
        return 24 * Number(days) + Number(rest);
      };
      const [head = "", tail = ""] = sentence.split(": ");
      const total = head.startsWith("within") ? 0 : hours(head) * (head.includes("earlier") ? -1 : 1);
      const mixed = tail.includes(" later from") || tail.includes(" earlier from");
      const sum = tail
        .split(", ")
        .slice(0, 3)
        .reduce((all, part) => {
          const way = mixed ? (part.includes(" earlier") ? -1 : 1) : Math.sign(total);
          return all + way * (part.startsWith("less") ? 0 : hours(part));
        }, 0);
      expect(sum, sentence).toBe(total);
    }
  });

  test("does not explain a step between two sources, and tells how well each date is known", () => {
    const sentence = dateStepSentence({
      dateStepHours: 45,
      parts: { calendarHours: 6, planetsHours: 2, moonHours: 37 },
      moon: { phase: "new", daysPast: 6 },
      now: KERNEL,
      before: ENGINE,
    });
    expect(sentence).toBe(
      "1 day 21 h later than last year, but the two dates come from different sources (engine, known to 70 min; de405, known to 1.0 s): " +
        "the step holds their difference and is not explained",
    );
  });

  test("says how well the dates are known where whole hours are too fine", () => {
    const sentence = dateStepSentence({
      dateStepHours: 45,
      parts: { calendarHours: 6, planetsHours: 2, moonHours: 37 },
      moon: null,
      now: ENGINE,
      before: ENGINE,
    });
    expect(sentence).toMatch(/1 day 13 h from the Moon \(the dates are known to 70 min\)$/);
  });

  test("says so where the barycentre's passage is beyond the sources", () => {
    expect(dateStepSentence({ dateStepHours: 5, parts: null, moon: null, ...both })).toBe(
      "5 h later than last year; no source reaches the barycentre's passage, so the step is not explained",
    );
  });
});

describe("the sentence of another pair's step", () => {
  const step = { term: "perigee", stepDays: 27.71341, departureHours: 39.5, ...both };

  test("tells the interval and the departure from the straight line", () => {
    expect(plainStepSentence(step)).toBe(
      "27 days 17 h after the perigee before it, 1 day 16 h later than the straight line",
    );
    expect(plainStepSentence({ ...step, departureHours: -0.2 })).toBe(
      "27 days 17 h after the perigee before it, on the straight line to the hour",
    );
    expect(plainStepSentence({ ...step, departureHours: null })).toBe("27 days 17 h after the perigee before it");
  });

  test("rounds to days where the dates are known no better", () => {
    const coarse = { source: "engine", timeUncertaintySeconds: 600_000 };
    const sentence = plainStepSentence({
      term: "perihelion",
      stepDays: 60_636.02,
      departureHours: -30_451,
      now: coarse,
      before: coarse,
    });
    expect(sentence).toBe(
      "about 60 636 days after the perihelion before it, about 1 269 days earlier than the straight line (the dates are known to 7 d)",
    );
  });
});
