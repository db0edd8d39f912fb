import { expect, it } from 'vitest';
import { worstSearched } from '../../src/app/site/worstCases.ts';
import { worstWords } from '../../src/charts/notes/verdictWords.ts';
import type { WorstResult, WorstVerdict } from '../../src/sizing/index.ts';

const verdict = (key: string, stateId: string, rated: boolean): WorstVerdict => ({
  key,
  check: 'bank-current',
  title: 'bank current',
  subject: { kind: 'element', id: 'c1' },
  caseId: stateId,
  value: 1.94,
  limit: 1.3,
  unit: 'p.u.',
  margin: -0.49,
  verdict: 'fail',
  screening: false,
  working: [],
  source: { document: 'IEC 60831-1', provenance: 'second-hand' },
  remarks: [],
  governing: {
    stateId,
    stateName: 'Night shift, Bank C1 at 240 kvar',
    caseId: 'night',
    point: 'frequency +1 %',
    rated,
  },
});

const result: WorstResult = {
  verdicts: [verdict('a', 'night · C1', false), verdict('b', 'day', true)],
  states: 4,
  points: 40,
  bound: 0,
  unsolved: [],
};

it('a note tells the worst over states and tolerances with the state and the point that govern', () => {
  const worst = worstSearched(result, 'day').get('a');
  expect(worst && worstWords({ unit: 'p.u.' }, worst)).toMatch(
    /^Worst of all states and tolerances: 1\.94.*, fails, in Night shift, Bank C1 at 240 kvar; frequency \+1 %\.$/,
  );
});

it('and says so where the case on screen, as it stands, is that worst', () => {
  const worst = worstSearched(result, 'day').get('b');
  expect(worst && worstWords({ unit: 'p.u.' }, worst)).toBe(
    'No state and no tolerance searched is worse than this.',
  );
});
