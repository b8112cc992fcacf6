import { type Design, STARTERS } from '../../shared/design/index.js';

/** A small valid design. */
export function aDesign(name = 'A plain stack'): Design {
  const [starter] = STARTERS;
  if (!starter) throw new Error('There is no starter.');
  return { ...starter.design, name };
}

/** The same, with a step that asks for more than there is. */
export function impossibleDesign(): Design {
  const design = aDesign();
  const [bar] = design.bars;
  if (!bar) throw new Error('The design has no bar.');
  const trim = { id: 'too-much', kind: 'trim', perEndMm: 2000 } as const;
  return { ...design, bars: [{ ...bar, steps: [...bar.steps, trim] }, ...design.bars.slice(1)] };
}
