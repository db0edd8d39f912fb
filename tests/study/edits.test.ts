import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addBus,
  addCase,
  addPart,
  addPin,
  addSpectrum,
  checkStudy,
  clipItems,
  confirmTypical,
  duplicateCase,
  duplicateParts,
  type Edit,
  elementById,
  elementKinds,
  moveCase,
  moveEnd,
  moveParts,
  newStudy,
  originOf,
  originTally,
  pasteClip,
  removeBus,
  removeCase,
  removeItems,
  removeParts,
  removePin,
  removeSpectrum,
  reorderAlong,
  replacePart,
  resetCase,
  resetInCase,
  type Study,
  sameData,
  setField,
  setOrigin,
  studyInCase,
  updateBus,
  updateCase,
  updateElement,
  updateGroup,
  updateSpectrum,
  updateStudy,
} from '../../src/study/index.ts';
import { deepFrozen, exampleStudy, studyFiles } from './exampleStudies.ts';

const detuned = deepFrozen(exampleStudy('1-detuned-400v'));

function errorsOf(study: Study) {
  return checkStudy(JSON.parse(JSON.stringify(study))).findings.filter(
    (finding) => finding.severity === 'error',
  );
}

describe('A new part', () => {
  it.each([400, 690, 6600, 20000] as const)(
    'of every kind stands soundly at a busbar of %d V with typical values',
    (nominalV) => {
      for (const frequencyHz of [50, 60] as const) {
        let study: Study = { ...newStudy({ frequencyHz }), buses: [{ id: 'b', nominalV }] };
        for (const kind of elementKinds) study = addPart(study, { kind, bus: 'b' }).apply(study);
        expect(checkStudy(study).findings).toEqual([]);
        expect(study.elements).toHaveLength(elementKinds.length);
        expect(study.buses).toHaveLength(1 + 5);
      }
    },
  );

  it('brings its lower busbar with it, or joins one that stands', () => {
    const first = addPart(detuned, { kind: 'transformer', bus: 'in' });
    const brought = first.apply(detuned);
    expect(first.busId).toBe('bus1');
    expect(brought.buses.at(-1)).toMatchObject({ id: 'bus1', nominalV: 400 });
    expect(elementById(brought, first.elementId)).toMatchObject({
      from: 'in',
      to: 'bus1',
      hvV: 11000,
      lvV: 400,
      ratedKVA: 1000,
      ukPercent: 6,
      loadLossKW: 7.6,
      vectorGroup: 'Dyn11',
    });
    const second = addPart(brought, { kind: 'coupler', bus: 'hall', to: 'bus1' });
    expect(second.busId).toBeUndefined();
    expect(second.apply(brought).buses).toHaveLength(4);
  });

  it('has its ids from kind and counter, and says what it does', () => {
    const edit = addPart(detuned, { kind: 'bank', bus: 'hall' });
    expect(edit).toMatchObject({ elementId: 'bank1', label: 'bank.add', words: 'add Bank 1 at Press hall' });
    const after = edit.apply(detuned);
    expect(addPart(after, { kind: 'bank', bus: 'hall' }).elementId).toBe('bank2');
    expect(elementById(after, 'bank1')).toMatchObject({
      ratedV: 440,
      steps: Array.from({ length: 6 }, () => ({ kvar: 25 })),
    });
  });

  it('takes the first name of its kind that no other part has', () => {
    expect(detuned.elements.some((element) => element.name === 'T1')).toBe(false);
    const named = updateElement(detuned, 't1', { name: 'T1' }).apply(detuned);
    const edit = addPart(named, { kind: 'transformer', bus: 'in' });
    expect(elementById(edit.apply(named), edit.elementId)?.name).toBe('T2');
  });

  it('marks what is typical, and the mark falls off with the first edit', () => {
    const after = addPart(detuned, { kind: 'load', bus: 'hall', values: { kW: 12 } }).apply(detuned);
    const load = elementById(after, 'load1')!;
    expect(originOf(after, load, 'powerFactor')).toEqual({ origin: 'typical' });
    expect(originOf(after, load, 'kW')).toBeUndefined();
    const edited = updateElement(after, 'load1', { powerFactor: 0.9 }).apply(after);
    expect(originOf(edited, load, 'powerFactor')).toBeUndefined();
  });

  it('at a busbar that is not there is a programming error', () => {
    expect(() => addPart(detuned, { kind: 'load', bus: 'cellar' })).toThrow(RangeError);
  });
});

