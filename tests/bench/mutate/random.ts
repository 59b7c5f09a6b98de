/** A small generator with 32 bits of state (mulberry32): the same numbers on every machine from the same start. */
export class Random {
  private state: number;

  constructor(start: number) {
    this.state = start | 0;
  }

  /** From 0 up to, not including, 1. */
  next(): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), this.state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 0x1_0000_0000;
  }

  /** A whole number from 0 up to, not including, `count`; 0 where there is nothing to choose from. */
  below(count: number): number {
    return Math.floor(this.next() * count);
  }

  chance(probability: number): boolean {
    return this.next() < probability;
  }

  pick<T>(list: readonly T[]): T {
    if (list.length === 0) throw new Error('nothing to pick from');
    return list[this.below(list.length)] as T;
  }

  /** One of the list, the small numbers beside each saying how often. */
  weighted<T>(list: readonly (readonly [weight: number, item: T])[]): T {
    let left = this.next() * list.reduce((sum, [weight]) => sum + weight, 0);
    for (const [weight, item] of list) {
      left -= weight;
      if (left < 0) return item;
    }
    return this.pick(list)[1];
  }
}

/** The generator of one case of a run: no case depends on how many others ran before it. */
export function randomOf(seed: number, index: number): Random {
  let mixed = (seed ^ Math.imul(index + 1, 0x9e3779b1)) | 0;
  mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return new Random(mixed ^ (mixed >>> 16));
}
