import type { Layer, Stack } from '@shared/design';
import type { Steel } from '@shared/steels';
import type { Format } from '@shared/units';
import { spreadLabels } from './label-spread';
import { FIGURES, type Measure, NAMES, shortened } from './paper';
import { repeatsOf } from './repeats';
import { type StackGeometry, layerAt, seamMm } from './stack-geometry';
import { isSameLayer, steelName } from './stack-text';
import { type AreaPx, type PointPx, type Viewport, toMm, toPx } from './viewport';

export const LABEL_FONT = `400 13px ${NAMES}`;
export const LABEL_FIGURE_FONT = `400 13px ${FIGURES}`;
export const PLACE_FONT = `400 11px ${FIGURES}`;
/** Height of a line of writing beside the stack, px. */
export const LABEL_PX = 20;
/** Room for the leader from the stack to its label: the grip stands in it too, px. */
const LEADER_PX = 40;
const GAP_PX = 8;

/** The sheet, and what of it the stack gets when it just fits. */
export interface StackFrame {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly area: AreaPx;
  /** Most that a label may take, px. */
  readonly labelPx: number;
  /** From the stack to the dimension of what is chosen, and to that of the whole, px. */
  readonly dimensionsPx: readonly [number, number];
}

/**
 * Shares out a sheet: dimensions at the left and below, names at the right.
 * @param wantedPx what the widest label would take, px
 */
export function stackFrame(widthPx: number, heightPx: number, wantedPx: number): StackFrame {
  const isNarrow = widthPx < 560;
  const left = isNarrow ? 46 : 70;
  const labelPx = Math.min(Math.ceil(wantedPx), isNarrow ? Math.round(widthPx * 0.36) : 250);
  const right = labelPx + LEADER_PX + (isNarrow ? 8 : 16);
  const top = 34;
  const bottom = 60;
  return {
    widthPx,
    heightPx,
    area: {
      leftPx: left,
      topPx: top,
      widthPx: Math.max(40, widthPx - left - right),
      heightPx: Math.max(40, heightPx - top - bottom),
    },
    labelPx,
    dimensionsPx: isNarrow ? [16, 32] : [22, 48],
  };
}

/** What the widest label of a stack takes, px. */
export function widestLabelPx(
  stack: Pick<Stack, 'layers'>,
  steels: ReadonlyMap<string, Pick<Steel, 'name'>>,
  format: Format,
  measure: Measure,
): number {
  const widest = (texts: Iterable<string>, font: string): number =>
    [...new Set(texts)].reduce((most, text) => Math.max(most, measure(text, font)), 0);
  const names = stack.layers.map((layer) => steelName(steels, layer.steel));
  const figures = stack.layers.map((layer) => figureOf(format, layer.thicknessMm));
  const places = measure(`${stack.layers.length} ×`, PLACE_FONT);
  return places + widest(names, LABEL_FONT) + widest(figures, LABEL_FIGURE_FONT) + 2.5 * GAP_PX;
}

function figureOf(format: Format, thicknessMm: number): string {
  return format.length(thicknessMm, { fractionStyle: 'built' });
}

/** Where the stack lies on the sheet, px. */
export interface StackRect {
  readonly leftPx: number;
  readonly rightPx: number;
  readonly topPx: number;
  readonly bottomPx: number;
}

export function stackRect(geometry: StackGeometry, viewport: Viewport): StackRect {
  const low = toPx(viewport, { acrossMm: 0, upMm: 0 });
  const high = toPx(viewport, { acrossMm: geometry.widthMm, upMm: geometry.heightMm });
  return { leftPx: low.xPx, rightPx: high.xPx, topPx: high.yPx, bottomPx: low.yPx };
}

/** Writing beside the stack: one line for a layer, one for each layer of a group. */
export interface StackLabel {
  /** The layer it names; null for a group of layers. */
  readonly place: number | null;
  /** What it names, px, upper end first; as far as it is on the sheet. */
  readonly spanPx: readonly [number, number];
  readonly middlePx: number;
  readonly heightPx: number;
  /** "12" for a layer, "6 ×" for a group. */
  readonly number: string;
  /** From the top down. */
  readonly lines: readonly { readonly name: string; readonly figure: string }[];
}

