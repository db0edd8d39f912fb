import { describe, expect, it } from 'vitest';
import { checkStudy, type Finding } from '../../src/study/index.ts';
import { type LooseStudy, looseStudy, part } from './exampleStudies.ts';

type Spoil = (study: LooseStudy) => void;

function findingsAfter(spoil: Spoil, name: Parameters<typeof looseStudy>[0] = '1-detuned-400v') {
  const study = looseStudy(name);
  spoil(study);
  return checkStudy(study);
}

const codeAt = (findings: readonly Finding[]) => findings.map(({ code, path }) => `${code} ${path}`);

/** Title, what is spoilt, code and path of the error. */
const detuned: [string, Spoil, string, string][] = [
  ['a study without a title', (s) => delete s.title, 'missing', '$.title'],
  ['a frequency of 16.7 Hz', (s) => Object.assign(s, { frequencyHz: 16.7 }), 'choice', '$.frequencyHz'],
  ['a highest order of 0', (s) => Object.assign(s, { maxOrder: 0 }), 'range', '$.maxOrder'],
  ['a highest order of 101', (s) => Object.assign(s, { maxOrder: 101 }), 'range', '$.maxOrder'],
  ['a broken highest order', (s) => Object.assign(s, { maxOrder: 12.5 }), 'range', '$.maxOrder'],
  ['an unknown summation', (s) => Object.assign(s, { summation: 'sum' }), 'choice', '$.summation'],
  [
    'a target power factor above 1',
    (s) => Object.assign(s, { criteria: { targetPF: 1.05 } }),
    'range',
    '$.criteria.targetPF',
  ],
  ['a limit set that is no text', (s) => Object.assign(s, { limits: { pcc: 3 } }), 'type', '$.limits.pcc'],
  [
    'an origin of an unknown word',
    (s) => Object.assign(s, { origins: { 'elements.t1.ukPercent': { origin: 'guess' } } }),
    'choice',
    '$.origins["elements.t1.ukPercent"]',
  ],
  ['parts that are no list', (s) => Object.assign(s, { elements: {} }), 'type', '$.elements'],
  ['a busbar of 0 V', (s) => Object.assign(s.buses[1]!, { nominalV: 0 }), 'range', '$.buses[1].nominalV'],
  ['a busbar without an id', (s) => delete s.buses[1]!.id, 'missing', '$.buses[1].id'],
  [
    'two busbars of one id',
    (s) => s.buses.push({ id: 'in', nominalV: 400 }),
    'duplicate-id',
    '$.buses[3].id',
  ],
  ['two parts of one id', (s) => s.elements.push({ ...part(s, 'heat') }), 'duplicate-id', '$.elements[8].id'],
  ['two cases of one id', (s) => s.cases.push({ id: 'base', changes: [] }), 'duplicate-id', '$.cases[3].id'],
  [
    'two spectra of one id',
    (s) =>
      Object.assign(s, {
        spectra: [
          { id: 'x', orders: [] },
          { id: 'x', orders: [] },
        ],
      }),
    'duplicate-id',
    '$.spectra[1].id',
  ],
  [
    'an unknown kind',
    (s) => Object.assign(part(s, 'heat'), { kind: 'furnace' }),
    'unknown-kind',
    '$.elements[6].kind',
  ],
  ['a part without a kind', (s) => delete part(s, 'heat').kind, 'missing', '$.elements[6].kind'],
  [
    'a part at a busbar that is not there',
    (s) => Object.assign(part(s, 'heat'), { bus: 'cellar' }),
    'dangling-id',
    '$.elements[6].bus',
  ],
  [
    'a cable to a busbar that is not there',
    (s) => Object.assign(part(s, 'k1'), { to: 'cellar' }),
    'dangling-id',
    '$.elements[2].to',
  ],
  [
    'a converter with an unknown spectrum',
    (s) => Object.assign(part(s, 'drv'), { spectrum: 'nobody' }),
    'dangling-id',
    '$.elements[5].spectrum',
  ],
  [
    'a scan at a busbar that is not there',
    (s) => Object.assign(s.scans[0]!, { bus: 'cellar' }),
    'dangling-id',
    '$.scans[0].bus',
  ],
  [
    'a number that is not finite',
    (s) => Object.assign(part(s, 't1'), { ukPercent: Number.POSITIVE_INFINITY }),
    'non-finite',
    '$.elements[1].ukPercent',
  ],
  [
    'text for a number',
    (s) => Object.assign(part(s, 't1'), { ukPercent: '5.5' }),
    'type',
    '$.elements[1].ukPercent',
  ],
  [
    'null for a number',
    (s) => Object.assign(part(s, 't1'), { ukPercent: null }),
    'type',
    '$.elements[1].ukPercent',
  ],
  [
    'a power factor of 0',
    (s) => Object.assign(part(s, 'light'), { powerFactor: 0 }),
    'range',
    '$.elements[4].powerFactor',
  ],
  [
    'a power factor above 1',
    (s) => Object.assign(part(s, 'light'), { powerFactor: 1.01 }),
    'range',
    '$.elements[4].powerFactor',
  ],
  [
    'an efficiency above 1',
    (s) => Object.assign(part(s, 'press'), { efficiency: 94 }),
    'range',
    '$.elements[3].efficiency',
  ],
  [
    'an efficiency of 0',
    (s) => Object.assign(part(s, 'press'), { efficiency: 0 }),
    'range',
    '$.elements[3].efficiency',
  ],
  ['half a motor', (s) => Object.assign(part(s, 'press'), { count: 1.5 }), 'range', '$.elements[3].count'],
  ['a load of negative kW', (s) => Object.assign(part(s, 'heat'), { kW: -1 }), 'range', '$.elements[6].kW'],
  [
    'a cable of no length',
    (s) => Object.assign(part(s, 'k1'), { lengthM: 0 }),
    'range',
    '$.elements[2].lengthM',
  ],
  [
    'a cable without impedance',
    (s) => Object.assign(part(s, 'k1'), { resistanceOhmPerKm: 0, reactanceOhmPerKm: 0 }),
    'rule',
    '$.elements[2].resistanceOhmPerKm',
  ],
  [
    'a step of 0 kvar',
    (s) => Object.assign(part(s, 'bank'), { steps: [{ kvar: 0 }] }),
    'range',
    '$.elements[7].steps[0].kvar',
  ],
  [
    'a step without kvar',
    (s) => Object.assign(part(s, 'bank'), { steps: [{}] }),
    'missing',
    '$.elements[7].steps[0].kvar',
  ],
  [
    'a detuning of 100 %',
    (s) => Object.assign(part(s, 'bank'), { detuningPercent: 100 }),
    'range',
    '$.elements[7].detuningPercent',
  ],
  [
    'a reactor quality of 0',
    (s) => Object.assign(part(s, 'bank'), { reactorQ: 0 }),
    'range',
    '$.elements[7].reactorQ',
  ],
  ['a bank rated 0 V', (s) => Object.assign(part(s, 'bank'), { ratedV: 0 }), 'range', '$.elements[7].ratedV'],
  [
    'a tolerance that runs backwards',
    (s) => Object.assign(part(s, 'bank'), { tolerancePercent: [10, -5] }),
    'range',
    '$.elements[7].tolerancePercent',
  ],
  [
    'a skin share above 1',
    (s) => Object.assign(part(s, 't1'), { skin: [1.2, 1] }),
    'range',
    '$.elements[1].skin',
  ],
  [
    'a skin law of one number',
    (s) => Object.assign(part(s, 't1'), { skin: [0.5] }),
    'range',
    '$.elements[1].skin',
  ],
  [
    'background of negative per cent',
    (s) => Object.assign(part(s, 'grid'), { background: [{ h: 5, percent: -1 }] }),
    'range',
    '$.elements[0].background[0].percent',
  ],
  [
    'background of a broken order',
    (s) => Object.assign(part(s, 'grid'), { background: [{ h: 5.5, percent: 1 }] }),
    'range',
    '$.elements[0].background[0].h',
  ],
  [
    'background of order 0',
    (s) => Object.assign(part(s, 'grid'), { background: [{ h: 0, percent: 1 }] }),
    'range',
    '$.elements[0].background[0].h',
  ],
  [
    'two background rows of one order',
    (s) =>
      Object.assign(part(s, 'grid'), {
        background: [
          { h: 5, percent: 1 },
          { h: 5, percent: 2 },
        ],
      }),
    'duplicate-order',
    '$.elements[0].background[1].h',
  ],
  [
    'two inline spectrum rows of one order',
    (s) =>
      Object.assign(part(s, 'drv'), {
        spectrum: [
          { h: 5, percent: 1 },
          { h: 5, percent: 2 },
        ],
      }),
    'duplicate-order',
    '$.elements[5].spectrum[1].h',
  ],
  [
    'two rows of one order in a spectrum of the study',
    (s) =>
      Object.assign(s, {
        spectra: [
          {
            id: 'x',
            orders: [
              { h: 7, percent: 1 },
              { h: 7, percent: 2 },
            ],
          },
        ],
      }),
    'duplicate-order',
    '$.spectra[0].orders[1].h',
  ],
  [
    'a spectrum without rows',
    (s) => Object.assign(s, { spectra: [{ id: 'x' }] }),
    'missing',
    '$.spectra[0].orders',
  ],
  [
    'a redefined built-in spectrum',
    (s) => Object.assign(s, { spectra: [{ id: 'six-pulse-ideal', orders: [] }] }),
    'built-in-spectrum',
    '$.spectra[0].id',
  ],
  [
    'a scan that starts at 0 Hz',
    (s) => Object.assign(s.scans[0]!, { fromHz: 0 }),
    'range',
    '$.scans[0].fromHz',
  ],
  [
    'a scan that ends where it starts',
    (s) => Object.assign(s.scans[0]!, { toHz: 50 }),
    'rule',
    '$.scans[0].toHz',
  ],
  ['a scan of one point', (s) => Object.assign(s.scans[0]!, { points: 1 }), 'range', '$.scans[0].points'],
  [
    'a scan of an unknown sequence',
    (s) => Object.assign(s.scans[0]!, { sequence: 'negative' }),
    'choice',
    '$.scans[0].sequence',
  ],
  [
    'a cable between a busbar and itself',
    (s) => Object.assign(part(s, 'k1'), { to: 'hall' }),
    'rule',
    '$.elements[2].to',
  ],
  [
    'a transformer with R above |Z|',
    (s) => Object.assign(part(s, 't1'), { loadLossKW: 44.1 }),
    'rule',
    '$.elements[1].loadLossKW',
  ],
  [
    'a transformer with G above |Y|',
    (s) => Object.assign(part(s, 't1'), { noLoadLossKW: 7.3 }),
    'rule',
    '$.elements[1].noLoadLossKW',
  ],
  [
    'a vector group that is none',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'D/y' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'Dyn with an even clock',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Dyn4' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'Yy with an odd clock',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Yy1' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'Dz with an odd clock',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Dzn1' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'Yz with an even clock',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Yzn0' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'a clock of 12',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Dd12' }),
    'choice',
    '$.elements[1].vectorGroup',
  ],
  [
    'Yyn without a zero-sequence impedance',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Yyn0' }),
    'rule',
    '$.elements[1].z0OverZ1',
  ],
  [
    'a star point resistor with two earthed star points',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'YNyn0', neutralOhm: 1 }),
    'rule',
    '$.elements[1].neutralOhm',
  ],
  [
    'a star point resistor without an earthed star point',
    (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Dy11', neutralOhm: 1 }),
    'rule',
    '$.elements[1].neutralOhm',
  ],
  [
    'a filter capacitor on a four-wire converter',
    (s) => Object.assign(part(s, 'drv'), { wires: 4 }),
    'rule',
    '$.elements[5].filterCapacitanceUF',
  ],
  [
    'a filter capacitor on a single-phase converter',
    (s) => Object.assign(part(s, 'drv'), { connection: 'L1' }),
    'rule',
    '$.elements[5].filterCapacitanceUF',
  ],
  [
    'a case with an unknown role',
    (s) => Object.assign(s.cases[2]!, { role: 'dark' }),
    'choice',
    '$.cases[2].role',
  ],
  [
    'a case of 25 hours a day',
    (s) => Object.assign(s.cases[2]!, { hoursPerDay: 25 }),
    'range',
    '$.cases[2].hoursPerDay',
  ],
  [
    'a case that changes a part which is not there',
    (s) => Object.assign(s.cases[1]!.changes[0]!, { element: 'ghost' }),
    'dangling-id',
    '$.cases[1].changes[0].element',
  ],
  [
    'a case that changes an id',
    (s) => Object.assign(s.cases[1]!.changes[0]!.set, { id: 'other' }),
    'rule',
    '$.cases[1].changes[0].set.id',
  ],
  [
    'a case that changes a kind',
    (s) => Object.assign(s.cases[1]!.changes[0]!.set, { kind: 'filter' }),
    'rule',
    '$.cases[1].changes[0].set.kind',
  ],
  [
    'a case that sets a value out of range',
    (s) => Object.assign(s.cases[1]!.changes[0]!.set, { ratedV: -400 }),
    'range',
    '$.cases[1].changes[0].set.ratedV',
  ],
  [
    'a case that sets a bad step',
    (s) => Object.assign(s.cases[2]!.changes[2]!.set, { steps: [{ kvar: 50 }, { kvar: -1 }] }),
    'range',
    '$.cases[2].changes[2].set.steps[1].kvar',
  ],
  [
    'a case that removes a required field',
    (s) => Object.assign(s.cases[2]!.changes[0]!.set, { kW: null }),
    'missing',
    '$.cases[2].changes[0].set.kW',
  ],
  [
    'a case that moves a part to a busbar that is not there',
    (s) => Object.assign(s.cases[2]!.changes[0]!.set, { bus: 'cellar' }),
    'dangling-id',
    '$.cases[2].changes[0].set.bus',
  ],
  [
    'a case whose u_k falls below the load loss',
    (s) => s.cases[1]!.changes.push({ element: 't1', set: { ukPercent: 0.5 } }),
    'rule',
    '$.cases[1].changes[1].set.ukPercent',
  ],
  [
    'a case that makes a vector group need Z0',
    (s) => s.cases[1]!.changes.push({ element: 't1', set: { vectorGroup: 'Yyn0' } }),
    'rule',
    '$.cases[1].changes[1].set.vectorGroup',
  ],
];

