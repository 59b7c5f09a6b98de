/** What depends on what: for each name, the names it reads. */
export type Dependencies = ReadonlyMap<string, ReadonlySet<string>>;

export interface Order {
  /** Names in an order in which each comes after all it reads. Names in a circle, or behind one, are left out. */
  readonly names: readonly string[];
  /** Each circle once, as the names along it; the last reads the first. */
  readonly circles: readonly (readonly string[])[];
}

type Progress = 'open' | 'done' | 'stuck';

/**
 * Puts names into the order in which they can be evaluated. The order does not depend on the order of the text
 * beyond ties, and the walk keeps its own stack, so that a chain of any length is safe.
 */
export function orderByDependence(dependencies: Dependencies): Order {
  const progress = new Map<string, Progress>();
  const names: string[] = [];
  const circles: string[][] = [];
  for (const start of dependencies.keys()) {
    if (!progress.has(start)) walk(start, dependencies, progress, names, circles);
  }
  return { names, circles };
}

interface Frame {
  readonly name: string;
  readonly reads: readonly string[];
  next: number;
  stuck: boolean;
}

function walk(
  start: string,
  dependencies: Dependencies,
  progress: Map<string, Progress>,
  names: string[],
  circles: string[][],
): void {
  const stack: Frame[] = [frame(start, dependencies)];
  progress.set(start, 'open');
  for (let top = stack.at(-1); top !== undefined; top = stack.at(-1)) {
    const read = top.reads[top.next];
    if (read === undefined) {
      stack.pop();
      progress.set(top.name, top.stuck ? 'stuck' : 'done');
      if (!top.stuck) names.push(top.name);
      else markStuck(stack.at(-1));
      continue;
    }
    top.next += 1;
    const state = progress.get(read);
    if (state === 'open') {
      circles.push(circleFrom(stack, read));
      top.stuck = true;
    } else if (state === 'stuck') {
      top.stuck = true;
    } else if (state === undefined) {
      progress.set(read, 'open');
      stack.push(frame(read, dependencies));
    }
  }
}

function frame(name: string, dependencies: Dependencies): Frame {
  const reads = [...(dependencies.get(name) ?? [])].filter((read) => dependencies.has(read));
  return { name, reads, next: 0, stuck: false };
}

function markStuck(below: Frame | undefined): void {
  if (below !== undefined) below.stuck = true;
}

function circleFrom(stack: readonly Frame[], name: string): string[] {
  const start = stack.findIndex((entry) => entry.name === name);
  return stack.slice(start).map((entry) => entry.name);
}