export interface LabelColumn {
  readonly leftPx: number;
  readonly widthPx: number;
  /** From the left edge to the names, px. */
  readonly nameAtPx: number;
  readonly labels: readonly StackLabel[];
}

/** What labels are made from. */
export interface LabelGround {
  readonly stack: Pick<Stack, 'layers'>;
  readonly steels: ReadonlyMap<string, Pick<Steel, 'name'>>;
  readonly format: Format;
  readonly geometry: StackGeometry;
  readonly viewport: Viewport;
  readonly frame: StackFrame;
  readonly chosen: ReadonlySet<number>;
  readonly measure: Measure;
}

/**
 * The writing beside the stack: every layer that can be seen, as long as there is room for all; else the groups that
 * repeat, "6 ×" and what lies in them; else only what is chosen and, from the thickest on, what finds room.
 */
export function labelColumn(ground: LabelGround): LabelColumn {
  const { frame, geometry, viewport } = ground;
  const fromPx = frame.area.topPx - 8;
  const toPxEnd = frame.heightPx - frame.area.topPx - 22;
  const room = Math.max(1, Math.floor((toPxEnd - fromPx) / LABEL_PX));
  const [first, last] = seenLayers(geometry, viewport, frame);
  const drafts =
    last - first + 1 <= room
      ? range(first, last).map((place) => layerDraft(ground, place))
      : (groupDrafts(ground, first, last, room) ??
        loosest(ground, first, last, room).map((place) => layerDraft(ground, place)));
  // From the top of the sheet down.
  const falling = drafts.sort((a, b) => a.wantedPx - b.wantedPx);
  const middles = spreadLabels(
    falling.map((draft) => draft.wantedPx),
    falling.map((draft) => draft.heightPx),
    fromPx,
    toPxEnd,
  );
  return columnOf(ground, falling, middles);
}

/** The layer whose writing is at a point of the sheet, or null. */
export function labelAt(column: LabelColumn, at: PointPx): number | null {
  if (at.xPx < column.leftPx - 6 || at.xPx > column.leftPx + column.widthPx + 6) return null;
  const found = column.labels.find((label) => Math.abs(label.middlePx - at.yPx) <= label.heightPx / 2);
  return found?.place ?? null;
}

type Draft = Omit<StackLabel, 'middlePx'> & { readonly wantedPx: number };

function columnOf(ground: LabelGround, drafts: readonly Draft[], middles: readonly number[]): LabelColumn {
  const { frame, measure } = ground;
  const widest = (texts: readonly string[], font: string): number =>
    texts.reduce((most, text) => Math.max(most, measure(text, font)), 0);
  const lines = drafts.flatMap((draft) => draft.lines);
  const numberPx = widest(
    drafts.map((draft) => draft.number),
    PLACE_FONT,
  );
  const figurePx = widest(
    lines.map((line) => line.figure),
    LABEL_FIGURE_FONT,
  );
  const nameAtPx = Math.ceil(numberPx) + GAP_PX;
  const roomPx = Math.max(0, frame.labelPx - nameAtPx - figurePx - GAP_PX);
  const nameOf = (name: string): string => shortened(name, LABEL_FONT, roomPx, measure);
  const namePx = widest(
    lines.map((line) => nameOf(line.name)),
    LABEL_FONT,
  );
  const widthPx = nameAtPx + Math.ceil(namePx) + GAP_PX * 1.5 + Math.ceil(figurePx);
  const { rightPx } = stackRect(ground.geometry, ground.viewport);
  const leftPx = Math.max(
    frame.area.leftPx,
    Math.min(Math.round(rightPx) + LEADER_PX, frame.widthPx - widthPx - GAP_PX),
  );
  const labels = drafts.map(({ wantedPx: _, ...draft }, i) => ({
    ...draft,
    middlePx: middles[i] as number,
    lines: draft.lines.map((line) => ({ ...line, name: nameOf(line.name) })),
  }));
  return { leftPx, widthPx, nameAtPx, labels };
}

