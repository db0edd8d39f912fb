import { describe, expect, it } from 'vitest';
import {
  type Phasor,
  phaseAngle,
  phaseAngleWords,
  phasorSpectrum,
  phasorsAt,
  reversedSpectrum,
  type ThreePhasors,
} from '../../src/charts/index.ts';
import { angleArc, arrowHead, phasorScale, phasorTip } from '../../src/charts/phasor/phasorGeometry.ts';

const polar = (size: number, degrees: number): Phasor => ({
  re: size * Math.cos((degrees * Math.PI) / 180),
  im: size * Math.sin((degrees * Math.PI) / 180),
});
const balanced = (size: number, degrees: number): ThreePhasors => [
  polar(size, degrees),
  polar(size, degrees - 120),
  polar(size, degrees + 120),
];

describe('phasors of a busbar or terminal', () => {
  it('are the stretch of the solution that belongs to its place', () => {
    const re = Float64Array.from({ length: 2 * 4 * 3 }, (_, i) => i);
    const second = phasorSpectrum({ re, im: re }, 1, 4);
    expect(phasorsAt(second, 1)).toEqual([12, 13, 14].map((value) => ({ re: value, im: value })));
    expect(phasorsAt(second, 4)?.[2]).toEqual({ re: 23, im: 23 });
    expect(phasorsAt(second, 5)).toBeNull();
    expect(phasorsAt(second, 1.5)).toBeNull();
    expect(() => phasorSpectrum({ re, im: re }, 2, 4)).toThrow(RangeError);
  });

  it('turn by half a turn when a current is shown out of its part', () => {
    const out = reversedSpectrum({ re: [1, -2, 0], im: [3, 0, -4] });
    expect(Array.from(out.re)).toEqual([-1, 2, -0]);
    expect(Array.from(out.im)).toEqual([-3, -0, 4]);
  });
});

describe('the angle φ', () => {
  it('is positive and lagging for an inductive current', () => {
    const angle = phaseAngle(balanced(230, 10), balanced(18, -24));
    expect(angle?.phase).toBe(0);
    expect(angle?.phiDeg).toBeCloseTo(34, 9);
    expect(angle && phaseAngleWords(angle)).toBe('φ 34° lagging');
  });

  it('is leading for a capacitive current, across the ±180° cut too', () => {
    const angle = phaseAngle(balanced(230, 179), balanced(18, -179));
    expect(angle?.phiDeg).toBeCloseTo(-2, 9);
    expect(angle && phaseAngleWords(angle)).toBe('φ 2° leading');
  });

  it('says that a part feeds in when the current turns its back on the voltage', () => {
    const angle = phaseAngle(balanced(230, 0), balanced(18, -165));
    expect(angle && phaseAngleWords(angle)).toBe('φ 165° lagging, feeding in');
  });

  it('is taken where the current flows when L1 carries none', () => {
    const current: ThreePhasors = [polar(0, 0), polar(20, -150), polar(0, 0)];
    expect(phaseAngle(balanced(230, 0), current)).toEqual({ phase: 1, phiDeg: expect.closeTo(30, 9) });
  });

  it('is absent without current or voltage', () => {
    expect(phaseAngle(balanced(230, 0), balanced(0, 0))).toBeNull();
    expect(phaseAngle(null, balanced(18, 0))).toBeNull();
  });
});

describe('the phasor picture', () => {
  it('scales voltage and current apart, voltages the longer', () => {
    const volts = phasorScale(balanced(230, 0), 100, 'voltage') ?? 0;
    const amps = phasorScale(balanced(1139, 0), 100, 'current') ?? 0;
    expect(volts * 230).toBeGreaterThan(amps * 1139);
    expect(volts * 230).toBeLessThanOrEqual(100);
    expect(phasorScale(balanced(0, 0), 100, 'voltage')).toBeNull();
  });

  it('turns anticlockwise with time, y downwards on screen', () => {
    const tip = phasorTip(polar(1, 0), 10, 0.25);
    expect(tip.x).toBeCloseTo(0, 12);
    expect(tip.y).toBeCloseTo(-10, 12);
  });

  it('draws the arc the short way from current to voltage', () => {
    const lagging = angleArc(polar(1, -30), polar(1, 0), 10, 0);
    const leading = angleArc(polar(1, 30), polar(1, 0), 10, 0);
    expect(lagging).toMatch(/^M8\.66,5\.00A10\.00,10\.00 0 0 0 10\.00,/);
    expect(leading).toMatch(/^M8\.66,-5\.00A10\.00,10\.00 0 0 1 10\.00,/);
  });

  it('draws no head on a phasor too short to see', () => {
    expect(arrowHead({ x: 0.1, y: 0 }, 8)).toBe('');
    expect(arrowHead({ x: 20, y: 0 }, 8)).toContain('M20.00,0.00');
  });
});
