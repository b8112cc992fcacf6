import { type Steel, kindWords } from '@shared/steels';

/** Steels under one heading. */
export interface SteelGroup {
  readonly label: string;
  readonly steels: readonly Steel[];
}

/**
 * Steels as a list offers them: those at hand first, then family by family in the catalogue's order.
 * @param atHand ids that come first
 */
export function steelGroups(
  steels: readonly Steel[],
  atHand: readonly string[],
  atHandLabel: string,
): readonly SteelGroup[] {
  const first = atHand.flatMap((id) => steels.find((steel) => steel.id === id) ?? []);
  const groups = new Map<string, Steel[]>();
  for (const steel of steels) {
    if (atHand.includes(steel.id)) continue;
    const label = sentenceCase(kindWords(steel.kind));
    const group = groups.get(label);
    if (group) group.push(steel);
    else groups.set(label, [steel]);
  }
  const families = [...groups].map(([label, members]) => ({ label, steels: members }));
  return first.length > 0 ? [{ label: atHandLabel, steels: first }, ...families] : families;
}

function sentenceCase(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
