import type { LimitSet, OrderRow } from './types.ts';

/** Compatibility levels shared by IEC 61000-2-2 (low voltage) and IEC 61000-2-12 (medium voltage). */
const publicNetworkOrders: OrderRow[] = [
  { family: 'odd-nontriplen', from: 5, to: 5, percent: 6 },
  { family: 'odd-nontriplen', from: 7, to: 7, percent: 5 },
  { family: 'odd-nontriplen', from: 11, to: 11, percent: 3.5 },
  { family: 'odd-nontriplen', from: 13, to: 13, percent: 3 },
  { family: 'odd-nontriplen', from: 17, to: 49, percent: { a: 2.27, at: 17, b: -0.27 } },
  { family: 'odd-triplen', from: 3, to: 3, percent: 5 },
  { family: 'odd-triplen', from: 9, to: 9, percent: 1.5 },
  { family: 'odd-triplen', from: 15, to: 15, percent: 0.4 },
  { family: 'odd-triplen', from: 21, to: 21, percent: 0.3 },
  { family: 'odd-triplen', from: 27, to: 45, percent: 0.2 },
  { family: 'even', from: 2, to: 2, percent: 2 },
  { family: 'even', from: 4, to: 4, percent: 1 },
  { family: 'even', from: 6, to: 8, percent: 0.5 },
  { family: 'even', from: 10, to: 50, percent: { a: 0.25, at: 10, b: 0.25 } },
];

const unbalance = { value: 2, clause: 'voltage unbalance', provenance: 'memory' } as const;

/** Low-voltage public networks. All values from memory: check against a licensed copy. */
export const iec61000x2x2: LimitSet = {
  id: 'iec-61000-2-2',
  label: 'IEC 61000-2-2 (public low voltage)',
  document: 'IEC 61000-2-2',
  edition: '2002 + A1:2017 + A2:2018',
  voltage: {
    thdToOrder: 50,
    tables: [
      {
        aboveV: 0,
        upToV: 1000,
        clause: 'Table 1',
        provenance: 'memory',
        orders: publicNetworkOrders,
        thdPercent: 8,
      },
    ],
  },
  unbalancePercent: unbalance,
};

/** Medium-voltage public networks, 1 kV to 35 kV. From memory. */
export const iec61000x2x12: LimitSet = {
  id: 'iec-61000-2-12',
  label: 'IEC 61000-2-12 (public medium voltage)',
  document: 'IEC 61000-2-12',
  edition: '2003',
  voltage: {
    thdToOrder: 50,
    tables: [
      {
        aboveV: 1000,
        upToV: 35000,
        clause: 'Table 1',
        provenance: 'memory',
        orders: publicNetworkOrders,
        thdPercent: 8,
      },
    ],
  },
  unbalancePercent: unbalance,
};
