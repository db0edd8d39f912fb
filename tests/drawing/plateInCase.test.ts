import { describe, expect, it } from 'vitest';
import { layoutStudy, plateInCase, textWidth, wrapWords } from '../../src/drawing/index.ts';
import { differencesByPart } from '../../src/drawing/layout/index.ts';
import { elementById, type Study, studyInCase } from '../../src/study/index.ts';
import { soundSite } from '../study/findings/soundSite.ts';

const site: Study = {
  ...soundSite(),
  cases: [
    { id: 'day', changes: [] },
    {
      id: 'night',
      changes: [
        { element: 'c1', set: { steps: [{ kvar: 50 }, { kvar: 50, on: false }] } },
        { element: 'fans', set: { loadPercent: 60 } },
        { element: 'heat', set: { on: false } },
        { element: 't1', set: { tapPercent: 2.5 } },
      ],
    },
  ],
};

function plate(id: string, caseId: string): string {
  const here = studyInCase(site, caseId);
  const part = elementById(here, id);
  if (!part) throw new Error(`no part ${id}`);
  return plateInCase(part, here, differencesByPart(site, caseId).get(id) ?? []).replaceAll('\u00a0', ' ');
}

describe('The nameplate in a case', () => {
  it('marks the piece that differs from the base study with a Δ, in words', () => {
    expect(plate('c1', 'night')).toBe('Δ 50 of 100 kvar at 440 V, 7 %');
    expect(plate('fans', 'night')).toBe('90 kW · Δ 60 % load');
  });

  it('says before it what no nameplate tells: out of service, a tap', () => {
    expect(plate('heat', 'night')).toBe('Δ off · 120 kW · 0.98 lag');
    expect(plate('t1', 'night')).toBe('Δ tap 2.5\u2009% · 1\u2009000 kVA · Dyn11 · 6 %');
  });

  it('is plain where the case changes nothing', () => {
    expect(plate('c1', 'day')).toBe('100 kvar at 440 V, 7 %');
  });

  it('has the same room in every case, wide enough for its marks', () => {
    const place = layoutStudy(site).parts.find(({ id }) => id === 'fans');
    const lines = wrapWords(plate('fans', 'night'), place?.label.width ?? 0, place?.text.plateLines ?? 0);
    expect(lines.join(' ')).toContain('Δ 60 % load');
    for (const line of lines) expect(textWidth(line)).toBeLessThanOrEqual(place?.label.width ?? 0);
  });
});
