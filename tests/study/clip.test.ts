import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addPart,
  checkStudy,
  clipItems,
  clipText,
  duplicateCase,
  elementById,
  newStudy,
  originOf,
  type PartsClip,
  pasteClip,
  readClip,
  type Study,
  sameData,
  setOrigin,
  updateElement,
} from '../../src/study/index.ts';
import { anyStudy } from '../drawing/randomStudy.ts';
import { deepFrozen, exampleStudy } from './exampleStudies.ts';

const desks = deepFrozen(exampleStudy('2-four-wire-480v'));

function errorsOf(study: Study) {
  return checkStudy(JSON.parse(JSON.stringify(study))).findings.filter(
    (finding) => finding.severity === 'error',
  );
}

/** Through the clipboard: written as text, read back. */
function carried(clip: PartsClip): PartsClip {
  const outcome = readClip(clipText(clip));
  if (!outcome.ok) throw new Error(outcome.words);
  return outcome.clip;
}

/** A board with two drives of one spectrum of the study's own, fed by a cable from the main board. */
function hall(): Study {
  const empty: Study = {
    ...newStudy({ title: 'Hall' }),
    buses: [
      { id: 'in', name: 'Intake', nominalV: 20_000, pcc: true },
      { id: 'main', name: 'Main board', nominalV: 400 },
      { id: 'sub', name: 'Drives board', nominalV: 400 },
    ],
    spectra: [{ id: 'own', name: 'Measured', orders: [{ h: 5, percent: 31 }] }],
    view: { orderAlong: { sub: ['converter2', 'converter1'] } },
  };
  const steps = [
    { kind: 'supply', bus: 'in' },
    { kind: 'transformer', bus: 'in', to: 'main' },
    { kind: 'cable', bus: 'main', to: 'sub' },
    { kind: 'converter', bus: 'sub', values: { spectrum: 'own' } },
    { kind: 'converter', bus: 'sub', values: { spectrum: 'own' } },
    { kind: 'bank', bus: 'main' },
  ] as const;
  return steps.reduce((study, step) => addPart(study, step).apply(study), empty);
}

describe('Copied parts', () => {
  it('hang from the busbar they are pasted on, under fresh ids and free names, with their origins', () => {
    const site = hall();
    const marked = setOrigin(site, elementById(site, 'bank1')!, 'ratedV', { origin: 'nameplate' }).apply(
      site,
    );
    const clip = carried(clipItems(marked, { parts: ['bank1'], buses: [] }));
    const edit = pasteClip(marked, clip, 'sub');
    const after = edit.apply(marked);
    expect(edit.words).toBe('paste Bank 2 at Drives board');
    expect(elementById(after, 'bank2')).toMatchObject({ kind: 'bank', name: 'Bank 2', bus: 'sub' });
    expect(originOf(after, elementById(after, 'bank2')!, 'ratedV')).toEqual({ origin: 'nameplate' });
    expect(errorsOf(after)).toEqual([]);
  });

  it('bring what hangs below, its busbars, order and spectra, into another study', () => {
    const site = hall();
    const clip = carried(clipItems(site, { parts: ['cable1'], buses: [] }));
    const edit = pasteClip(desks, clip, desks.buses.at(-1)!.id);
    const after = edit.apply(desks);
    expect(edit.elementIds).toHaveLength(3);
    expect(edit.busIds).toHaveLength(1);
    const board = edit.busIds[0]!;
    expect(after.buses.at(-1)).toMatchObject({ id: board, name: 'Drives board', nominalV: 400 });
    expect(elementById(after, edit.elementIds[0]!)).toMatchObject({ kind: 'cable', to: board });
    expect(after.view?.orderAlong?.[board]).toEqual([edit.elementIds[2], edit.elementIds[1]]);
    const spectrum = after.spectra?.at(-1);
    expect(spectrum).toMatchObject({ name: 'Measured', orders: [{ h: 5, percent: 31 }] });
    expect(elementById(after, edit.elementIds[1]!)).toMatchObject({ spectrum: spectrum?.id });
    expect(errorsOf(after)).toEqual([]);
  });

  it('share the spectrum of the study they are pasted into where it is the same one', () => {
    const site = hall();
    const clip = carried(clipItems(site, { parts: ['converter1'], buses: [] }));
    const after = pasteClip(site, clip, 'main').apply(site);
    expect(after.spectra).toEqual(site.spectra);
    const other: Study = {
      ...site,
      spectra: [{ id: 'own', name: 'Measured', orders: [{ h: 5, percent: 9 }] }],
    };
    const beside = pasteClip(other, clip, 'main').apply(other);
    expect(beside.spectra).toHaveLength(2);
    expect(beside.elements.at(-1)).toMatchObject({ spectrum: beside.spectra?.[1]?.id });
    expect(new Set(beside.spectra?.map(({ id }) => id)).size).toBe(2);
    expect(errorsOf(beside)).toEqual([]);
  });

  it('of a tie between two busbars that stay bring a bare lower busbar', () => {
    const site = hall();
    const tied = addPart(site, { kind: 'coupler', bus: 'main', to: 'sub' }).apply(site);
    const clip = carried(clipItems(tied, { parts: ['coupler1'], buses: [] }));
    const edit = pasteClip(tied, clip, 'main');
    expect(edit.elementIds).toHaveLength(1);
    expect(edit.busIds).toHaveLength(1);
    expect(errorsOf(edit.apply(tied))).toEqual([]);
  });

  it('of a busbar are all that hangs from it, and its feed stays', () => {
    const clip = carried(clipItems(hall(), { parts: [], buses: ['main'] }));
    expect(clip.study.elements.map(({ id }) => id).sort()).toEqual([
      'bank1',
      'cable1',
      'converter1',
      'converter2',
    ]);
    expect(clip.hangsFrom).toEqual([]);
    const edit = pasteClip(hall(), clip, 'in');
    expect(edit.words).toBe('paste 4 parts and 2 busbars');
    expect(edit.apply(hall()).buses.map(({ name }) => name)).toContain('Main board 2');
  });

  it('in an empty study bring the busbar they hung from', () => {
    const clip = carried(clipItems(hall(), { parts: ['grid', 'supply1'], buses: [] }));
    const after = pasteClip(newStudy(), clip, null).apply(newStudy());
    expect(after.buses).toMatchObject([{ name: 'Intake', nominalV: 20_000, pcc: true }]);
    expect(after.elements).toMatchObject([{ kind: 'supply', bus: after.buses[0]?.id }]);
  });

  it('say another voltage, another frequency and the values of cases that stay behind', () => {
    const base = hall();
    const site: Study = { ...base, cases: [{ id: 'base', changes: [] }] };
    const copy = duplicateCase(site, 'base');
    const cased = copy.apply(site);
    const off = updateElement(cased, 'bank1', { on: false }, { caseId: copy.caseId }).apply(cased);
    const clip = carried(clipItems(off, { parts: ['bank1'], buses: [] }));
    const { remarks } = pasteClip(desks, clip, desks.buses[0]!.id);
    expect(remarks).toHaveLength(3);
    expect(remarks[0]).toMatch(/hung at 400.V and hang at/);
    expect(remarks[1]).toMatch(/60 Hz/);
    expect(remarks[2]).toMatch(/1 value set by cases/);
    expect(pasteClip(off, clip, 'sub').remarks).toHaveLength(1);
  });

  it('of any site are pasted soundly anywhere, and copying never touches the study', () => {
    fc.assert(
      fc.property(anyStudy, fc.array(fc.nat(40), { maxLength: 5 }), fc.nat(20), (site, picks, where) => {
        fc.pre(site.buses.length > 0);
        const before = structuredClone(site);
        const items = {
          parts: picks.flatMap((pick) => site.elements[pick]?.id ?? []),
          buses: where % 3 === 0 ? [site.buses[where % site.buses.length]!.id] : [],
        };
        const sound = (study: Study) =>
          study.elements.every((part) =>
            'from' in part
              ? part.from !== part.to &&
                [part.from, part.to].every((id) => study.buses.some((b) => b.id === id))
              : study.buses.some((b) => b.id === part.bus),
          ) &&
          new Set(study.elements.map(({ id }) => id)).size === study.elements.length &&
          new Set(study.buses.map(({ id }) => id)).size === study.buses.length;
        fc.pre(sound(site));
        const clip = clipItems(site, items);
        const edit = pasteClip(site, clip, site.buses[where % site.buses.length]!.id);
        expect(sound(edit.apply(site))).toBe(true);
        expect(sound(pasteClip(newStudy(), clip, null).apply(newStudy()))).toBe(true);
        expect(sameData(site, before)).toBe(true);
      }),
      { seed: 31, numRuns: 200 },
    );
  });
});

