import { describe, expect, it } from 'vitest';
import { addPart, newStudy, type Study, siteFindings, updateElement } from '../../src/study/index.ts';

const codes = (study: Study) => siteFindings(study).map((finding) => finding.code);

function site(): Study {
  const empty: Study = {
    ...newStudy(),
    buses: [{ id: 'b', nominalV: 20000, pcc: true }],
    criteria: { demandCurrentA: 900 },
  };
  const fed = addPart(empty, { kind: 'supply', bus: 'b', values: { shortCircuitMVAMin: 120 } }).apply(empty);
  return addPart(fed, { kind: 'transformer', bus: 'b' }).apply(fed);
}

function withBank(values: Record<string, unknown>): Study {
  const base = site();
  return addPart(base, { kind: 'bank', bus: 'bus1', values }).apply(base);
}

describe('A site in the making', () => {
  it('draws no word when empty and none when complete', () => {
    expect(siteFindings(newStudy())).toEqual([]);
    expect(siteFindings(site())).toEqual([]);
  });

  it('says which busbars no source in service reaches', () => {
    const off = updateElement(site(), 'transformer1', { on: false }).apply(site());
    expect(siteFindings(off)).toMatchObject([{ code: 'unfed-bus', path: '$.buses[1]', severity: 'warning' }]);
    const dead = updateElement(site(), 'supply1', { on: false }).apply(site());
    expect(codes(dead)).toEqual(['no-source']);
  });

  it('says that a capacitor at bus volts cannot stand behind a reactor: 400 V becomes 430.1 V at 7 %', () => {
    const findings = siteFindings(withBank({ detuningPercent: 7, ratedV: 400 }));
    expect(findings).toMatchObject([
      { code: 'capacitor-voltage', path: '$.elements[2].ratedV', value: '400' },
    ]);
    expect(findings[0]?.message).toContain('430');
    expect(codes(withBank({ detuningPercent: 7, ratedV: 440 }))).toEqual([]);
  });

  it('says that a capacitor is rated below its busbar, and that kvar count at the rated voltage', () => {
    expect(codes(withBank({ ratedV: 230 }))).toEqual(['capacitor-voltage']);
    const high = siteFindings(withBank({ ratedV: 525 }));
    expect(high).toMatchObject([{ code: 'kvar-at-rated-voltage' }]);
    expect(high[0]?.message).toContain(`${Math.round((100 * 400 ** 2) / 525 ** 2)}`);
    expect(codes(withBank({ ratedV: 440 }))).toEqual([]);
  });

  it('says that a filter capacitor stands above bus volts', () => {
    const base = site();
    const filtered = addPart(base, { kind: 'filter', bus: 'bus1', values: { ratedV: 400 } }).apply(base);
    expect(codes(filtered)).toEqual(['capacitor-voltage']);
  });

  it('asks for the point of common coupling, the demand current, the minimum fault level and the steps', () => {
    const base = site();
    const { criteria: _criteria, ...rest } = base;
    const bare: Study = { ...rest, buses: base.buses.map(({ pcc: _pcc, ...bus }) => bus) };
    expect(codes(bare)).toEqual(['no-pcc', 'no-demand-current']);
    expect(codes(updateElement(base, 'supply1', { shortCircuitMVAMin: null }).apply(base))).toEqual([
      'fault-level-min',
    ]);
    expect(codes(withBank({ steps: [] }))).toEqual(['no-steps']);
  });
});