describe('Changing a part', () => {
  it('sets and removes fields, and no-op edits give the same study', () => {
    const edit = updateElement(detuned, 'bank', { detuningPercent: 5.67 });
    expect(edit).toMatchObject({
      label: 'bank.setDetuningPercent',
      words: 'set the detuning p of bank',
    });
    expect(elementById(edit.apply(detuned), 'bank')).toMatchObject({ detuningPercent: 5.67 });
    expect(
      elementById(updateElement(detuned, 'bank', { detuningPercent: undefined }).apply(detuned), 'bank'),
    ).not.toHaveProperty('detuningPercent');
    expect(updateElement(detuned, 'bank', { detuningPercent: 7 }).apply(detuned)).toBe(detuned);
    expect(
      updateElement(detuned, 'bank', { steps: [{ kvar: 50 }, { kvar: 50 }, { on: false, kvar: 50 }] }).apply(
        detuned,
      ),
    ).toBe(detuned);
    expect(updateElement(detuned, 'nobody', { kW: 7 }).apply(detuned)).toBe(detuned);
  });

  it('never changes id or kind', () => {
    expect(updateElement(detuned, 'bank', { id: 'x', kind: 'filter' }).apply(detuned)).toBe(detuned);
  });

  it('in a case writes that case alone, and the base value takes the change away again', () => {
    const edit = updateElement(detuned, 'heat', { kW: 20 }, { caseId: 'night' });
    expect(edit.words).toBe('set the active power, total of load heat in case Night');
    const after = edit.apply(detuned);
    expect(elementById(after, 'heat')).toBe(elementById(detuned, 'heat'));
    expect(elementById(studyInCase(after, 'night'), 'heat')).toMatchObject({ kW: 20 });
    const back = updateElement(after, 'heat', { kW: 90 }, { caseId: 'night' }).apply(after);
    expect(sameData(back, detuned)).toBe(true);
  });

  it('in a case removes a field by null and puts it back to the base', () => {
    const after = updateElement(detuned, 'bank', { detuningPercent: undefined }, { caseId: 'night' }).apply(
      detuned,
    );
    expect(after.cases?.[2]?.changes[2]).toEqual({
      element: 'bank',
      set: { steps: [{ kvar: 50, on: false }], detuningPercent: null },
    });
    const back = resetInCase(after, 'night', 'bank', 'detuningPercent').apply(after);
    expect(sameData(back, detuned)).toBe(true);
    expect(resetInCase(back, 'night', 'bank').apply(back).cases?.[2]?.changes).toHaveLength(2);
    expect(resetInCase(detuned, 'night', 'heat').apply(detuned)).toBe(detuned);
  });

  it('in the plain base case writes the part itself', () => {
    expect(
      elementById(updateElement(detuned, 'heat', { kW: 20 }, { caseId: 'base' }).apply(detuned), 'heat'),
    ).toMatchObject({ kW: 20 });
  });

  it('in and out of service is said in those words', () => {
    expect(updateElement(detuned, 'k1', { on: false }).words).toBe('take cable k1 out of service');
    expect(updateElement(detuned, 'k1', { on: true }).words).toBe('put cable k1 in service');
    const off = updateElement(detuned, 'k1', { on: false }, { caseId: 'night' }).apply(detuned);
    expect(sameData(updateElement(off, 'k1', { on: true }, { caseId: 'night' }).apply(off), detuned)).toBe(
      true,
    );
  });
});

