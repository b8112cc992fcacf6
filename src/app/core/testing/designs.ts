import { type Design, renameDesign, type Starter, STARTERS } from '@shared/design';
import type { DesignListItem } from '../designs/designs-api';

/** A design with a name of its own. */
export function designNamed(name: string): Design {
  return renameDesign((STARTERS[0] as Starter).design, name);
}

/** A design as the list has it. */
export function listed(id: string, name: string, updatedAt = '2026-03-01T08:30:00.000Z'): DesignListItem {
  return {
    id,
    name,
    revision: 1,
    updatedAt,
    summary: { layers: 52, bars: 1, startMassKg: 0.99, endMassKg: 0.742 },
  };
}

/** The body of an answer that holds one design; its ETag goes into the header. */
export function designBody(id: string, document: Design, revision = 1): Record<string, unknown> {
  return { id, name: document.name, revision, updatedAt: '2026-03-01T08:30:00.000Z', document };
}
