import { integer, number } from './build.ts';
import type { Field } from './Field.ts';
import { seriesFields, skin } from './partFields.ts';

export const cableFields: readonly Field[] = [
  ...seriesFields,
  number('lengthM', 'length', 'm', 'γl enters the exact equivalent π.', { required: true, above: 0 }),
  number('resistanceOhmPerKm', 'resistance R′', 'Ω/km', 'At operating temperature, not at 20 °C.', {
    required: true,
    min: 0,
    usual: '0.05…2',
    typical: '0.0754 Ω/km × 1.20 for 240 mm² copper at 70 °C (IEC 60228 value at 20 °C)',
  }),
  number('reactanceOhmPerKm', 'reactance X′', 'Ω/km', 'At the nominal frequency; Z(h) = R(h) + jhX.', {
    required: true,
    min: 0,
    usual: '0.08…0.13',
    typical: '0.08 Ω/km multicore or trefoil (from memory)',
  }),
  number('capacitanceNFPerKm', 'capacitance C′', 'nF/km', 'Zero: series impedance alone.', {
    default: 0,
    min: 0,
    rare: true,
  }),
  integer('runs', 'cables in parallel', '', 'Admittances are multiplied by the number of runs.', {
    default: 1,
    min: 1,
  }),
  number('ratedA', 'rated current, all runs', 'A', 'Judged by the cable-load check.', { above: 0 }),
  number('r0OverR1', 'R0/R1', '', 'R0 includes three times the return path.', {
    default: 4,
    above: 0,
    rare: true,
  }),
  number('x0OverX1', 'X0/X1', '', 'X0 includes three times the return path.', {
    default: 3,
    above: 0,
    rare: true,
  }),
  number('c0OverC1', 'C0/C1', '', 'Above zero the cable is a zero-sequence path.', {
    default: 1,
    min: 0,
    rare: true,
  }),
  skin(0.26, 0.5),
];
