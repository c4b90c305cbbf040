import { escaped } from "../report/chart-element.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { missingLine, VERDICT_WORDS } from "./audit-report.ts";
import type { AuditRow, Verdict } from "./audit-row.ts";
import type { AuditEnd } from "./auditor.ts";
import { residualChart } from "./residual-chart.ts";

/** What a page tells of its making. */
interface Made {
  readonly program: string;
  readonly version: string;
  readonly sources: readonly { readonly id: string; readonly title: string }[];
}

const STYLE = `body { font: 16px/1.5 system-ui, sans-serif; margin: 2rem auto; max-width: 60rem; padding: 0 1rem; color: #222; background: #fff }
h1 { font-size: 1.4rem } h2 { font-size: 1.1rem; margin-top: 2rem }
.lead { font-size: 1.15rem }
.table { overflow-x: auto }
table { border-collapse: collapse } th, td { text-align: left; vertical-align: top; padding: .3rem .8rem .3rem 0; border-bottom: 1px solid #ccc }
td:first-child, th:first-child { text-align: right }
footer { margin-top: 2rem; color: #555; font-size: .9rem }`;

/**
 * Writes the audit as a page by itself: the list's verdict, the chart of what each row is off by, the rows to mend.
 *
 * @param title the list
 * @param rows  those to mend, and those for the chart
 * @param end   what is known of the whole list
 */
export function auditPage(
  title: string,
  rows: { readonly toMend: readonly AuditRow[]; readonly charted: readonly AuditRow[] },
  end: AuditEnd,
  made: Made,
): string {
  const chart = rows.charted.length === 0 ? "" : residualChart(rows.charted).replace(/^<\?xml[^>]*>\n/, "");
  const counts = (Object.entries(end.summary) as [Verdict, number][]).filter(([, count]) => count > 0);
  const cells = rows.toMend.map(
    (row) =>
      `<tr><td>${row.line}</td><td>${escaped(row.published.when.slice(0, 60))}</td><td>${escaped(row.passage ? `${row.passage.pair} ${row.passage.term}` : "")}</td>` +
      `<td>${escaped(row.cause ?? row.verdict)}</td><td>${escaped(row.sentence)}</td></tr>`,
  );
  const list = (head: string, items: readonly string[]) =>
    items.length === 0
      ? ""
      : `<h2>${head}</h2>\n<ul>\n${items.map((item) => `<li>${escaped(item)}</li>`).join("\n")}\n</ul>\n`;
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Audit of ${escaped(title)}</title>
<style>
${STYLE}
</style>
</head>
<body>
<h1>Audit of ${escaped(title)}</h1>
<p class="lead">${escaped(end.list.sentence)}</p>
<p>${counts.map(([verdict, count]) => `${groupedNumber(count, 0)} ${VERDICT_WORDS[verdict]}`).join(", ")}.</p>
${chart}
${rows.toMend.length === 0 ? "<p>No row needs mending.</p>" : `<h2>Rows to mend</h2>\n<div class="table"><table>\n<thead><tr><th>line</th><th>published</th><th>passage</th><th>verdict</th><th>what to do</th></tr></thead>\n<tbody>\n${cells.join("\n")}\n</tbody>\n</table></div>`}
${list("Missing from the list", end.missing.slice(0, 200).map(missingLine))}
${list(
  "Told twice",
  end.duplicates.slice(0, 200).map(([first, again]) => `line ${again} has the passage of line ${first}`),
)}
<footer>${escaped(made.program)} ${escaped(made.version)}; ${escaped(made.sources.map(({ id, title }) => `${id}: ${title}`).join("; "))}. A row agrees when some instant within the computed one's bound (99.9 %) rounds to it.</footer>
</body>
</html>
`;
}
