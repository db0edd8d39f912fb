import { describe, expect, it } from 'vitest';
import { solveCase } from '../../src/engine/index.ts';
import { kvarAtBus } from '../../src/sizing/index.ts';
import { site } from '../checks/site.ts';

// Invented site; the laws tested are the definition of the power factor and the balance at a busbar.
describe('kvar to add at a busbar', () => {
  const bare = site({ bank: null });

  it('is Q − P·tan φ2 of the power the network feeds in', () => {
    const at = kvarAtBus(bare, solveCase(bare, 'base'), 'LV', 0.95);
    // 400 kW at 0.80 and 200 kW at 0.95, both constant power, hang from the busbar.
    expect(at?.kW).toBeCloseTo(600, 6);
    expect(at?.kvar).toBeCloseTo(400 * Math.tan(Math.acos(0.8)) + 200 * Math.tan(Math.acos(0.95)), 6);
    expect(at?.additionalKvar).toBeCloseTo((at?.kvar ?? 0) - 600 * Math.tan(Math.acos(0.95)), 9);
    expect(at?.working.at(-1)?.numbers).toMatch(/kvar/);
  });

  it('a bank that gives that kvar brings the busbar to the target', () => {
    const solution = solveCase(bare, 'base');
    const need = kvarAtBus(bare, solution, 'LV', 0.95)?.additionalKvar ?? 0;
    const corrected = site({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: need }] } });
    const after = kvarAtBus(corrected, solveCase(corrected, 'base'), 'LV', 0.95);
    // The bank gives its kvar at 400 V; the busbar stands within a few per cent of that.
    expect(after?.displacementPF).toBeCloseTo(0.95, 1);
    expect(Math.abs(after?.additionalKvar ?? need)).toBeLessThan(0.12 * need);
  });

  it('counts more at the supply, where the transformer draws its own kvar', () => {
    const solution = solveCase(bare, 'base');
    const low = kvarAtBus(bare, solution, 'LV', 0.95);
    const high = kvarAtBus(bare, solution, 'HV', 0.95);
    expect(high?.kvar).toBeGreaterThan(low?.kvar ?? 0);
    expect(high?.kW).toBeGreaterThan(low?.kW ?? 0);
  });

  it('a generator below counts as a load of negative kW, not as the network', () => {
    const generator = {
      id: 'PV',
      kind: 'converter' as const,
      bus: 'LV',
      kW: -150,
      powerFactor: 1,
      spectrum: [],
    };
    const study = site({ bank: null, more: [generator] });
    expect(kvarAtBus(study, solveCase(study, 'base'), 'LV', 0.95)?.kW).toBeCloseTo(450, 6);
  });

  it('gives nothing for a busbar without a source or a case without a solution', () => {
    const dead = site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000 },
          { id: 'LV', nominalV: 400 },
          { id: 'X', nominalV: 400 },
        ],
      },
    });
    expect(kvarAtBus(dead, solveCase(dead, 'base'), 'X', 0.95)).toBeNull();
    const lost = site({ loadKW: 100_000 });
    expect(kvarAtBus(lost, solveCase(lost, 'base'), 'LV', 0.95)).toBeNull();
  });
});
