import { chartElement, escaped } from "./chart-element.ts";

/** A page as a whole. */
export interface HtmlPage {
  readonly title: string;
  /** One line for those who list pages. */
  readonly description: string;
  /** Rules beyond the shared ones. */
  readonly style: string;
  /** Markup of the body, in pieces. */
  readonly body: Iterable<string>;
}

/** Colours of light, dark and print, as custom properties; every pair of ink and ground has a contrast of 4.5 and more. */
const LIGHT = "--ground: #fff; --panel: #f3f5f8; --ink: #1a1d21; --soft: #4c5560; --line: #c3cad3; --accent: #12406b";
const DARK = "--ground: #14171b; --panel: #1e2329; --ink: #e8eaed; --soft: #b3bcc7; --line: #454e59; --accent: #9ccbff";

const STYLE = `
:root { color-scheme: light dark; ${LIGHT} }
@media screen and (prefers-color-scheme: dark) { :root { ${DARK} } }
@media print { :root { color-scheme: light } }
* { box-sizing: border-box }
body { margin: 0; background: var(--ground); color: var(--ink); font: 1rem/1.5 system-ui, sans-serif }
header, main, footer { max-width: 75rem; margin: 0 auto; padding: 0 1rem }
h1 { font-size: 1.7rem; line-height: 1.2; margin: 1.5rem 0 0.5rem }
h2 { font-size: 1.3rem; margin: 2.5rem 0 0.5rem }
h3 { font-size: 1.1rem; margin: 2rem 0 0.5rem }
a { color: var(--accent) }
a:focus-visible, .scroll:focus-visible { outline: 3px solid var(--accent); outline-offset: 2px }
footer { margin-top: 2.5rem; padding-bottom: 2rem; border-top: 1px solid var(--line); color: var(--soft); font-size: 0.875rem }
.scroll { overflow-x: auto; margin: 0.5rem 0 }
table { border-collapse: collapse; width: 100%; font-size: 0.9rem; font-variant-numeric: tabular-nums }
caption { text-align: left; color: var(--soft); padding: 0.25rem 0 }
th, td { padding: 0.3rem 0.6rem; text-align: left; vertical-align: top; border-bottom: 1px solid var(--line) }
thead th { vertical-align: bottom; background: var(--panel) }
tbody th { font-weight: 600; white-space: nowrap }
.number { text-align: right; white-space: nowrap }
@media print {
  body { font-size: 9pt }
  header, main, footer { max-width: none; padding: 0 }
  .scroll { overflow: visible }
  table { font-size: 7.5pt }
  th, td { padding: 0.15rem 0.3rem }
  tr, figure { break-inside: avoid }
  h2, h3 { break-after: avoid }
  @page { margin: 14mm }
}`;

/**
 * Writes a page of HTML that holds all it needs: no script, no request, light, dark and print; piece by piece.
 *
 * A content security policy in the page forbids whatever would leave it.
 */
export function* htmlPage({ title, description, style, body }: HtmlPage): Generator<string, void, undefined> {
  yield `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'; img-src data:">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="description" content="${escaped(description)}">
<link rel="icon" href="data:,">
<title>${escaped(title)}</title>
<style>${STYLE}
${style}
</style>
</head>
<body>
`;
  yield* body;
  yield "</body>\n</html>\n";
}

/** One column of a table on a page. */
export interface HtmlColumn<Row> {
  /** Markup of the heading. */
  readonly title: string;
  /** Gives the markup of a row's cell. */
  readonly cell: (row: Row) => string;
  /** `number` stands flush right and is not broken. */
  readonly className?: string;
}

/**
 * Writes a table: caption, headings, a line for each row whose first cell is its heading. It scrolls sideways in a narrow window, by keyboard
 * as well.
 *
 * @param id unique on the page
 */
export function htmlTable<Row>(
  id: string,
  caption: string,
  columns: readonly HtmlColumn<Row>[],
  rows: readonly Row[],
): string {
  const classOf = ({ className }: HtmlColumn<Row>): Record<string, string> => (className ? { class: className } : {});
  const heads = columns.map((column) => chartElement("th", { scope: "col", ...classOf(column) }, column.title));
  const lines = rows.map((row) => {
    const cells = columns.map((column, i) =>
      i === 0
        ? chartElement("th", { scope: "row", ...classOf(column) }, column.cell(row))
        : chartElement("td", classOf(column), column.cell(row)),
    );
    return `${chartElement("tr", {}, ...cells)}\n`;
  });
  const table = chartElement(
    "table",
    {},
    chartElement("caption", { id }, escaped(caption)),
    "\n",
    chartElement("thead", {}, chartElement("tr", {}, ...heads)),
    "\n",
    chartElement("tbody", {}, "\n", ...lines),
  );
  return `${chartElement("div", { class: "scroll", role: "region", tabindex: 0, "aria-labelledby": id }, "\n", table, "\n")}\n`;
}
