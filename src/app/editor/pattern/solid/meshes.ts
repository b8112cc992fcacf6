import type { Blank } from '@shared/design';
import { FACES, type Face, type Surface, type Window, bladeOf } from '@shared/pattern';
import type { BarSize } from '../views';

/**
 * A part of a solid's skin, in bar coordinates about the solid's middle, mm: x along, y across, z up. Flat arrays, as the
 * graphics card takes them.
 */
export interface Skin {
  readonly name: string;
  /** What is to be seen on it; null for what is not pictured. */
  readonly surface: Surface | null;
  /** The part of the surface that lies on it. */
  readonly window: Window;
  /** Size of that part, mm: its picture has these proportions. */
  readonly widthMm: number;
  readonly heightMm: number;
  readonly positions: Float32Array;
  /** 0–1 of the picture, from its left and lower edge. */
  readonly uvs: Float32Array;
  /** Triangles, each turning left when seen from outside. */
  readonly indices: Uint32Array;
}

type Point = readonly [x: number, y: number, z: number];

/** The six faces of a bar that was ground all round, each where it lies. */
export function barSkins(bar: BarSize, groundMm: number): readonly Skin[] {
  return FACES.map((face) => barSkin(face, bar, groundMm));
}

/** How deep a bar can be ground all round and still be there. */
export function mostGroundMm({ lengthMm, widthMm, thicknessMm }: BarSize): number {
  return 0.45 * Math.min(lengthMm, widthMm, thicknessMm);
}

function barSkin(face: Face, bar: BarSize, groundMm: number): Skin {
  const x = bar.lengthMm / 2 - groundMm;
  const y = bar.widthMm / 2 - groundMm;
  const z = bar.thicknessMm / 2 - groundMm;
  // From the picture's lower left corner, over its lower right one, to the upper left: all seen as the pictures lie.
  const corners: Readonly<Record<Face, readonly [Point, Point, Point, Point]>> = {
    top: [p(-x, -y, z), p(x, -y, z), p(-x, y, z), p(x, y, z)],
    bottom: [p(-x, -y, -z), p(x, -y, -z), p(-x, y, -z), p(x, y, -z)],
    left: [p(-x, -y, -z), p(x, -y, -z), p(-x, -y, z), p(x, -y, z)],
    right: [p(-x, y, -z), p(x, y, -z), p(-x, y, z), p(x, y, z)],
    near: [p(-x, -y, -z), p(-x, y, -z), p(-x, -y, z), p(-x, y, z)],
    far: [p(x, -y, -z), p(x, y, -z), p(x, -y, z), p(x, y, z)],
  };
  // The other three are pictured as seen through the bar: from outside their corners run the other way.
  const isFromOutside = face === 'top' || face === 'left' || face === 'far';
  const [wide, high] =
    face === 'top' || face === 'bottom'
      ? [bar.lengthMm, bar.widthMm]
      : face === 'left' || face === 'right'
        ? [bar.lengthMm, bar.thicknessMm]
        : [bar.widthMm, bar.thicknessMm];
  return {
    name: face,
    surface: { kind: 'face', face, depthMm: groundMm },
    window: {
      left: groundMm / wide,
      right: 1 - groundMm / wide,
      bottom: groundMm / high,
      top: 1 - groundMm / high,
    },
    widthMm: wide - 2 * groundMm,
    heightMm: high - 2 * groundMm,
    positions: Float32Array.from(corners[face].flat()),
    uvs: Float32Array.of(0, 0, 1, 0, 0, 1, 1, 1),
    indices: isFromOutside ? Uint32Array.of(0, 1, 2, 2, 1, 3) : Uint32Array.of(0, 2, 1, 1, 2, 3),
  };
}

/** Places along the blade and up its sides at which its skin is bent. */
const ALONG = 120;
const UP = 24;
const WHOLE_WINDOW: Window = { left: 0, bottom: 0, right: 1, top: 1 };