describe('A clipboard without sound parts is refused in words', () => {
  const good = clipItems(hall(), { parts: ['cable1'], buses: [] });
  const words = (text: string) => {
    const outcome = readClip(text);
    if (outcome.ok) throw new Error('it was taken');
    return outcome;
  };

  it('text, a table, a study and nothing at all are foreign', () => {
    expect(words('')).toMatchObject({ foreign: true, words: expect.stringContaining('no text') });
    expect(words('see you at noon')).toMatchObject({
      foreign: true,
      words: expect.stringContaining('no parts'),
    });
    expect(words('kW\tcos φ\n55\t0.85')).toMatchObject({
      foreign: true,
      words: expect.stringContaining('table'),
    });
    expect(words(JSON.stringify(hall()))).toMatchObject({ words: expect.stringContaining('whole study') });
    expect(words('[1, 2]')).toMatchObject({ foreign: true });
  });

  it('damage names the part, the value and what is allowed', () => {
    const bent = JSON.parse(clipText(good));
    bent.study.elements[0].lengthM = -5;
    expect(words(JSON.stringify(bent)).words).toMatch(/Cable 1.*-5.*above 0/);
    const cut = clipText(good).slice(0, 400);
    expect(words(cut).words).toContain('cut off');
    expect(words(JSON.stringify({ ...good, version: 2 })).words).toContain('another version');
    expect(words(JSON.stringify({ ...good, hangsFrom: ['nowhere'] })).words).toContain('busbars');
    expect(words(JSON.stringify({ ...good, hangsFrom: ['main', 'sub'] })).words).toContain('both ends');
    const bare = { ...good, hangsFrom: ['main', 'sub'], study: { ...good.study, elements: [] } };
    expect(words(JSON.stringify(bare)).words).toContain('no part');
  });

  it('any text at all is read without a throw', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.json()), (text) => {
        readClip(text);
        readClip(`{"format":"varwright-parts","version":1,"study":${text}`);
        readClip(`{"format":"varwright-parts","version":1,"hangsFrom":[],"study":${text}}`);
      }),
      { seed: 32, numRuns: 300 },
    );
  });
});
