import { Complex } from 'complex.js';
import { describe, expect, it } from 'vitest';
import { bankLaw } from '../../src/engine/models/bank.ts';
import { cableLaw } from '../../src/engine/models/cable.ts';
import { converterFilterLaw } from '../../src/engine/models/converter.ts';
import { couplerLaw } from '../../src/engine/models/coupler.ts';
import { filterLaw } from '../../src/engine/models/filter.ts';
import { branchLaw, shuntLaw } from '../../src/engine/models/freeRLC.ts';
import { loadLaw, reactivePower } from '../../src/engine/models/load.ts';
import { motorLaw, motorPower } from '../../src/engine/models/motor.ts';
import type { PartLaw } from '../../src/engine/models/PartLaw.ts';
import { reactorLaw } from '../../src/engine/models/reactor.ts';
import { skinFactor } from '../../src/engine/models/skinFactor.ts';
import { generatorOhm, sourceLaw, supplyOhm } from '../../src/engine/models/source.ts';
import { transformerLaw } from '../../src/engine/models/transformer.ts';
import { windingOf } from '../../src/engine/models/vectorGroup.ts';

/** Every kind of part against its closed form, written once more with complex.js. */
const omega = 2 * Math.PI * 50;
const orders = [0.7, 1, 2, 3.5, 5, 13, 49];

function valuesOf(law: PartLaw, h: number): Complex[] {
  const out = new Float64Array(16).fill(7);
  law(h, out, 2);
  return Array.from({ length: 6 }, (_, k) => new Complex(out[2 + 2 * k] ?? 0, out[3 + 2 * k] ?? 0));
}

function expectClose(got: Complex | undefined, want: Complex, digits = 11): void {
  expect(got?.sub(want).abs() ?? Number.NaN).toBeLessThanOrEqual(10 ** -digits * Math.max(want.abs(), 1e-30));
}

const z = (re: number, im: number): Complex => new Complex(re, im);
const skin = (h: number, s: number, e: number): number => 1 - s + s * h ** e;

describe('resistance over frequency', () => {
  it.each([0, 0.5, 1, 1.5, 2, 0.73])('is R·((1 − s) + s·h^e) for e = %d', (e) => {
    for (const h of orders) expect(skinFactor(h, [0.3, e])).toBeCloseTo(skin(h, 0.3, e), 12);
    expect(skinFactor(17, [0, e])).toBe(1);
  });
});

describe('sources', () => {
  it('supply: |Z1| = U²/Ssc split by X/R, Z0 by its ratio, open without a neutral', () => {
    const ohm = supplyOhm(20000, 250);
    expect(ohm).toBeCloseTo(1.6, 12);
    const r = ohm / Math.sqrt(101);
    for (const h of orders) {
      const [y0, y1] = valuesOf(
        sourceLaw({ ohm, xOverR: 10, z0OverZ1: 2.5, neutral: true, skin: [0.2, 1] }),
        h,
      );
      const want = z(r * skin(h, 0.2, 1), h * 10 * r).inverse();
      expectClose(y1, want);
      expectClose(y0, want.div(2.5));
    }
    const open = valuesOf(sourceLaw({ ohm, xOverR: 10, z0OverZ1: 1, neutral: false, skin: [0, 1] }), 3);
    expect(open[0]?.abs()).toBe(0);
  });

  it('generator: x″d of its own rating', () => {
    expect(generatorOhm(400, 15, 1000)).toBeCloseTo(0.024, 15);
  });
});

