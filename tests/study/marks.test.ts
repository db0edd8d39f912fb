import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addMark,
  checkStudy,
  type DrawingMark,
  type Edit,
  fingerprint,
  marksOf,
  moveMark,
  newStudy,
  phaseColoursOf,
  phaseNamesOf,
  readStudy,
  removeMark,
  removeParts,
  type Study,
  setMarkText,
  setPhaseColours,
  setPhaseLabels,
  writeStudy,
} from '../../src/study/index.ts';

const site: Study = {
  ...newStudy({ title: 'Marked', frequencyHz: 50 }),
  buses: [{ id: 'main', name: 'Main', nominalV: 400 }],
  elements: [
    { id: 's', kind: 'supply', bus: 'main', shortCircuitMVA: 20, xOverR: 5 },
    { id: 'c1', kind: 'bank', name: 'Bank C1', bus: 'main', ratedV: 400, steps: [{ kvar: 25 }] },
  ],
};

const atBank = { x: 120, y: 80, by: { kind: 'element' as const, id: 'c1', dx: 30, dy: -10 } };
const note = { kind: 'note' as const, text: 'check the discharge time\nbefore approval', from: atBank };
const arrow = { kind: 'arrow' as const, text: '', from: { x: 10, y: 10 }, to: atBank };

/** An edit does something, says what, leaves the study before it alone, and does it once. */
function done(study: Study, edit: Edit): Study {
  const kept = structuredClone(study);
  const next = edit.apply(study);
  expect(next).not.toBe(study);
  expect(study).toEqual(kept);
  expect(edit.words).not.toBe('');
  expect(checkStudy(next).study).not.toBeNull();
  return next;
}

describe('marks on the drawing', () => {
  it('are written, moved, reworded and removed, each said in words', () => {
    const write = addMark(site, note);
    expect(write.words).toBe('write the note “check the discharge time”');
    const written = done(site, write);
    expect(marksOf(written)).toEqual([{ id: 'note1', ...note }]);

    const move = moveMark(written, 'note1', { from: { x: 5, y: 6 } });
    expect(move.words).toBe('move the note “check the discharge time”');
    expect(marksOf(done(written, move))[0]?.from).toEqual({ x: 5, y: 6 });
    expect(moveMark(written, 'note1', { from: atBank }).apply(written)).toBe(written);

    const reworded = done(written, setMarkText(written, 'note1', 'approved'));
    expect(marksOf(reworded)[0]?.text).toBe('approved');
    expect(removeMark(reworded, 'note1').words).toBe('remove the note “approved”');
    const bare = done(reworded, removeMark(reworded, 'note1'));
    expect(bare).toEqual(site);
  });

  it('go with their last word, unless they outline or point', () => {
    const both = done(done(site, addMark(site, note)), addMark(site, arrow));
    const wordless = done(both, setMarkText(both, 'note1', '  '));
    expect(marksOf(wordless).map(({ id }) => id)).toEqual(['arrow1']);
    expect(setMarkText(wordless, 'arrow1', '').apply(wordless)).toBe(wordless);
  });

  it('keep their place when the part they follow is removed', () => {
    const both = done(done(site, addMark(site, note)), addMark(site, arrow));
    const after = done(both, removeParts(both, ['c1']));
    expect(marksOf(after).map(({ from, to }) => [from, to])).toEqual([
      [{ x: 120, y: 80 }, undefined],
      [
        { x: 10, y: 10 },
        { x: 120, y: 80 },
      ],
    ]);
  });

  it('travel with the file and never decide a number', () => {
    const marked = done(done(site, addMark(site, note)), addMark(site, arrow));
    const { study } = readStudy(writeStudy(marked));
    expect(study && marksOf(study)).toEqual(marksOf(marked));
    expect(fingerprint(marked)).toBe(fingerprint(site));
  });

  it('of a later version stay in the file, are not drawn, and are no reason to refuse it', () => {
    const strange = { id: 'x', kind: 'hologram', text: 'hm', from: { x: 1, y: 2 } } as unknown as DrawingMark;
    const broken = [null, 7, 'note', { id: 'note1' }] as unknown as DrawingMark[];
    const given: Study = { ...site, view: { marks: [strange, ...broken] } };
    const { study, findings } = checkStudy(given);
    expect(findings.filter(({ code }) => code === 'unknown-mark')).toMatchObject([{ severity: 'warning' }]);
    if (!study) throw new Error('refused');
    expect(marksOf(study)).toEqual([]);
    const written = addMark(study, note).apply(study);
    expect(written.view?.marks).toHaveLength(6);
    const without = removeParts(written, ['c1']).apply(written);
    expect(without.view?.marks).toHaveLength(6);
    expect(removeMark(without, 'note1').apply(without).view?.marks).toEqual([strange, ...broken]);
  });

  it('are refused as a whole only where they are no list', () => {
    const { study, findings } = checkStudy({ ...site, view: { marks: 'x' as unknown as DrawingMark[] } });
    expect(study).toBeNull();
    expect(findings.map(({ path }) => path)).toContain('$.view.marks');
  });

  it('of any words are only data', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        const written = addMark(site, { ...arrow, text }).apply(site);
        const { study } = readStudy(writeStudy(written));
        expect(study && marksOf(study)[0]?.text).toBe(text);
      }),
      { seed: 12 },
    );
  });
});

describe('phases', () => {
  it('are called and coloured as the study says, on every page alike', () => {
    expect(phaseNamesOf(site)).toEqual(['L1', 'L2', 'L3']);
    expect(phaseColoursOf(site)).toBe('brown-black-grey');
    const named = done(site, setPhaseLabels(site, 'ABC'));
    const both = done(named, setPhaseColours(named, 'red-yellow-blue'));
    expect(phaseNamesOf(both)).toEqual(['A', 'B', 'C']);
    expect(phaseColoursOf(both)).toBe('red-yellow-blue');
    const plain = setPhaseColours(both, 'brown-black-grey').apply(both);
    expect(setPhaseLabels(plain, 'L123').apply(plain)).toEqual(site);
    expect(fingerprint(both)).toBe(fingerprint(site));
  });

  it('of unknown names or colours are those of IEC 60445', () => {
    const odd = { ...site, view: { phases: { labels: 'RYB', colours: 'plaid' } } } as unknown as Study;
    expect(checkStudy(odd).study).not.toBeNull();
    expect(phaseNamesOf(odd)).toEqual(['L1', 'L2', 'L3']);
    expect(phaseColoursOf(odd)).toBe('brown-black-grey');
  });
});
