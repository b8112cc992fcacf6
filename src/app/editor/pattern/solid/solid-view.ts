import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type ElementRef,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatSliderModule } from '@angular/material/slider';
import type { Format } from '@shared/units';
import type { Subscription } from 'rxjs';
import { ComputeClient } from '../../../core/compute/compute-client';
import { elementSize } from '../element-size';
import { type PictureSource, orderOf } from '../picture-source';
import type { BarSize } from '../views';
import { type Skin, barSkins, bladeSkins, mostGroundMm, texturePx } from './meshes';
import { SolidScene, type Standpoint } from './solid-scene';
import { standpointText } from './solid-text';

/** Long side of the pictures on a solid, px. */
const TEXTURE_PX = 2048;
/** Samples at the borders of layers: the graphics card softens the rest. */
const TEXTURE_SAMPLES = 4;
const KEY_TURN_DEG = 10;

let instances = 0;

/** The bar with its pictures on all faces, or the blade, to be turned with pointer, fingers or keys. */
@Component({
  selector: 'lw-solid-view',
  imports: [MatIconButton, MatSliderModule],
  templateUrl: './solid-view.html',
  styleUrl: './solid-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SolidView {
  /** Which bar, when, and in what look; what of it is seen plays no part, but for blade or bar. */
  readonly source = input.required<PictureSource>();
  readonly bar = input.required<BarSize>();
  readonly format = input.required<Format>();
  /** Whose solid it is: "Billet after Draw out". */
  readonly text = input.required<string>();

  protected readonly id = `lw-solid-${instances++}`;
  protected readonly step = 1.25;
  private readonly client = inject(ComputeClient);
  private readonly sheet = viewChild.required<ElementRef<HTMLDivElement>>('sheet');
  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly size = elementSize(this.sheet);
  private readonly scene = signal<SolidScene | null>(null);
  protected readonly trouble = signal<string | null>(null);
  private readonly standpoint = signal<Standpoint | null>(null);
  protected readonly announcement = signal('');

  private readonly blank = computed(() =>
    this.source().view.surface.kind === 'blade' ? this.source().design.blank : undefined,
  );
  /** Null for the blade: its grind is its own. */
  protected readonly mostMm = computed(() => (this.blank() ? null : mostGroundMm(this.bar())));
  protected readonly groundMm = linkedSignal<number | null, number>({
    source: this.mostMm,
    computation: (most, before) => Math.min(most ?? 0, before?.value ?? 0),
  });
  private readonly skins = computed<readonly Skin[]>(() => {
    const blank = this.blank();
    return blank ? bladeSkins(blank, this.bar()) : barSkins(this.bar(), this.groundMm());
  });
  protected readonly label = computed(() => {
    const { lengthMm, widthMm, thicknessMm } = this.blank() ?? this.bar();
    const what = this.blank() ? `Blade from ${this.text()}` : this.text();
    const from = this.standpoint();
    const size = this.format().size([lengthMm, widthMm, thicknessMm]);
    return `${what}, ${size}, as a solid${from ? `, seen ${standpointText(from)}` : ''}`;
  });

  constructor() {
    const destroyRef = inject(DestroyRef);
    afterNextRender(() => {
      try {
        this.scene.set(
          new SolidScene(this.canvas().nativeElement, (standpoint) => this.standpoint.set(standpoint)),
        );
      } catch {
        this.trouble.set('This browser can’t draw solids. The flat pictures work without.');
      }
    });
    destroyRef.onDestroy(() => untracked(this.scene)?.dispose());

    effect(() => {
      const { widthPx, heightPx, pixelRatio } = this.size();
      this.scene()?.resize(widthPx, heightPx, pixelRatio);
    });
    effect(() => {
      const scene = this.scene();
      const size = this.blank() ?? this.bar();
      const skins = this.skins();
      untracked(() => scene?.setSkins(skins, size));
    });
    effect((onCleanup) => {
      const scene = this.scene();
      if (scene === null) return;
      const subscriptions = this.pictures(scene);
      onCleanup(() => {
        for (const subscription of subscriptions) subscription.unsubscribe();
      });
    });
  }

  protected turn(rightDeg: number, upDeg: number): void {
    this.scene()?.turn(rightDeg, upDeg);
    this.announce();
  }

  protected approach(factor: number): void {
    this.scene()?.approach(factor);
  }

  protected reset(): void {
    this.scene()?.reset();
    this.announce();
  }

  protected keyed(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    switch (event.key) {
      case 'ArrowLeft':
        this.turn(-KEY_TURN_DEG, 0);
        break;
      case 'ArrowRight':
        this.turn(KEY_TURN_DEG, 0);
        break;
      case 'ArrowUp':
        this.turn(0, KEY_TURN_DEG);
        break;
      case 'ArrowDown':
        this.turn(0, -KEY_TURN_DEG);
        break;
      case '+':
      case '=':
        this.approach(this.step);
        break;
      case '-':
      case '_':
        this.approach(1 / this.step);
        break;
      case '0':
        this.reset();
        break;
      default:
        return;
    }
    event.preventDefault();
  }

  /** Has every skin pictured; what is not wanted any more is stopped by unsubscribing. */
  private pictures(scene: SolidScene): readonly Subscription[] {
    const order = orderOf(this.source());
    const skins = this.skins();
    const longestMm = Math.max(...skins.map(({ widthMm, heightMm }) => Math.max(widthMm, heightMm)));
    return skins.flatMap((skin) => {
      const { name, surface, window } = skin;
      if (surface === null) return [];
      const size = texturePx(skin, TEXTURE_PX, longestMm);
      return untracked(() =>
        this.client
          .picture({
            ...order,
            ...size,
            surface,
            window,
            samples: TEXTURE_SAMPLES,
            lane: `${this.id}/${name}`,
            rank: 1,
          })
          .subscribe({
            next: (part) => {
              this.trouble.set(null);
              scene.setPicture(name, part);
            },
            error: () => this.trouble.set('The pictures on the solid could not be made.'),
          }),
      );
    });
  }

  private announce(): void {
    const from = this.standpoint();
    if (from) this.announcement.set(`Seen ${standpointText(from)}`);
  }
}
