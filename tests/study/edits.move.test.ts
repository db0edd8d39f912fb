import { describe, expect, it } from 'vitest';
import {
  addPart,
  addPin,
  alongWith,
  busesLosingFeed,
  checkStudy,
  duplicateCase,
  type ElementKind,
  elementById,
  moveEnd,
  moveObstacle,
  moveParts,
  newStudy,
  originOf,
  removalOf,
  removalWords,
  removeItems,
  reorderAlong,
  replaceObstacle,
  replacePart,
  type Study,
  setOrigin,
  updateElement,
} from '../../src/study/index.ts';
import { deepFrozen } from './exampleStudies.ts';

/** Intake 20 kV, T1 to the main board, cable to a sub-board with a load, a bank and a motor on the main board. */
function works(): Study {
  const empty: Study = {
    ...newStudy(),
    buses: [
      { id: 'in', name: 'Intake', nominalV: 20_000, pcc: true },
      { id: 'main', name: 'Main board', nominalV: 400 },
      { id: 'sub', name: 'Sub-board', nominalV: 400 },
    ],
  };
  const steps = [
    { kind: 'supply', bus: 'in' },
    { kind: 'transformer', bus: 'in', to: 'main' },
    { kind: 'cable', bus: 'main', to: 'sub' },
    { kind: 'load', bus: 'sub', values: { kW: 80, powerFactor: 0.82 } },
    { kind: 'motor', bus: 'main', values: { ratedKW: 55, count: 2 } },
    { kind: 'bank', bus: 'main', values: { steps: [{ kvar: 50 }, { kvar: 50, on: false }], ratedV: 440 } },
  ] as const;
  return deepFrozen(steps.reduce((study, step) => addPart(study, step).apply(study), empty));
}

const site = works();
const errorsOf = (study: Study) =>
  checkStudy(JSON.parse(JSON.stringify(study))).findings.filter((finding) => finding.severity === 'error');

describe('Moving several parts', () => {
  it('is one edit; a branch takes along what hangs below it and says how much', () => {
    const lift = [{ id: 'cable1', end: 'from' as const }];
    const edit = moveParts(site, lift, 'in');
    expect(alongWith(site, lift)).toBe('1 part and 1 busbar');
    expect(edit.words).toBe('move Cable 1 with 1 part and 1 busbar below to Intake');
    expect(elementById(edit.apply(site), 'cable1')).toMatchObject({ from: 'in', to: 'sub' });
    const both = moveParts(
      site,
      [
        { id: 'motor1', end: 'bus' },
        { id: 'bank1', end: 'bus' },
      ],
      'sub',
    );
    expect(both.words).toBe('move 2 parts to Sub-board');
    const after = both.apply(site);
    expect(after.elements.filter((part) => 'bus' in part && part.bus === 'sub')).toHaveLength(3);
    expect(both.apply(after)).toBe(after);
  });

  it('is refused onto both ends of one part and onto what hangs below it', () => {
    expect(moveObstacle(site, [{ id: 'cable1', end: 'to' }], 'main')).toBe(
      'both ends of Cable 1 would be at Main board',
    );
    expect(moveObstacle(site, [{ id: 'transformer1', end: 'from' }], 'sub')).toBe(
      'Sub-board hangs below T1 itself',
    );
    expect(moveObstacle(site, [{ id: 'motor1', end: 'bus' }], 'sub')).toBeNull();
  });

  it('names the busbars that lose their feed', () => {
    expect(busesLosingFeed(site, moveEnd(site, 'cable1', 'to', 'in'))).toEqual(['sub']);
    expect(busesLosingFeed(site, moveEnd(site, 'motor1', 'bus', 'sub'))).toEqual([]);
  });

  it('takes away the bare busbar a foot came with, and leaves a named one', () => {
    const second = addPart(site, { kind: 'transformer', bus: 'in' });
    const twice = second.apply(site);
    expect(twice.buses).toHaveLength(4);
    const parallel = moveEnd(twice, second.elementId, 'to', 'main').apply(twice);
    expect(parallel.buses.map(({ id }) => id)).toEqual(['in', 'main', 'sub']);
    const named: Study = {
      ...twice,
      buses: twice.buses.map((bus) => (bus.id === second.busId ? { ...bus, name: 'North board' } : bus)),
    };
    expect(moveEnd(named, second.elementId, 'to', 'main').apply(named).buses).toHaveLength(4);
  });

  it('along a busbar names the part', () => {
    expect(reorderAlong(site, 'main', ['bank1', 'motor1'], ['bank1']).words).toBe(
      'move Bank 1 along Main board',
    );
  });
});

