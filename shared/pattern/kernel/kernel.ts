import type { Program } from '../program/program.js';
import type { Tracer } from '../tracer.js';
import { bytesOfBase64 } from './base64.js';
import { KERNEL_BASE64 } from './kernel.generated.js';
import { kernelTables, layOut } from './memory.js';
import { type WasmMemory, hostWasm } from './webassembly.js';

/** The kernel, compiled for this host; make it once and keep it. */
export interface Kernel {
  readonly module: object;
}

/** Numbers in single precision, four at a time, or in double, two at a time. */
export type Precision = 'f32' | 'f64';

/** Points in a batch: their coordinates stay in the first-level cache. */
const CAPACITY: Readonly<Record<Precision, number>> = { f32: 2048, f64: 1024 };

/** What the kernel exports; see `assembly/index.ts`. */
interface KernelExports {
  readonly memory: WasmMemory;
  prepare(header: number): void;
  memoryFrom(): number;
  runSingle(segment: number, count: number, skip: number): number;
  runDouble(segment: number, count: number, skip: number): number;
  beginSingle(segment: number, count: number, toOp: number, fromOp: number): number;
  beginDouble(segment: number, count: number, toOp: number, fromOp: number): number;
}

/** The kernel, or null where WebAssembly or its vector instructions are missing. Takes a few milliseconds. */
export function kernelOf(): Kernel | null {
  const wasm = hostWasm();
  if (wasm === null) return null;
  const bytes = bytesOfBase64(KERNEL_BASE64);
  return wasm.validate(bytes) ? { module: new wasm.Module(bytes) } : null;
}

/**
 * A tracer on the kernel, with memory of its own.
 * @param capacity points in a batch
 */
export function kernelTracer(
  kernel: Kernel,
  program: Program,
  precision: Precision,
  capacity = CAPACITY[precision],
): Tracer {
  const wasm = hostWasm();
  if (wasm === null) throw new RangeError('kernelTracer: this host has no WebAssembly');
  const exports = new wasm.Instance(kernel.module, {}).exports as unknown as KernelExports;
  const isDouble = precision === 'f64';
  const tables = kernelTables(program);
  const numberBytes = isDouble ? 8 : 4;
  const { addresses, headerAt, pages } = layOut(tables, exports.memoryFrom(), capacity, numberBytes);
  const missing = pages - exports.memory.buffer.byteLength / 65_536;
  if (missing > 0) exports.memory.grow(missing);
  const { buffer } = exports.memory;
  const parts = [
    tables.code,
    tables.params,
    tables.segments,
    tables.pieces,
    tables.groups,
    tables.layerTopMm,
    tables.layerCells,
    tables.cellsPerMm,
  ];
  parts.forEach((part, i) => {
    const bytes = new Uint8Array(part.buffer, part.byteOffset, part.byteLength);
    new Uint8Array(buffer, addresses[i], part.byteLength).set(bytes);
  });
  new Uint32Array(buffer, headerAt, addresses.length).set(addresses);
  exports.prepare(headerAt);
  const coordinates = (which: 8 | 9 | 10): Float32Array | Float64Array => {
    const at = addresses[which] as number;
    return isDouble ? new Float64Array(buffer, at, capacity) : new Float32Array(buffer, at, capacity);
  };
  const entry = program.entry;
  return {
    program,
    engine: isDouble ? 'kernel-f64' : 'kernel-f32',
    capacity,
    x: coordinates(8),
    y: coordinates(9),
    z: coordinates(10),
    layer: new Uint16Array(buffer, addresses[11], capacity),
    run: (count, fromOp = 0) =>
      isDouble ? exports.runDouble(entry, count, fromOp) : exports.runSingle(entry, count, fromOp),
    begin: (count, toOp, fromOp = 0) =>
      isDouble
        ? exports.beginDouble(entry, count, toOp, fromOp)
        : exports.beginSingle(entry, count, toOp, fromOp),
  };
}
