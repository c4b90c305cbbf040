declare module "astronomia" {
  export const planetelements: {
    readonly earth: string;
    /** Mean elements of date; `peri` is the longitude of perihelion, radians. */
    mean(planet: string, jde: number): { readonly peri: number };
  };
}
