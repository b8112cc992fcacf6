import {
  AmbientLight,
  BufferAttribute,
  BufferGeometry,
  CanvasTexture,
  Color,
  DirectionalLight,
  Mesh,
  MeshStandardMaterial,
  PerspectiveCamera,
  SRGBColorSpace,
  Scene,
  Spherical,
  Vector3,
  WebGLRenderer,
} from 'three';
import { OrbitControls } from 'three/addons/controls/OrbitControls.js';
import type { PicturePart } from '../../../core/compute/messages';
import type { Skin } from './meshes';

/** From where a solid is seen. */
export interface Standpoint {
  /** To the right of its left side, degrees: 0 looks at the left side, 90 at the far end. */
  readonly aroundDeg: number;
  /** Over its middle plane, degrees: 90 from straight above, −90 from below. */
  readonly aboveDeg: number;
}

const START: Standpoint = { aroundDeg: -28, aboveDeg: 42 };
/** Grey of what is not pictured: ground steel. */
const BARE = 0x8d9095;
const FIELD_DEG = 30;
/** How much of its length a bar shows upward at first: it lies askew. */
const HALF_TILT = Math.sin((28 * Math.PI) / 180) * Math.sin((42 * Math.PI) / 180);

/** Size of a solid, mm. */
export interface SolidSize {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
}

/** A solid on a canvas, to be turned. Draws only when something changed. */
export class SolidScene {
  private readonly renderer: WebGLRenderer;
  private readonly scene = new Scene();
  private readonly camera = new PerspectiveCamera(FIELD_DEG, 1, 1, 20_000);
  private readonly controls: OrbitControls;
  private readonly light = new DirectionalLight(0xffffff, 1.5);
  private readonly meshes = new Map<string, Mesh<BufferGeometry, MeshStandardMaterial>>();
  private frame = 0;
  private size: SolidSize = { lengthMm: 100, widthMm: 100, thicknessMm: 100 };
  /** Whether nobody has turned it yet: then it stays fitted. */
  private isAsAtFirst = true;

  /**
   * @param turned called after each turn, by whatever means
   * @throws Error where there is no WebGL
   */
  constructor(
    canvas: HTMLCanvasElement,
    private readonly turned: (from: Standpoint) => void,
  ) {
    this.renderer = new WebGLRenderer({ canvas, antialias: true, alpha: true, powerPreference: 'low-power' });
    // The pictures are lit already: the light here only tells the faces apart.
    this.scene.add(new AmbientLight(0xffffff, 2.1), this.light);
    this.camera.up.set(0, 0, 1);
    this.controls = new OrbitControls(this.camera, canvas);
    this.controls.enablePan = false;
    this.controls.enableDamping = false;
    this.controls.addEventListener('start', () => (this.isAsAtFirst = false));
    this.controls.addEventListener('change', () => this.moved());
    // The page scrolls with one finger; two turn and pinch.
    canvas.style.touchAction = 'pan-y';
  }

  /** Other skins in place of those there are; the standpoint stays, unless the size is another altogether. */
  setSkins(skins: readonly Skin[], size: SolidSize): void {
    for (const [name, mesh] of this.meshes) {
      if (!skins.some((skin) => skin.name === name)) this.removeMesh(name, mesh);
    }
    for (const skin of skins) this.setSkin(skin);
    const ratio = size.lengthMm / this.size.lengthMm;
    this.size = size;
    const reachMm = Math.hypot(size.lengthMm, size.widthMm, size.thicknessMm);
    this.controls.minDistance = 0.08 * reachMm;
    this.controls.maxDistance = 6 * reachMm;
    if (this.isAsAtFirst || ratio > 1.2 || ratio < 1 / 1.2) this.reset();
    this.draw();
  }

  setPicture(name: string, { pixels, widthPx, heightPx }: PicturePart): void {
    const mesh = this.meshes.get(name);
    if (!mesh) return;
    const canvas = document.createElement('canvas');
    canvas.width = widthPx;
    canvas.height = heightPx;
    canvas.getContext('2d')?.putImageData(new ImageData(pixels, widthPx, heightPx), 0, 0);
    const texture = new CanvasTexture(canvas);
    texture.colorSpace = SRGBColorSpace;
    texture.anisotropy = Math.min(8, this.renderer.capabilities.getMaxAnisotropy());
    mesh.material.map?.dispose();
    mesh.material.map = texture;
    mesh.material.color.set(0xffffff);
    mesh.material.needsUpdate = true;
    this.draw();
  }

