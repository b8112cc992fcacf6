import type { Starter } from './plan.js';
import { fiveBars, fourWay, sanMai } from './several-bars.js';
import { feather, laddered, onTheCorners, raindrop, straight, twisted } from './single-bar.js';

export type { Starter } from './plan.js';

/** Ready designs for the common patterns, from the plain to the elaborate. All figures: common practice, no source. */
export const STARTERS: readonly Starter[] = [
  straight,
  twisted,
  laddered,
  raindrop,
  feather,
  onTheCorners,
  fourWay,
  fiveBars,
  sanMai,
];
