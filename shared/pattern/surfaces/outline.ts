import type { BladeOutlineName, Blank, OutlinePoint } from '../../design/index.js';

/** Spine and edge along a blade, 0 at the spine's side of the blank, 1 at the edge's. */
export interface Outline {
  readonly spineAt: (alongShare: number) => number;
  readonly edgeAt: (alongShare: number) => number;
}

type Knots = readonly (readonly [alongShare: number, spineShare: number, edgeShare: number])[];

/** The named outlines. Drawn by eye: common practice, no source. */
const NAMED: Readonly<Record<BladeOutlineName, Knots>> = {
  straightBack: [
    [0, 0, 1],
    [0.55, 0, 1],
    [0.75, 0, 0.94],
    [0.89, 0, 0.72],
    [0.965, 0, 0.4],
    [1, 0, 0],
  ],
  drop: [
    [0, 0, 1],
    [0.42, 0, 1],
    [0.7, 0.07, 0.96],
    [0.88, 0.2, 0.78],
    [0.965, 0.3, 0.53],
    [1, 0.36, 0.36],
  ],
  spear: [
    [0, 0, 1],
    [0.55, 0, 1],
    [0.78, 0.13, 0.87],
    [0.91, 0.29, 0.71],
    [1, 0.5, 0.5],
  ],
  kitchen: [
    [0, 0, 1],
    [0.35, 0.01, 0.995],
    [0.65, 0.1, 0.96],
    [0.85, 0.26, 0.86],
    [0.95, 0.42, 0.74],
    [1, 0.6, 0.6],
  ],
  leaf: [
    [0, 0.17, 0.83],
    [0.2, 0.22, 0.78],
    [0.42, 0.1, 0.9],
    [0.6, 0, 1],
    [0.78, 0.09, 0.91],
    [0.92, 0.29, 0.71],
    [1, 0.5, 0.5],
  ],
};

/** The outline of a blank: smooth curves through its points that never swing past them. */
export function outlineOf({ outline = 'drop' }: Pick<Blank, 'outline'>): Outline {
  const points = typeof outline === 'string' ? NAMED[outline].map(asPoint) : outline.points;
  const along = points.map((point) => point.alongShare);
  return {
    spineAt: monotoneCurve(
      along,
      points.map((point) => point.spineShare),
    ),
    edgeAt: monotoneCurve(
      along,
      points.map((point) => point.edgeShare),
    ),
  };
}

/** The points of a named outline, to start drawing from. */
export function outlinePoints(name: BladeOutlineName): readonly OutlinePoint[] {
  return NAMED[name].map(asPoint);
}

function asPoint([alongShare, spineShare, edgeShare]: Knots[number]): OutlinePoint {
  return { alongShare, spineShare, edgeShare };
}

/**
 * A curve of cubic pieces through points, monotone wherever they are.
 *
 * **Source**: Fritsch and Butland, A method for constructing local monotone piecewise cubic interpolants, SIAM J. Sci. Stat.
 * Comput. 5 (1984) (from memory: source to be confirmed).
 */
function monotoneCurve(at: readonly number[], values: readonly number[]): (where: number) => number {
  const last = at.length - 1;
  const width = (i: number): number => (at[i + 1] as number) - (at[i] as number);
  const rise = (i: number): number => ((values[i + 1] as number) - (values[i] as number)) / width(i);
  const slopes = at.map((_, i) => {
    if (i === 0) return rise(0);
    if (i === last) return rise(last - 1);
    const before = rise(i - 1);
    const after = rise(i);
    if (before * after <= 0) return 0;
    const weightBefore = width(i - 1) + 2 * width(i);
    const weightAfter = 2 * width(i - 1) + width(i);
    return (weightBefore + weightAfter) / (weightAfter / before + weightBefore / after);
  });
  return (where) => {
    let i = 0;
    while (i < last - 1 && where >= (at[i + 1] as number)) i++;
    const h = width(i);
    const t = Math.max(0, Math.min(1, (where - (at[i] as number)) / h));
    const rest = 1 - t;
    const from = values[i] as number;
    const to = values[i + 1] as number;
    const slopeFrom = (slopes[i] as number) * h;
    const slopeTo = (slopes[i + 1] as number) * h;
    return rest * rest * ((1 + 2 * t) * from + t * slopeFrom) + t * t * ((3 - 2 * t) * to - rest * slopeTo);
  };
}
