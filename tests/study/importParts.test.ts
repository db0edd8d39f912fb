import { describe, expect, it } from 'vitest';
import {
  checkStudy,
  elementById,
  importParts,
  newStudy,
  partsHangingFrom,
  restoreStudy,
  type Study,
} from '../../src/study/index.ts';
import { site } from '../store/site.ts';

const works: Study = {
  ...newStudy({ title: 'Marl Street works' }),
  spectra: [{ id: 'own', name: 'Press drives, measured', orders: [{ h: 5, percent: 28 }] }],
  buses: [
    { id: 'in', name: 'Intake', nominalV: 10_000, pcc: true },
    { id: 'hall', name: 'Hall board', nominalV: 400 },
    { id: 'press', name: 'Press board', nominalV: 400 },
  ],
  elements: [
    { id: 'grid', kind: 'supply', bus: 'in', shortCircuitMVA: 200, xOverR: 8 },
    {
      id: 't1',
      name: 'T1',
      kind: 'transformer',
      from: 'in',
      to: 'hall',
      ratedKVA: 800,
      hvV: 10_000,
      lvV: 400,
      ukPercent: 5,
      loadLossKW: 6,
      vectorGroup: 'Dyn5',
    },
    { id: 'pumps', name: 'Pumps', kind: 'motor', bus: 'hall', ratedKW: 30 },
    {
      id: 'w1',
      name: 'W1',
      kind: 'cable',
      from: 'hall',
      to: 'press',
      lengthM: 60,
      resistanceOhmPerKm: 0.1,
      reactanceOhmPerKm: 0.08,
    },
    {
      id: 'presses',
      name: 'Presses',
      kind: 'converter',
      bus: 'press',
      kW: 120,
      powerFactor: 0.95,
      spectrum: 'own',
    },
  ],
  origins: { 'elements.presses.kW': { origin: 'measured', note: 'clamp meter', date: '2026-03-02' } },
};

describe('parts of another study', () => {
  it('hang under the chosen busbar with all below, spectra and origins along, and undo takes them away', () => {
    const edit = importParts(site, works, ['w1', 'pumps'], 'main');
    const after = edit.apply(site);
    expect(checkStudy(after).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    const [cable, , presses] = edit.elementIds.map((id) => elementById(after, id));
    expect(cable).toMatchObject({ name: 'W1', from: 'main', to: edit.busIds[0] });
    expect(presses).toMatchObject({ name: 'Presses', spectrum: 'own', bus: edit.busIds[0] });
    expect(after.spectra).toEqual(works.spectra);
    expect(after.origins?.[`elements.${presses?.id}.kW`]).toEqual(works.origins?.['elements.presses.kW']);
    expect(edit.words).toBe('bring 3 parts and 1 busbar at Main board from Marl Street works');
    expect(edit.apply(site)).toEqual(after);
    expect(site.elements).toHaveLength(5);
  });

  it('keep their names where these are free and take the next number where not', () => {
    const edit = importParts(site, works, ['t1'], 'in');
    const after = edit.apply(site);
    expect(elementById(after, edit.elementIds[0] ?? '')).toMatchObject({ name: 'T2', from: 'in' });
  });

  it('come to an empty study with the busbar they hung from', () => {
    const edit = importParts(newStudy(), works, ['pumps'], null);
    const after = edit.apply(newStudy());
    expect(after.buses).toMatchObject([{ name: 'Hall board', nominalV: 400 }]);
    expect(after.elements).toMatchObject([{ name: 'Pumps', bus: after.buses[0]?.id }]);
  });

  it('are listed by the busbar they hang from, without what feeds it', () => {
    expect(partsHangingFrom(works, 'hall').map(({ id }) => id)).toEqual(['pumps', 'w1']);
    expect(partsHangingFrom(works, 'press').map(({ id }) => id)).toEqual(['presses']);
  });
});

describe('going back to a former state', () => {
  it('is one edit that gives exactly that state', () => {
    const former = { ...site, title: 'Before' };
    const edit = restoreStudy(former, '14:02');
    expect(edit.apply(site)).toBe(former);
    expect(edit.words).toBe('go back to the state of 14:02');
  });
});