const fourWire: [string, Spoil, string, string][] = [
  [
    'a coupler without impedance',
    (s) => Object.assign(part(s, 'tie'), { resistanceMOhm: 0, reactanceMOhm: 0 }),
    'rule',
    '$.elements[3].resistanceMOhm',
  ],
  [
    'a reactor of 0 mH',
    (s) => Object.assign(part(s, 'x'), { inductanceMH: 0 }),
    'range',
    '$.elements[5].inductanceMH',
  ],
  [
    'an R-L-C part with nothing in it',
    (s) => Object.assign(part(s, 'br'), { resistanceOhm: undefined, inductanceMH: undefined }),
    'rule',
    '$.elements[12].arrangement',
  ],
  [
    'a parallel R-L-C part with R = 0',
    (s) => Object.assign(part(s, 'br'), { resistanceOhm: 0 }),
    'rule',
    '$.elements[12].resistanceOhm',
  ],
  [
    'a parallel R-L-C part with L = 0',
    (s) => Object.assign(part(s, 'br'), { inductanceMH: 0 }),
    'rule',
    '$.elements[12].inductanceMH',
  ],
  [
    'a series R-L-C part with C = 0',
    (s) => Object.assign(part(s, 'rc'), { capacitanceUF: 0 }),
    'rule',
    '$.elements[13].capacitanceUF',
  ],
  [
    'a series R-L-C part that sums to zero',
    (s) => Object.assign(part(s, 'rc'), { resistanceOhm: 0, capacitanceUF: undefined }),
    'rule',
    '$.elements[13].resistanceOhm',
  ],
  [
    'an unknown arrangement',
    (s) => Object.assign(part(s, 'rc'), { arrangement: 'delta' }),
    'choice',
    '$.elements[13].arrangement',
  ],
  [
    'an unknown connection',
    (s) => Object.assign(part(s, 'weld'), { connection: 'L1L3' }),
    'choice',
    '$.elements[8].connection',
  ],
  ['five wires', (s) => Object.assign(part(s, 'it'), { wires: 5 }), 'choice', '$.elements[6].wires'],
];

