import type { Stretch } from './block-loops.ts';

/** Cases that are computed side by side: few enough that their columns stay near the processor. */
export const BLOCK = 512;

/** Values per piece of memory that is asked for at once. */
const CHUNK = 1 << 16;

/**
 * Memory for the values of one evaluation: columns are cut from few large pieces, and the registers of all kernels are
 * the same. Thousands of small arrays would cost more time to make and to clear away than their values take to compute.
 */
export class Arena {
  private readonly chunks: Float64Array[] = [];
  private at = 0;
  private used = 0;
  private readonly registers: Float64Array[] = [];

  /** A column that nothing else uses, with whatever its memory held. */
  column(length: number): Float64Array {
    for (let chunk = this.chunks[this.at]; chunk !== undefined; chunk = this.chunks[this.at]) {
      if (length <= chunk.length - this.used) {
        this.used += length;
        return chunk.subarray(this.used - length, this.used);
      }
      this.at += 1;
      this.used = 0;
    }
    const made = new Float64Array(Math.max(length, CHUNK));
    this.chunks.push(made);
    this.used = length;
    return made.subarray(0, length);
  }

  /** Gives all columns up: what is computed next takes their memory. */
  clear(): void {
    this.at = 0;
    this.used = 0;
  }

  /** The register of that number, with what a former kernel has left in it. */
  register(index: number): Float64Array {
    const known = this.registers[index];
    if (known !== undefined) return known;
    const made = new Float64Array(BLOCK);
    this.registers[index] = made;
    return made;
  }
}

/** A stretch that is moved along from block to block. */
export type Moving = { -readonly [K in keyof Stretch]: Stretch[K] };