describe('Removing', () => {
  it('a transformer takes what hangs below it when nothing else feeds it', () => {
    const edit = removeParts(detuned, ['t1']);
    expect(edit.words).toBe('remove transformer t1 with 6 parts and 2 busbars below');
    const after = edit.apply(detuned);
    expect(after.buses.map((bus) => bus.id)).toEqual(['in']);
    expect(after.elements.map((element) => element.id)).toEqual(['grid']);
    expect(after.cases?.every((item) => item.changes.length === 0)).toBe(true);
    expect(after.scans).toEqual([]);
    expect(errorsOf(after)).toEqual([]);
  });

  it('one of two feeds leaves what is below', () => {
    const study = deepFrozen(exampleStudy('2-four-wire-480v'));
    const after = removeParts(study, ['ta']).apply(study);
    expect(after.buses).toHaveLength(4);
    expect(after.elements).toHaveLength(study.elements.length - 1);
  });

  it('a shunt part takes nothing with it but its references', () => {
    const pinned = addPin(detuned, { quantity: 'current', element: 'bank', bus: 'hall' }).apply(detuned);
    const ordered = reorderAlong(pinned, 'hall', ['bank', 'drv']).apply(pinned);
    const marked = setOrigin(ordered, elementById(ordered, 'bank')!, 'ratedV', { origin: 'nameplate' }).apply(
      ordered,
    );
    const after = removeParts(marked, ['bank']).apply(marked);
    expect(after.view).toEqual({ pins: [], orderAlong: { hall: ['drv'] } });
    expect(after.origins).toBeUndefined();
    expect(after.cases?.flatMap((item) => item.changes.map((change) => change.element))).not.toContain(
      'bank',
    );
  });

  it('keeps the origins of a part whose id only begins like the removed one’s', () => {
    const study: Study = {
      ...detuned,
      elements: [...detuned.elements, { ...elementById(detuned, 'heat')!, id: 'heat.2' }],
    };
    const marked = setOrigin(study, elementById(study, 'heat.2')!, 'kW', { origin: 'measured' }).apply(study);
    expect(removeParts(marked, ['heat']).apply(marked).origins).toEqual({
      'elements.heat.2.kW': { origin: 'measured' },
    });
  });

  it('a busbar takes its parts and what hangs below', () => {
    const after = removeBus(detuned, 'hall').apply(detuned);
    expect(after.buses.map((bus) => bus.id)).toEqual(['in']);
    expect(errorsOf(after)).toEqual([]);
    expect(removeParts(detuned, ['nobody']).apply(detuned)).toBe(detuned);
  });

  it('a spectrum leaves its rows with the parts that used it', () => {
    const study = deepFrozen(exampleStudy('2-four-wire-480v'));
    const after = removeSpectrum(study, 'desk').apply(study);
    expect(elementById(after, 'it')).toMatchObject({ spectrum: study.spectra?.[0]?.orders });
    expect(after).not.toHaveProperty('spectra');
    expect(errorsOf(after)).toEqual([]);
  });

  it('the last case is refused', () => {
    const study: Study = { ...detuned, cases: [detuned.cases![0]!] };
    expect(removeCase(study, 'base').apply(study)).toBe(study);
  });
});

describe('Moving, copying, arranging', () => {
  it('an end goes to another busbar, never onto the other end', () => {
    expect(elementById(moveEnd(detuned, 'heat', 'bus', 'hall').apply(detuned), 'heat')).toMatchObject({
      bus: 'hall',
    });
    expect(moveEnd(detuned, 'k1', 'to', 'hall').apply(detuned)).toBe(detuned);
    expect(moveEnd(detuned, 'k1', 'bus', 'in').apply(detuned)).toBe(detuned);
    expect(moveEnd(detuned, 'heat', 'bus', 'cellar').apply(detuned)).toBe(detuned);
  });

  it('a pin follows its terminal', () => {
    const pinned = addPin(detuned, { quantity: 'current', element: 'heat', bus: 'dry' }).apply(detuned);
    expect(moveEnd(pinned, 'heat', 'bus', 'hall').apply(pinned).view?.pins).toEqual([
      { quantity: 'current', element: 'heat', bus: 'hall' },
    ]);
  });

  it('a duplicate has the next name, its cases and its origins', () => {
    const study = setOrigin(detuned, elementById(detuned, 'drv')!, 'kW', {
      origin: 'measured',
      date: '2026-03-02',
    }).apply(detuned);
    const edit = duplicateParts(study, ['drv']);
    const after = edit.apply(study);
    expect(edit.elementIds).toEqual(['converter1']);
    expect(elementById(after, 'converter1')).toMatchObject({ name: 'drv 2', kW: 140 });
    expect(elementById(studyInCase(after, 'night'), 'converter1')).toMatchObject({ kW: 30 });
    expect(originOf(after, elementById(after, 'converter1')!, 'kW')).toMatchObject({ origin: 'measured' });
  });

  it('a pin is set once and taken away', () => {
    const pin = { quantity: 'voltage', bus: 'hall' } as const;
    const pinned = addPin(detuned, pin).apply(detuned);
    expect(addPin(pinned, { ...pin }).apply(pinned)).toBe(pinned);
    expect(removePin(pinned, { ...pin }).apply(pinned).view?.pins).toEqual([]);
  });
});

