import * as z from 'zod';

/** Outlines of a blade that have a name; the shop draws others by hand. */
export const BLADE_OUTLINES = [
  { value: 'straightBack', label: 'Straight back' },
  { value: 'drop', label: 'Drop point' },
  { value: 'spear', label: 'Spear point' },
  { value: 'kitchen', label: 'Kitchen' },
  { value: 'leaf', label: 'Leaf' },
] as const;
export type BladeOutlineName = (typeof BLADE_OUTLINES)[number]['value'];

/** How a blade's section runs from the spine to the edge. */
export const BLADE_GRINDS = [
  { value: 'flat', label: 'Flat: straight from the spine to the edge' },
  { value: 'sabre', label: 'Sabre: flats above, straight below' },
  { value: 'convex', label: 'Convex: bellied towards the edge' },
  { value: 'hollow', label: 'Hollow: hollowed towards the edge' },
] as const;
export type BladeGrind = (typeof BLADE_GRINDS)[number]['value'];

/** Whether the bevels cut through the layers or bend them. */
export const BLADE_BEVELS = [
  { value: 'ground', label: 'Ground: the bevels cut through the layers' },
  { value: 'forged', label: 'Forged: the layers follow the bevels' },
] as const;
export type BladeBevels = (typeof BLADE_BEVELS)[number]['value'];

/** Spine and edge of a drawn outline at one place along the blade. */
export interface OutlinePoint {
  /** 0 at the heel, 1 at the tip. */
  readonly alongShare: number;
  /** Height of the spine: 0 at the spine's side of the blank, 1 at the edge's. */
  readonly spineShare: number;
  /** Height of the edge on the same scale, not above the spine. */
  readonly edgeShare: number;
}

/** An outline drawn by hand: points from the heel (0) to the tip (1), joined smoothly. */
export interface DrawnOutline {
  readonly points: readonly OutlinePoint[];
}

/** The finished piece the billet is for; it must fit into the end of the result bar. */
export interface Blank {
  /** From the heel to the tip. */
  readonly lengthMm: number;
  /** From the spine to the edge, at the widest. */
  readonly widthMm: number;
  /** Of the spine at the heel. */
  readonly thicknessMm: number;
  /** Absent: a drop point. */
  readonly outline?: BladeOutlineName | DrawnOutline;
  /** Absent: flat. */
  readonly grind?: BladeGrind;
  /** Absent: ground. */
  readonly bevels?: BladeBevels;
  /** The side of the billet on which the edge lies. Absent: left. */
  readonly edge?: 'left' | 'right';
  /** Before sharpening. Absent: 0.4 mm. */
  readonly edgeThicknessMm?: number;
  /** Of the spine at the tip: the distal taper. Absent: two fifths of the thickness. */
  readonly tipThicknessMm?: number;
  /** How far up a sabre or hollow grind goes, as a part of the width. Absent: 0.6. */
  readonly bevelShare?: number;
  /** Length from the heel that stays flat. Absent: none. */
  readonly plungeMm?: number;
  /** Where the blank lies in the bar, from the near end, the left side and the bottom. Absent: in the middle. */
  readonly nearMm?: number;
  readonly leftMm?: number;
  readonly bottomMm?: number;
}

const share = z.number().min(0).max(1);
const sizeMm = (max: number): z.ZodNumber => z.number().min(0.1).max(max);
const names = <V extends string>(choices: readonly { readonly value: V }[]): readonly V[] =>
  choices.map(({ value }) => value);

const drawnOutlineSchema = z.strictObject({
  points: z
    .array(z.strictObject({ alongShare: share, spineShare: share, edgeShare: share }))
    .min(2)
    .max(24)
    .refine(
      isFromHeelToTip,
      'The points run from the heel, 0, to the tip, 1, each further along than the last.',
    )
    .refine(isEdgeBelowSpine, 'The edge lies on the edge’s side of the spine.'),
});

export const blankSchema = z.strictObject({
  lengthMm: sizeMm(2_000),
  widthMm: sizeMm(500),
  thicknessMm: sizeMm(200),
  outline: z.union([z.enum(names(BLADE_OUTLINES)), drawnOutlineSchema]).optional(),
  grind: z.enum(names(BLADE_GRINDS)).optional(),
  bevels: z.enum(names(BLADE_BEVELS)).optional(),
  edge: z.enum(['left', 'right']).optional(),
  edgeThicknessMm: z.number().min(0).max(50).optional(),
  tipThicknessMm: z.number().min(0).max(200).optional(),
  bevelShare: z.number().min(0.05).max(1).optional(),
  plungeMm: z.number().min(0).max(2_000).optional(),
  nearMm: z.number().min(0).max(20_000).optional(),
  leftMm: z.number().min(0).max(2_000).optional(),
  bottomMm: z.number().min(0).max(2_000).optional(),
});

function isFromHeelToTip(points: readonly OutlinePoint[]): boolean {
  const isRising = points.every((point, i) => i === 0 || point.alongShare > (points[i - 1]?.alongShare ?? 0));
  return isRising && points[0]?.alongShare === 0 && points[points.length - 1]?.alongShare === 1;
}

function isEdgeBelowSpine(points: readonly OutlinePoint[]): boolean {
  return points.every(({ spineShare, edgeShare }) => spineShare <= edgeShare);
}
