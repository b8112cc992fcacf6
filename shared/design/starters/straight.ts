import { repeatedGroup } from '../edits/index.js';
import type { Starter } from './index.js';

export const straight: Starter = {
  id: 'straight',
  title: 'Straight layers',
  sentence: 'Flat layers, ground into by the bevels: fine lines that open towards the edge.',
  design: {
    format: 'layerwright.design',
    version: 1,
    name: 'Straight layers',
    bars: [
      {
        id: 'billet',
        name: 'Billet',
        start: {
          kind: 'stack',
          lengthMm: 150,
          widthMm: 40,
          layers: repeatedGroup(
            [
              { steel: '1084', thicknessMm: 3 },
              { steel: '15n20', thicknessMm: 2 },
            ],
            6,
            true,
          ),
        },
        steps: [
          { id: 's1', kind: 'weld', heats: 2 },
          { id: 's2', kind: 'draw', heats: 4, lengthMm: 320, widthMm: 40 },
          { id: 's3', kind: 'restack', pieces: 4, turnAlternate: false },
          { id: 's4', kind: 'weld', heats: 2 },
          { id: 's5', kind: 'draw', heats: 6, widthMm: 40, thicknessMm: 8 },
        ],
      },
    ],
    result: 'billet',
    blank: { lengthMm: 240, widthMm: 38, thicknessMm: 5 },
  },
};
