import { type Design, STARTERS, renameDesign } from '../../shared/design/index.js';

/** Who of the invented shop a design belongs to. */
export type DemoAuthor = 'owner' | 'smith' | 'student';

export interface DemoDesign {
  readonly author: DemoAuthor;
  readonly design: Design;
}

/** Five designs of the invented shop: ordinary kitchen and field knives. */
export const DEMO_DESIGNS: readonly DemoDesign[] = [
  {
    author: 'smith',
    design: project(
      'laddered',
      'Kitchen knife, ladder, 240 mm',
      'For a chef’s knife of 240 mm with a hidden tang. Thin behind the edge: leave the spine at 2.5 mm.',
    ),
  },
  {
    author: 'smith',
    design: project(
      'twisted',
      'Paring knife, twisted bar',
      'One bar for two paring knives. Ground to half the thickness the stars come out.',
    ),
  },
  {
    author: 'owner',
    design: project(
      'san-mai',
      'Santoku, san mai',
      'Hard core, layered jackets. The core must come out centred: turn it over at every heat.',
    ),
  },
  {
    author: 'owner',
    design: project(
      'five-bars',
      'Field knife, five bars',
      'Four twisted bars and a fine edge bar. Mark the bars with a chisel so that hands don’t get mixed up.',
    ),
  },
  {
    author: 'student',
    design: project(
      'feather',
      'Utility knife, feather',
      'First feather. Practise the split on mild steel before lighting the forge for this one.',
    ),
  },
];

function project(starterId: string, name: string, note: string): Design {
  const starter = STARTERS.find((candidate) => candidate.id === starterId);
  if (starter === undefined) throw new RangeError(`project: there is no starter "${starterId}"`);
  return { ...renameDesign(starter.design, name), note };
}
