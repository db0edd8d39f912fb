import { describe, expect, it } from 'vitest';
import {
  checkStudy,
  drawnItems,
  drawnOf,
  newStudy,
  setDrawn,
  setSymbols,
  symbolSetOf,
} from '../../src/study/index.ts';

const site = newStudy({ title: 'Site', frequencyHz: 50 });

describe('What the drawing shows', () => {
  it('is everything, and IEC 60617, where the view says nothing', () => {
    expect([...drawnOf(site)]).toEqual([...drawnItems]);
    expect(symbolSetOf(site)).toBe('iec60617');
  });

  it('hides and shows one item at a time, and leaves no trace once all is shown', () => {
    const hidden = setDrawn(site, 'dials', false).apply(site);
    expect(hidden.view?.hidden).toEqual(['dials']);
    expect(setDrawn(hidden, 'dials', false).apply(hidden)).toBe(hidden);
    const two = setDrawn(hidden, 'current', false).apply(hidden);
    expect(two.view?.hidden).toEqual(['current', 'dials']);
    const back = setDrawn(two, 'current', true).apply(two);
    expect(setDrawn(back, 'dials', true).apply(back)).toEqual(site);
    expect(setDrawn(site, 'dials', false).words).toBe('hide the phasor dials on the drawing');
  });

  it('follows IEEE 315 on request and goes back to IEC 60617 without a trace', () => {
    const ieee = setSymbols(site, 'ieee315').apply(site);
    expect(symbolSetOf(ieee)).toBe('ieee315');
    expect(setSymbols(ieee, 'ieee315').apply(ieee)).toBe(ieee);
    expect(setSymbols(ieee, 'iec60617').apply(ieee)).toEqual(site);
  });

  it('takes a set or an item it does not know as the default, and refuses what is no list of words', () => {
    const later = { ...site, view: { symbols: 'another', hidden: ['stars', 'dials'] } };
    const read = checkStudy(later);
    expect(read.study && symbolSetOf(read.study)).toBe('iec60617');
    expect(read.study && drawnOf(read.study).has('dials')).toBe(false);
    const wrong = checkStudy({ ...site, view: { hidden: 'dials', symbols: 7 } });
    expect(wrong.findings.map(({ path }) => path)).toEqual(['$.view.symbols', '$.view.hidden']);
  });
});