describe('transformer', () => {
  const data = {
    ratedKVA: 1000,
    hvV: 20000,
    lvV: 400,
    ukPercent: 6,
    loadLossKW: 7.6,
    vectorGroup: 'Dyn11',
    tapPercent: 2.5,
    z0OverZ1: 0.9,
    neutralOhm: 0.01,
    noLoadLossKW: 1.2,
    noLoadCurrentPercent: 1,
    skin: [1 / 11, 1.5] as [number, number],
  };
  const n = 51.25;
  const series = (h: number): Complex =>
    z(1.216e-3 * skin(h, 1 / 11, 1.5), h * Math.sqrt(9.6e-3 ** 2 - 1.216e-3 ** 2));
  const g = 1200 / 160000;
  const b = Math.sqrt(0.0625 ** 2 - g * g);

  it('has R 1.216 mΩ and X 9.52268 mΩ at 400 V (benchmark of closed-form physics)', () => {
    expect(series(1).re).toBeCloseTo(1.216e-3, 12);
    expect(series(1).im).toBeCloseTo(9.52268e-3, 8);
  });

  it('Dyn: y/n² and y with the magnetising branch, y0 at LV behind three times the star point resistor', () => {
    for (const h of orders) {
      const y = series(h).inverse();
      const [ff0, ff1, tt0, tt1, ft0, ft1] = valuesOf(transformerLaw(data), h);
      expectClose(ff1, y.div(n * n));
      expectClose(tt1, y.add(z(g, -b / h)));
      expectClose(ft1, y.div(-n));
      expectClose(tt0, series(h).mul(0.9).add(0.03).inverse());
      expect([ff0?.abs(), ft0?.abs()]).toEqual([0, 0]);
    }
  });

  it.each([
    ['YNyn0', -1],
    ['YNyn4', -1],
    ['YNyn6', 1],
    ['YNyn10', 1],
  ] as const)('%s passes zero sequence through with its clock’s sign', (vectorGroup, sign) => {
    const [ff0, , tt0, , ft0] = valuesOf(transformerLaw({ ...data, vectorGroup, neutralOhm: 0 }), 5);
    const y0 = series(5).mul(0.9).inverse();
    expectClose(ff0, y0.div(n * n));
    expectClose(tt0, y0);
    expectClose(ft0, y0.mul(sign).div(n));
  });

  it('YNd earths the HV side alone, the star point resistor there at its own voltage', () => {
    const [ff0, , tt0] = valuesOf(transformerLaw({ ...data, vectorGroup: 'YNd5', neutralOhm: 20 }), 3);
    expectClose(
      ff0,
      series(3)
        .mul(0.9 * n * n)
        .add(60)
        .inverse(),
    );
    expect(tt0?.abs()).toBe(0);
  });

  it.each(['Dd0', 'Yy6', 'Yd1', 'YNy0', 'Dy5', 'Yz11', 'Dz0'])(
    '%s is open in zero sequence on both sides',
    (vectorGroup) => {
      const [ff0, , tt0, , ft0] = valuesOf(transformerLaw({ ...data, vectorGroup, neutralOhm: 0 }), 3);
      expect([ff0?.abs(), tt0?.abs(), ft0?.abs()]).toEqual([0, 0, 0]);
    },
  );

  it.each(['Dyn1', 'Dzn0', 'Yzn5', 'YNzn11', 'Yyn0'])('%s earths the LV side alone', (group) => {
    expect(windingOf(group).zeroPath).toBe('lv');
  });

  it('refuses losses beyond its impedance voltage or its no-load current', () => {
    expect(() => transformerLaw({ ...data, loadLossKW: 61 })).toThrow(RangeError);
    expect(() => transformerLaw({ ...data, noLoadLossKW: 11 })).toThrow(RangeError);
    expect(() => transformerLaw({ ...data, vectorGroup: 'Dyn12' })).toThrow(RangeError);
  });
});