describe('Cases and spectra', () => {
  it('a study without cases gets its base case first', () => {
    const { cases: _cases, ...bare } = detuned;
    const edit = addCase(bare, { name: 'Night', role: 'light' });
    expect(edit.apply(bare).cases?.map((item) => item.id)).toEqual(['base', 'case1']);
  });
  it('a case is moved along the list, stopping at both ends, and put back to the base study', () => {
    const order = (study: Study) => study.cases?.map((item) => item.id);
    const [first, , last] = order(detuned) ?? [];
    const up = moveCase(detuned, last!, -2);
    expect(up.words).toBe('move case Night up');
    expect(order(up.apply(detuned))?.[0]).toBe(last);
    expect(moveCase(detuned, first!, -1).apply(detuned)).toBe(detuned);
    expect(moveCase(detuned, last!, 1).apply(detuned)).toBe(detuned);
    expect(
      sameData(
        moveCase(detuned, first!, 1).apply(moveCase(detuned, first!, 1).apply(detuned)).cases?.[2],
        detuned.cases![0],
      ),
    ).toBe(true);
    const bare = resetCase(detuned, 'night');
    expect(bare.words).toBe('put case Night back to the base study');
    expect(bare.apply(detuned).cases?.[2]?.changes).toEqual([]);
    expect(bare.apply(bare.apply(detuned))).toEqual(bare.apply(detuned));
  });
  it('a case is duplicated with its changes, renamed and removed', () => {
    const edit = duplicateCase(detuned, 'night');
    const copied = edit.apply(detuned);
    expect(copied.cases?.at(-1)).toEqual({ ...detuned.cases![2], id: edit.caseId, name: 'Night, copy' });
    expect(updateCase(copied, edit.caseId, { name: 'Dusk' }).apply(copied).cases?.at(-1)?.name).toBe('Dusk');
    expect(sameData(removeCase(copied, edit.caseId).apply(copied), detuned)).toBe(true);
  });
  it('a spectrum of the study’s own is edited, a built-in one never', () => {
    const edit = addSpectrum(detuned, { orders: [{ h: 5, percent: 30 }] });
    const after = edit.apply(detuned);
    expect(updateSpectrum(after, edit.spectrumId, { orders: [] }).apply(after).spectra?.[0]?.orders).toEqual(
      [],
    );
    expect(updateSpectrum(after, 'six-pulse-ideal', { name: 'mine' }).apply(after)).toBe(after);
  });
});

/** Every edit at some busbar and part of the study, chosen by numbers. */
function someEdit(study: Study, which: number, a: number, b: number): Edit {
  const bus = study.buses[a % Math.max(1, study.buses.length)]?.id ?? 'none';
  const otherBus = study.buses[b % Math.max(1, study.buses.length)]?.id ?? 'none';
  const element = study.elements[a % Math.max(1, study.elements.length)];
  const id = element?.id ?? 'none';
  const caseId = study.cases?.[b % Math.max(1, study.cases.length)]?.id ?? 'base';
  const end = (['bus', 'from', 'to'] as const)[b % 3] ?? 'bus';
  const makers: (() => Edit)[] = [
    () => addBus(study, { nominalV: 100 + a }),
    () =>
      study.buses.length > 0
        ? addPart(study, { kind: elementKinds[b % elementKinds.length]!, bus })
        : addBus(study),
    () =>
      study.buses.length > 1 && bus !== otherBus
        ? addPart(study, { kind: 'coupler', bus, to: otherBus })
        : addBus(study),
    () => updateElement(study, id, { name: `part ${b}` }),
    () => updateElement(study, id, { on: b % 2 === 0 }, { caseId }),
    () => resetInCase(study, caseId, id),
    () => updateBus(study, bus, { pcc: b % 2 === 0 }),
    () => updateStudy(study, { notes: `note ${b}` }),
    () => updateGroup(study, 'criteria', { targetPF: b % 2 === 0 ? 0.9 + (a % 10) / 100 : undefined }),
    () => removeParts(study, [id]),
    () => (b % 7 === 0 ? removeBus(study, bus) : removeParts(study, [id])),
    () => duplicateParts(study, [id]),
    () => pasteClip(study, clipItems(study, { parts: [id], buses: [] }), bus),
    () => pasteClip(study, clipItems(study, { parts: [id], buses: [otherBus] }), null),
    () => replacePart(study, id, elementKinds[b % elementKinds.length]!),
    () => removeItems(study, { parts: [id], buses: b % 5 === 0 ? [bus, otherBus] : [] }),
    () =>
      moveParts(
        study,
        study.elements.slice(a % 3, 4).map((item) => ({ id: item.id, end: 'from' in item ? 'from' : 'bus' })),
        otherBus,
      ),
    () => moveEnd(study, id, end, otherBus),
    () =>
      reorderAlong(
        study,
        bus,
        study.elements.map((item) => item.id),
      ),
    () => addPin(study, { quantity: 'voltage', bus }),
    () => removePin(study, { quantity: 'voltage', bus }),
    () => addCase(study, { name: `case ${b}` }),
    () => (study.cases ? duplicateCase(study, caseId) : addCase(study)),
    () => removeCase(study, caseId),
    () => moveCase(study, caseId, (b % 3) - 1),
    () => resetCase(study, caseId),
    () => addSpectrum(study, { orders: [{ h: 5, percent: b }] }),
    () => removeSpectrum(study, study.spectra?.[0]?.id ?? 'none'),
    () => (element ? setOrigin(study, element, 'name', { origin: 'assumed' }) : addBus(study)),
  ];
  return makers[which % makers.length]!();
}

