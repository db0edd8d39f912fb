import { describe, expect, it } from 'vitest';
import {
  defaultFamilies,
  MOST_STATES,
  type StateFamilies,
  statesOf,
  studyInState,
} from '../../../src/sizing/index.ts';
import type { Bank, Study, StudyElement } from '../../../src/study/index.ts';
import { checkStudy, studyInCase } from '../../../src/study/index.ts';
import { studyOf } from '../../engine/study.ts';

const none: StateFamilies = { ...defaultFamilies, steps: false };

const transformer = (id: string, to: string): StudyElement => ({
  id,
  kind: 'transformer',
  from: 'mv',
  to,
  ratedKVA: 1000,
  hvV: 20000,
  lvV: 400,
  ukPercent: 6,
  loadLossKW: 9,
  vectorGroup: 'Dyn11',
});

const bank = (id: string, bus: string, kvar: readonly number[], on = kvar.length): Bank => ({
  id,
  name: id.toUpperCase(),
  kind: 'bank',
  bus,
  ratedV: 440,
  steps: kvar.map((step, k) => ({ kvar: step, on: k < on })),
});

/** Two transformers on two boards with a coupler between, open; a bank on each; a standby generator. */
function site(more: Partial<Study> = {}, banks: Bank[] = [bank('c1', 'lv1', [50, 50, 50])]): Study {
  return studyOf(
    [
      { id: 'mv', nominalV: 20000 },
      { id: 'lv1', nominalV: 400 },
      { id: 'lv2', nominalV: 400 },
    ],
    [
      { id: 'grid', kind: 'supply', bus: 'mv', shortCircuitMVA: 250, shortCircuitMVAMin: 100, xOverR: 10 },
      transformer('t1', 'lv1'),
      transformer('t2', 'lv2'),
      { id: 'q1', name: 'Q1', kind: 'coupler', from: 'lv1', to: 'lv2', on: false },
      { id: 'g1', kind: 'generator', bus: 'lv1', ratedKVA: 400, xdSubtransientPercent: 12, on: false },
      { id: 'load', kind: 'load', bus: 'lv2', kW: 200, powerFactor: 0.9 },
      ...banks,
    ],
    more,
  );
}

const kvarOf = (study: Study, id: string, state: string): number => {
  const found = studyInCase(study, state).elements.find((part) => part.id === id);
  return found?.kind === 'bank'
    ? found.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0)
    : -1;
};

describe('step combinations', () => {
  it('like steps by distinct kvar, off included, the case itself first and under its own id', () => {
    const study = site();
    const { states, count } = statesOf(study, defaultFamilies);
    expect(count).toBe(4);
    expect(states?.map(({ name }) => name)).toEqual([
      'Base',
      'Base, C1 off',
      'Base, C1 at 50 kvar',
      'Base, C1 at 100 kvar',
    ]);
    expect(states?.[0]?.id).toBe('base');
    const found = (states ?? []).map((state) => kvarOf(studyInState(study, state), 'c1', state.id));
    expect(found).toEqual([150, 0, 50, 100]);
  });

  it('unlike steps by every distinct sum, each made of the bank’s own steps', () => {
    const study = site({}, [bank('c1', 'lv1', [12.5, 25, 50, 50])]);
    const states = statesOf(study, defaultFamilies).states ?? [];
    const sums = states
      .map((state) => kvarOf(studyInState(study, state), 'c1', state.id))
      .sort((a, b) => a - b);
    expect(sums).toEqual([0, 12.5, 25, 37.5, 50, 62.5, 75, 87.5, 100, 112.5, 125, 137.5]);
  });

  it('every combination of several banks', () => {
    const study = site({}, [bank('c1', 'lv1', [50, 50]), bank('c2', 'lv2', [25, 50])]);
    expect(statesOf(study, defaultFamilies).count).toBe(3 * 4);
  });

  it('each case has its own', () => {
    const cases = [
      { id: 'day', name: 'Day', changes: [] },
      { id: 'night', name: 'Night', changes: [{ element: 'c1', set: { on: false } }] },
    ];
    expect(statesOf(site({ cases }), defaultFamilies).states?.map(({ name }) => name)).toEqual([
      'Day',
      'Night',
      'Day, C1 off',
      'Day, C1 at 50 kvar',
      'Day, C1 at 100 kvar',
    ]);
  });
});

describe('the other families', () => {
  it('a weak supply where its smallest fault level is entered', () => {
    const study = site();
    const states = statesOf(study, { ...none, weakSupply: true }).states ?? [];
    expect(states.map(({ name }) => name)).toEqual(['Base', 'Base, smallest fault level']);
    const weak = states[1];
    const inState = weak && studyInCase(studyInState(study, weak), weak.id);
    expect(inState?.elements.find((part) => part.kind === 'supply')?.shortCircuitMVA).toBe(100);
  });

  it('a transformer is taken out only where the coupler keeps its board fed', () => {
    const names = statesOf(site(), { ...none, couplers: true, transformerOut: true }).states?.map(
      ({ name }) => name,
    );
    expect(names).toEqual(['Base', 'Base, Q1 closed', 'Base, Q1 closed, t1 out', 'Base, Q1 closed, t2 out']);
  });

  it('the generator takes over from the supply, and such a state is judged as one', () => {
    const states = statesOf(site(), { ...none, generator: true, couplers: true }).states ?? [];
    expect(states.map(({ name, role }) => [name, role])).toEqual([
      ['Base', 'load'],
      ['Base, Q1 closed', 'load'],
      ['Base, on the generator', 'generator'],
      ['Base, on the generator, Q1 closed', 'generator'],
    ]);
  });

  it('light load by per cent of what the case draws', () => {
    const study = site();
    const light = statesOf(study, { ...none, lightLoadPercent: 20 }).states?.[1];
    expect(light?.role).toBe('light');
    const inState = light && studyInCase(studyInState(study, light), light.id);
    expect(inState?.elements.find((part) => part.kind === 'load')?.kW).toBe(40);
  });

  it('multiply one another, and every state is a valid study', () => {
    const study = site();
    const families = { ...defaultFamilies, weakSupply: true, couplers: true, lightLoadPercent: 20 };
    const { states, count } = statesOf(study, families);
    expect(count).toBe(4 * 2 * 2 * 2);
    expect(new Set(states?.map(({ id }) => id)).size).toBe(count);
    for (const state of states ?? [])
      expect(
        checkStudy(studyInState(study, state)).findings.filter(({ severity }) => severity === 'error'),
      ).toEqual([]);
  });
});

describe('too many states', () => {
  it('are counted, not made', () => {
    const unlike = [1, 2, 4, 8, 16, 32];
    const study = site({}, [bank('c1', 'lv1', unlike), bank('c2', 'lv2', unlike)]);
    const set = statesOf(study, defaultFamilies);
    expect(set.count).toBe(64 * 64);
    expect(set.count).toBeGreaterThan(MOST_STATES);
    expect(set.states).toBeNull();
  });

  it('and a case the study does not have is refused', () => {
    expect(() => statesOf(site(), { ...none, cases: ['evening'] })).toThrow(/no case "evening"/);
  });
});
