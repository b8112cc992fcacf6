/** A part of a mix: its density and how much of it there is, by volume or by mass as the function says. */
export interface MixPart {
  /** > 0 */
  readonly densityKgM3: number;
  /** ≥ 0, in any unit common to all parts: a fraction, mm³, kg, or layers' thicknesses. */
  readonly share: number;
}

/**
 * Mean density of parts given by volume (or by thickness, for layers of one area): ρ = Σ φᵢρᵢ, kg/m³.
 * @throws RangeError when the shares add up to nothing
 */
export function mixDensityByVolume(parts: readonly MixPart[]): number {
  const total = totalShare(parts, 'mixDensityByVolume');
  return parts.reduce((sum, part) => sum + (part.share / total) * part.densityKgM3, 0);
}

/**
 * Mean density of parts given by mass: ρ = 1/Σ(wᵢ/ρᵢ), kg/m³.
 * @throws RangeError when the shares add up to nothing
 */
export function mixDensityByMass(parts: readonly MixPart[]): number {
  const total = totalShare(parts, 'mixDensityByMass');
  return 1 / parts.reduce((sum, part) => sum + part.share / total / part.densityKgM3, 0);
}

/** Slag in wrought iron (fayalite with wüstite), kg/m³. **Source**: from memory: source to be confirmed (4000–5000). */
export const SLAG_DENSITY_KG_M3 = 4000;

function totalShare(parts: readonly MixPart[], caller: string): number {
  const total = parts.reduce((sum, part) => sum + part.share, 0);
  if (!(total > 0)) throw new RangeError(`${caller}: shares add up to ${total}; must be > 0`);
  return total;
}
