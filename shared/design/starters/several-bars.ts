import { type Starter, assembledBar, designOf, pair, stackBar, steel } from './plan.js';

export const fourWay: Starter = {
  id: 'four-way',
  title: 'Four-way',
  sentence:
    'Four square bars laid in a grid with their layers turned against each other, sliced end-grain up into tiles.',
  design: designOf(
    'Four-way',
    'Each quarter is turned by 90° from its neighbour. Slices off the end show the figure; laid in a row they make the blade.',
    [
      stackBar(
        'square',
        'Square bar',
        { lengthMm: 112, widthMm: 34, layers: pair(steel('1084', 3), steel('15n20', 2), 6) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 5, widthMm: 22, thicknessMm: 22 },
          { kind: 'grind', perFaceMm: 0.5, faces: 'all' },
        ],
      ),
      assembledBar(
        'lower',
        'Lower pair',
        'width',
        [{ bar: 'square' }, { bar: 'square', quarterTurns: 1 }],
        [],
      ),
      assembledBar(
        'upper',
        'Upper pair',
        'width',
        [{ bar: 'square', quarterTurns: 1 }, { bar: 'square' }],
        [],
      ),
      assembledBar(
        'mosaic',
        'Mosaic',
        'thickness',
        [{ bar: 'lower' }, { bar: 'upper' }],
        [
          { kind: 'weld', heats: 3 },
          { kind: 'draw', heats: 4, widthMm: 32, thicknessMm: 32 },
          { kind: 'slice', sliceMm: 9, count: 7, turnAlternate: true },
          { kind: 'weld', heats: 3 },
          { kind: 'draw', heats: 3, widthMm: 32, thicknessMm: 7 },
          { kind: 'trim', perEndMm: 6 },
        ],
      ),
    ],
    { lengthMm: 190, widthMm: 30, thicknessMm: 5 },
  ),
};

export const fiveBars: Starter = {
  id: 'five-bars',
  title: 'Five bars with an edge bar',
  sentence:
    'Four twisted bars side by side, every second one the other way, with a bar of finer layers for the edge.',
  design: designOf(
    'Five bars with an edge bar',
    'Opposite twists meet in chevrons. The edge bar carries the hardness: straight, fine and high in carbon.',
    [
      stackBar(
        'right',
        'Right-hand bar',
        { lengthMm: 170, widthMm: 20, layers: pair(steel('1084', 2.4), steel('15n20', 1.6), 4) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 12, thicknessMm: 12 },
          { kind: 'twist', heats: 3, turns: 16, hand: 'right', reversals: 0 },
          { kind: 'grind', perFaceMm: 0.5, faces: 'all' },
        ],
      ),
      stackBar(
        'left',
        'Left-hand bar',
        { lengthMm: 170, widthMm: 20, layers: pair(steel('1084', 2.4), steel('15n20', 1.6), 4) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 12, thicknessMm: 12 },
          { kind: 'twist', heats: 3, turns: 16, hand: 'left', reversals: 0 },
          { kind: 'grind', perFaceMm: 0.5, faces: 'all' },
        ],
      ),
      stackBar(
        'edge',
        'Edge bar',
        { lengthMm: 58, widthMm: 30, layers: pair(steel('1095', 2.5), steel('15n20', 1.5), 6) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 30, thicknessMm: 10 },
          { kind: 'restack', pieces: 2, turnAlternate: false },
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 16, thicknessMm: 11 },
          { kind: 'grind', perFaceMm: 0.4, faces: 'flats' },
        ],
      ),
      assembledBar(
        'composite',
        'Composite',
        'width',
        [{ bar: 'right' }, { bar: 'left' }, { bar: 'right' }, { bar: 'left' }, { bar: 'edge' }],
        [
          { kind: 'weld', heats: 3 },
          { kind: 'draw', heats: 4, widthMm: 58, thicknessMm: 7 },
          { kind: 'trim', perEndMm: 10 },
        ],
      ),
    ],
    // The edge bar is the last one, on the right.
    { lengthMm: 200, widthMm: 54, thicknessMm: 5.5, edge: 'right' },
  ),
};

export const sanMai: Starter = {
  id: 'san-mai',
  title: 'San mai',
  sentence:
    'A hard core between two layered jackets: the core shows at the edge, the pattern lies on the flanks.',
  design: designOf(
    'San mai',
    'The core must stay in the middle of the thickness: forge both sides alike and turn it over at each heat.',
    [
      stackBar(
        'jacket',
        'Jacket',
        { lengthMm: 116, widthMm: 40, layers: pair(steel('1084', 3), steel('15n20', 2), 5) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 5, widthMm: 42, thicknessMm: 11 },
          { kind: 'grind', perFaceMm: 0.5, faces: 'flats' },
        ],
      ),
      stackBar('core', 'Core', { lengthMm: 130, widthMm: 42, layers: [steel('26c3', 5)] }, [
        { kind: 'grind', perFaceMm: 0.2, faces: 'flats' },
      ]),
      assembledBar(
        'billet',
        'Billet',
        'thickness',
        [{ bar: 'jacket' }, { bar: 'core' }, { bar: 'jacket', quarterTurns: 2 }],
        [
          { kind: 'weld', heats: 3, temperatureC: 1175 },
          { kind: 'draw', heats: 6, widthMm: 45, thicknessMm: 8 },
          { kind: 'trim', perEndMm: 10 },
        ],
      ),
    ],
    { lengthMm: 280, widthMm: 43, thicknessMm: 5 },
  ),
};
