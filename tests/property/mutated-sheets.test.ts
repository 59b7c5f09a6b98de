import { expect, it } from 'vitest';
import { examine } from '../bench/fuzz-check.ts';
import { readCorpus } from '../bench/mutate/corpus.ts';
import { mutatedRequest } from '../bench/mutate/mutated-request.ts';

const SHEETS = 3000;
const SEED = 618;

/** A small part of what `npm run bench -- fuzz` does at length; time is measured there, and not here. */
it('a mutated sheet gives a report of finite numbers, or faults that stand in its text', () => {
  const corpus = readCorpus();
  const faulty = Array.from({ length: SHEETS }, (_, index) => {
    const { faults } = examine(mutatedRequest(corpus, SEED, index));
    return faults.map((fault) => `case ${index} of seed ${SEED}: ${fault}`);
  });
  expect(faulty.flat()).toEqual([]);
}, 60_000);
