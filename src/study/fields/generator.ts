import { boolean, number } from './build.ts';
import type { Field } from './Field.ts';
import { shuntFields } from './partFields.ts';

export const generatorFields: readonly Field[] = [
  ...shuntFields,
  number('ratedKVA', 'rated power', 'kVA', '|Z1| = x″_d/100 · U²/S.', { required: true, above: 0 }),
  number('xdSubtransientPercent', 'subtransient reactance x″_d', '%', '|Z1| = x″_d/100 · U²/S.', {
    required: true,
    above: 0,
    max: 200,
    usual: '12…20',
    typical: '12 to 20 % (IEEE 141 typical values, second-hand)',
  }),
  number('xOverR', 'X/R', '', 'R = |Z1|/√(1 + (X/R)²).', { default: 20, min: 0, rare: true }),
  number('setpointPercent', 'voltage behind the impedance', '%', 'E = setpoint/100 · U/√3.', {
    default: 100,
    above: 0,
    max: 200,
    rare: true,
  }),
  number('angleDeg', 'angle', '°', 'Absent: the no-load angle of its busbar from the nearest source.', {
    rare: true,
  }),
  number('z0OverZ1', 'zero-sequence impedance Z0/Z1', '', 'Z0 = (Z0/Z1)·Z1.', {
    default: 0.5,
    above: 0,
    rare: true,
  }),
  boolean('neutral', 'earthed neutral', 'Without one there is no zero-sequence path here.', {
    default: true,
    rare: true,
  }),
];