const filters: [string, Spoil, string, string][] = [
  [
    'a filter tuned to the fundamental',
    (s) => Object.assign(part(s, 'f5'), { tunedOrder: 1 }),
    'range',
    '$.elements[9].tunedOrder',
  ],
  [
    'a filter of quality 0',
    (s) => Object.assign(part(s, 'f5'), { qFactor: 0 }),
    'range',
    '$.elements[9].qFactor',
  ],
  [
    'a filter of an unknown type',
    (s) => Object.assign(part(s, 'f5'), { type: 'double-tuned' }),
    'choice',
    '$.elements[9].type',
  ],
];

describe('A study is refused, with code and path, for', () => {
  it.each(detuned)('%s', (_title, spoil, code, path) => {
    const { study, findings } = findingsAfter(spoil);
    expect(study).toBeNull();
    expect(codeAt(findings.filter((finding) => finding.severity === 'error'))).toContain(`${code} ${path}`);
  });
  it.each(fourWire)('%s', (_title, spoil, code, path) => {
    const { study, findings } = findingsAfter(spoil, '2-four-wire-480v');
    expect(study).toBeNull();
    expect(codeAt(findings)).toContain(`${code} ${path}`);
  });
  it.each(filters)('%s', (_title, spoil, code, path) => {
    const { study, findings } = findingsAfter(spoil, '3-filters-6k6-alpha');
    expect(study).toBeNull();
    expect(codeAt(findings)).toContain(`${code} ${path}`);
  });

  it('a foreign format, and a newer version with a word on what to do', () => {
    expect(codeAt(checkStudy({ format: 'other', version: 1 }).findings)).toEqual(['format $.format']);
    const newer = checkStudy({ ...looseStudy('1-detuned-400v'), version: 2 });
    expect(newer.study).toBeNull();
    expect(newer.findings[0]?.message).toContain('newer programme');
    expect(checkStudy(null).findings[0]?.path).toBe('$');
    expect(checkStudy([]).study).toBeNull();
  });

  it('each single fault with one finding alone', () => {
    const { findings } = findingsAfter((s) => Object.assign(part(s, 'heat'), { powerFactor: 0 }));
    expect(findings).toHaveLength(1);
    expect(findings[0]).toEqual({
      code: 'range',
      severity: 'error',
      path: '$.elements[6].powerFactor',
      value: '0',
      message: 'load heat: power factor cos φ is 0; allowed is a number above 0 and at most 1.',
    });
  });
});

