import { type Design, parseDesign } from '../../shared/design/index.js';

/** A valid design that takes minutes and gigabytes to work out: forty bars, each of more than a million layers. */
export function largeDesign(): Design {
  const bars = Array.from({ length: 40 }, (_, bar) => ({
    id: `bar-${bar}`,
    name: `Bar ${bar}`,
    start: {
      kind: 'stack',
      lengthMm: 4000,
      widthMm: 900,
      layers: Array.from({ length: 400 }, (_layer, n) => ({
        steel: n % 2 ? '1084' : '15n20',
        thicknessMm: 10,
      })),
    },
    steps: [
      ...[12, 12, 12, 2].flatMap((pieces) => [
        { kind: 'restack', pieces, turnAlternate: false, grindPerFaceMm: 0 },
        { kind: 'draw', lengthMm: 4000, widthMm: 900 },
      ]),
      ...Array.from({ length: 25 }, () => [
        { kind: 'turn', onto: 'edge' },
        { kind: 'grind', perFaceMm: 0.1, faces: 'all' },
      ]).flat(),
    ].map((step, n) => ({ id: `${bar}-${n}`, ...step })),
  }));
  const parsed = parseDesign({
    format: 'layerwright.design',
    version: 1,
    name: 'Large',
    bars,
    result: 'bar-39',
  });
  if (!parsed.ok) throw new Error(parsed.problems[0]?.message);
  return parsed.design;
}
