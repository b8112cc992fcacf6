import Konva from 'konva/lib/Core';

/** Draws on the sheet in CSS pixels. Nothing it needs to know lies in the sheet. */
export type Paint = (context: CanvasRenderingContext2D, pixelRatio: number) => void;

/** Part of a drawing. It is painted anew when `paint` is another function than before, and only then. */
export interface Drawing {
  readonly id: string;
  /** What seldom changes, or what follows the pointer: each has its own canvas. */
  readonly on: 'base' | 'over';
  readonly paint: Paint;
}

/**
 * Sheets of paper that lie on each other: a projection of drawings onto Konva, which holds no state of ours. Nodes are
 * kept by the id of their drawing, and what leaves is destroyed. Konva is not asked what was hit: that is arithmetic.
 */
export class Sheet {
  readonly #stage: Konva.Stage;
  readonly #layers: Readonly<Record<Drawing['on'], Konva.Layer>>;
  readonly #shapes = new Map<string, { shape: Konva.Shape; drawing: Drawing }>();

  constructor(container: HTMLDivElement) {
    this.#stage = new Konva.Stage({ container, width: 1, height: 1, listening: false });
    this.#layers = {
      base: new Konva.Layer({ listening: false }),
      over: new Konva.Layer({ listening: false }),
    };
    this.#stage.add(this.#layers.base, this.#layers.over);
  }

  /** Puts these drawings on the sheet, in this order, and nothing else. */
  render(widthPx: number, heightPx: number, pixelRatio: number, drawings: readonly Drawing[]): void {
    const isResized = this.#resize(Math.max(1, widthPx), Math.max(1, heightPx), pixelRatio);
    const stale = new Set<Drawing['on']>(isResized ? ['base', 'over'] : []);
    const kept = new Set(drawings.map((drawing) => drawing.id));
    for (const [id, { shape, drawing }] of this.#shapes) {
      if (kept.has(id)) continue;
      shape.destroy();
      this.#shapes.delete(id);
      stale.add(drawing.on);
    }
    for (const drawing of drawings) {
      const known = this.#shapes.get(drawing.id);
      if (known?.drawing.paint === drawing.paint && known.drawing.on === drawing.on) continue;
      const shape = known?.drawing.on === drawing.on ? known.shape : this.#added(drawing, known?.shape);
      shape.sceneFunc((context) => drawing.paint(context._context, context.getCanvas().getPixelRatio()));
      this.#shapes.set(drawing.id, { shape, drawing });
      stale.add(drawing.on);
    }
    for (const on of stale) this.#layers[on].draw();
  }

  /** What is on the sheet as one picture. */
  toCanvas(pixelRatio: number): HTMLCanvasElement {
    return this.#stage.toCanvas({ pixelRatio });
  }

  /** Gives back the canvases and their memory. */
  destroy(): void {
    this.#shapes.clear();
    this.#stage.destroy();
  }

  #added(drawing: Drawing, before: Konva.Shape | undefined): Konva.Shape {
    before?.destroy();
    const shape = new Konva.Shape({ listening: false });
    this.#layers[drawing.on].add(shape);
    return shape;
  }

  #resize(widthPx: number, heightPx: number, pixelRatio: number): boolean {
    let isResized = false;
    for (const layer of Object.values(this.#layers)) {
      if (layer.getCanvas().getPixelRatio() === pixelRatio) continue;
      layer.getCanvas().setPixelRatio(pixelRatio);
      isResized = true;
    }
    if (this.#stage.width() !== widthPx || this.#stage.height() !== heightPx) {
      this.#stage.size({ width: widthPx, height: heightPx });
      isResized = true;
    }
    return isResized;
  }
}
