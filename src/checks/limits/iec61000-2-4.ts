import type { LimitSet, OrderFamily, OrderRow, OverOrder } from './types.ts';

type ByClass = readonly [number | OverOrder, number | OverOrder, number | OverOrder];

const highOdd: OverOrder = { a: 2.27, at: 17, b: -0.27 };
const highEven: OverOrder = { a: 0.25, at: 10, b: 0.25 };

/** Compatibility levels of classes 1, 2 and 3 by order. From memory. */
const levels: { family: OrderFamily; from: number; to: number; byClass: ByClass }[] = [
  { family: 'odd-nontriplen', from: 5, to: 5, byClass: [3, 6, 8] },
  { family: 'odd-nontriplen', from: 7, to: 7, byClass: [3, 5, 7] },
  { family: 'odd-nontriplen', from: 11, to: 11, byClass: [3, 3.5, 5] },
  { family: 'odd-nontriplen', from: 13, to: 13, byClass: [3, 3, 4.5] },
  { family: 'odd-nontriplen', from: 17, to: 17, byClass: [2, 2, 4] },
  { family: 'odd-nontriplen', from: 19, to: 49, byClass: [highOdd, highOdd, { a: 4.5, at: 17, b: -0.5 }] },
  { family: 'odd-triplen', from: 3, to: 3, byClass: [3, 5, 6] },
  { family: 'odd-triplen', from: 9, to: 9, byClass: [1.5, 1.5, 2.5] },
  { family: 'odd-triplen', from: 15, to: 15, byClass: [0.3, 0.4, 2] },
  { family: 'odd-triplen', from: 21, to: 21, byClass: [0.2, 0.3, 1.75] },
  { family: 'odd-triplen', from: 27, to: 45, byClass: [0.2, 0.2, 1] },
  { family: 'even', from: 2, to: 2, byClass: [2, 2, 3] },
  { family: 'even', from: 4, to: 4, byClass: [1, 1, 1.5] },
  { family: 'even', from: 6, to: 10, byClass: [0.5, 0.5, 1] },
  { family: 'even', from: 12, to: 50, byClass: [highEven, highEven, 1] },
];

const thdPercent = [5, 8, 10] as const;
const unbalancePercent = [2, 2, 3] as const;
const bands = [
  [92, 108],
  [90, 110],
  [85, 110],
] as const;

function environmentClass(index: 0 | 1 | 2): LimitSet {
  const orders: OrderRow[] = levels.map(({ family, from, to, byClass }) => ({
    family,
    from,
    to,
    percent: byClass[index],
  }));
  const [lowPercent, highPercent] = bands[index];
  return {
    id: `iec-61000-2-4-class-${index + 1}`,
    label: `IEC 61000-2-4 class ${index + 1} (industrial)`,
    document: 'IEC 61000-2-4',
    edition: '2002',
    note: 'The third edition (2024) restructures the classes; check before use.',
    voltage: {
      thdToOrder: 50,
      tables: [
        {
          aboveV: 0,
          upToV: 35000,
          clause: `Tables 2 to 5, class ${index + 1}`,
          provenance: 'memory',
          orders,
          thdPercent: thdPercent[index],
        },
      ],
    },
    band: {
      lowPercent,
      highPercent,
      clause: `Table 1, class ${index + 1}`,
      provenance: 'memory',
    },
    unbalancePercent: {
      value: unbalancePercent[index],
      clause: `Table 1, class ${index + 1}`,
      provenance: 'memory',
    },
  };
}

/** Compatibility levels inside an industrial plant: 1 protected, 2 general, 3 harsh. */
export const iec61000x2x4: LimitSet[] = [environmentClass(0), environmentClass(1), environmentClass(2)];
