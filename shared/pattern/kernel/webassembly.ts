/**
 * The part of WebAssembly that the kernel needs. The language library doesn't speak of it, as it belongs to the host;
 * every host of ours has it, and where one hasn't, `kernelOf` gives null.
 */
export interface WasmInstance {
  readonly exports: Readonly<Record<string, unknown>>;
}

export interface WasmMemory {
  readonly buffer: ArrayBuffer;
  grow(pages: number): number;
}

export interface Wasm {
  validate(bytes: Uint8Array): boolean;
  readonly Module: new (bytes: Uint8Array) => object;
  readonly Instance: new (module: object, imports: object) => WasmInstance;
}

declare const WebAssembly: Wasm | undefined;

/** The host's WebAssembly, if it has one. */
export function hostWasm(): Wasm | null {
  return typeof WebAssembly === 'undefined' ? null : WebAssembly;
}
