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
header, main, footer { max-width: 80rem; margin: 0 auto; padding: 0 1rem }
h1 { font-size: 1.7rem; line-height: 1.2; margin: 1.5rem 0 0.5rem }
h2 { font-size: 1.3rem; margin: 2.5rem 0 0.5rem }
h3 { font-size: 1.1rem; margin: 2rem 0 0.5rem }
a { color: var(--accent) }
a:focus-visible, .scroll:focus-visible { outline: 3px solid var(--accent); outline-offset: 2px }
footer { margin-top: 2.5rem; padding-bottom: 2rem; border-top: 1px solid var(--line); color: var(--soft); font-size: 0.875rem }
.scroll { overflow-x: auto; margin: 0.5rem 0 }
table { border-collapse: collapse; width: 100%; font-size: 0.85rem; font-variant-numeric: tabular-nums }
caption { text-align: left; color: var(--soft); padding: 0.25rem 0 }
th, td { padding: 0.3rem 0.45rem; text-align: left; vertical-align: top; border-bottom: 1px solid var(--line) }
thead th { vertical-align: bottom; background: var(--panel) }
tbody th { font-weight: 600; white-space: nowrap }
.number { text-align: right; white-space: nowrap }
.whole { white-space: nowrap }
@media screen and (max-width: 44rem) {
  table, caption, tbody, th, td { display: block }
  thead { position: absolute; clip-path: inset(50%); width: 1px; height: 1px; overflow: hidden }
  tr { display: flex; flex-wrap: wrap; gap: 0.1rem 1rem; border-bottom: 1px solid var(--line); padding: 0.5rem 0 }
  tbody th, td, .number { border: 0; padding: 0.1rem 0; text-align: left }
  tbody th, td.words { flex-basis: 100% }
  td[data-label]::before { content: attr(data-label) " "; color: var(--soft) }
  td.words::before, tbody td:empty { display: none }
}
@media print {
  :root { font-size: 9pt }
  header, main, footer { max-width: none; padding: 0 }
  .scroll { overflow: visible }
  table { font-size: 8pt }
  th, td { padding: 0.15rem 0.3rem }
  tr, figure { break-inside: avoid }
  h2, h3, caption { break-after: avoid }
  @page { size: landscape; margin: 14mm }
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
  /** The heading, as text. */
  readonly title: string;
  /** Gives the markup of a row's cell. */
  readonly cell: (row: Row) => string;
  /** `number` stands flush right and is not broken, `whole` is not broken, `words` take a line of their own in a narrow window. */
  readonly className?: "number" | "whole" | "words";
}

/**
 * Writes a table: caption, headings, a line for each row whose first cell is its heading.
 *
 * It scrolls sideways where it must, by keyboard as well. In a narrow window each row becomes a card, its cells with their headings before
 * them; the roles are written out so that it stays a table for those who hear it.
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
  const heads = columns.map((column) =>
    chartElement("th", { scope: "col", role: "columnheader", ...classOf(column) }, escaped(column.title)),
  );
  const lines = rows.map((row) => {
    const cells = columns.map((column, i) =>
      i === 0
        ? chartElement("th", { scope: "row", role: "rowheader", ...classOf(column) }, column.cell(row))
        : chartElement("td", { role: "cell", "data-label": column.title, ...classOf(column) }, column.cell(row)),
    );
    return `${chartElement("tr", { role: "row" }, ...cells)}\n`;
  });
  const table = chartElement(
    "table",
    { role: "table" },
    chartElement("caption", { id }, escaped(caption)),
    "\n",
    chartElement("thead", { role: "rowgroup" }, chartElement("tr", { role: "row" }, ...heads)),
    "\n",
    chartElement("tbody", { role: "rowgroup" }, "\n", ...lines),
  );
  return `${chartElement("div", { class: "scroll", role: "region", tabindex: 0, "aria-labelledby": id }, "\n", table, "\n")}\n`;
}