describe('cable', () => {
  const data = {
    lengthM: 2200,
    resistanceOhmPerKm: 0.21,
    reactanceOhmPerKm: 0.11,
    capacitanceNFPerKm: 340,
    r0OverR1: 4,
    x0OverX1: 3,
    c0OverC1: 0.6,
    runs: 2,
    skin: [0.26, 0.5] as [number, number],
  };

  /** γ = √(z·yc), Zc = z/γ: series Zc·sinh(γl), ends tanh(γl/2)/Zc. */
  function pi(h: number, length: number, r: number, x: number, c: number): { own: Complex; mutual: Complex } {
    const impedance = z(r * skin(h, 0.26, 0.5), h * x);
    const shunt = z(0, h * omega * c * 1e-9);
    const gamma = impedance.mul(shunt).sqrt();
    const zc = impedance.div(gamma);
    const series = zc.mul(gamma.mul(length).sinh()).inverse();
    return {
      own: series
        .add(
          gamma
            .mul(length / 2)
            .tanh()
            .div(zc),
        )
        .mul(2),
      mutual: series.mul(-2),
    };
  }

  it.each([0.05, 2.2, 30, 400])(
    'is the exact equivalent π at %d km, short or long against the wave',
    (km) => {
      for (const h of orders) {
        const [ff0, ff1, tt0, tt1, ft0, ft1] = valuesOf(cableLaw({ ...data, lengthM: km * 1e3 }, omega), h);
        const one = pi(h, km, 0.21, 0.11, 340);
        const zero = pi(h, km, 0.84, 0.33, 204);
        expectClose(ff1, one.own, 9);
        expectClose(tt1, one.own, 9);
        expectClose(ft1, one.mutual, 9);
        expectClose(ff0, zero.own, 9);
        expectClose(tt0, zero.own, 9);
        expectClose(ft0, zero.mutual, 9);
      }
    },
  );

  it('without capacitance is its series impedance alone, runs in parallel', () => {
    for (const h of orders) {
      const [ff0, ff1, , tt1, , ft1] = valuesOf(cableLaw({ ...data, capacitanceNFPerKm: 0 }, omega), h);
      const y = z(0.462 * skin(h, 0.26, 0.5), h * 0.242)
        .inverse()
        .mul(2);
      expectClose(ff1, y);
      expectClose(tt1, y);
      expectClose(ft1, y.neg());
      expectClose(
        ff0,
        z(1.848 * skin(h, 0.26, 0.5), h * 0.726)
          .inverse()
          .mul(2),
      );
    }
  });
});

describe('reactor, coupler, free R-L-C', () => {
  it('reactor and coupler: one impedance in all sequences', () => {
    for (const h of orders) {
      const reactor = valuesOf(
        reactorLaw({ inductanceMH: 0.4, resistanceOhm: 0.01, skin: [0.5, 1] }, omega),
        h,
      );
      const y = z(0.01 * skin(h, 0.5, 1), h * omega * 0.4e-3).inverse();
      for (const k of [0, 1, 2, 3]) expectClose(reactor[k], y);
      for (const k of [4, 5]) expectClose(reactor[k], y.neg());
      const coupler = valuesOf(couplerLaw({ resistanceMOhm: 0.02, reactanceMOhm: 0.1 }), h);
      expectClose(coupler[0], z(2e-5, h * 1e-4).inverse());
    }
  });

  it('branch: absent parts are a short in series and open in parallel', () => {
    const lc = { inductanceMH: 2, capacitanceUF: 40 };
    for (const h of orders) {
      const x = h * omega * 2e-3;
      const b = h * omega * 40e-6;
      const full = { resistanceOhm: 5, ...lc };
      expectClose(
        valuesOf(branchLaw({ ...full, arrangement: 'series' }, omega), h)[0],
        z(5, x - 1 / b).inverse(),
      );
      expectClose(valuesOf(branchLaw({ ...full, arrangement: 'parallel' }, omega), h)[2], z(0.2, b - 1 / x));
      expectClose(valuesOf(branchLaw({ resistanceOhm: 5, arrangement: 'series' }, omega), h)[0], z(0.2, 0));
      expectClose(
        valuesOf(branchLaw({ inductanceMH: 2, arrangement: 'parallel' }, omega), h)[0],
        z(0, -1 / x),
      );
    }
  });

  it('shunt: to neutral or open in zero sequence', () => {
    const data = { resistanceOhm: 2, capacitanceUF: 40, arrangement: 'series' } as const;
    const y = z(2, -1 / (3 * omega * 40e-6)).inverse();
    const [joined, one] = valuesOf(shuntLaw({ ...data, neutral: true }, omega), 3);
    expectClose(one, y);
    expectClose(joined, y);
    expect(valuesOf(shuntLaw({ ...data, neutral: false }, omega), 3)[0]?.abs()).toBe(0);
  });
});

