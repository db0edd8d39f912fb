import { describe, expect, it } from 'vitest';
import { checkStudy, type SiteFinding, type Study, siteFindings } from '../../../src/study/index.ts';
import { deepFrozen } from '../exampleStudies.ts';
import { soundSite, withPart, withParts, withSecond } from './soundSite.ts';

interface Row {
  title: string;
  spoil(study: Study): Study;
  code: string;
  severity: SiteFinding['severity'];
  path: string;
  /** What the sentence must say: value and unit, and what is allowed. */
  says: RegExp;
  mend: RegExp;
  /** Undo's words of the mend the programme makes; absent where the engineer must decide. */
  repair?: string;
}

/** The kvar note follows from the rating; the sound site's bank of 440 V at 7 % has it by its nature. */
const natural = new Set(['kvar-at-rated-voltage']);

const withCase = (
  study: Study,
  id: string,
  changes: NonNullable<Study['cases']>[number]['changes'],
): Study => ({
  ...study,
  cases: (study.cases ?? []).map((item) => (item.id === id ? { ...item, changes } : item)),
});

const generator = {
  id: 'g1',
  name: 'G1',
  kind: 'generator',
  bus: 'main',
  ratedKVA: 500,
  xdSubtransientPercent: 15,
  on: false,
} as const;

const tie = { id: 'k1', name: 'Tie 1', kind: 'coupler', from: 'main', to: 'mill', on: false } as const;

/** The generator and the coupler are in service in one case each, so that no state is left out. */
function tied(study: Study): Study {
  const next = withParts(study, tie);
  return withCase(next, 'weak', [
    { element: 'grid', set: { shortCircuitMVA: 120 } },
    { element: 'k1', set: { on: true } },
  ]);
}

