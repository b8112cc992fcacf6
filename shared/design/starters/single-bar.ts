import { type Starter, designOf, pair, stackBar, steel } from './plan.js';

const dark = steel('1084', 3.2);
const bright = steel('15n20', 1.8);

export const straight: Starter = {
  id: 'straight',
  title: 'Straight layers',
  sentence: 'Flat layers that the bevels grind through: long calm lines, opening towards the edge.',
  design: designOf(
    'Straight layers',
    'Thirteen layers, restacked once by four. The plainest billet there is and the best first one.',
    [
      stackBar('billet', 'Billet', { lengthMm: 95, widthMm: 40, layers: pair(dark, bright, 6) }, [
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 4, widthMm: 40, thicknessMm: 14 },
        { kind: 'restack', pieces: 4, turnAlternate: false },
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 6, widthMm: 40, thicknessMm: 7 },
        { kind: 'trim', perEndMm: 8 },
      ]),
    ],
    { lengthMm: 270, widthMm: 38, thicknessMm: 5 },
  ),
};

export const twisted: Starter = {
  id: 'twisted',
  title: 'Twisted bar',
  sentence:
    'One square bar twisted tightly: waves near the skin, stars when it is ground towards the middle.',
  design: designOf(
    'Twisted bar',
    'Square it well before the twist and round the corners; grind to about half the thickness for full stars.',
    [
      stackBar(
        'billet',
        'Bar',
        { lengthMm: 115, widthMm: 26, layers: pair(steel('1084', 2.4), steel('15n20', 1.6), 5) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 16, thicknessMm: 16 },
          { kind: 'twist', heats: 4, turns: 20, hand: 'right', reversals: 0 },
          { kind: 'draw', heats: 4, widthMm: 24, thicknessMm: 8 },
          { kind: 'trim', perEndMm: 10 },
        ],
      ),
    ],
    { lengthMm: 220, widthMm: 22, thicknessMm: 5 },
  ),
};

export const laddered: Starter = {
  id: 'laddered',
  title: 'Ladder',
  sentence: 'Grooves cut across both faces and forged flat: rungs that cross the blade at an even pitch.',
  design: designOf(
    'Ladder',
    'Grooves to a quarter of the thickness from each side, half a pitch apart, then forged level.',
    [
      stackBar('billet', 'Billet', { lengthMm: 100, widthMm: 42, layers: pair(dark, bright, 7) }, [
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 5, widthMm: 42, thicknessMm: 14 },
        { kind: 'restack', pieces: 3, turnAlternate: false },
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 5, widthMm: 42, thicknessMm: 12 },
        {
          kind: 'groove',
          heats: 2,
          pitchMm: 12,
          depthMm: 3,
          radiusMm: 3.5,
          angleDeg: 0,
          faces: 'bothStaggered',
          finish: 'forgeFlat',
        },
        { kind: 'draw', heats: 2, widthMm: 44, thicknessMm: 6 },
        { kind: 'trim', perEndMm: 8 },
      ]),
    ],
    { lengthMm: 280, widthMm: 42, thicknessMm: 4.5 },
  ),
};

export const raindrop: Starter = {
  id: 'raindrop',
  title: 'Raindrop',
  sentence:
    'Round pits drilled into both faces and forged flat: rings scattered over the blade like drops on water.',
  design: designOf(
    'Raindrop',
    'A ball-nosed drill to a quarter of the thickness; every second row half a pitch along.',
    [
      stackBar('billet', 'Billet', { lengthMm: 90, widthMm: 40, layers: pair(dark, bright, 7) }, [
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 5, widthMm: 40, thicknessMm: 14 },
        { kind: 'restack', pieces: 4, turnAlternate: false },
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 6, widthMm: 40, thicknessMm: 11 },
        {
          kind: 'dimple',
          heats: 2,
          pitchMm: 11,
          rowPitchMm: 9,
          depthMm: 2.6,
          radiusMm: 4,
          layout: 'staggered',
          seed: 1,
          faces: 'bothStaggered',
          finish: 'forgeFlat',
        },
        { kind: 'draw', heats: 3, widthMm: 41, thicknessMm: 6 },
        { kind: 'trim', perEndMm: 8 },
      ]),
    ],
    { lengthMm: 260, widthMm: 38, thicknessMm: 4.5 },
  ),
};

export const feather: Starter = {
  id: 'feather',
  title: 'Feather',
  sentence:
    'A tall stack split with a blunt wedge and welded shut: layers sweep out from a quill like the barbs of a feather.',
  design: designOf(
    'Feather',
    'The wedge drags the layers down into the cut. Stood up afterwards, so that the quill runs along the blade.',
    [
      stackBar(
        'billet',
        'Block',
        { lengthMm: 105, widthMm: 45, layers: pair(steel('1084', 3), steel('15n20', 2), 6) },
        [
          { kind: 'weld', heats: 3 },
          { kind: 'draw', heats: 4, widthMm: 45, thicknessMm: 18 },
          { kind: 'restack', pieces: 3, turnAlternate: false },
          { kind: 'weld', heats: 3 },
          { kind: 'wedge', heats: 3, dragMm: 18, reachMm: 7 },
          { kind: 'weld', heats: 2 },
          { kind: 'turn', onto: 'end' },
          { kind: 'draw', heats: 8, widthMm: 45, thicknessMm: 9 },
          { kind: 'trim', perEndMm: 10 },
        ],
      ),
    ],
    { lengthMm: 240, widthMm: 42, thicknessMm: 6 },
  ),
};

export const onTheCorners: Starter = {
  id: 'on-the-corners',
  title: 'On the corners',
  sentence:
    'A square bar forged flat across its diagonal: layers run out to the sides in wide slanting bands.',
  design: designOf(
    'On the corners',
    'Square first, then on the corners until they are the new flats; restacked, the diagonals meet in chevrons.',
    [
      stackBar(
        'billet',
        'Billet',
        { lengthMm: 100, widthMm: 34, layers: pair(steel('1095', 3), steel('15n20', 1.8), 6) },
        [
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 4, widthMm: 24, thicknessMm: 24 },
          { kind: 'corner', heats: 4 },
          { kind: 'draw', heats: 4, widthMm: 24, thicknessMm: 14 },
          { kind: 'restack', pieces: 2, turnAlternate: true },
          { kind: 'weld', heats: 2 },
          { kind: 'draw', heats: 5, widthMm: 30, thicknessMm: 8 },
          { kind: 'trim', perEndMm: 8 },
        ],
      ),
    ],
    { lengthMm: 260, widthMm: 28, thicknessMm: 5.5 },
  ),
};