/** The two sides of a blade, and the strips of spine, edge and heel between them. */
export function bladeSkins(blank: Blank, bar: BarSize): readonly Skin[] {
  const blade = bladeOf(blank, bar);
  const { outline, lengthMm, widthMm, isEdgeLeft } = blade;
  /** Place of a point of one side. `over` counts from the picture's lower edge, where the edge is. */
  const at = (
    along: number,
    height: number,
    sign: 1 | -1,
  ): { readonly point: Point; readonly over: number } => {
    const spine = outline.spineAt(along);
    const edge = outline.edgeAt(along);
    const over = 1 - edge + height * Math.max(0, edge - spine);
    const y = (isEdgeLeft ? over : 1 - over) * widthMm - widthMm / 2;
    return {
      point: p(along * lengthMm - lengthMm / 2, y, sign * blade.halfAt(along, height)),
      over,
    };
  };
  const side = (which: 'left' | 'right'): Skin => {
    const sign = (which === 'left') === isEdgeLeft ? 1 : -1;
    const positions: number[] = [];
    const uvs: number[] = [];
    for (let i = 0; i <= ALONG; i++) {
      for (let j = 0; j <= UP; j++) {
        const { point, over } = at(i / ALONG, j / UP, sign);
        positions.push(...point);
        uvs.push(i / ALONG, over);
      }
    }
    // Turned over, or with its edge to the other side, the net runs the other way round.
    return {
      name: `blade-${which}`,
      surface: { kind: 'blade', side: which },
      window: WHOLE_WINDOW,
      widthMm: lengthMm,
      heightMm: widthMm,
      positions: Float32Array.from(positions),
      uvs: Float32Array.from(uvs),
      indices: netIndices(ALONG, UP, sign > 0 === isEdgeLeft),
    };
  };
  const strip = (name: string, height: 0 | 1): Skin => {
    const positions: number[] = [];
    for (let i = 0; i <= ALONG; i++) {
      for (const sign of [1, -1] as const) positions.push(...at(i / ALONG, height, sign).point);
    }
    return plain(name, positions, netIndices(ALONG, 1, (height === 1) === isEdgeLeft));
  };
  const heel: number[] = [];
  for (let j = 0; j <= UP; j++) {
    for (const sign of [1, -1] as const) heel.push(...at(0, j / UP, sign).point);
  }
  return [
    side('left'),
    side('right'),
    strip('spine', 1),
    strip('edge', 0),
    plain('heel', heel, netIndices(UP, 1, isEdgeLeft)),
  ];
}

function plain(name: string, positions: readonly number[], indices: Uint32Array): Skin {
  return {
    name,
    surface: null,
    window: WHOLE_WINDOW,
    widthMm: 0,
    heightMm: 0,
    positions: Float32Array.from(positions),
    uvs: new Float32Array((positions.length / 3) * 2),
    indices,
  };
}

/** Triangles of a net of points, column by column. */
function netIndices(columns: number, rows: number, isTurningLeft: boolean): Uint32Array {
  const indices: number[] = [];
  for (let i = 0; i < columns; i++) {
    for (let j = 0; j < rows; j++) {
      const a = i * (rows + 1) + j;
      const b = a + rows + 1;
      if (isTurningLeft) indices.push(a, b, a + 1, a + 1, b, b + 1);
      else indices.push(a, a + 1, b, a + 1, b + 1, b);
    }
  }
  return Uint32Array.from(indices);
}

function p(x: number, y: number, z: number): Point {
  return [x, y, z];
}

/** Pixels of a skin's picture: the long side as given, the short one in proportion, both at least 16. */
export function texturePx(
  { widthMm, heightMm }: Pick<Skin, 'widthMm' | 'heightMm'>,
  longPx: number,
  longestMm: number,
): { readonly widthPx: number; readonly heightPx: number } {
  const pxPerMm = longPx / longestMm;
  const px = (mm: number): number => Math.round(Math.min(longPx, Math.max(16, mm * pxPerMm)));
  return { widthPx: px(widthMm), heightPx: px(heightMm) };
}