const rows: Row[] = [
  {
    title: 'a site that nothing feeds',
    spoil: (s) => withPart(s, 'grid', { on: false }),
    code: 'no-source',
    severity: 'error',
    path: '$.elements',
    says: /^Nothing feeds the site/,
    mend: /put a supply or generator in service, such as supply Grid/i,
    repair: 'put supply Grid in service',
  },
  {
    title: 'a busbar that no source reaches, with the parts not supplied',
    spoil: (s) => withPart(s, 'w1', { on: false }),
    code: 'unfed-bus',
    severity: 'warning',
    path: '$.buses[2]',
    says: /busbar Mill board: no source in service reaches it; not supplied there: motor Fans, Drive 1/,
    mend: /put cable W1 in service/i,
    repair: 'put cable W1 in service',
  },
  {
    title: 'a busbar dead in one case, fed by closing the coupler there',
    spoil: (s) =>
      withCase(tied(s), 'night', [...(s.cases?.[1]?.changes ?? []), { element: 'w1', set: { on: false } }]),
    code: 'unfed-bus',
    severity: 'warning',
    path: '$.buses[2]',
    says: /busbar Mill board, in Night:/,
    mend: /cable W1|Tie 1/,
  },
  {
    title: 'transformers of different clock number in parallel',
    spoil: (s) => withSecond(s, { vectorGroup: 'Dyn5' }),
    code: 'phase-shift',
    severity: 'error',
    path: '$.elements[7].vectorGroup',
    says: /Dyn5 lies in parallel with transformer T1 \(Dyn11\).*180° apart.*allowed is 0°/,
    mend: /never close them in parallel/,
  },
  {
    title: 'transformers of different clock number joined by a coupler, in the cases that close it',
    spoil: (s) =>
      withCase(
        withParts(
          withSecond(
            { ...s, buses: [...s.buses, { id: 'b', name: 'Board B', nominalV: 400 }] },
            { to: 'b', vectorGroup: 'Yyn0', z0OverZ1: 1 },
          ),
          { ...tie, to: 'b' },
        ),
        'weak',
        [
          { element: 'grid', set: { shortCircuitMVA: 120 } },
          { element: 'k1', set: { on: true } },
        ],
      ),
    code: 'phase-shift',
    severity: 'error',
    path: '$.elements[7].vectorGroup',
    says: /T2, in Weak grid: Yyn0 .* T1 \(Dyn11\).*30° apart/,
    mend: /open one of them or the coupler between/,
  },
  {
    title: 'transformers of different tap in parallel',
    spoil: (s) => withSecond(s, { tapPercent: 5 }),
    code: 'parallel-ratio',
    severity: 'warning',
    path: '$.elements[7].tapPercent',
    says: /ratio 52.5 lies 4.8\u2009% from the 50 of transformer T1.*40\u2009% of its rated current circulates.*0.5 %/,
    mend: /set the tap of transformer T2 to 0\u2009%/i,
    repair: 'set the tap of transformer T2 to 0\u2009%',
  },
  {
    title: 'transformers of different impedance voltage in parallel',
    spoil: (s) => withSecond(s, { ukPercent: 4 }),
    code: 'parallel-uk',
    severity: 'warning',
    path: '$.elements[7].ukPercent',
    says: /uk 4\u2009% beside 6\u2009% of transformer T1.*40\u2009% apart; transformer T2 takes more.*10 %/,
    mend: /nameplates/,
  },
  {
    title: 'transformers of very different size in parallel',
    spoil: (s) => withSecond(s, { ratedKVA: 250, loadLossKW: 3 }),
    code: 'parallel-rating',
    severity: 'note',
    path: '$.elements[7].ratedKVA',
    says: /250\u2009kVA lies in parallel with 1\u2009000\u2009kVA, 4 : 1; common practice keeps to 3 : 1/,
    mend: /share/,
  },
  {
    title: 'a transformer side that does not meet its busbar',
    spoil: (s) => withPart(s, 't1', { lvV: 690 }),
    code: 'voltage-mismatch',
    severity: 'error',
    path: '$.elements[1].lvV',
    says: /lower side is rated 690\u2009V at busbar Main board of 400\u2009V nominal, more than 15 % apart/,
    mend: /correct the rated voltage or the busbar/i,
  },
  {
    title: 'a transformer on its head',
    spoil: (s) => withPart(s, 't1', { from: 'main', to: 'intake' }),
    code: 'transformer-turned',
    severity: 'error',
    path: '$.elements[1].from',
    says: /20\u2009kV side stands at busbar Main board of 400\u2009V and its 400\u2009V side at Intake of 20\u2009kV/,
    mend: /turn transformer T1 round/i,
    repair: 'turn transformer T1 round',
  },
  {
    title: 'a cable between busbars of unequal voltage',
    spoil: (s) => ({
      ...s,
      buses: s.buses.map((bus) => (bus.id === 'mill' ? { ...bus, nominalV: 415 } : bus)),
    }),
    code: 'voltage-mismatch',
    severity: 'error',
    path: '$.elements[2].to',
    says: /joins busbar Main board of 400\u2009V to Mill board of 415\u2009V nominal; .* both must have the same/,
    mend: /correct the nominal voltage of one busbar/i,
    repair: 'set the nominal voltage of Mill board to 400\u2009V',
  },
  {
    title: 'a bank without steps',
    spoil: (s) => withCase(withPart(s, 'c1', { steps: [] }), 'night', [{ element: 'heat', set: { kW: 20 } }]),
    code: 'no-steps',
    severity: 'warning',
    path: '$.elements[6].steps',
    says: /no steps .* allowed is one step or more/,
    mend: /6x25/,
  },
  {
    // 400 V / (1 − 0.07) = 430 V: CHECKS, numbers these must reproduce.
    title: 'capacitors at bus volts behind a reactor of 7 %',
    spoil: (s) => withPart(s, 'c1', { ratedV: 400 }),
    code: 'capacitor-voltage',
    severity: 'warning',
    path: '$.elements[6].ratedV',
    says: /rated 400\u2009V and stand at 430\u2009V behind its 7\u2009% reactor at the 400\u2009V busbar/,
    mend: /capacitors of 440\u2009V or above/,
    repair: 'set the rated voltage of Bank C1 to 440\u2009V',
  },
  {
    title: 'capacitors rated below their busbar',
    spoil: (s) => withPart(s, 'c1', { ratedV: 230, detuningPercent: undefined }),
    code: 'capacitor-voltage',
    severity: 'error',
    path: '$.elements[6].ratedV',
    says: /rated 230\u2009V and stand at 400\u2009V at the 400\u2009V busbar/,
    mend: /400\u2009V or above/,
    repair: 'set the rated voltage of Bank C1 to 400\u2009V',
  },
  {
    // n²/(n² − 1) at n = 4.7 is 1.0474: 419 V on 400 V.
    title: 'filter capacitors at bus volts',
    spoil: (s) =>
      withParts(s, {
        id: 'f',
        name: 'F5',
        kind: 'filter',
        bus: 'main',
        type: 'single-tuned',
        kvar: 100,
        tunedOrder: 4.7,
        qFactor: 40,
        ratedV: 400,
      }),
    code: 'capacitor-voltage',
    severity: 'warning',
    path: '$.elements[7].ratedV',
    says: /rated 400\u2009V and stand at 419\u2009V behind its reactor/,
    mend: /440\u2009V/,
    repair: 'set the rated voltage of filter F5 to 440\u2009V',
  },
  {
    // (400/525)² / (1 − 0.07) = 0.624.
    title: 'kvar that count at another voltage',
    spoil: (s) => withPart(s, 'c1', { ratedV: 525 }),
    code: 'kvar-at-rated-voltage',
    severity: 'warning',
    path: '$.elements[6].ratedV',
    says: /its 100\u2009kvar are rated at 525\u2009V; at 400\u2009V all steps give 62.4\u2009kvar, 62.4\u2009% of the nameplate/,
    mend: /enter the kvar they have at 525\u2009V: 1.6 times/,
  },
  {
    title: 'detuning that no bank has',
    spoil: (s) => withPart(s, 'c1', { detuningPercent: 25, ratedV: 550 }),
    code: 'detuning-range',
    severity: 'warning',
    path: '$.elements[6].detuningPercent',
    says: /p = 25\u2009% tunes it to h 2 and puts its capacitors at 133\u2009% .* customary are 5.67, 7 and 14 %/,
    mend: /share of the reactance/,
  },
  {
    title: 'a bank tuned to an order that a drive injects',
    spoil: (s) => withPart(s, 'c1', { detuningPercent: 4 }),
    code: 'tuned-order-present',
    severity: 'warning',
    path: '$.elements[6].detuningPercent',
    says: /tuned to h 5, on the order 5 that Drive 1 injects.*allowed is a tuning below every order present/,
    mend: /5.67 %/,
  },
  {
    title: 'a bank of 7 % beside single-phase electronics with their third order',
    spoil: (s) =>
      withParts(s, {
        id: 'it',
        name: 'Servers',
        kind: 'converter',
        bus: 'main',
        kW: 30,
        powerFactor: 0.98,
        connection: 'L1',
        spectrum: 'single-phase-electronics',
      }),
    code: 'tuned-order-present',
    severity: 'warning',
    path: '$.elements[6].detuningPercent',
    says: /tuned to h 3.78, above the order 3 that Servers injects; below its tuning it is a capacitor/,
    mend: /14 %/,
  },
  {
    title: 'a filter tuned above its order',
    spoil: (s) =>
      withParts(s, {
        id: 'f',
        name: 'F5',
        kind: 'filter',
        bus: 'main',
        type: 'single-tuned',
        kvar: 100,
        tunedOrder: 5.1,
        qFactor: 40,
        ratedV: 440,
      }),
    code: 'filter-above-order',
    severity: 'warning',
    path: '$.elements[7].tunedOrder',
    says: /tuned to h 5.1, above the order 5;.*customary is 3 to 10 % below/,
    mend: /tune filter F5 to 4.7, 6\u2009% below the order 5/i,
    repair: 'tune filter F5 to 4.7',
  },
  {
    title: 'a fraction of 1 where per cent are meant',
    spoil: (s) => withPart(s, 't1', { ukPercent: 0.06, loadLossKW: 0.1 }),
    code: 'fraction-for-percent',
    severity: 'warning',
    path: '$.elements[1].ukPercent',
    says: /0.06\u2009% reads as a fraction of 1; customary are 2 to 20\u2009%/,
    mend: /to 6\u2009%/,
    repair: 'set the impedance voltage u_k of transformer T1 to 6\u2009%',
  },
  {
    title: 'a detuning written as a fraction',
    spoil: (s) => withPart(s, 'c1', { detuningPercent: 0.07 }),
    code: 'fraction-for-percent',
    severity: 'warning',
    path: '$.elements[6].detuningPercent',
    says: /0.07\u2009% reads as a fraction of 1/,
    mend: /to 7\u2009%/,
    repair: 'set the detuning p of Bank C1 to 7\u2009%',
  },
  {
    title: 'a supply without its minimum fault level',
    spoil: (s) => withPart(s, 'grid', { shortCircuitMVAMin: undefined }),
    code: 'fault-level-min',
    severity: 'warning',
    path: '$.elements[0].shortCircuitMVAMin',
    says: /minimum fault level is missing beside the maximum of 200\u2009MVA/,
    mend: /network operator/,
  },
  {
    title: 'a minimum fault level above the maximum',
    spoil: (s) =>
      withCase(withPart(s, 'grid', { shortCircuitMVAMin: 300 }), 'weak', [
        { element: 'heat', set: { kW: 90 } },
      ]),
    code: 'fault-level-order',
    severity: 'error',
    path: '$.elements[0].shortCircuitMVAMin',
    says: /minimum fault level 300\u2009MVA lies above the maximum 200\u2009MVA/,
    mend: /exchange the fault levels/i,
    repair: 'exchange the fault levels of supply Grid',
  },
  {
    title: 'a fault level nobody has stated',
    spoil: ({ origins: _origins, ...s }) => s,
    code: 'fault-level-source',
    severity: 'note',
    path: '$.elements[0].shortCircuitMVA',
    says: /fault level of 200\u2009MVA has no source/,
    mend: /origin/,
  },
  {
    title: 'a supply without background distortion',
    spoil: (s) => withPart(s, 'grid', { background: undefined }),
    code: 'no-background',
    severity: 'note',
    path: '$.elements[0].background',
    says: /no background distortion/,
    mend: /planning levels/,
  },
  {
    title: 'a generator whose x″d is only typical',
    spoil: (s) => ({
      ...withCase(withParts(s, generator), 'weak', [
        { element: 'grid', set: { shortCircuitMVA: 120 } },
        { element: 'g1', set: { on: true } },
      ]),
      origins: { ...s.origins, 'elements.g1.xdSubtransientPercent': { origin: 'assumed' } },
    }),
    code: 'generator-reactance',
    severity: 'note',
    path: '$.elements[7].xdSubtransientPercent',
    says: /x″d of 15\u2009% is assumed/,
    mend: /data sheet/,
  },
  {
    title: 'a motor with neither efficiency nor cos φ',
    spoil: (s) => withPart(s, 'fans', { efficiency: undefined, powerFactor: undefined }),
    code: 'motor-data',
    severity: 'note',
    path: '$.elements[4].efficiency',
    says: /neither efficiency nor cos φ is given; 0.94 and 0.85 are assumed/,
    mend: /nameplate/,
  },
  {
    title: 'a cable of next to no length',
    spoil: (s) => withPart(s, 'w1', { lengthM: 0.04 }),
    code: 'cable-length',
    severity: 'warning',
    path: '$.elements[2].lengthM',
    says: /0.04\u2009m is next to no length; lengths are in metres/,
    mend: /40\u2009m where km were meant.*bus coupler/,
  },
  {
    title: 'a spectrum kept where a case changes the kW',
    spoil: (s) =>
      withCase(s, 'weak', [
        { element: 'grid', set: { shortCircuitMVA: 120 } },
        { element: 'drive', set: { kW: 20 } },
      ]),
    code: 'spectrum-scales',
    severity: 'note',
    path: '$.elements[5].spectrum',
    says: /belongs to 60\u2009kW and is kept in Weak grid \(20\u2009kW\): the amperes scale with I1/,
    mend: /spectrum measured or stated at their load/,
  },
  {
    title: 'interharmonics declared',
    spoil: (s) => withPart(s, 'drive', { interharmonics: true }),
    code: 'interharmonics',
    severity: 'warning',
    path: '$.elements[5].interharmonics',
    says: /injects interharmonics; whole orders alone/,
    mend: /rail between the orders/,
  },
  {
    title: 'a spectrum measured with the old bank on',
    spoil: (s) => withPart(s, 'drive', { spectrumWithBank: true }),
    code: 'spectrum-with-bank',
    severity: 'warning',
    path: '$.elements[5].spectrumWithBank',
    says: /measured with capacitors in/,
    mend: /with the bank out/,
  },
  {
    title: 'a drive that injects nothing',
    spoil: (s) => withPart(s, 'drive', { spectrum: [] }),
    code: 'spectrum-empty',
    severity: 'note',
    path: '$.elements[5].spectrum',
    says: /injects nothing/,
    mend: /choose a spectrum/i,
  },
  {
    title: 'no point of common coupling',
    spoil: (s) => ({ ...s, buses: s.buses.map(({ pcc: _pcc, ...bus }) => bus) }),
    code: 'no-pcc',
    severity: 'warning',
    path: '$.buses',
    says: /no busbar is marked as point of common coupling/i,
    mend: /mark Intake/i,
    repair: 'mark Intake as point of common coupling',
  },
  {
    title: 'more points of common coupling than feeds',
    spoil: (s) => ({ ...s, buses: s.buses.map((bus) => ({ ...bus, pcc: bus.id !== 'mill' })) }),
    code: 'several-pcc',
    severity: 'warning',
    path: '$.buses[1].pcc',
    says: /2 busbars are marked .*\(Intake, Main board\) with 1 fed by a supply; allowed is one/,
    mend: /take the mark off/i,
  },
  {
    title: 'distortion without a demand current',
    spoil: ({ criteria: _criteria, ...s }) => s,
    code: 'no-demand-current',
    severity: 'warning',
    path: '$.criteria.demandCurrentA',
    says: /maximum demand current I_L .* TDD/,
    mend: /bills/,
  },
  {
    title: 'two parts of one name',
    spoil: (s) => withPart(s, 'fans', { name: 'drive 1' }),
    code: 'duplicate-name',
    severity: 'warning',
    path: '$.elements[5].name',
    says: /has the same name/,
    mend: /rename Drive 1 to Drive 2/i,
    repair: 'rename Drive 1 to Drive 2',
  },
  {
    title: 'a case that repeats the base study',
    spoil: (s) =>
      withCase(s, 'weak', [
        { element: 'grid', set: { shortCircuitMVA: 120 } },
        { element: 'heat', set: { kW: 120 } },
      ]),
    code: 'case-repeats-base',
    severity: 'note',
    path: '$.cases[2]',
    says: /case Weak grid: it sets Heaters to what the base study has/,
    mend: /repeats of the base study/,
    repair: 'take what case Weak grid repeats of the base study out of it',
  },
  {
    title: 'a case in the state of another',
    spoil: (s) => ({ ...s, cases: [...(s.cases ?? []), { id: 'twin', name: 'Evening', changes: [] }] }),
    code: 'case-twice',
    severity: 'note',
    path: '$.cases[3]',
    says: /case Evening: it is in the same state as case Day/,
    mend: /remove the case/,
  },
  {
    title: 'a case that names a part that is gone',
    spoil: (s) =>
      withCase(s, 'weak', [
        { element: 'grid', set: { shortCircuitMVA: 120 } },
        { element: 'gone', set: { kW: 1 } },
      ]),
    code: 'case-without-part',
    severity: 'error',
    path: '$.cases[2]',
    says: /changes "gone", which the study no longer has/,
    mend: /take the changes of missing parts out/i,
    repair: 'take the changes of missing parts out of case Weak grid',
  },
  {
    title: 'a case that sets a field its part does not have',
    spoil: (s) => withCase(s, 'weak', [{ element: 'grid', set: { shortCircuitMVA: 120, kw: 3 } }]),
    code: 'case-unknown-field',
    severity: 'warning',
    path: '$.cases[2]',
    says: /sets "kw" of supply Grid, which such a part does not have/,
    mend: /without effect/,
    repair: 'take out what case Weak grid sets without effect',
  },
  {
    title: 'the weak grid in no case',
    spoil: (s) => withCase(s, 'weak', [{ element: 'heat', set: { kW: 90 } }]),
    code: 'state-not-covered',
    severity: 'note',
    path: '$.cases',
    says: /supply Grid: no case looks at the state "Minimum fault level"/,
    mend: /add case Minimum fault level/i,
    repair: 'add case Minimum fault level',
  },
  {
    title: 'the bank with all steps only',
    spoil: (s) => withCase(s, 'night', [{ element: 'heat', set: { kW: 20 } }]),
    code: 'state-not-covered',
    severity: 'note',
    path: '$.cases',
    says: /Bank C1: no case looks at the state "Bank C1: 1 of 2 steps"/,
    mend: /add case Bank C1: 1 of 2 steps/i,
    repair: 'add case Bank C1: 1 of 2 steps',
  },
  {
    title: 'a generator that runs in no case',
    spoil: (s) => withParts(s, generator),
    code: 'state-not-covered',
    severity: 'note',
    path: '$.cases',
    says: /No case looks at the state "On generator G1"; the bank meets x″d/,
    mend: /add case On generator G1/i,
    repair: 'add case On generator G1',
  },
  {
    title: 'a coupler closed in no case',
    spoil: (s) => withParts(s, tie),
    code: 'state-not-covered',
    severity: 'note',
    path: '$.cases',
    says: /bus coupler Tie 1: no case looks at the state "Tie 1 closed"/,
    mend: /add case Tie 1 closed/i,
    repair: 'add case Tie 1 closed',
  },
  {
    title: 'light load in no case',
    spoil: (s) => ({ ...s, cases: (s.cases ?? []).map(({ role: _role, ...item }) => item) }),
    code: 'state-not-covered',
    severity: 'note',
    path: '$.cases',
    says: /no case looks at the state "Light load, 30\u2009%"/i,
    mend: /add case Light load/i,
    repair: 'add case Light load, 30\u2009%',
  },
  {
    title: 'typical values not yet confirmed',
    spoil: (s) => ({
      ...s,
      origins: {
        ...s.origins,
        'elements.t1.ukPercent': { origin: 'typical' },
        'elements.c1.steps': { origin: 'typical' },
      },
    }),
    code: 'typical-values',
    severity: 'note',
    path: '$.origins',
    says: /2 values are typical and not yet confirmed: transformer T1, Bank C1/,
    mend: /nameplate/,
  },
];

