declare module "astronomia" {
  /** ΔT in seconds of a year with decimals. */
  export const deltat: { deltaT(year: number): number };
}

declare module "astronomia/data/deltat" {
  /** ΔT at the first of each month. */
  const tables: { readonly data: { readonly table: readonly number[]; readonly firstYM: readonly [number, number] } };
  export default tables;
}
