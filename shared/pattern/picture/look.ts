import { type Steel, etchBrightness, toneOf } from '../../steels/index.js';

/** How a surface was finished and etched. Changing it traces nothing. */
export interface Look {
  /** 0: bright metal, all steels alike; 1: etched to full contrast. */
  readonly etch: number;
  /** How far the etched layers stand out and catch the light, 0–1. */
  readonly relief: number;
  /** 0: polished; 1: as it comes from a coarse belt, with scratches along the bar. */
  readonly grit: number;
}

/** A well etched surface from fine paper. Common practice, no source. */
export const USUAL_LOOK: Look = { etch: 0.9, relief: 0.35, grit: 0.25 };

/** The etch shows nothing but steels: no light, no scratches. For print and for thumbnails. */
export const PLAIN_LOOK: Look = { etch: 1, relief: 0, grit: 0 };

/** CIE lightness of ground steel that was not etched. Common practice, no source. */
const BRIGHT_STEEL = 74;

/** A steel as it is painted. */
export interface Paint {
  /** Linear reflectance of red, green and blue, 0–1. */
  readonly rgb: readonly [number, number, number];
  /** How high it stands after the etch: 0 the most eaten, 1 untouched. */
  readonly height: number;
}

/** What each steel looks like after an etch of a given depth. */
export function paintsOf(steels: readonly Steel[], etch: number): readonly Paint[] {
  const bare = luminanceOfLightness(BRIGHT_STEEL);
  return steels.map((steel) => {
    const [red, green, blue] = toneOf(steel).rgb.map(linearOfSrgb) as [number, number, number];
    const mixed = (channel: number): number => {
      // Steps of lightness look equal, steps of light don't: the two are mixed as the eye sees them.
      const from = lightnessOf(bare);
      return luminanceOfLightness(from + (lightnessOf(channel) - from) * etch);
    };
    return { rgb: [mixed(red), mixed(green), mixed(blue)], height: etchBrightness(steel) };
  });
}

/** sRGB channel, 0–255, as linear light. **Source**: IEC 61966-2-1. */
export function linearOfSrgb(channel: number): number {
  const share = channel / 255;
  return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
}

/** Entries in the table that turns light into sRGB: fine enough for a step of one in 255 in the darkest tones. */
const TABLE = 4096;
const SRGB_OF_LIGHT = Uint8Array.from({ length: TABLE + 1 }, (_, i) => {
  const light = i / TABLE;
  const channel = light <= 0.0031308 ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055;
  return Math.round(255 * channel);
});

/** Linear light, clipped to 0–1, as an sRGB channel, 0–255. */
export function srgbOfLinear(light: number): number {
  if (light <= 0) return 0;
  return light >= 1 ? 255 : (SRGB_OF_LIGHT[Math.round(light * TABLE)] as number);
}

/** CIE L*, 0–100, of a luminance. **Source**: CIE 15. */
function lightnessOf(luminance: number): number {
  return luminance > 0.008856 ? 116 * luminance ** (1 / 3) - 16 : 903.2963 * luminance;
}

function luminanceOfLightness(lightness: number): number {
  return lightness > 8 ? ((lightness + 16) / 116) ** 3 : lightness / 903.2963;
}