describe('Any row of edits', () => {
  it('keeps the study sound, leaves every earlier study untouched, and gives the same again on redo', () => {
    const step = fc.tuple(fc.nat(200), fc.nat(40), fc.nat(40));
    fc.assert(
      fc.property(
        fc.constantFrom(...studyFiles),
        fc.array(step, { minLength: 1, maxLength: 14 }),
        (name, steps) => {
          let study = deepFrozen(exampleStudy(name));
          for (const [which, a, b] of steps) {
            const before = JSON.stringify(study);
            const edit = someEdit(study, which, a, b);
            const after = deepFrozen(edit.apply(study));
            expect(edit.words.length).toBeGreaterThan(4);
            expect(JSON.stringify(study), 'undo: the earlier study is still as it was').toBe(before);
            expect(sameData(edit.apply(study), after), 'redo gives the same data').toBe(true);
            if (sameData(after, study)) expect(after, edit.label).toBe(study);
            expect(errorsOf(after), edit.label).toEqual([]);
            study = after;
          }
        },
      ),
      { seed: 2026, numRuns: 120 },
    );
  });
});

describe('Where values come from', () => {
  const placed = deepFrozen(
    addPart(detuned, { kind: 'transformer', bus: 'in', to: 'hall', values: { ratedKVA: 630 } }).apply(
      detuned,
    ),
  );
  const ids = ['transformer1'];
  const part = (study: Study) => elementById(study, 'transformer1')!;

  it('is counted for a part: typical until somebody confirms it', () => {
    expect(originTally(placed, part(placed))).toEqual({
      measured: 0,
      nameplate: 0,
      typical: 3,
      assumed: 0,
      // The rating was given, the volts are the busbars'.
      notStated: 3,
    });
  });

  it('typical values are confirmed as nameplate data in one step that can be undone and done again', () => {
    const noted = setOrigin(placed, part(placed), 'ratedKVA', {
      origin: 'measured',
      date: '2026-01',
      note: 'plate photo',
    }).apply(placed);
    const edit = confirmTypical(noted, ids);
    expect(edit.words).toBe('confirm typical values of transformer T1 as nameplate data');
    const after = edit.apply(noted);
    expect(originTally(after, part(after))).toMatchObject({ typical: 0, nameplate: 3, measured: 1 });
    expect(originOf(after, part(after), 'ratedKVA')).toMatchObject({ note: 'plate photo' });
    expect(after.elements).toBe(noted.elements);
    expect(originTally(noted, part(noted)).typical).toBe(3);
    expect(edit.apply(noted)).toEqual(after);
    expect(confirmTypical(after, ids).apply(after)).toBe(after);
  });

  it('a built-in spectrum brings its source with it, and a part’s own rows lose it', () => {
    const chosen = setField(detuned, 'drv', 'spectrum', 'drive-reactance-5').apply(detuned);
    const drive = elementById(chosen, 'drv')!;
    expect(originOf(chosen, drive, 'spectrum')).toMatchObject({
      origin: 'typical',
      note: expect.stringContaining('from memory'),
    });
    const own = setField(chosen, 'drv', 'spectrum', [{ h: 5, percent: 30 }]).apply(chosen);
    expect(originOf(own, drive, 'spectrum')).toBeUndefined();
  });

  it('a busbar given in a field is a move; both ends at one busbar are refused by the rules', () => {
    const moved = setField(detuned, 'bank', 'bus', 'in');
    expect(moved.label).toBe('part.move');
    expect(elementById(moved.apply(detuned), 'bank')).toMatchObject({ bus: 'in' });
    const looped = setField(placed, 'transformer1', 'to', 'in').apply(placed);
    expect(
      errorsOf(looped)
        .map(({ message }) => message)
        .join(),
    ).toContain('both ends');
  });
});