describe('A study is accepted with', () => {
  const accepted: [string, Spoil][] = [
    ['a converter of negative kW, which feeds in', (s) => Object.assign(part(s, 'drv'), { kW: -50 })],
    ['a load of 0 kW', (s) => Object.assign(part(s, 'heat'), { kW: 0 })],
    ['a bank with no step on', (s) => Object.assign(part(s, 'bank'), { steps: [{ kvar: 50, on: false }] })],
    [
      'Yyn with its zero-sequence impedance',
      (s) => Object.assign(part(s, 't1'), { vectorGroup: 'Yyn0', z0OverZ1: 5 }),
    ],
    ['a star point resistor on Dyn', (s) => Object.assign(part(s, 't1'), { neutralOhm: 1 })],
    ['R as large as |Z|', (s) => Object.assign(part(s, 't1'), { loadLossKW: 44 })],
    [
      'no-load loss without a no-load current',
      (s) => Object.assign(part(s, 't1'), { noLoadLossKW: 9, noLoadCurrentPercent: 0 }),
    ],
    [
      'a case that repeats the id and kind of its part',
      (s) => Object.assign(s.cases[1]!.changes[0]!.set, { id: 'bank', kind: 'bank' }),
    ],
    [
      'a case that removes an optional field',
      (s) => Object.assign(s.cases[1]!.changes[0]!.set, { detuningPercent: null }),
    ],
    ['no cases at all', (s) => delete (s as { cases?: unknown }).cases],
    ['an empty list of rows', (s) => Object.assign(part(s, 'drv'), { spectrum: [] })],
  ];
  it.each(accepted)('%s', (_title, spoil) => {
    expect(findingsAfter(spoil).findings).toEqual([]);
  });
});