describe('loads and motors', () => {
  it('load: conductance of P, inductance or capacitance of Q at nominal voltage', () => {
    const q = reactivePower(50e3, 0.8, false);
    expect(q).toBeCloseTo(37.5e3, 6);
    expect(reactivePower(-50e3, 0.8, false)).toBeCloseTo(37.5e3, 6);
    expect(reactivePower(50e3, 0.8, true)).toBeCloseTo(-37.5e3, 6);
    for (const h of orders) {
      const [y0, y1] = valuesOf(loadLaw(50e3, q, 400, true), h);
      expectClose(y1, z(0.3125, -0.234375 / h));
      expectClose(y0, z(0.3125, -0.234375 / h));
      expectClose(valuesOf(loadLaw(50e3, -q, 400, false), h)[1], z(0.3125, 0.234375 * h));
    }
  });

  it('motor: locked-rotor impedance with R·√h, zero sequence open', () => {
    const data = {
      ratedKW: 55,
      count: 3,
      loadPercent: 70,
      efficiency: 0.94,
      powerFactor: 0.85,
      lockedRotorRatio: 6,
      lockedRotorPowerFactor: 0.3,
    };
    // 55·3·0.7/0.94 kW, as in the first reference study: 122.872 kW.
    expect(motorPower(data)).toBeCloseTo(122872.34, 2);
    const ohm = 400 ** 2 / ((165e3 / (0.94 * 0.85)) * 6);
    for (const h of orders) {
      const [y0, y1] = valuesOf(motorLaw(data, 400), h);
      expectClose(y1, z(0.3 * ohm * Math.sqrt(h), h * ohm * Math.sqrt(1 - 0.09)).inverse());
      expect(y0?.abs()).toBe(0);
    }
  });

  it('converter: its own filter capacitor alone', () => {
    const [y0, y1] = valuesOf(converterFilterLaw(30, omega), 7);
    expectClose(y1, z(0, 7 * omega * 30e-6));
    expect(y0?.abs()).toBe(0);
  });
});

describe('banks and filters', () => {
  const bank = {
    steps: [{ kvar: 50 }, { kvar: 50 }, { kvar: 50, on: false }],
    ratedV: 440,
    detuningPercent: 7,
    reactorQ: 50,
    reactorSkin: [0.1, 2] as [number, number],
    lossWPerKvar: 0.3,
    connection: 'delta' as const,
  };

  it('bank: Rc + RL(h) + j(h·XL − Xc/h) of the steps that are on, zero sequence only star-earthed', () => {
    const xc = 440 ** 2 / 100e3;
    for (const h of orders) {
      const want = z(0.3e-3 * xc + ((0.07 * xc) / 50) * skin(h, 0.1, 2), h * 0.07 * xc - xc / h).inverse();
      const [y0, y1] = valuesOf(bankLaw(bank), h);
      expectClose(y1, want);
      expect(y0?.abs()).toBe(0);
      expectClose(valuesOf(bankLaw({ ...bank, connection: 'star-earthed' }), h)[0], want);
    }
    expect(() => bankLaw({ ...bank, steps: [{ kvar: 50, on: false }] })).toThrow(RangeError);
  });

  it('filters: their textbook circuits', () => {
    const data = { kvar: 300, tunedOrder: 4.8, qFactor: 12, lossWPerKvar: 0.3, connection: 'delta' as const };
    const net = 6600 ** 2 / 300e3;
    const xc = (net * 4.8 ** 2) / (4.8 ** 2 - 1);
    const xl = xc / 4.8 ** 2;
    for (const h of orders) {
      const capacitor = z(0.3e-3 * xc, -xc / h);
      expectClose(
        valuesOf(filterLaw({ ...data, type: 'single-tuned' }, 6600), h)[1],
        capacitor.add(z((4.8 * xl) / 12, h * xl)).inverse(),
      );
      const damped = z(1 / (12 * 4.8 * xl), -1 / (h * xl)).inverse();
      expectClose(
        valuesOf(filterLaw({ ...data, type: 'high-pass' }, 6600), h)[1],
        capacitor.add(damped).inverse(),
      );
      if (h === 1) continue;
      const l = net / (4.8 ** 2 - 1);
      const branch = z(1 / (12 * 4.8 * l), -1 / (h * l - l / h)).inverse();
      const c1 = z(0.3e-3 * net, -net / h);
      expectClose(valuesOf(filterLaw({ ...data, type: 'c-type' }, 6600), h)[1], c1.add(branch).inverse(), 10);
    }
  });
});
