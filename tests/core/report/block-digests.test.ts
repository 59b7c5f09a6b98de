import { describe, expect, it } from 'vitest';
import { blockDigests, type BlockContent } from '../../../core/report/block-digests.ts';

const chain = (content: string): BlockContent[] => [
  { path: 'steps/F', content: 'dp*A', uses: ['steps/dp', 'inputs/A'] },
  { path: 'steps/dp', content: 'p*x', uses: ['inputs/p'] },
  { path: 'inputs/p', content, uses: [] },
  { path: 'inputs/A', content: '26 in^2', uses: [] },
];

describe('blockDigests', () => {
  it('gives every block a SHA-256 digest', () => {
    for (const digest of blockDigests(chain('905 psig')).values()) expect(digest).toMatch(/^sha256-[0-9a-f]{64}$/);
  });

  it('changes the digest of a block and of all that rests on it, and of nothing else', () => {
    const before = blockDigests(chain('905 psig'));
    const after = blockDigests(chain('906 psig'));
    const changed = [...before].filter(([path, digest]) => after.get(path) !== digest).map(([path]) => path);
    expect(changed.toSorted()).toEqual(['inputs/p', 'steps/F', 'steps/dp']);
  });

  it('does not depend on the order of blocks or of uses', () => {
    const turned = chain('905 psig')
      .toReversed()
      .map((block) => ({ ...block, uses: block.uses.toReversed() }));
    expect(new Map([...blockDigests(turned)].toSorted())).toEqual(
      new Map([...blockDigests(chain('905 psig'))].toSorted()),
    );
  });

  it('takes a chain of 50,000 blocks', () => {
    const long = Array.from({ length: 50_000 }, (_, i) => ({ path: `s${i}`, content: i, uses: [`s${i + 1}`] }));
    expect(blockDigests(long).size).toBe(50_000);
  });
});
