import { describe, expect, it } from 'vitest';
import {
  addBus,
  addPart,
  elementKinds,
  newStudy,
  type Study,
  siteFindings,
} from '../../../src/study/index.ts';
import { soundSite } from './soundSite.ts';

const codes = (study: Study, ...severities: string[]) =>
  siteFindings(study).flatMap(({ severity, code }) => (severities.includes(severity) ? [code] : []));

describe('Findings are not noisy', () => {
  it.each(elementKinds)(
    'a new %s with its typical values is neither error nor warning on a sound site',
    (kind) => {
      const study = soundSite();
      const next = addPart(study, { kind, bus: kind === 'supply' ? 'intake' : 'main' }).apply(study);
      const expected = kind === 'supply' ? ['fault-level-min'] : [];
      expect(codes(next, 'error', 'warning')).toEqual(expected);
    },
  );

  it('a site in the making asks for what a supply and a point of common coupling need, and no more', () => {
    let study: Study = newStudy();
    study = addBus(study).apply(study);
    expect(codes(study, 'error', 'warning')).toEqual(['no-source', 'no-pcc']);
    study = addPart(study, { kind: 'supply', bus: 'bus1' }).apply(study);
    study = addPart(study, { kind: 'transformer', bus: 'bus1' }).apply(study);
    expect(codes(study, 'error', 'warning')).toEqual(['fault-level-min', 'no-pcc']);
  });

  it('stands in order of gravity and is remembered with the study', () => {
    const study = newStudy();
    const drawn = addBus(study).apply(study);
    const found = siteFindings(drawn);
    expect(siteFindings(drawn)).toBe(found);
    expect(found.map(({ severity }) => severity)).toEqual(['error', 'warning']);
  });
});

describe('What holds in some cases alone', () => {
  it('names them, and the mend goes where the value came from', () => {
    const site = soundSite();
    const study: Study = {
      ...site,
      cases: (site.cases ?? []).map((item) =>
        item.id === 'night'
          ? { ...item, changes: [...item.changes, { element: 't1', set: { ukPercent: 0.06 } }] }
          : item,
      ),
      elements: site.elements.map((part) =>
        part.kind === 'transformer' ? { ...part, loadLossKW: 0.1 } : part,
      ),
    };
    const finding = siteFindings(study).find(({ code }) => code === 'fraction-for-percent');
    expect(finding).toMatchObject({
      cases: ['night'],
      subject: { kind: 'element', id: 't1' },
      field: 'ukPercent',
    });
    expect(finding?.message).toContain('transformer T1, in Night:');
    const mended = finding?.repair?.apply(study);
    expect(mended?.elements).toBe(study.elements);
    expect(siteFindings(mended as Study).some(({ code }) => code === 'fraction-for-percent')).toBe(false);
  });

  it('an empty busbar that a case leaves dead is meant so', () => {
    const site = soundSite();
    const study: Study = {
      ...site,
      elements: site.elements.filter(({ id }) => id !== 'fans' && id !== 'drive'),
      cases: [{ id: 'out', name: 'W1 out', role: 'light', changes: [{ element: 'w1', set: { on: false } }] }],
    };
    expect(codes(study, 'error', 'warning')).toEqual([]);
  });
});
