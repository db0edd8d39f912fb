import { describe, expect, it } from 'vitest';
import { capacitorCurrentLimit, capacitorVoltageLimit, limitSet } from '../../src/checks/index.ts';
import { capacitorKvarLimit, capacitorPeakLimit } from '../../src/checks/limits/capacitorLimit.ts';

const set = (id: string) => {
  const found = limitSet(id);
  if (!found) throw new Error(`no limit set ${id}`);
  return found;
};

describe('capacitor limits as their documents state them', () => {
  // IEC 60831-1:2014, long-duration voltages. From memory.
  it.each([
    [24, 1],
    [12, 1],
    [8.01, 1],
    [8, 1.1],
    [1, 1.1],
    [0.5, 1.15],
    [5 / 60, 1.2],
    [1 / 60, 1.3],
  ])('IEC 60831-1 for %f h a day', (hours, ratio) => {
    expect(capacitorVoltageLimit(set('iec-60831-1'), hours)?.value).toBe(ratio);
  });

  it('IEC 60871-1 allows 1.10 for 12 hours in 24 (from memory)', () => {
    expect(capacitorVoltageLimit(set('iec-60871-1'), 12)?.value).toBe(1.1);
    expect(capacitorVoltageLimit(set('iec-60871-1'), 13)?.value).toBe(1);
  });

  // IEEE 18-2012: 110 % rms voltage, 120 % crest, 135 % rms current, 135 % kvar. From memory.
  it('IEEE 18 bears 1.10 rms, 1.20 crest, 1.35 current and 1.35 kvar', () => {
    const ieee18 = set('ieee-18');
    expect(capacitorVoltageLimit(ieee18, 24)?.value).toBe(1.1);
    expect(capacitorPeakLimit(ieee18)?.value).toBe(1.2);
    expect(capacitorCurrentLimit(ieee18)?.value).toBe(1.35);
    expect(capacitorKvarLimit(ieee18)?.value).toBe(1.35);
  });

  it('IEC documents allow 1.30 times rated current (from memory)', () => {
    expect(capacitorCurrentLimit(set('iec-60831-1'))?.value).toBe(1.3);
    expect(capacitorCurrentLimit(set('iec-60871-1'))?.value).toBe(1.3);
  });

  it('borrow the crest and kvar limits of IEEE 18 and name it as the source', () => {
    expect(capacitorPeakLimit(set('iec-60831-1'))).toMatchObject({
      value: 1.2,
      source: { document: 'IEEE 18' },
    });
    expect(capacitorKvarLimit(set('iec-60831-1'))).toMatchObject({
      value: 1.35,
      source: { document: 'IEEE 18' },
    });
  });
});
