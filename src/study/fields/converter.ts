import { boolean, choice, list, number } from './build.ts';
import type { Field } from './Field.ts';
import { connection, leading, shuntFields } from './partFields.ts';

export const converterFields: readonly Field[] = [
  ...shuntFields,
  number(
    'kW',
    'active power, total',
    'kW',
    'Negative feeds in. I_h = (%/100)·|I1|, so amperes scale with kW.',
    { required: true },
  ),
  number(
    'powerFactor',
    'displacement power factor cos φ1',
    '',
    'Of the fundamental alone; distortion is not in it.',
    {
      required: true,
      above: 0,
      max: 1,
      usual: '0.95…1',
      typical: '0.95 to 1 for diode bridges (common practice)',
    },
  ),
  leading('Q turns negative: the bridge gives kvar.'),
  list('spectrum', 'spectrum', 'spectrum', 'I_h = (%/100)·|I1| at angle_h + h·φ1, into the part.', {
    required: true,
  }),
  choice(
    'wires',
    'wires',
    'Three wires carry no zero-sequence current; matters for three-phase parts only.',
    [
      { value: 3, label: 'three, no neutral' },
      { value: 4, label: 'four, with neutral' },
    ],
    { default: 3, rare: true },
  ),
  connection,
  number(
    'filterCapacitanceUF',
    'filter capacitor, star per phase',
    'µF',
    'y1 = y2 = jhω_n C beside the bridge; three-wire, three-phase parts only.',
    {
      default: 0,
      min: 0,
      rare: true,
    },
  ),
  boolean(
    'spectrumWithBank',
    'spectrum measured with capacitors in',
    'A bank takes up or raises what the bridge injects: the reading is then of both.',
    { rare: true },
  ),
  boolean(
    'interharmonics',
    'injects interharmonics',
    'Cycloconverter, arc furnace, sub-synchronous cascade: currents between the whole orders.',
    { rare: true },
  ),
];
