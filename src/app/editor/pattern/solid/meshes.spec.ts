import { type Blank, STARTERS } from '@shared/design';
import { type Skin, barSkins, bladeSkins, mostGroundMm, texturePx } from './meshes';

const BAR = { lengthMm: 300, widthMm: 40, thicknessMm: 8 };

type Point = readonly [number, number, number];

function pointsOf({ positions }: Skin): readonly Point[] {
  return Array.from(
    { length: positions.length / 3 },
    (_, i) => [positions[3 * i], positions[3 * i + 1], positions[3 * i + 2]] as unknown as Point,
  );
}

/**
 * Volume that skins enclose, mm³: the sum of the tetrahedra that their triangles make with the middle. Positive only if
 * every triangle turns left when seen from outside.
 */
function enclosedMm3(skins: readonly Skin[]): number {
  let volume = 0;
  for (const skin of skins) {
    const points = pointsOf(skin);
    for (let i = 0; i < skin.indices.length; i += 3) {
      const [a, b, c] = [0, 1, 2].map((k) => points[skin.indices[i + k] as number] as Point) as [
        Point,
        Point,
        Point,
      ];
      volume +=
        (a[0] * (b[1] * c[2] - b[2] * c[1]) -
          a[1] * (b[0] * c[2] - b[2] * c[0]) +
          a[2] * (b[0] * c[1] - b[1] * c[0])) /
        6;
    }
  }
  return volume;
}

describe('barSkins', () => {
  it('close the bar, facing outward', () => {
    expect(enclosedMm3(barSkins(BAR, 0))).toBeCloseTo(300 * 40 * 8, 3);
    expect(enclosedMm3(barSkins(BAR, 2))).toBeCloseTo(296 * 36 * 4, 3);
  });

  it('show each face where its picture lies, cut to what is left of it', () => {
    const skins = new Map(barSkins(BAR, 2).map((skin) => [skin.name, skin]));
    expect(skins.get('top')?.surface).toEqual({ kind: 'face', face: 'top', depthMm: 2 });
    const { window } = skins.get('near') as Skin;
    expect(window.left).toBeCloseTo(2 / 40, 12);
    expect(window.top).toBeCloseTo(6 / 8, 12);
    // The picture's lower left corner: x along on the sides, y across on the ends, z or y up.
    expect(pointsOf(skins.get('right') as Skin)[0]).toEqual([-148, 18, -2]);
    expect(pointsOf(skins.get('far') as Skin)[0]).toEqual([148, -18, -2]);
    expect(pointsOf(skins.get('bottom') as Skin)[1]).toEqual([148, -18, -2]);
    expect([...(skins.get('left') as Skin).uvs]).toEqual([0, 0, 1, 0, 0, 1, 1, 1]);
  });

  it('leave something of the thinnest bar', () => {
    const most = mostGroundMm({ lengthMm: 300, widthMm: 40, thicknessMm: 0.5 });
    expect(0.5 - 2 * most).toBeGreaterThan(0);
  });
});

describe('bladeSkins', () => {
  const slab: Blank = {
    lengthMm: 200,
    widthMm: 30,
    thicknessMm: 4,
    tipThicknessMm: 4,
    edgeThicknessMm: 1,
    outline: {
      points: [
        { alongShare: 0, spineShare: 0, edgeShare: 1 },
        { alongShare: 1, spineShare: 0, edgeShare: 1 },
      ],
    },
  };

  it('face outward with the edge on either side [a flat grind: the mean of spine and edge times length and width]', () => {
    // The tip's end is open: its part of the volume about the middle is a pyramid of a third of it, 1/6 of all.
    const whole = 200 * 30 * 2.5;
    for (const edge of ['left', 'right'] as const) {
      expect(enclosedMm3(bladeSkins({ ...slab, edge }, BAR)))
        .withContext(edge)
        .toBeCloseTo(whole * (5 / 6), 1);
    }
  });

  it('put the edge where the picture has its lower edge', () => {
    const edgeOf = (edge: 'left' | 'right'): number => {
      const strip = bladeSkins({ ...slab, edge }, BAR).find(({ name }) => name === 'edge') as Skin;
      return pointsOf(strip)[0]?.[1] as number;
    };
    expect(edgeOf('left')).toBeCloseTo(-15, 9);
    expect(edgeOf('right')).toBeCloseTo(15, 9);
  });

  it('close every starter’s blade to a point', () => {
    for (const { id, design } of STARTERS) {
      if (!design.blank) continue;
      const { lengthMm, widthMm, thicknessMm } = design.blank;
      const volume = enclosedMm3(bladeSkins(design.blank, BAR));
      expect(volume)
        .withContext(id)
        .toBeGreaterThan(0.25 * lengthMm * widthMm * thicknessMm);
      expect(volume)
        .withContext(id)
        .toBeLessThan(lengthMm * widthMm * thicknessMm);
    }
  });
});

describe('texturePx', () => {
  it('gives every skin of a solid the same scale, and no picture less than a few pixels', () => {
    expect(texturePx({ widthMm: 300, heightMm: 40 }, 2048, 300)).toEqual({ widthPx: 2048, heightPx: 273 });
    expect(texturePx({ widthMm: 40, heightMm: 1 }, 2048, 300)).toEqual({ widthPx: 273, heightPx: 16 });
  });
});
