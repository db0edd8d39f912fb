import { describe, expect, it } from 'vitest';
import { phasorValues } from '../../src/charts/phasor/phasorValues.ts';
import { railValues } from '../../src/charts/rail/railValues.ts';
import { spectrumValues } from '../../src/charts/spectrum/spectrumValues.ts';
import { waveValues } from '../../src/charts/waveform/waveValues.ts';
import { railScan } from './railScan.ts';

/** 230 V balanced, with a fifth of a tenth of it in the first phase alone. */
function spectrum() {
  const re = new Float64Array(15);
  const im = new Float64Array(15);
  [0, -120, 120].forEach((degrees, phase) => {
    re[phase] = 230 * Math.cos((degrees * Math.PI) / 180);
    im[phase] = 230 * Math.sin((degrees * Math.PI) / 180);
  });
  re[12] = 23;
  return { re, im };
}

describe('the numbers of a figure for a spreadsheet', () => {
  it('of phasors are rms and angle of each phase under the names the study gives them', () => {
    const three = [
      { re: 230, im: 0 },
      { re: -115, im: -199.186 },
      { re: -115, im: 199.186 },
    ] as const;
    expect(phasorValues(three, null, ['A', 'B', 'C'])).toEqual([
      ['phase', 'U, V', 'U, °'],
      ['A', '230', '0'],
      ['B', '230', '-120'],
      ['C', '230', '120'],
    ]);
  });

  it('of a waveform cover one period in milliseconds, both ends alike', () => {
    const [head, ...rows] = waveValues({ voltage: spectrum(), current: null, frequencyHz: 50, maxOrder: 5 });
    expect(head).toEqual(['t, ms', 'u L1, V', 'u L2, V', 'u L3, V']);
    expect(rows[0]?.[0]).toBe('0');
    expect(rows.at(-1)?.[0]).toBe('20');
    expect(rows.at(-1)?.slice(1)).toEqual(rows[0]?.slice(1));
    expect(Number(rows[0]?.[1])).toBeCloseTo(Math.SQRT2 * 253, 2);
  });

  it('of a spectrum leave an order without a limit empty', () => {
    const bar = { value: 11.5, percent: 5, fails: false };
    expect(
      spectrumValues(
        [
          { ...bar, h: 5, limit: 6 },
          { ...bar, h: 6, limit: null },
        ],
        'voltage',
      ),
    ).toEqual([
      ['order', '% of fundamental', 'U, V', 'limit, %'],
      ['5', '5', '11.5', '6'],
      ['6', '5', '11.5', ''],
    ]);
  });

  it('of the rail are the points of the scan with the impedance without the correction beside them', () => {
    const scan = railScan(300, 0);
    const [head, ...rows] = railValues(scan, 50);
    expect(head).toHaveLength(5);
    expect(rows).toHaveLength(scan.with.frequencyHz.length);
    for (const row of rows) for (const cell of row) expect(Number.isFinite(Number(cell))).toBe(true);
    const first = rows[0]?.map(Number) ?? [];
    expect(first[0]).toBeCloseTo(0.8, 6);
    expect(first[2]).toBeCloseTo(Math.hypot(scan.with.re[0] ?? 0, scan.with.im[0] ?? 0), 6);
  });
});
