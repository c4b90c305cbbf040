/** Progress is shown only when a run has taken so long, milliseconds. */
const PATIENCE = 2000;
const INTERVAL = 500;
/** Rows between looks at the clock. */
const ROWS = 64;

/**
 * Passes rows through and, on a terminal, tells on standard error how far they have come.
 *
 * @param rows   in order of time
 * @param timeOf gives a row's time
 * @param from   where the span begins, in the same time
 * @param to     where it ends
 * @param shown  whether anything may be shown
 */
export function* withProgress<Row>(
  rows: Iterable<Row>,
  timeOf: (row: Row) => number,
  from: number,
  to: number,
  shown: boolean,
): Generator<Row, void, undefined> {
  if (!shown) {
    yield* rows;
    return;
  }
  const start = performance.now();
  let last = start + PATIENCE - INTERVAL;
  let count = 0;
  let told = false;
  try {
    for (const row of rows) {
      yield row;
      count++;
      if (count % ROWS !== 0) continue;
      const now = performance.now();
      if (now < last + INTERVAL) continue;
      last = now;
      told = true;
      const share = Math.floor((100 * (timeOf(row) - from)) / (to - from));
      process.stderr.write(`\r\u001b[K${count} rows, ${share} % of the span`);
    }
  } finally {
    if (told) process.stderr.write("\r\u001b[K");
  }
}

/** Whether progress may be shown: standard error is a terminal and the answer itself does not run over it. */
export function mayShowProgress(out: string | undefined): boolean {
  return process.stderr.isTTY === true && (out !== undefined || process.stdout.isTTY !== true);
}
