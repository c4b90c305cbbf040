/** Mean orbital elements of an Earth satellite, for SGP4. Angles in degrees. */
export interface MeanElements {
  /** What the file calls the object; `null` where it has no name. */
  readonly objectName: string | null;
  /** Catalogue number or international designator; `null` where there is none. */
  readonly objectId: string | null;
  /** TDB seconds past J2000. */
  readonly epochTdb: number;
  /** Revolutions a day. */
  readonly meanMotion: number;
  readonly eccentricity: number;
  readonly inclination: number;
  readonly node: number;
  readonly argument: number;
  readonly meanAnomaly: number;
  /** Drag term, 1/Earth radii. */
  readonly bstar: number;
}
