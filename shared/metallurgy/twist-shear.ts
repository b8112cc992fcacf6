/** What twisting does to the skin of a round bar. */
export interface TwistShear {
  /** Shear strain at the surface: γ = π D N/L. */
  readonly shear: number;
  /** Angle of the lines on the surface to the bar's axis: atan γ. */
  readonly angleDeg: number;
  /** Length of one turn, mm. */
  readonly pitchMm: number;
  /** How many times as long a fibre of the surface becomes: √(1 + γ²). */
  readonly fibreStretch: number;
}

/**
 * Shear at the surface of a twisted bar. **Source**: derived here, geometry of the helix.
 * @param diameterMm of a round bar, or of the circle inscribed in a square one; mm, > 0
 * @param turns over the length, > 0; reversals don't lessen it
 * @param lengthMm mm, > 0
 */
export function twistShear(diameterMm: number, turns: number, lengthMm: number): TwistShear {
  const shear = (Math.PI * diameterMm * turns) / lengthMm;
  return {
    shear,
    angleDeg: (Math.atan(shear) * 180) / Math.PI,
    pitchMm: lengthMm / turns,
    fibreStretch: Math.hypot(1, shear),
  };
}
