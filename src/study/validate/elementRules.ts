import type {
  Branch,
  Cable,
  Converter,
  Coupler,
  ElementOf,
  Shunt,
  StudyElement,
  Supply,
  Transformer,
} from '../types.ts';
import { parseVectorGroup } from '../vectorGroup.ts';
import { errorIssue, type Issue, warningIssue } from './issue.ts';
import { rowIssues } from './rowIssues.ts';

/** A relative slack for rules that compare a given value with one computed from other given values. */
const roundingSlack = 1e-12;

function rule(keys: readonly [string, ...string[]], value: unknown, text: string): Issue {
  return errorIssue('rule', [keys[0]], value, text, keys);
}

function transformerRules(part: Transformer): Issue[] {
  const issues: Issue[] = [];
  const lossPercent = (100 * part.loadLossKW) / part.ratedKVA;
  if (lossPercent > part.ukPercent * (1 + roundingSlack)) {
    issues.push(
      rule(
        ['loadLossKW', 'ukPercent', 'ratedKVA'],
        part.loadLossKW,
        `load loss ${part.loadLossKW} kW makes R larger than |Z|; allowed is up to u_k/100·S = ${(part.ukPercent * part.ratedKVA) / 100} kW`,
      ),
    );
  }
  const noLoadPercent = part.noLoadCurrentPercent ?? 0;
  const noLoadLoss = part.noLoadLossKW ?? 0;
  if (noLoadPercent > 0 && noLoadLoss > ((noLoadPercent * part.ratedKVA) / 100) * (1 + roundingSlack)) {
    issues.push(
      rule(
        ['noLoadLossKW', 'noLoadCurrentPercent', 'ratedKVA'],
        noLoadLoss,
        `no-load loss ${noLoadLoss} kW makes G larger than |Y|; allowed is up to i_0/100·S = ${(noLoadPercent * part.ratedKVA) / 100} kW`,
      ),
    );
  }
  return [...issues, ...starPointRules(part)];
}

function starPointRules(part: Transformer): Issue[] {
  const group = parseVectorGroup(part.vectorGroup);
  if (typeof group === 'string') return [];
  const issues: Issue[] = [];
  if ((part.neutralOhm ?? 0) > 0 && group.hvEarthed === group.lvEarthed) {
    const text = group.hvEarthed ? 'both star points are' : 'neither star point is';
    issues.push(
      rule(
        ['neutralOhm', 'vectorGroup'],
        part.neutralOhm,
        `a star point resistor of ${part.neutralOhm} Ω stands where ${text} earthed (${part.vectorGroup}); allowed are groups earthed on exactly one side, such as Dyn or YNd`,
      ),
    );
  }
  if (group.hv === 'Y' && group.lv === 'yn' && part.z0OverZ1 === undefined) {
    issues.push(
      rule(
        ['z0OverZ1', 'vectorGroup'],
        undefined,
        `Z0/Z1 is missing; a ${part.vectorGroup} transformer depends on its core, so give a number above 0`,
      ),
    );
  }
  return issues;
}

function cableRules(part: Cable): Issue[] {
  if (part.resistanceOhmPerKm > 0 || part.reactanceOhmPerKm > 0) return [];
  return [
    rule(
      ['resistanceOhmPerKm', 'reactanceOhmPerKm'],
      0,
      'resistance and reactance are both 0; allowed is at least one above 0 Ω/km',
    ),
  ];
}

function couplerRules(part: Coupler): Issue[] {
  if ((part.resistanceMOhm ?? 0.02) > 0 || (part.reactanceMOhm ?? 0.1) > 0) return [];
  return [
    rule(
      ['resistanceMOhm', 'reactanceMOhm'],
      0,
      'resistance and reactance are both 0; allowed is at least one above 0 mΩ',
    ),
  ];
}

function freeRules(part: Branch | Shunt): Issue[] {
  const { resistanceOhm: r, inductanceMH: l, capacitanceUF: c } = part;
  const keys = ['resistanceOhm', 'inductanceMH', 'capacitanceUF'] as const;
  if (r === undefined && l === undefined && c === undefined) {
    return [
      rule(
        ['arrangement', ...keys],
        part.arrangement,
        'resistance, inductance and capacitance are all absent; give at least one',
      ),
    ];
  }
  if (part.arrangement === 'parallel') {
    const shorted: Issue[] = [];
    if (r === 0)
      shorted.push(
        rule(
          ['resistanceOhm', 'arrangement'],
          0,
          'a parallel resistance of 0 Ω is a short; allowed is above 0 Ω, or leave it out',
        ),
      );
    if (l === 0)
      shorted.push(
        rule(
          ['inductanceMH', 'arrangement'],
          0,
          'a parallel inductance of 0 mH is a short; allowed is above 0 mH, or leave it out',
        ),
      );
    return shorted;
  }
  if (c === 0)
    return [
      rule(
        ['capacitanceUF', 'arrangement'],
        0,
        'a series capacitance of 0 µF is open; allowed is above 0 µF, or leave it out',
      ),
    ];
  if (c === undefined && (r ?? 0) === 0 && (l ?? 0) === 0) {
    return [
      rule(
        [r === undefined ? 'inductanceMH' : 'resistanceOhm', ...keys, 'arrangement'],
        0,
        'the series impedance is zero; give a resistance, inductance or capacitance above 0, or use a bus coupler',
      ),
    ];
  }
  return [];
}

function supplyRules(part: Supply): Issue[] {
  if (part.shortCircuitMVAMin === undefined || part.shortCircuitMVAMin <= part.shortCircuitMVA) return [];
  return [
    warningIssue(
      'fault-level-order',
      ['shortCircuitMVAMin'],
      part.shortCircuitMVAMin,
      `the minimum fault level ${part.shortCircuitMVAMin} MVA is above the maximum ${part.shortCircuitMVA} MVA`,
      ['shortCircuitMVAMin', 'shortCircuitMVA'],
    ),
  ];
}

function converterRules(part: Converter): Issue[] {
  const threeWire = (part.wires ?? 3) === 3 && (part.connection ?? 'L1L2L3') === 'L1L2L3';
  if (threeWire || (part.filterCapacitanceUF ?? 0) === 0) return [];
  return [
    rule(
      ['filterCapacitanceUF', 'wires', 'connection'],
      part.filterCapacitanceUF,
      `a filter capacitor of ${part.filterCapacitanceUF} µF stands in a part that is not three-wire and three-phase; allowed is 0 µF there`,
    ),
  ];
}

const rules: { [K in StudyElement['kind']]?: (part: ElementOf<K>) => Issue[] } = {
  transformer: transformerRules,
  cable: cableRules,
  coupler: couplerRules,
  branch: freeRules,
  shunt: freeRules,
  supply: supplyRules,
  converter: converterRules,
};

/** Rules between the fields of one part whose single fields are sound. */
export function elementRules(element: StudyElement, maxOrder: number): Issue[] {
  const own = rules[element.kind] as ((part: StudyElement) => Issue[]) | undefined;
  const issues = own ? own(element) : [];
  if ('from' in element && element.from === element.to) {
    issues.push(
      rule(
        ['to', 'from'],
        element.to,
        `both ends stand at busbar "${element.to}"; allowed are two different busbars`,
      ),
    );
  }
  if (element.kind === 'supply' && element.background)
    issues.push(...rowIssues(element.background, ['background'], maxOrder));
  if (element.kind === 'converter' && typeof element.spectrum !== 'string') {
    issues.push(...rowIssues(element.spectrum, ['spectrum'], maxOrder));
  }
  return issues;
}
