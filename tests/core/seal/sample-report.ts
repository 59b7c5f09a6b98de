import type { Report } from '../../../core/report/model.ts';

const DIGEST = `sha256-${'0'.repeat(64)}`;
const PLACE = { file: 'run-force.yaml', line: 9 };

/** A small report in the shape of the schema; what it says is invented. */
export const SAMPLE_REPORT: Report = {
  antinode: 'report/1',
  core: '0.1.0',
  sheet: { number: 'TH3-C-104', title: 'Force on a run – Ω', units: 'us', digest: DIGEST, atmosphere: null },
  summary: {
    blocks: 2,
    passed: 1,
    failed: 0,
    holds: 0,
    governing: { path: 'sections/1/checks/1', label: 'Run 3', utilisation: 0.875 },
  },
  quantities: {
    F: {
      value: 533.75,
      unit: 'lbf',
      si: 2374.2382862,
      dimension: 'force',
      axes: [],
      label: 'Force',
      digest: DIGEST,
      printed: { number: '534', unit: 'lbf', tex: '534\\,\\mathrm{lbf}' },
      path: 'inputs/F',
    },
  },
  axes: [],
  checks: [
    {
      path: 'sections/1/checks/1',
      that: 'F <= 610 lbf',
      label: 'Run 3',
      status: 'pass',
      utilisation: 0.875,
      governing: {},
    },
  ],
  holds: [],
  sections: [
    {
      path: 'sections/1',
      title: 'Force',
      utilisation: 0.875,
      blocks: [
        {
          block: 'check',
          path: 'sections/1/checks/1',
          digest: DIGEST,
          label: 'Run 3',
          place: PLACE,
          that: 'F <= 610 lbf',
          formula: 'F \\le 610',
          substituted: '534 \\le 610',
          status: 'pass',
          utilisation: 0.875,
          standing: 'within',
          governing: {},
          uses: ['inputs/F'],
        },
      ],
    },
  ],
  sources: [],
  cautions: ['Results support the judgement of a licensed engineer.'],
  diagnostics: [],
};
