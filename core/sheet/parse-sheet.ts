import { isMap, isScalar, isSeq, parseDocument, type Node, type Pair, type YAMLMap } from 'yaml';
import { error, type Diagnosed } from '../diagnostics/diagnostic.ts';
import type { SheetDocument, Text } from './document.ts';
export function parseSheet(file: string, text: string): Diagnosed<SheetDocument> {
  const doc = parseDocument(text);
  if (doc.errors.length) return { diagnostics: doc.errors.map((e) => error('YAML_SYNTAX', { file, start: e.pos[0], end: e.pos[1] }, e.message)) };
  const T = (n: unknown): Text => {
    if (!isScalar(n)) throw new Error('scalar');
    const r = n.range!; const q = n.type?.startsWith('QUOTE') ? 1 : 0;
    return { text: q || n.type?.startsWith('BLOCK') ? String(n.value) : (n.source ?? String(n.value)), span: { file, start: r[0] + q, end: r[1] - q } };
  };
  const get = (m: Node | undefined | null, k: string): Node | undefined => (isMap(m) ? ((m as YAMLMap).get(k, true) as Node | undefined) : undefined);
  const pairs = (m: Node | undefined | null): Pair<Node, Node>[] => (isMap(m) ? ((m as YAMLMap).items as Pair<Node, Node>[]) : []);
  const items = (m: Node | undefined | null): Node[] => (isSeq(m) ? (m.items as Node[]) : []);
  const opt = (m: Node | null | undefined, k: string): Record<string, Text> => { const n = get(m, k); return n ? { [k]: T(n) } : {}; };
  const ann = (m: Node | null | undefined) => ({ ...opt(m, 'label'), ...opt(m, 'symbol'), ...opt(m, 'note'), ...opt(m, 'source') });
  const root = doc.contents as Node;
  return { diagnostics: [], value: {
    file, number: T(get(root, 'number')), title: T(get(root, 'title')), units: T(get(root, 'units')).text as 'us', ...opt(root, 'atmosphere'),
    sources: pairs(get(root, 'sources')).map((p) => ({ id: T(p.key), text: T(p.value) })),
    assumptions: items(get(root, 'assumptions')).map(T),
    gases: pairs(get(root, 'gases')).map((p) => ({ name: T(p.key), ...opt(p.value, 'method'), ...opt(p.value, 'source'), fractions: pairs(get(p.value, 'fractions')).map((q) => ({ component: T(q.key), amount: T(q.value) })) })),
    inputs: pairs(get(root, 'inputs')).map((p) => isScalar(p.value) ? ({ name: T(p.key), value: T(p.value) }) : ({ name: T(p.key), value: T(get(p.value, 'value')), ...opt(p.value, 'hold'), ...ann(p.value) })),
    sections: items(get(root, 'sections')).map((s) => ({ title: T(get(s, 'title')), ...opt(s, 'text'),
      steps: pairs(get(s, 'steps')).map((p) => isScalar(p.value) ? ({ name: T(p.key), calc: T(p.value) }) : ({ name: T(p.key), calc: T(get(p.value, 'calc')), ...opt(p.value, 'unit'), ...ann(p.value) })),
      checks: items(get(s, 'checks')).map((c) => ({ that: T(get(c, 'that')), ...ann(c) })) })),
  } as unknown as SheetDocument };
}
