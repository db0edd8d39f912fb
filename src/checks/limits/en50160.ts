import type { LimitSet, OrderRow } from './types.ts';

const orders: OrderRow[] = [
  { family: 'odd-nontriplen', from: 5, to: 5, percent: 6 },
  { family: 'odd-nontriplen', from: 7, to: 7, percent: 5 },
  { family: 'odd-nontriplen', from: 11, to: 11, percent: 3.5 },
  { family: 'odd-nontriplen', from: 13, to: 13, percent: 3 },
  { family: 'odd-nontriplen', from: 17, to: 17, percent: 2 },
  { family: 'odd-nontriplen', from: 19, to: 25, percent: 1.5 },
  { family: 'odd-triplen', from: 3, to: 3, percent: 5 },
  { family: 'odd-triplen', from: 9, to: 9, percent: 1.5 },
  { family: 'odd-triplen', from: 15, to: 21, percent: 0.5 },
  { family: 'even', from: 2, to: 2, percent: 2 },
  { family: 'even', from: 4, to: 4, percent: 1 },
  { family: 'even', from: 6, to: 24, percent: 0.5 },
];

/**
 * Voltage characteristics of public supply: 95 % of the 10-minute values of a week. Harmonic values
 * second-hand (several instrument manuals quote the table and agree); the ±10 % band from memory.
 */
export const en50160: LimitSet = {
  id: 'en-50160',
  label: 'EN 50160 (public supply)',
  document: 'EN 50160',
  edition: '2010',
  note: 'Orders above 25 have no limit here. A3:2019 is said to raise the 15th to 1.0 and the 21st to 0.75 (memory, unsure).',
  voltage: {
    thdToOrder: 40,
    tables: [
      {
        aboveV: 0,
        upToV: 1000,
        clause: '4.2.5, Table 1',
        provenance: 'second-hand',
        orders,
        thdPercent: 8,
      },
      {
        aboveV: 1000,
        upToV: 36000,
        clause: '5.2.5, MV table',
        provenance: 'second-hand',
        note: 'The 3rd may be lower, depending on the network.',
        orders,
        thdPercent: 8,
      },
    ],
  },
  band: { lowPercent: 90, highPercent: 110, clause: 'supply voltage variations', provenance: 'memory' },
  unbalancePercent: { value: 2, clause: 'supply voltage unbalance', provenance: 'memory' },
};