function layerDraft(ground: LabelGround, place: number): Draft {
  const layer = ground.stack.layers[place];
  return {
    place,
    ...spanOf(ground, place, place + 1),
    heightPx: LABEL_PX,
    number: String(place + 1),
    lines: layer ? [lineOf(ground, layer)] : [],
  };
}

/** Most layers of a group that are named one by one. */
const NAMED_IN_GROUP = 4;

/** The groups that repeat, or null when they find no room or there are none. */
function groupDrafts(ground: LabelGround, first: number, last: number, room: number): Draft[] | null {
  const { layers } = ground.stack;
  const groups = repeatsOf(layers, isSameLayer).filter(
    (group) => group.from <= last && group.from + group.period * group.times > first,
  );
  // A long stretch without order says nothing as a group.
  if (groups.some((group) => group.times === 1 && group.period > NAMED_IN_GROUP)) return null;
  const drafts = groups.map((group): Draft => {
    if (group.period * group.times === 1) return layerDraft(ground, group.from);
    const named = layers.slice(group.from, group.from + Math.min(group.period, NAMED_IN_GROUP)).reverse();
    const rest = group.period - named.length;
    const lines = [
      ...(rest > 0 ? [{ name: `and ${rest} more`, figure: '' }] : []),
      ...named.map((layer) => lineOf(ground, layer)),
    ];
    return {
      place: null,
      ...spanOf(ground, group.from, group.from + group.period * group.times),
      heightPx: LABEL_PX * lines.length,
      number: group.times === 1 ? '' : `${group.times} ×`,
      lines,
    };
  });
  const lines = drafts.reduce((sum, draft) => sum + draft.lines.length, 0);
  return lines <= room ? drafts : null;
}

function lineOf(ground: LabelGround, layer: Layer): StackLabel['lines'][number] {
  return { name: steelName(ground.steels, layer.steel), figure: figureOf(ground.format, layer.thicknessMm) };
}

/** What of the layers from `from` to before `to` is on the sheet, and its middle, where its label belongs. */
function spanOf(ground: LabelGround, from: number, to: number): Pick<Draft, 'spanPx' | 'wantedPx'> {
  const { geometry, viewport, frame } = ground;
  const high = toPx(viewport, { acrossMm: 0, upMm: seamMm(geometry, to) }).yPx;
  const low = toPx(viewport, { acrossMm: 0, upMm: seamMm(geometry, from) }).yPx;
  const within = (px: number): number => Math.min(frame.heightPx, Math.max(0, px));
  return { spanPx: [within(high), within(low)], wantedPx: (within(high) + within(low)) / 2 };
}

function seenLayers(
  geometry: StackGeometry,
  viewport: Viewport,
  frame: StackFrame,
): readonly [number, number] {
  const lowMm = toMm(viewport, { xPx: 0, yPx: frame.heightPx }).upMm;
  const highMm = toMm(viewport, { xPx: 0, yPx: 0 }).upMm;
  const first = layerAt(geometry, Math.min(geometry.heightMm, Math.max(0, lowMm))) ?? 0;
  const last = layerAt(geometry, Math.min(geometry.heightMm, Math.max(0, highMm))) ?? geometry.count - 1;
  return [first, last];
}

/** Where neither all layers nor their groups find room: what is chosen, then the thickest. */
function loosest(ground: LabelGround, first: number, last: number, room: number): readonly number[] {
  const { geometry, chosen } = ground;
  const thickness = (place: number): number => seamMm(geometry, place + 1) - seamMm(geometry, place);
  const most = Math.floor(room / 2);
  return range(first, last)
    .sort((a, b) => Number(chosen.has(b)) - Number(chosen.has(a)) || thickness(b) - thickness(a) || a - b)
    .slice(0, most);
}

function range(first: number, last: number): number[] {
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
}