  resize(widthPx: number, heightPx: number, pixelRatio: number): void {
    if (widthPx === 0 || heightPx === 0) return;
    this.renderer.setPixelRatio(Math.min(2, pixelRatio));
    this.renderer.setSize(widthPx, heightPx, false);
    this.camera.aspect = widthPx / heightPx;
    this.camera.updateProjectionMatrix();
    if (this.isAsAtFirst) this.reset();
    this.draw();
  }

  /** Turns by so many degrees: to the right, and up. */
  turn(rightDeg: number, upDeg: number): void {
    this.isAsAtFirst = false;
    const { aroundDeg, aboveDeg } = this.standpoint();
    this.stand({ aroundDeg: aroundDeg + rightDeg, aboveDeg: aboveDeg + upDeg }, this.distanceMm());
  }

  approach(factor: number): void {
    this.isAsAtFirst = false;
    this.stand(this.standpoint(), this.distanceMm() / factor);
  }

  reset(): void {
    // So near that it fits when it is turned broadside, the corner that comes nearest too.
    const { lengthMm, widthMm, thicknessMm } = this.size;
    const halfUp = Math.tan((FIELD_DEG * Math.PI) / 360);
    const halfAcross = halfUp * this.camera.aspect;
    const highMm = Math.hypot(widthMm, thicknessMm) + 0.5 * lengthMm * HALF_TILT;
    const distanceMm = Math.max(lengthMm / halfAcross, highMm / halfUp) / 2;
    this.stand(START, 1.08 * distanceMm + widthMm / 2);
    this.isAsAtFirst = true;
  }

  dispose(): void {
    cancelAnimationFrame(this.frame);
    this.controls.dispose();
    for (const [name, mesh] of this.meshes) this.removeMesh(name, mesh);
    this.light.dispose();
    this.renderer.dispose();
    this.renderer.forceContextLoss();
  }

  private setSkin(skin: Skin): void {
    const geometry = new BufferGeometry();
    geometry.setAttribute('position', new BufferAttribute(skin.positions, 3));
    geometry.setAttribute('uv', new BufferAttribute(skin.uvs, 2));
    geometry.setIndex(new BufferAttribute(skin.indices, 1));
    geometry.computeVertexNormals();
    const known = this.meshes.get(skin.name);
    if (known) {
      known.geometry.dispose();
      known.geometry = geometry;
      return;
    }
    const material = new MeshStandardMaterial({ color: new Color(BARE), metalness: 0, roughness: 0.55 });
    // The picture of a blade is empty beside it.
    if (skin.surface?.kind === 'blade') material.alphaTest = 0.5;
    const mesh = new Mesh(geometry, material);
    this.meshes.set(skin.name, mesh);
    this.scene.add(mesh);
  }

  private removeMesh(name: string, mesh: Mesh<BufferGeometry, MeshStandardMaterial>): void {
    this.scene.remove(mesh);
    mesh.geometry.dispose();
    mesh.material.map?.dispose();
    mesh.material.dispose();
    this.meshes.delete(name);
  }

  private distanceMm(): number {
    return this.camera.position.length();
  }

  private standpoint(): Standpoint {
    const { x, y, z } = this.camera.position;
    const distance = Math.max(1e-9, Math.hypot(x, y, z));
    return {
      aroundDeg: (Math.atan2(x, -y) * 180) / Math.PI,
      aboveDeg: (Math.asin(z / distance) * 180) / Math.PI,
    };
  }

  private stand({ aroundDeg, aboveDeg }: Standpoint, distanceMm: number): void {
    const { minDistance, maxDistance } = this.controls;
    const radius = Math.min(maxDistance, Math.max(minDistance, distanceMm));
    const polar = ((90 - Math.min(89.5, Math.max(-89.5, aboveDeg))) * Math.PI) / 180;
    // Three.js measures about the y axis; here z is up.
    const turned = new Vector3().setFromSpherical(new Spherical(radius, polar, (aroundDeg * Math.PI) / 180));
    this.camera.position.set(turned.x, -turned.z, turned.y);
    this.camera.lookAt(0, 0, 0);
    this.controls.update();
    this.moved();
  }

  private moved(): void {
    // The light comes with whoever looks, from over the left shoulder.
    const { x, y, z } = this.camera.position;
    const side = new Vector3(1, 0, 0)
      .applyQuaternion(this.camera.quaternion)
      .multiplyScalar(-0.6 * this.distanceMm());
    this.light.position.set(x + side.x, y + side.y, z + side.z + 0.6 * this.distanceMm());
    this.turned(this.standpoint());
    this.draw();
  }

  private draw(): void {
    if (this.frame !== 0) return;
    this.frame = requestAnimationFrame(() => {
      this.frame = 0;
      this.renderer.render(this.scene, this.camera);
    });
  }
}
