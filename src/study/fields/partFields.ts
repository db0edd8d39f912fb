import { boolean, busRef, choice, number, pair, text } from './build.ts';
import type { DefaultContext, Field } from './Field.ts';

const name = text('name', 'name', 'What the part is called on the drawing and on the results sheet.');
const on = boolean('on', 'in service', 'A part out of service takes no part in the solution.', {
  default: true,
});

/** Fields that lead every series part. */
export const seriesFields: readonly Field[] = [
  name,
  on,
  busRef('from', 'from busbar', 'Upper end; the terminal listed first.'),
  busRef('to', 'to busbar', 'Lower end.'),
];

/** Fields that lead every part hanging from one busbar. */
export const shuntFields: readonly Field[] = [name, on, busRef('bus', 'busbar', 'The busbar it hangs from.')];

export const connection = choice(
  'connection',
  'connected to',
  'Three-phase, one phase to neutral, or between two phases.',
  [
    { value: 'L1L2L3', label: 'three-phase' },
    { value: 'L1', label: 'L1 to neutral' },
    { value: 'L2', label: 'L2 to neutral' },
    { value: 'L3', label: 'L3 to neutral' },
    { value: 'L1L2', label: 'L1 to L2' },
    { value: 'L2L3', label: 'L2 to L3' },
    { value: 'L3L1', label: 'L3 to L1' },
  ],
  { default: 'L1L2L3', rare: true },
);

export const starDelta = choice(
  'connection',
  'connection',
  'Only a star-earthed unit carries zero-sequence current: y0 = 1/Z, otherwise y0 = 0.',
  [
    { value: 'delta', label: 'delta' },
    { value: 'star', label: 'star, not earthed' },
    { value: 'star-earthed', label: 'star, earthed' },
  ],
  { default: 'delta', rare: true },
);

export const lossWPerKvar = number(
  'lossWPerKvar',
  'capacitor loss',
  'W/kvar',
  'Rc = loss/1000 · Xc, in series with the capacitor.',
  {
    min: 0,
    default: 0.3,
    rare: true,
    usual: '0.2…0.5',
    typical: '0.2 to 0.5 W/kvar with discharge resistors (common practice)',
  },
);

export function leading(help: string): Field {
  return boolean('leading', 'leading', help, { default: false, rare: true });
}

/** R(h) = R·((1 − s) + s·h^e). */
export function skin(s: number, e: number, key = 'skin'): Field {
  return pair('skin', key, 'skin effect s, e', 'R(h) = R·((1 − s) + s·h^e); 0 and 1 switch it off.', {
    default: [s, e],
    rare: true,
  });
}

/** A neutral is usual in low-voltage distribution and unusual above: true up to 1000 V. */
export function neutralUpTo1000V(context: DefaultContext): boolean | undefined {
  return context.nominalV === undefined ? undefined : context.nominalV <= 1000;
}

export const freeRLC: readonly Field[] = [
  choice(
    'arrangement',
    'arrangement',
    'Series: Z = R + jωL + 1/(jωC). Parallel: Y = 1/R + 1/(jωL) + jωC. An absent part is left out.',
    [
      { value: 'series', label: 'in series' },
      { value: 'parallel', label: 'in parallel' },
    ],
    { required: true },
  ),
  number('resistanceOhm', 'resistance R', 'Ω', 'Absent: a short in series, open in parallel.', { min: 0 }),
  number('inductanceMH', 'inductance L', 'mH', 'Absent: a short in series, open in parallel.', { min: 0 }),
  number('capacitanceUF', 'capacitance C', 'µF', 'Absent: a short in series, open in parallel.', { min: 0 }),
];
