import { describe, expect, it } from 'vitest';
import {
  addCaseByRecipe,
  type CaseRecipe,
  caseDifferences,
  caseRecipes,
  checkStudy,
  type Study,
} from '../../src/study/index.ts';
import { deepFrozen } from './exampleStudies.ts';
import { soundSite, withParts, withSecond } from './findings/soundSite.ts';

const site = (): Study =>
  withParts(
    withSecond(
      { ...soundSite(), buses: [...soundSite().buses, { id: 'b', name: 'Board B', nominalV: 400 }] },
      { to: 'b' },
    ),
    { id: 'k1', name: 'Tie 1', kind: 'coupler', from: 'main', to: 'b', on: false },
    {
      id: 'g1',
      name: 'G1',
      kind: 'generator',
      bus: 'main',
      ratedKVA: 500,
      xdSubtransientPercent: 15,
      on: false,
    },
    {
      id: 'pv',
      name: 'Roof',
      kind: 'converter',
      bus: 'main',
      kW: -80,
      powerFactor: 1,
      spectrum: 'six-pulse-ideal',
    },
  );

function recipe(study: Study, id: string, from = 'day'): CaseRecipe {
  const found = caseRecipes(study, from)
    .flatMap(({ recipes }) => recipes)
    .find((one) => one.id === id);
  if (!found) throw new Error(`no recipe ${id}`);
  return found;
}

function made(id: string, from = 'day') {
  const study = deepFrozen(site());
  const edit = addCaseByRecipe(study, from, recipe(study, id, from));
  const after = edit.apply(study);
  const written = after.cases?.find((item) => item.id === edit.caseId);
  expect(checkStudy(after).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  return {
    edit,
    after,
    written,
    marks: caseDifferences(after, edit.caseId).map(({ element, mark }) => `${element.id} ${mark}`),
  };
}

describe('A common operating state made from a case', () => {
  it('light load: every load, motor and drive at a share; what feeds in stays', () => {
    const { written, marks } = made('light');
    expect(written).toMatchObject({ name: 'Light load, 30\u2009%', role: 'light' });
    expect(marks).toEqual(['heat 36\u2009kW', 'fans 22.5\u2009% load', 'drive 18\u2009kW']);
    const study = site();
    const [light] = caseRecipes(study, 'day', { lightPercent: 10 });
    expect(light?.recipes[0]?.patches[0]).toEqual({ element: 'heat', patch: { kW: 12 } });
  });

  it('one step of a bank fewer', () => {
    const { written, marks, edit } = made('step.c1');
    expect(written?.name).toBe('Bank C1: 1 of 2 steps');
    expect(marks).toEqual(['c1 1 of 2 steps']);
    expect(edit.words).toBe('add case Bank C1: 1 of 2 steps');
  });

  it('the minimum fault level', () => {
    expect(made('weak').marks).toEqual(['grid 120\u2009MVA']);
  });

  it('on the generator: the supply opens, the generator runs, with the caution about banks', () => {
    const { written, marks } = made('generator.g1');
    expect(written).toMatchObject({ role: 'generator' });
    expect(written?.description).toMatch(/interlock them off/);
    expect(marks).toEqual(['grid off', 'g1 in service']);
  });

  it('a coupler in its other position', () => {
    expect(made('coupler.k1')).toMatchObject({ written: { name: 'Tie 1 closed' }, marks: ['k1 closed'] });
  });

  it('a transformer out, with the coupler that takes its load over', () => {
    expect(made('transformer.t2')).toMatchObject({
      written: { name: 'T2 out, Tie 1 closed' },
      marks: ['t2 off', 'k1 closed'],
    });
  });

  it('all motors off', () => {
    expect(made('motors').marks).toEqual(['fans off']);
  });

  it('starts from the changes of the case it is made from, and says so', () => {
    const { written, marks } = made('motors', 'night');
    expect(marks).toEqual(['heat 20\u2009kW', 'fans off', 'c1 1 of 2 steps']);
    expect(written).toMatchObject({ role: 'light' });
    expect(written?.description).toMatch(/Starts from Night\.$/);
  });

  it('where it cannot be made says what is missing', () => {
    const bare: Study = {
      ...soundSite(),
      elements: soundSite().elements.filter(({ kind }) => kind === 'supply'),
    };
    const study = {
      ...bare,
      cases: [],
      elements: bare.elements.map(({ ...grid }) => ({ ...grid, shortCircuitMVAMin: 200 })),
    } as Study;
    for (const group of caseRecipes(study, 'base')) {
      expect(group.recipes).toEqual([]);
      expect(group.missing.length).toBeGreaterThan(10);
    }
  });

  it('made twice has two names', () => {
    const first = made('motors').after;
    const again = addCaseByRecipe(first, 'day', recipe(first, 'motors'));
    expect(again.apply(first).cases?.at(-1)?.name).toBe('Motors off (2)');
  });
});
