import { type Design, STARTERS, type Starter } from '@shared/design';

/** A ready design of the program, by its id. */
export function starter(id: string): Design {
  const found = STARTERS.find((candidate: Starter) => candidate.id === id);
  if (!found) throw new RangeError(`starter: there is none called "${id}"`);
  return found.design;
}

/** A plain stack in one bar called `billet`: thirteen layers of two steels, then `straight`'s steps. */
export const STRAIGHT = starter('straight');
