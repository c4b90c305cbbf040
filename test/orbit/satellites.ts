/**
 * Verification cases of SGP4: D. A. Vallado, P. Crawford, R. Hujsak and T. S. Kelso, *Revisiting Spacetrack Report #3*, AIAA 2006-6753, its element
 * sets and its results in km (from memory; the sets' checksums hold them).
 */
export const VERIFICATION = `1 00005U 58002B   00179.78495062  .00000023  00000-0  28098-4 0  4753
2 00005  34.2682 348.7242 1859667 331.7664  19.3264 10.82419157413667
DEEP SPACE, TWICE A DAY
1 08195U 75081A   06176.33215444  .00000099  00000-0  11873-3 0   813
2 08195  64.1586 279.0717 6877146 264.7651  20.2257  2.00491383225656
0 LOW
1 06251U 62025E   06176.82412014  .00008885  00000-0  12808-3 0  3985
2 06251  58.0579  54.0425 0030035 139.1568 221.1854 15.56387291  6774
`;

/** By catalogue number: minutes from the epoch, x, y, z. */
export const VERIFIED: readonly (readonly [string, number, number, number, number])[] = [
  ["00005", 0, 7022.46529266, -1400.08296755, 0.03995155],
  ["00005", 360, -7154.03120202, -3783.17682504, -3536.19412294],
  ["08195", 0, 2349.8948335, -14785.93811562, 0.02119378],
  ["06251", 0, 3988.31022699, 5498.96657235, 0.90055879],
];

/** The same source's case of a satellite that decays within the hour. */
export const DECAYING = `1 28872U 05037B   05333.02012661  .25992681  00000-0  24476-3 0  1534
2 28872  96.4736 157.9986 0303955 244.0492 110.6523 16.46015938 10708
`;

/** An invented satellite in the three forms of the message. */
export const MESSAGE = {
  OBJECT_NAME: "PROBE ONE",
  OBJECT_ID: "2027-001A",
  CENTER_NAME: "EARTH",
  REF_FRAME: "TEME",
  TIME_SYSTEM: "UTC",
  MEAN_ELEMENT_THEORY: "SGP4",
  EPOCH: "2027-03-01T12:00:00.123456",
  MEAN_MOTION: "2.00612345",
  ECCENTRICITY: "0.7123456",
  INCLINATION: "63.4001",
  RA_OF_ASC_NODE: "120.25",
  ARG_OF_PERICENTER: "270.5",
  MEAN_ANOMALY: "10.125",
  NORAD_CAT_ID: "99001",
  BSTAR: "0.0001",
} as const;

export const asXml = (fields: Readonly<Record<string, string>> = MESSAGE): string =>
  `<?xml version="1.0" encoding="UTF-8"?>\n<ndm><omm id="CCSDS_OMM_VERS" version="2.0"><body><segment>${Object.entries(
    fields,
  )
    .map(([key, value]) => `<${key}${key === "MEAN_MOTION" ? ' units="rev/day"' : ""}>${value}</${key}>`)
    .join("\n")}</segment></body></omm></ndm>\n`;

export const asLines = (fields: Readonly<Record<string, string>> = MESSAGE): string =>
  `CCSDS_OMM_VERS = 2.0\nCOMMENT invented\n${Object.entries(fields)
    .map(([key, value]) => `${key} = ${value}${key === "INCLINATION" ? " [deg]" : ""}`)
    .join("\n")}\n`;
