import type { CurrentLimits, CurrentTable, EvenRule, LimitSet, OrderRow, VoltageLimits } from './types.ts';

const everyOrder = (percent: number): OrderRow[] => [{ family: 'any', from: 2, to: 50, percent }];

const voltage: VoltageLimits = {
  thdToOrder: 50,
  pccOnly: true,
  tables: [
    {
      aboveV: 0,
      upToV: 1000,
      clause: 'Table 1',
      provenance: 'second-hand',
      orders: everyOrder(5),
      thdPercent: 8,
    },
    {
      aboveV: 1000,
      upToV: 69000,
      clause: 'Table 1',
      provenance: 'memory',
      orders: everyOrder(3),
      thdPercent: 5,
    },
    {
      aboveV: 69000,
      upToV: 161000,
      clause: 'Table 1',
      provenance: 'memory',
      orders: everyOrder(1.5),
      thdPercent: 2.5,
    },
    { aboveV: 161000, clause: 'Table 1', provenance: 'memory', orders: everyOrder(1), thdPercent: 1.5 },
  ],
};

const bands = [10, 16, 22, 34, 50];

const tables: CurrentTable[] = [
  {
    aboveV: 0,
    upToV: 69000,
    clause: 'Table 2',
    provenance: 'second-hand',
    note: 'Numbers read in the 1992 table; said to be unchanged since.',
    bands,
    rows: [
      { ratioFrom: 0, ratioBelow: 20, percent: [4, 2, 1.5, 0.6, 0.3], tddPercent: 5 },
      { ratioFrom: 20, ratioBelow: 50, percent: [7, 3.5, 2.5, 1, 0.5], tddPercent: 8 },
      { ratioFrom: 50, ratioBelow: 100, percent: [10, 4.5, 4, 1.5, 0.7], tddPercent: 12 },
      { ratioFrom: 100, ratioBelow: 1000, percent: [12, 5.5, 5, 2, 1], tddPercent: 15 },
      { ratioFrom: 1000, percent: [15, 7, 6, 2.5, 1.4], tddPercent: 20 },
    ],
  },
  {
    aboveV: 69000,
    upToV: 161000,
    clause: 'Table 3',
    provenance: 'memory',
    bands,
    rows: [
      { ratioFrom: 0, ratioBelow: 20, percent: [2, 1, 0.75, 0.3, 0.15], tddPercent: 2.5 },
      { ratioFrom: 20, ratioBelow: 50, percent: [3.5, 1.75, 1.25, 0.5, 0.25], tddPercent: 4 },
      { ratioFrom: 50, ratioBelow: 100, percent: [5, 2.25, 2, 0.75, 0.35], tddPercent: 6 },
      { ratioFrom: 100, ratioBelow: 1000, percent: [6, 2.75, 2.5, 1, 0.5], tddPercent: 7.5 },
      { ratioFrom: 1000, percent: [7.5, 3.5, 3, 1.25, 0.7], tddPercent: 10 },
    ],
  },
  {
    aboveV: 161000,
    clause: 'Table 4',
    provenance: 'memory',
    bands,
    rows: [
      { ratioFrom: 0, ratioBelow: 25, percent: [1, 0.5, 0.38, 0.15, 0.1], tddPercent: 1.5 },
      { ratioFrom: 25, ratioBelow: 50, percent: [2, 1, 0.75, 0.3, 0.15], tddPercent: 2.5 },
      { ratioFrom: 50, percent: [3, 1.5, 1.15, 0.45, 0.22], tddPercent: 3.75 },
    ],
  },
];

const even2014: EvenRule = {
  clause: 'even harmonics, note to Tables 2 to 4',
  provenance: 'second-hand',
  spans: [{ to: 50, share: 0.25 }],
};

const even2022: EvenRule = {
  clause: 'even harmonics, note to Tables 2 to 4',
  provenance: 'second-hand',
  spans: [
    { to: 6, share: 0.5 },
    { to: 50, share: 1 },
  ],
};

function edition(year: 2014 | 2022, even: EvenRule): LimitSet {
  const current: CurrentLimits = { tables, even, toOrder: 50 };
  return {
    id: `ieee-519-${year}`,
    label: `IEEE 519-${year}`,
    document: 'IEEE 519',
    edition: String(year),
    note: 'Weekly 95th percentile of 10-minute values at the point of common coupling; away from it the values only inform.',
    voltage,
    current,
  };
}

/** Harmonic control at the PCC, editions 2014 and 2022; they differ in the rule for even orders. */
export const ieee519: LimitSet[] = [edition(2014, even2014), edition(2022, even2022)];
