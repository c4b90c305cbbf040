/** What stands in a table's cell; `null` is printed as a dash. */
export type Cell = string | number | null;

/** One column of a table for people. */
export interface Column<Row> {
  readonly title: string;
  /** Printed under the title; empty where the title says all. */
  readonly unit: string;
  /** Gives a row's cell. */
  readonly values: (row: Row) => Cell;
  /** Decimals of a number, for all rows or row by row; −3 rounds to thousands. */
  readonly digits: number | ((row: Row) => number);
}
