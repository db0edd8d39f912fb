import { boolean, number, text } from './build.ts';
import type { DefaultContext, Field } from './Field.ts';
import { seriesFields, skin } from './partFields.ts';

/** Zigzag secondaries have a small zero-sequence impedance; Yyn depends on the core and must be given. */
function z0Default({ owner }: DefaultContext): number | undefined {
  const group = typeof owner.vectorGroup === 'string' ? owner.vectorGroup : '';
  if (/^(D|YN?)zn/.test(group)) return 0.1;
  return /^Yyn/.test(group) ? undefined : 1;
}

export const transformerFields: readonly Field[] = [
  ...seriesFields,
  number('ratedKVA', 'rated power', 'kVA', '|Z| = u_k/100 · U_LV²/S.', {
    required: true,
    above: 0,
    usual: '100…2500',
    typical: '100 to 2500 kVA at low voltage',
  }),
  number('ukPercent', 'impedance voltage u_k', '%', '|Z| = u_k/100 · U_LV²/S.', {
    required: true,
    above: 0,
    max: 100,
    usual: '4…8',
    typical: '4 % up to 630 kVA, 6 % up to 2500 kVA (common practice)',
  }),
  number('loadLossKW', 'load loss P_k', 'kW', 'R = P_k·U_LV²/S², and R may not exceed |Z|.', {
    required: true,
    min: 0,
    typical: '7.6 kW at 1000 kVA (Regulation (EU) 548/2014, tier 2)',
  }),
  text('vectorGroup', 'vector group', 'LV lags HV by clock · 30°; Dyn11 leads by 30°.', {
    required: true,
    type: 'vectorGroup',
    suggestions: ['Dyn11', 'Dyn5', 'Dyn1', 'Yyn0', 'YNyn0', 'YNd11', 'Yd11', 'Dzn0', 'Yzn11', 'Dd0'],
  }),
  number('hvV', 'rated high voltage', 'V', 'n = U_HV·(1 + tap/100)/U_LV.', { required: true, above: 0 }),
  number('lvV', 'rated low voltage, no load', 'V', 'n = U_HV·(1 + tap/100)/U_LV.', {
    required: true,
    above: 0,
  }),
  number(
    'tapPercent',
    'tap',
    '%',
    'Effective high voltage U_HV·(1 + tap/100); a negative tap raises the low voltage.',
    {
      default: 0,
      min: -50,
      max: 50,
      usual: '±2.5, ±5',
      typical: '±2.5 % and ±5 % (common practice)',
    },
  ),
  number('noLoadLossKW', 'no-load loss P_0', 'kW', 'G = P_0/U_LV² at the low-voltage side.', {
    default: 0,
    min: 0,
    rare: true,
  }),
  number(
    'noLoadCurrentPercent',
    'no-load current i_0',
    '%',
    '|Y| = i_0/100 · S/U_LV², B = −√(|Y|² − G²)/h.',
    {
      default: 0,
      min: 0,
      max: 100,
      rare: true,
      usual: '0.3…1',
      typical: '0.3 to 1 % (common practice)',
    },
  ),
  number(
    'z0OverZ1',
    'zero-sequence impedance Z0/Z1',
    '',
    'Z0 = (Z0/Z1)·Z1 at the earthed star point; needed for Yyn.',
    {
      defaultFor: z0Default,
      above: 0,
      rare: true,
      usual: '0.85…1',
      typical: '1 for Dyn, 0.1 for a zigzag secondary',
    },
  ),
  number(
    'neutralOhm',
    'star point resistor',
    'Ω',
    '3·R_N is added to Z0 on the side whose star point is earthed.',
    {
      default: 0,
      min: 0,
      rare: true,
    },
  ),
  skin(1 / 11, 1.5),
  number(
    'eddyLossShare',
    'winding eddy-current loss P_EC-R',
    '',
    'Per unit of the I²R loss at rated current (IEEE C57.110).',
    {
      min: 0,
      max: 1,
      rare: true,
      usual: '0.01…0.15',
      typical: '0.01 to 0.15 (common practice)',
    },
  ),
  boolean(
    'ukTested',
    'u_k from the test report',
    'A tested u_k has no tolerance; otherwise ±10 % (IEC 60076-1, from memory).',
    {
      default: false,
      rare: true,
    },
  ),
];
