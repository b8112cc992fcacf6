/**
 * How a section is turned about its middle without leaving its outline or changing any area.
 *
 * With y and z from the middle in half widths, H = y² + z² − y²z² is 1 on the square's outline and close to r² around
 * the middle: its level curves are circles inside and become the square. Points run along them as in the motion
 * y' = ∂H/∂z, z' = −∂H/∂y, which keeps areas exactly, whatever the time that each curve is given. That motion is known
 * in closed form, y = k·sn u and z = k·cd u with k² = H, so a turn is the addition theorem of the Jacobi functions. The
 * time is chosen so that every ring turns evenly: u = w·2K(k)/π for the angle w, and sn follows from its theta series.
 *
 * Smooth everywhere but in the four corners, so no creases along the diagonals. Turns by 90° are exact.
 *
 * **Accuracy**: areas are kept exactly. It deviates from a rigid rotation by up to 0.2 % of the half width on the circle
 * of a quarter of it, 1.8 % at a half, 5.7 % at 0.7. The nome's series is cut after three terms: rings with H > 0.999, the outermost
 * thousandth, turn not quite evenly.
 *
 * **Source**: level curves and motion worked out here; Jacobi functions, theta series and nome after Abramowitz and
 * Stegun, Handbook of Mathematical Functions (1964), chapters 16 and 17 (from memory: source to be confirmed).
 */

/** Less than this is rounding: a division by it happens in the very corners alone. */
const TINY = 1e-30;

/** Turns `quarters` of 90° (within ±½), on the ring whose complementary modulus squared is `kk2` = (1 − y²)(1 − z²). */
export function ringSine(quarters: number, kk2: number): number {
  const kk = Math.sqrt(kk2);
  const root = Math.sqrt(kk);
  const lambda = (0.5 * (1 - root)) / (1 + root);
  const lambda4 = lambda * lambda * lambda * lambda;
  const q = lambda * (1 + lambda4 * (2 + lambda4 * 15));
  const q2 = q * q;
  const q4 = q2 * q2;
  const q6 = q2 * q4;
  const sin = Math.sin(quarters * (Math.PI / 2));
  const s = sin * sin;
  const upper = 1 - q2 * (3 - 4 * s) + q6 * (5 - 20 * s + 16 * s * s);
  const lower = 1 - 2 * q * (1 - 2 * s) + 2 * q4 * (1 - 8 * s + 8 * s * s);
  // The series' constant factor is set by the exact value at 45°, so that one quarter joins the next.
  return (Math.SQRT2 * sin * upper * (1 - 2 * q4)) / (lower * (1 - q2 - q6) * Math.sqrt(1 + kk));
}

/** The same for half a quarter, 45°: exact. */
export function halfQuarterSine(kk2: number): number {
  return 1 / Math.sqrt(1 + Math.sqrt(kk2));
}

/**
 * Turns one point back by an angle.
 * @param ys y in half widths from the middle, −1 to 1; overwritten
 * @param zs z likewise
 * @param i index of the point
 * @param sine of the turn, see {@link ringSine}
 * @param quarters whole quarter turns beside it
 */
export function turnPoint(
  ys: Float64Array,
  zs: Float64Array,
  i: number,
  sine: number,
  quarters: number,
): void {
  const y = ys[i] as number;
  const z = zs[i] as number;
  const y2 = y * y;
  const z2 = z * z;
  const sine2 = sine * sine;
  const kk2 = (1 - y2) * (1 - z2);
  const cosine = Math.sqrt(Math.max(0, (1 - sine2) * (1 - (1 - kk2) * sine2)));
  const yTurned = inside((y * cosine - sine * z * (1 - y2)) / Math.max(TINY, 1 - y2 * sine2));
  const zTurned = inside((z * cosine + sine * y * (1 - z2)) / Math.max(TINY, 1 - z2 * sine2));
  switch (quarters & 3) {
    case 0:
      ys[i] = yTurned;
      zs[i] = zTurned;
      break;
    case 1:
      ys[i] = -zTurned;
      zs[i] = yTurned;
      break;
    case 2:
      ys[i] = -yTurned;
      zs[i] = -zTurned;
      break;
    default:
      ys[i] = zTurned;
      zs[i] = -yTurned;
  }
}

function inside(value: number): number {
  return Math.max(-1, Math.min(1, value));
}