describe('A warning is given, and the study accepted, for', () => {
  const warned: [string, Spoil, string, string][] = [
    [
      'rows at the fundamental',
      (s) => Object.assign(part(s, 'drv'), { spectrum: [{ h: 1, percent: 100 }] }),
      'ignored-row',
      '$.elements[5].spectrum[0].h',
    ],
    [
      'rows above the highest order',
      (s) => Object.assign(part(s, 'grid'), { background: [{ h: 17, percent: 1 }] }),
      'ignored-row',
      '$.elements[0].background[0].h',
    ],
    [
      'a nominal voltage 20 % off the rated one',
      (s) => Object.assign(part(s, 't1'), { lvV: 500 }),
      'voltage-mismatch',
      '$.elements[1].lvV',
    ],
    [
      'a cable between busbars of unequal voltage',
      (s) => Object.assign(s.buses[2]!, { nominalV: 415 }),
      'voltage-mismatch',
      '$.elements[2].to',
    ],
    [
      'transformers of different shift in parallel',
      (s) => s.elements.push({ ...part(s, 't1'), id: 't2', vectorGroup: 'Dyn5' }),
      'phase-shift',
      '$.elements[8].vectorGroup',
    ],
    [
      'a minimum fault level above the maximum',
      (s) => Object.assign(part(s, 'grid'), { shortCircuitMVAMin: 200 }),
      'fault-level-order',
      '$.elements[0].shortCircuitMVAMin',
    ],
    [
      'an unknown field',
      (s) => Object.assign(part(s, 'grid'), { colour: 'red' }),
      'unknown-field',
      '$.elements[0].colour',
    ],
  ];
  it.each(warned)('%s', (_title, spoil, code, path) => {
    const { study, findings } = findingsAfter(spoil);
    expect(study).not.toBeNull();
    expect(codeAt(findings)).toEqual([`${code} ${path}`]);
  });

  it('an unknown field once, however often it stands in parts of the kind', () => {
    const { findings } = findingsAfter((s) => {
      for (const element of s.elements) element.colour = 'red';
    });
    expect(findings.filter((finding) => finding.path.endsWith('colour'))).toHaveLength(7);
    expect(findings.find((finding) => finding.path === '$.elements[4].colour')?.message).toContain(
      'in 2 places',
    );
  });

  it('an unknown field inside a step or a row as well', () => {
    const { findings } = findingsAfter((s) => {
      Object.assign((part(s, 'bank').steps as object[])[1]!, { serial: 1 });
      Object.assign((part(s, 'grid').background as object[])[0]!, { phase: 'L1' });
    });
    expect(codeAt(findings).toSorted()).toEqual([
      'unknown-field $.elements[0].background[0].phase',
      'unknown-field $.elements[7].steps[1].serial',
    ]);
  });

  it('not for a rated voltage 15 % off, nor for equal shift in parallel', () => {
    expect(findingsAfter((s) => Object.assign(part(s, 't1'), { lvV: 460 })).findings).toEqual([]);
    expect(findingsAfter((s) => s.elements.push({ ...part(s, 't1'), id: 't2' })).findings).toEqual([]);
  });
});
