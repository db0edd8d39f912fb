import type { Study } from '../../../src/study/index.ts';

/** An invented site with every kind of part, each arrangement and connection at least once. */
export const everyKind: Study = {
  format: 'varwright-study',
  version: 1,
  title: 'Every kind of part',
  frequencyHz: 50,
  buses: [
    { id: 'grid', nominalV: 20000 },
    { id: 'yard', nominalV: 20000 },
    { id: 'main', nominalV: 400 },
    { id: 'hall', nominalV: 400 },
    { id: 'shed', nominalV: 400 },
    { id: 'mill', nominalV: 690 },
  ],
  elements: [
    {
      id: 'Q',
      kind: 'supply',
      bus: 'grid',
      shortCircuitMVA: 180,
      xOverR: 6,
      z0OverZ1: 1.7,
      skin: [0.2, 0.7],
    },
    {
      id: 'W1',
      kind: 'cable',
      from: 'grid',
      to: 'yard',
      lengthM: 2600,
      resistanceOhmPerKm: 0.16,
      reactanceOhmPerKm: 0.12,
      capacitanceNFPerKm: 310,
      runs: 2,
    },
    {
      id: 'T1',
      kind: 'transformer',
      from: 'yard',
      to: 'main',
      ratedKVA: 1000,
      hvV: 20000,
      lvV: 410,
      ukPercent: 6,
      loadLossKW: 10.5,
      vectorGroup: 'Dyn11',
      tapPercent: 2.5,
      neutralOhm: 0.01,
      noLoadLossKW: 1.4,
      noLoadCurrentPercent: 0.5,
    },
    {
      id: 'T2',
      kind: 'transformer',
      from: 'yard',
      to: 'mill',
      ratedKVA: 630,
      hvV: 20000,
      lvV: 690,
      ukPercent: 4,
      loadLossKW: 6.5,
      vectorGroup: 'YNyn6',
      z0OverZ1: 0.9,
    },
    {
      id: 'T3',
      kind: 'transformer',
      from: 'yard',
      to: 'shed',
      ratedKVA: 250,
      hvV: 20000,
      lvV: 400,
      ukPercent: 4,
      loadLossKW: 3.2,
      vectorGroup: 'YNd5',
      neutralOhm: 2,
    },
    {
      id: 'W2',
      kind: 'cable',
      from: 'main',
      to: 'hall',
      lengthM: 120,
      resistanceOhmPerKm: 0.1,
      reactanceOhmPerKm: 0.08,
    },
    {
      id: 'L1',
      kind: 'reactor',
      from: 'main',
      to: 'hall',
      inductanceMH: 0.05,
      resistanceOhm: 0.002,
      skin: [0.3, 1.1],
    },
    { id: 'K1', kind: 'coupler', from: 'main', to: 'hall', resistanceMOhm: 0.5, reactanceMOhm: 3 },
    {
      id: 'B1',
      kind: 'branch',
      from: 'main',
      to: 'hall',
      resistanceOhm: 0.02,
      inductanceMH: 0.01,
      capacitanceUF: 900,
      arrangement: 'series',
    },
    {
      id: 'B2',
      kind: 'branch',
      from: 'hall',
      to: 'main',
      resistanceOhm: 5,
      inductanceMH: 0.4,
      capacitanceUF: 60,
      arrangement: 'parallel',
    },
    {
      id: 'G1',
      kind: 'generator',
      bus: 'hall',
      ratedKVA: 400,
      xdSubtransientPercent: 14,
      xOverR: 11,
      z0OverZ1: 0.4,
    },
    { id: 'P1', kind: 'load', bus: 'hall', kW: 80, powerFactor: 0.85 },
    { id: 'P2', kind: 'load', bus: 'shed', kW: 40, powerFactor: 0.95, leading: true },
    { id: 'P3', kind: 'load', bus: 'hall', kW: 9, powerFactor: 0.9, connection: 'L2' },
    { id: 'P4', kind: 'load', bus: 'main', kW: 12, powerFactor: 0.8, connection: 'L3L1' },
    { id: 'M1', kind: 'motor', bus: 'mill', ratedKW: 90, count: 2 },
    {
      id: 'D1',
      kind: 'converter',
      bus: 'main',
      kW: 150,
      powerFactor: 0.97,
      spectrum: 'six-pulse-ideal',
      filterCapacitanceUF: 80,
    },
    {
      id: 'C1',
      kind: 'bank',
      bus: 'main',
      steps: [{ kvar: 50 }, { kvar: 50 }, { kvar: 25, on: false }],
      ratedV: 440,
      detuningPercent: 7,
      reactorSkin: [0.1, 1.2],
      connection: 'star-earthed',
    },
    { id: 'C2', kind: 'bank', bus: 'mill', steps: [{ kvar: 60 }], ratedV: 690 },
    {
      id: 'F1',
      kind: 'filter',
      bus: 'main',
      type: 'single-tuned',
      kvar: 40,
      tunedOrder: 4.8,
      qFactor: 40,
      ratedV: 440,
    },
    {
      id: 'F2',
      kind: 'filter',
      bus: 'mill',
      type: 'high-pass',
      kvar: 30,
      tunedOrder: 11,
      qFactor: 3,
      ratedV: 760,
      connection: 'star-earthed',
    },
    {
      id: 'F3',
      kind: 'filter',
      bus: 'yard',
      type: 'c-type',
      kvar: 200,
      tunedOrder: 3,
      qFactor: 2,
      ratedV: 22000,
    },
    {
      id: 'S1',
      kind: 'shunt',
      bus: 'hall',
      resistanceOhm: 3,
      inductanceMH: 2,
      capacitanceUF: 400,
      arrangement: 'series',
    },
    {
      id: 'S2',
      kind: 'shunt',
      bus: 'mill',
      resistanceOhm: 40,
      inductanceMH: 9,
      capacitanceUF: 15,
      arrangement: 'parallel',
      neutral: false,
    },
  ],
};

/** The study with every single-phase and pair part taken away. */
export const balancedKinds: Study = {
  ...everyKind,
  elements: everyKind.elements.filter(({ id }) => id !== 'P3' && id !== 'P4'),
};

/** The study with one parameter of a part set to another value. */
export function withParameter(study: Study, element: string, field: string, value: number): Study {
  const elements = study.elements.map((part) => {
    if (part.id !== element) return part;
    if (part.kind === 'bank' && field === 'kvar') return { ...part, steps: [{ kvar: value }] };
    const place = /^(\w+)\[(\d)\]$/.exec(field);
    if (!place) return { ...part, [field]: value };
    const pair = (Reflect.get(part, place[1]!) ??
      defaultSkin[part.kind as keyof typeof defaultSkin]) as number[];
    return { ...part, [place[1]!]: pair.map((x, k) => (k === Number(place[2]) ? value : x)) };
  });
  return { ...study, elements };
}

/** Study format, §3: defaults of skin by kind. */
const defaultSkin = {
  transformer: [1 / 11, 1.5],
  cable: [0.26, 0.5],
  bank: [0, 1],
  reactor: [0, 1],
  supply: [0, 1],
};
