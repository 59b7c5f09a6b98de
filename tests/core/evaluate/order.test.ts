import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orderByDependence } from '../../../core/evaluate/order.ts';

function dependencies(graph: Record<string, string[]>): Map<string, Set<string>> {
  return new Map(Object.entries(graph).map(([name, reads]) => [name, new Set(reads)]));
}

describe('orderByDependence', () => {
  it('puts each name after all it reads, whatever the order of the text', () => {
    const order = orderByDependence(dependencies({ F: ['dp', 'A'], A: ['D'], dp: ['p'], D: [], p: [] }));
    expect(order.circles).toEqual([]);
    expect(order.names).toEqual(['p', 'dp', 'D', 'A', 'F']);
  });

  it('reports a circle of three once, along its way, and leaves out what stands behind it', () => {
    const order = orderByDependence(dependencies({ a: ['b'], b: ['c'], c: ['a'], behind: ['a'], free: [] }));
    expect(order.circles).toEqual([['a', 'b', 'c']]);
    expect(order.names).toEqual(['free']);
  });

  it('reports a name that reads itself', () => {
    expect(orderByDependence(dependencies({ a: ['a'] })).circles).toEqual([['a']]);
  });

  it('takes a chain of 100,000 names', () => {
    const chain = new Map(Array.from({ length: 100_000 }, (_, i) => [`n${i}`, new Set([`n${i + 1}`])] as const));
    expect(orderByDependence(chain).names).toHaveLength(100_000);
  });

  it('orders any graph without circles', () => {
    const edges = fc.array(fc.tuple(fc.nat(30), fc.nat(30)), { maxLength: 120 });
    fc.assert(
      fc.property(edges, (pairs) => {
        const graph = new Map(Array.from({ length: 31 }, (_, i) => [`n${i}`, new Set<string>()] as const));
        for (const [a, b] of pairs) if (a !== b) graph.get(`n${Math.max(a, b)}`)?.add(`n${Math.min(a, b)}`);
        const { names, circles } = orderByDependence(graph);
        expect(circles).toEqual([]);
        expect(names).toHaveLength(31);
        for (const [name, reads] of graph) {
          for (const read of reads) expect(names.indexOf(read)).toBeLessThan(names.indexOf(name));
        }
      }),
    );
  });
});
