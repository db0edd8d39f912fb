import { boolean, list, number } from './build.ts';
import type { Field } from './Field.ts';
import { shuntFields, skin } from './partFields.ts';

export const supplyFields: readonly Field[] = [
  ...shuntFields,
  number('shortCircuitMVA', 'fault level, maximum', 'MVA', '|Z1| = U²/S_sc.', {
    required: true,
    above: 0,
    usual: '100…500',
    typical: '100 to 500 MVA at medium voltage; ask the network operator',
  }),
  number(
    'shortCircuitMVAMin',
    'fault level, minimum',
    'MVA',
    'The weakest state of the grid, searched by the tolerance run.',
    { above: 0 },
  ),
  number('xOverR', 'X/R', '', 'R = |Z1|/√(1 + (X/R)²), X = R·(X/R).', {
    required: true,
    min: 0,
    usual: '5…15',
    typical: '5 to 15 at medium voltage (common practice)',
  }),
  number('setpointPercent', 'voltage behind the impedance', '%', 'E = setpoint/100 · U/√3.', {
    default: 100,
    above: 0,
    max: 200,
    rare: true,
  }),
  number('angleDeg', 'angle', '°', 'E stands at this angle to the cosine reference.', {
    default: 0,
    rare: true,
  }),
  list(
    'rows',
    'background',
    'background distortion',
    'E_h = (%/100)·U/√3 at angle_h + h·angle, behind Z(h).',
  ),
  number('z0OverZ1', 'zero-sequence impedance Z0/Z1', '', 'Z0 = (Z0/Z1)·Z1 at every order.', {
    default: 1,
    above: 0,
    rare: true,
  }),
  boolean('neutral', 'earthed neutral', 'Without one there is no zero-sequence path here.', {
    default: true,
    rare: true,
  }),
  skin(0, 1),
];
