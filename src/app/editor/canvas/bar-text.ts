import { type BarState, type Lie, layerCount } from '@shared/bar';
import type { Overhang } from '@shared/forging';
import type { Format } from '@shared/units';

const LIE_WORDS: Readonly<Record<Exclude<Lie, 'mixed'>, string>> = {
  thickness: 'lying flat, one on the other',
  width: 'standing on edge, side by side',
  length: 'standing end-grain, one behind the other',
};

/** How the layers of a bar lie, in words: what the drawing shows, or why it can't. */
export function lieText(bar: BarState, format: Format): string {
  const layers = bar.layers === 1 ? '1 layer' : `${format.count(bar.layers)} layers`;
  if (bar.lie === 'mixed') {
    return `${layers}, twisted or joined at odds: no straight line through the bar meets them all`;
  }
  if (bar.section === null) {
    return `${layers}, ${LIE_WORDS[bar.lie]}, in several pictures beside each other`;
  }
  if (layerCount(bar.section) === 1) return layers;
  const bands = bar.section.bands === bar.layers ? '' : `, ${format.count(bar.section.bands)} bands`;
  return `${layers}${bands}, ${LIE_WORDS[bar.lie]}`;
}

/**
 * What sticks out of an assembly and goes: "Piece 2 sticks out 1.5 mm on each side", "Pieces 1 and 3 stick out 4 mm at
 * the far end".
 */
export function overhangTexts(
  overhangs: readonly Overhang[],
  along: 'thickness' | 'width',
  format: Format,
): readonly string[] {
  const sides = along === 'thickness' ? 'on each side' : 'above and below';
  const places = new Map<string, number[]>();
  for (const [i, overhang] of overhangs.entries()) {
    const parts = [
      ...(sticksOut(overhang.acrossMm) ? [`${format.length(overhang.acrossMm / 2)} ${sides}`] : []),
      ...(sticksOut(overhang.lengthMm) ? [`${format.length(overhang.lengthMm)} at the far end`] : []),
    ];
    if (parts.length === 0) continue;
    const words = parts.join(' and ');
    places.set(words, [...(places.get(words) ?? []), i + 1]);
  }
  return [...places].map(([words, pieces]) =>
    pieces.length === 1
      ? `Piece ${pieces[0]} sticks out ${words}`
      : `Pieces ${pieces.slice(0, -1).join(', ')} and ${pieces[pieces.length - 1]} stick out ${words}`,
  );
}

/** What the drawing of a bar shows, in words. */
export function barText(
  bar: BarState,
  overhangs: readonly Overhang[],
  along: 'thickness' | 'width',
  format: Format,
): string {
  const size = `${format.length(bar.lengthMm)} long, ${format.length(bar.widthMm)} wide, ${format.length(bar.thicknessMm)} thick`;
  const pieces =
    overhangs.length === 0 ? '' : ` ${format.count(overhangs.length)} pieces ${alongText(along)}.`;
  const trimmed = overhangTexts(overhangs, along, format);
  const trim = trimmed.length === 0 ? '' : ` ${trimmed.join('; ')}: trimmed.`;
  return `Bar, ${size}: side view and end section, to scale. ${capitalised(lieText(bar, format))}.${pieces}${trim}`;
}

export function alongText(along: 'thickness' | 'width'): string {
  return along === 'thickness' ? 'one on the other' : 'side by side';
}

/** Less than a hundredth of a millimetre is rounding. */
export function sticksOut(mm: number): boolean {
  return mm > 0.005;
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