describe('Removing with what hangs below', () => {
  it('counts what was not chosen', () => {
    const chosen = { parts: ['transformer1', 'bank1'], buses: [] };
    expect(removalOf(site, chosen).below).toEqual({ parts: 3, buses: 2 });
    expect(removalWords(site, chosen)).toBe('2 parts with 3 parts and 2 busbars below');
    const after = removeItems(site, chosen).apply(site);
    expect(after.elements.map(({ id }) => id)).toEqual(['supply1']);
    expect(removalWords(site, { parts: ['bank1'], buses: [] })).toBe('Bank 1');
  });

  it('of several busbars is one edit', () => {
    const edit = removeItems(site, { parts: [], buses: ['main', 'sub'] });
    expect(edit.words).toBe('remove 2 busbars with 5 parts below');
    expect(edit.apply(site)).toMatchObject({ buses: [{ id: 'in' }], elements: [{ id: 'supply1' }] });
    expect(removeItems(site, { parts: ['nobody'], buses: [] }).apply(site)).toBe(site);
  });
});

describe('Replacing a part', () => {
  it('keeps name, busbar, place, pins and what means the same; the rest is typical', () => {
    const pinned = addPin(site, { quantity: 'current', element: 'load1', bus: 'sub' }).apply(site);
    const marked = setOrigin(pinned, elementById(pinned, 'load1')!, 'kW', { origin: 'measured' }).apply(
      pinned,
    );
    const edit = replacePart(marked, 'load1', 'converter');
    expect(edit.words).toBe('replace Load 1 by drive');
    const after = edit.apply(marked);
    const drive = elementById(after, 'load1')!;
    expect(drive).toMatchObject({
      kind: 'converter',
      name: 'Load 1',
      bus: 'sub',
      kW: 80,
      powerFactor: 0.82,
      spectrum: 'drive-reactance-3',
    });
    expect(originOf(after, drive, 'kW')).toEqual({ origin: 'measured' });
    expect(originOf(after, drive, 'spectrum')).toEqual({ origin: 'typical' });
    expect(after.view?.pins).toEqual(pinned.view?.pins);
    expect(errorsOf(after)).toEqual([]);
  });

  it('gives a drive the power the motor draws, not its cos φ', () => {
    const after = replacePart(site, 'motor1', 'converter').apply(site);
    // 55 kW · 2 · 75 % / 0.94 by the definition of efficiency.
    expect(elementById(after, 'motor1')).toMatchObject({ kW: 87.8, powerFactor: 0.95 });
    expect(originOf(after, elementById(after, 'motor1')!, 'kW')).toMatchObject({ origin: 'assumed' });
    const back = replacePart(after, 'motor1', 'motor').apply(after);
    expect(elementById(back, 'motor1')).toMatchObject({ ratedKW: 110 });
  });

  it('gives a filter the kvar the bank has at its busbar', () => {
    const after = replacePart(site, 'bank1', 'filter').apply(site);
    // 50 kvar · (400/440)², Q = U²/X_c.
    expect(elementById(after, 'bank1')).toMatchObject({ kind: 'filter', kvar: 41.3 });
    const back = replacePart(after, 'bank1', 'bank').apply(after);
    expect(elementById(back, 'bank1')).toMatchObject({ steps: [{ kvar: 50 }], ratedV: 440 });
  });

  it('carries what a case says where it means the same, and drops the rest', () => {
    const copy = duplicateCase({ ...site, cases: [{ id: 'base', changes: [] }] }, 'base');
    const cased = copy.apply({ ...site, cases: [{ id: 'base', changes: [] }] });
    const night = { caseId: copy.caseId };
    const set = updateElement(cased, 'motor1', { loadPercent: 30, on: false }, night).apply(cased);
    const after = replacePart(set, 'motor1', 'load').apply(set);
    expect(after.cases?.[1]?.changes).toEqual([{ element: 'motor1', set: { on: false } }]);
    expect(errorsOf(after)).toEqual([]);
  });

  it('is refused by the same kind and where the number of ends differs', () => {
    expect(replaceObstacle(site, 'motor1', 'motor')).toBe('Motor 1 is a motor already');
    expect(replaceObstacle(site, 'motor1', 'cable')).toContain('hangs from one busbar');
    expect(replaceObstacle(site, 'cable1', 'load')).toContain('joins two busbars');
    expect(replacePart(site, 'motor1', 'cable').apply(site)).toBe(site);
  });

  it('of every kind by every other leaves a sound study', () => {
    const hanging: ElementKind[] = [
      'supply',
      'generator',
      'load',
      'motor',
      'converter',
      'bank',
      'filter',
      'shunt',
    ];
    const series: ElementKind[] = ['transformer', 'cable', 'reactor', 'coupler', 'branch'];
    for (const family of [hanging, series])
      for (const first of family)
        for (const second of family) {
          const part = addPart(site, { kind: first, bus: 'main' });
          const with1 = part.apply(site);
          const after = replacePart(with1, part.elementId, second).apply(with1);
          expect(errorsOf(after), `${first} by ${second}`).toEqual([]);
          expect(elementById(after, part.elementId)?.kind).toBe(second);
        }
  });
});
