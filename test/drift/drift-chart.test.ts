import { describe, expect, test } from "vitest";
import { driftAccount } from "../../src/drift/drift-account.ts";
import { driftChart } from "../../src/drift/drift-chart.ts";
import { builtIn } from "./sources.ts";

const ephemeris = await builtIn();
const rows = driftAccount(ephemeris, { from: "2016", to: "2030" });
const chart = driftChart(rows, ephemeris);

/** Checks that every element is closed in its order, and gives the names of all. */
function elementsOf(svg: string): string[] {
  const open: string[] = [];
  const all: string[] = [];
  for (const [, closing, name = "", , empty] of svg.matchAll(/<(\/?)([a-z]+)((?:\s[a-zA-Z-]+="[^"<]*")*)(\/?)>/g)) {
    if (closing) expect(open.pop()).toBe(name);
    else {
      all.push(name);
      if (!empty) open.push(name);
    }
  }
  expect(open).toEqual([]);
  return all;
}

function attributes(svg: string, element: string, name: string): number[] {
  return [...svg.matchAll(new RegExp(`<${element}[^>]* ${name}="([^"]*)"`, "g"))].map(([, value]) => Number(value));
}

describe("the chart of an account", () => {
  test("is one well-formed SVG without script, link or anything from elsewhere", () => {
    const names = elementsOf(chart);
    expect(names[0]).toBe("svg");
    expect(names.filter((name) => name === "svg")).toHaveLength(1);
    for (const forbidden of ["script", "image", "foreignObject", "a", "use"]) expect(names).not.toContain(forbidden);
    expect(chart).not.toMatch(/\son[a-z]+=|javascript:|@import|href=/);
    expect(chart.match(/https?:\/\/[^"]*/g)).toEqual(["http://www.w3.org/2000/svg"]);
    expect(chart).not.toMatch(/NaN|Infinity|undefined|null/);
  });

  test("says in its title and description what it shows, and in which units", () => {
    expect(chart).toMatch(
      /<title id="drift-title">Perihelion of the Earth, 2015 to 2029; Aphelion of the Earth, 2015 to 2029<\/title>/,
    );
    const description = /<desc[^>]*>([^<]*)</.exec(chart)?.[1] ?? "";
    expect(description).toContain("UTC");
    expect(description).toContain("in hours");
    expect(chart).toContain('aria-labelledby="drift-title drift-description"');
    for (const caption of ["Date (UTC)", "Hours later (+) or earlier (−) than the year before", ">year<"]) {
      expect(chart).toContain(caption);
    }
  });

  test("has a bar of three parts and a mark for each step, and both dates of each year, the one before the first included", () => {
    const bars = (name: string) => chart.match(new RegExp(`<rect class="${name}" [^>]*/>`, "g"))?.length;
    // one more of each in the keys of perihelia and aphelia
    for (const part of ["calendar", "planets", "moon"]) expect(bars(part)).toBe(rows.length + 2);
    expect(chart.match(/<polygon class="sum"/g)).toHaveLength(rows.length + 2);
    expect(chart.match(/<circle class="earth"/g)).toHaveLength(rows.length + 2 + 2);
    expect(chart.match(/<circle class="barycentre"/g)).toHaveLength(rows.length + 2 + 2);
  });

  test("tells each step in numbers to those who point at its bar", () => {
    expect(chart).toContain("<title>2020: +50.5 h = calendar +6.2, planets +0.7, moon +43.6</title>");
  });

  test("keeps everything inside its frame", () => {
    const [, , width = 0, height = 0] = (/viewBox="([^"]*)"/.exec(chart)?.[1] ?? "").split(" ").map(Number);
    const x = [
      ...attributes(chart, "circle", "cx"),
      ...attributes(chart, "rect", "x"),
      ...attributes(chart, "text", "x"),
    ];
    const y = [
      ...attributes(chart, "circle", "cy"),
      ...attributes(chart, "rect", "y"),
      ...attributes(chart, "text", "y"),
    ];
    expect(Math.min(...x, ...y)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...x)).toBeLessThan(width);
    expect(Math.max(...y)).toBeLessThan(height);
  });

  test("has at most eight labels of years in a row, so that they do not run into each other on a narrow screen", () => {
    for (const span of [
      ["2019", "2021"],
      ["1961", "2060"],
      ["1990", "2031"],
      ["2001", "2013"],
    ] as const) {
      const drawn = driftChart(driftAccount(ephemeris, { from: span[0], to: span[1], kind: "periapsis" }), ephemeris);
      const labels = drawn.match(/dominant-baseline="hanging">\d{4}</g)?.length ?? 0;
      expect(labels / 2).toBeLessThanOrEqual(8);
      expect(labels / 2).toBeGreaterThanOrEqual(2);
    }
  });

  test("puts dates where the calendar has them: a later hour of a day higher than an earlier one", () => {
    const dates = [...chart.matchAll(/<circle class="earth" cx="([\d.]+)" cy="([\d.]+)"/g)].map(([, , y]) => Number(y));
    // after the key: perihelia of 2015 to 2029; 2020-01-05 07:48 is the latest of 2015-2027, 2021-01-02 13:51 the earliest
    const perihelia = dates.slice(1, 16);
    const untilThen = perihelia.slice(0, 13);
    expect(untilThen.indexOf(Math.min(...untilThen))).toBe(5);
    expect(perihelia.indexOf(Math.max(...perihelia))).toBe(6);
  });

  test("is refused where there is nothing to draw, and beyond 200 years, in one line", () => {
    expect(() => driftChart([], ephemeris)).toThrow(/^there is no step to draw;/);
    expect(() => driftChart(driftAccount(ephemeris, { from: "2020", to: "2022", pair: "mars-sun" }))).toThrow(
      /no step to draw/,
    );
    const many = Array.from({ length: 201 }, () => rows[0] as (typeof rows)[number]);
    expect(() => driftChart(many, ephemeris)).toThrow(/200 years at most, not 201/);
  });
});
