import type { Layer, Stack } from '@shared/design';
import type { Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { type Repeat, repeatsOf } from './repeats';

/** A text alternative names so many layers or groups; the text twin beside the drawing names them all. */
const MOST_ITEMS = 40;

/** What a steel is called; its id where the design speaks of one that is not known. */
export function steelName(steels: ReadonlyMap<string, Pick<Steel, 'name'>>, id: string): string {
  return steels.get(id)?.name ?? id;
}

/**
 * What the drawing of a stack shows, in words: "Stack of 13 layers, 33 mm high, 40 mm wide, 95 mm long. From the bottom:
 * 6 times 1084 3 mm and 15N20 2 mm; 1084 3 mm."
 */
export function stackText(
  stack: Stack,
  steels: ReadonlyMap<string, Pick<Steel, 'name'>>,
  format: Format,
): string {
  const { layers } = stack;
  const heightMm = layers.reduce((sum, layer) => sum + layer.thicknessMm, 0);
  const count = layers.length === 1 ? '1 layer' : `${format.count(layers.length)} layers`;
  const sizes = [
    `${format.length(heightMm)} high`,
    `${format.length(stack.widthMm)} wide`,
    `${format.length(stack.lengthMm)} long`,
  ];
  const words = (layer: Layer): string =>
    `${steelName(steels, layer.steel)} ${format.length(layer.thicknessMm)}`;
  const items: string[] = [];
  let said = 0;
  for (const repeat of repeatsOf(layers, isSameLayer)) {
    if (items.length >= MOST_ITEMS) break;
    const group = layers.slice(repeat.from, repeat.from + repeat.period);
    const room = MOST_ITEMS - items.length;
    if (repeat.times === 1) {
      const named = group.slice(0, room);
      items.push(...named.map(words));
      said += named.length;
    } else {
      items.push(repeatText(repeat, group.map(words)));
      said += repeat.period * repeat.times;
    }
  }
  const rest = layers.length - said;
  if (rest > 0) items.push(`and ${format.count(rest)} more`);
  return `Stack of ${count}, ${sizes.join(', ')}. From the bottom: ${items.join('; ')}.`;
}

/** "6 times 1084 3 mm and 15N20 2 mm". */
export function repeatText(repeat: Repeat, words: readonly string[]): string {
  const last = words[words.length - 1] ?? '';
  const group = words.length > 1 ? `${words.slice(0, -1).join(', ')} and ${last}` : last;
  return `${repeat.times} times ${group}`;
}

/** What is chosen: "Layer 3 of 13, 15N20, 2 mm", "4 layers, 10 mm together", "Nothing selected". */
export function selectionText(
  stack: Pick<Stack, 'layers'>,
  places: ReadonlySet<number>,
  steels: ReadonlyMap<string, Pick<Steel, 'name'>>,
  format: Format,
): string {
  const chosen = [...places].filter((place) => place < stack.layers.length).sort((a, b) => a - b);
  const [first] = chosen;
  if (first === undefined) return 'Nothing selected';
  if (chosen.length === 1) {
    const layer = stack.layers[first] as Layer;
    const place = `Layer ${format.count(first + 1)} of ${format.count(stack.layers.length)}`;
    return `${place}, ${steelName(steels, layer.steel)}, ${format.length(layer.thicknessMm)}`;
  }
  const totalMm = chosen.reduce((sum, place) => sum + (stack.layers[place] as Layer).thicknessMm, 0);
  return `${format.count(chosen.length)} layers, ${format.length(totalMm)} together`;
}

export function isSameLayer(a: Layer, b: Layer): boolean {
  return a.steel === b.steel && a.thicknessMm === b.thicknessMm;
}