const spoken = (study: Study): SiteFinding[] =>
  siteFindings(study).filter(({ code, severity }) => severity !== 'note' || !natural.has(code));

describe('Nothing is said', () => {
  it('of an empty study', () => {
    expect(siteFindings({ ...soundSite(), buses: [], elements: [], cases: [] })).toEqual([]);
  });

  it('of a sound site, which the reader accepts, but what its nature is: kvar rated at 440 V on 400 V', () => {
    expect(checkStudy(soundSite()).findings).toEqual([]);
    expect(spoken(soundSite())).toEqual([]);
    expect(siteFindings(soundSite())).toMatchObject([
      { code: 'kvar-at-rated-voltage', severity: 'note', cases: [] },
    ]);
  });
});

describe('A finding names part, value, what is allowed and what mends it:', () => {
  it.each(rows)('$title', ({ spoil, code, severity, path, says, mend, repair }) => {
    const study = deepFrozen(spoil(soundSite()));
    const found = spoken(study);
    expect(found.map((one) => `${one.code} ${one.severity} ${one.path}`)).toEqual([
      `${code} ${severity} ${path}`,
    ]);
    const [finding] = found as [SiteFinding];
    expect(finding.message).toMatch(says);
    expect(finding.message).toMatch(/\.$/);
    expect(finding.mend).toMatch(mend);
    expect(finding.mend).toMatch(/^[A-Z].*\.$/);
    expect(finding.repair?.words).toBe(repair);
  });

  it.each(rows.filter(({ repair }) => repair !== undefined))(
    '$title: the mend removes it',
    ({ spoil, code }) => {
      const study = deepFrozen(spoil(soundSite()));
      const finding = spoken(study).find((one) => one.code === code);
      const mended = finding?.repair?.apply(study) as Study;
      expect(mended).not.toBe(study);
      expect(spoken(mended).filter((one) => one.key === finding?.key)).toEqual([]);
      expect(checkStudy(mended).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    },
  );
});
