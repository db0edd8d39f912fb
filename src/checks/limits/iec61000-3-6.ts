import type { LimitSet, OrderFamily, OrderRow, OverOrder } from './types.ts';

type MvHv = readonly [number | OverOrder, number | OverOrder];

/** Indicative planning levels: medium voltage, then high and extra-high voltage. From memory. */
const levels: { family: OrderFamily; from: number; to: number; mvHv: MvHv }[] = [
  { family: 'odd-nontriplen', from: 5, to: 5, mvHv: [5, 2] },
  { family: 'odd-nontriplen', from: 7, to: 7, mvHv: [4, 2] },
  { family: 'odd-nontriplen', from: 11, to: 11, mvHv: [3, 1.5] },
  { family: 'odd-nontriplen', from: 13, to: 13, mvHv: [2.5, 1.5] },
  {
    family: 'odd-nontriplen',
    from: 17,
    to: 49,
    mvHv: [
      { a: 1.9, at: 17, b: -0.2 },
      { a: 1.2, at: 17, b: 0 },
    ],
  },
  { family: 'odd-triplen', from: 3, to: 3, mvHv: [4, 2] },
  { family: 'odd-triplen', from: 9, to: 9, mvHv: [1.2, 1] },
  { family: 'odd-triplen', from: 15, to: 15, mvHv: [0.3, 0.3] },
  { family: 'odd-triplen', from: 21, to: 45, mvHv: [0.2, 0.2] },
  { family: 'even', from: 2, to: 2, mvHv: [1.8, 1.4] },
  { family: 'even', from: 4, to: 4, mvHv: [1, 0.8] },
  { family: 'even', from: 6, to: 8, mvHv: [0.5, 0.4] },
  {
    family: 'even',
    from: 10,
    to: 50,
    mvHv: [
      { a: 0.25, at: 10, b: 0.22 },
      { a: 0.19, at: 10, b: 0.16 },
    ],
  },
];

function ordersAt(index: 0 | 1): OrderRow[] {
  return levels.map(({ family, from, to, mvHv }) => ({ family, from, to, percent: mvHv[index] }));
}

/** Planning levels of the network operator; the operator's own figures prevail. */
export const iec61000x3x6: LimitSet = {
  id: 'iec-61000-3-6',
  label: 'IEC TR 61000-3-6 planning levels',
  document: 'IEC TR 61000-3-6',
  edition: '2008',
  note: 'Indicative planning levels; the network operator sets the ones that apply.',
  voltage: {
    thdToOrder: 50,
    tables: [
      {
        aboveV: 1000,
        upToV: 35000,
        clause: 'Table 2, MV',
        provenance: 'memory',
        orders: ordersAt(0),
        thdPercent: 6.5,
      },
      {
        aboveV: 35000,
        clause: 'Table 2, HV-EHV',
        provenance: 'memory',
        orders: ordersAt(1),
        thdPercent: 3,
      },
    ],
  },
};
