import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { HtmlValidate } from "html-validate";
import { chromium } from "playwright-core";
import { beforeAll, describe, expect, test } from "vitest";
import { apsisCalendar, type CalendarQuery } from "../../src/calendar/apsis-calendar.ts";
import { calendarPage } from "../../src/calendar/calendar-page.ts";
import { completeStyle } from "../../src/calendar/house-style.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { CHROMIUM, QUIET } from "./chromium.ts";

let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

function page(query: CalendarQuery): string {
  const years = typeof query.years === "number" ? ([query.years, query.years] as const) : query.years;
  const pieces = calendarPage(ephemeris, apsisCalendar(ephemeris, query), {
    title: `Passages of ${years[0]}: Ferry Point <Astronomers> & friends`,
    zone: query.zone,
    style: completeStyle(query.style),
    source: "auto",
    years,
    cautions: ["Never look at the Sun through any optics without a certified solar filter."],
    foot: () => ["The foot."],
  });
  return [...pieces].join("");
}

const PAGES: [string, CalendarQuery][] = [
  ["of one year", { years: 2027, zone: "Pacific/Chatham" }],
  [
    "of two years, with zones side by side and names of months",
    {
      years: [2026, 2027],
      zone: "Asia/Kathmandu",
      pairs: ["earth-sun", "moon-earth"],
      style: { besides: ["UTC"], months: "names", language: "pt-BR" },
    },
  ],
  ["with nothing in it", { years: 2027, zone: "UTC", pairs: ["saturn-sun"] }],
];

describe.each(PAGES)("a page %s", (_, query) => {
  test("is valid HTML", async () => {
    // The roles of tables are written out, since cards in a narrow window lose their own; the other rules are the validator's recommended ones.
    const validator = new HtmlValidate({
      extends: ["html-validate:recommended"],
      rules: {
        "no-redundant-role": "off",
        "prefer-native-element": "off",
        "long-title": "off",
        "no-inline-style": "error",
        "attribute-empty-style": "off",
        "void-style": "off",
        "doctype-style": "off",
      },
    });
    const report = await validator.validateString(page(query));
    expect(
      report.results.flatMap(({ messages }) => messages.map((m) => `${m.line}: ${m.ruleId}: ${m.message}`)),
    ).toEqual([]);
  });

  test("holds no script and no address of anything outside itself", () => {
    const html = page(query);
    expect(html).not.toMatch(/<script|<link(?! rel="icon" href="data:,")|<img|@import|url\(|https?:|\bon\w+=/i);
    expect(html).toContain("&lt;Astronomers&gt; &amp; friends");
  });
});

test("a page has a chart and a captioned table for each body, with a mark for each passage", () => {
  const query = { years: 2027, zone: "UTC" } as const;
  const html = page(query);
  const rows = [...apsisCalendar(ephemeris, query)];
  const bodies = new Set(rows.map(({ pair }) => pair)).size;
  const count = (pattern: RegExp) => [...html.matchAll(pattern)].length;
  expect(count(/<svg /g)).toBe(bodies);
  expect(count(/<caption /g)).toBe(bodies);
  expect(count(/<circle class="(least|greatest)"/g)).toBe(rows.length);
  expect(count(/<th scope="row"/g)).toBe(rows.length);
  for (const { printedUtc } of rows) expect(html).toContain(printedUtc);
});

describe.skipIf(CHROMIUM === null)("a page in Chromium", () => {
  const axe = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

  test.each(["light", "dark", "print", "narrow"] as const)(
    "gives axe nothing to complain of and asks for nothing: %s",
    async (how) => {
      const folder = mkdtempSync(join(tmpdir(), "apsidary-page-"));
      const file = join(folder, "page.html");
      writeFileSync(file, page({ years: 2027, zone: "Pacific/Chatham" }));
      const browser = await chromium.launch({ executablePath: CHROMIUM ?? "", args: QUIET });
      try {
        const view = await browser.newPage({
          colorScheme: how === "dark" ? "dark" : "light",
          viewport: how === "narrow" ? { width: 360, height: 800 } : { width: 1280, height: 900 },
          bypassCSP: true, // axe is put into the page, which itself allows no script
        });
        const asked: string[] = [];
        view.on("request", (request) => asked.push(request.url()));
        if (how === "print") await view.emulateMedia({ media: "print" });
        await view.goto(pathToFileURL(file).href);
        await view.evaluate(axe);
        const found = await view.evaluate(
          "axe.run().then((r) => r.violations.map((v) => v.id + ': ' + v.nodes[0].html))",
        );
        expect(found).toEqual([]);
        expect(asked.filter((url) => !url.startsWith("data:"))).toEqual([pathToFileURL(file).href]);
        const wide = await view.evaluate("document.documentElement.scrollWidth - innerWidth");
        if (how !== "print") expect(wide).toBeLessThanOrEqual(0);
      } finally {
        await browser.close();
        rmSync(folder, { recursive: true });
      }
    },
  );
});
