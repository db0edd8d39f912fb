import type { Study, StudyElement } from '../../../src/study/index.ts';

/** A site about which nothing is to be said: fed, marked, rated and covered by its cases. Invented. */
export function soundSite(): Study {
  return {
    format: 'varwright-study',
    version: 1,
    title: 'Lowmere mill',
    frequencyHz: 50,
    criteria: { demandCurrentA: 40 },
    buses: [
      { id: 'intake', name: 'Intake', nominalV: 20_000, pcc: true },
      { id: 'main', name: 'Main board', nominalV: 400 },
      { id: 'mill', name: 'Mill board', nominalV: 400 },
    ],
    elements: [
      {
        id: 'grid',
        name: 'Grid',
        kind: 'supply',
        bus: 'intake',
        shortCircuitMVA: 200,
        shortCircuitMVAMin: 120,
        xOverR: 10,
        background: [{ h: 5, percent: 1.5 }],
      },
      {
        id: 't1',
        name: 'T1',
        kind: 'transformer',
        from: 'intake',
        to: 'main',
        ratedKVA: 1000,
        hvV: 20_000,
        lvV: 400,
        ukPercent: 6,
        loadLossKW: 10,
        vectorGroup: 'Dyn11',
      },
      {
        id: 'w1',
        name: 'W1',
        kind: 'cable',
        from: 'main',
        to: 'mill',
        lengthM: 40,
        resistanceOhmPerKm: 0.09,
        reactanceOhmPerKm: 0.08,
      },
      { id: 'heat', name: 'Heaters', kind: 'load', bus: 'main', kW: 120, powerFactor: 0.98 },
      {
        id: 'fans',
        name: 'Fans',
        kind: 'motor',
        bus: 'mill',
        ratedKW: 90,
        efficiency: 0.95,
        powerFactor: 0.87,
      },
      {
        id: 'drive',
        name: 'Drive 1',
        kind: 'converter',
        bus: 'mill',
        kW: 60,
        powerFactor: 0.95,
        spectrum: 'drive-reactance-3',
      },
      {
        id: 'c1',
        name: 'Bank C1',
        kind: 'bank',
        bus: 'main',
        ratedV: 440,
        detuningPercent: 7,
        steps: [{ kvar: 50 }, { kvar: 50 }],
      },
    ],
    cases: [
      { id: 'day', name: 'Day', changes: [] },
      {
        id: 'night',
        name: 'Night',
        role: 'light',
        changes: [
          { element: 'heat', set: { kW: 20 } },
          { element: 'c1', set: { steps: [{ kvar: 50 }, { kvar: 50, on: false }] } },
        ],
      },
      { id: 'weak', name: 'Weak grid', changes: [{ element: 'grid', set: { shortCircuitMVA: 120 } }] },
    ],
    origins: { 'elements.grid.shortCircuitMVA': { origin: 'measured', note: 'operator’s letter' } },
  };
}

/** Fields of a part replaced; undefined removes one. */
export function withPart(study: Study, id: string, values: Record<string, unknown>): Study {
  const elements = study.elements.map((element) => {
    if (element.id !== id) return element;
    const entries = Object.entries({ ...element, ...values }).filter(([, value]) => value !== undefined);
    return Object.fromEntries(entries) as unknown as StudyElement;
  });
  return { ...study, elements };
}

export function withParts(study: Study, ...parts: StudyElement[]): Study {
  return { ...study, elements: [...study.elements, ...parts] };
}

/** A second transformer beside T1, the same but for what is given. */
export function withSecond(study: Study, values: Record<string, unknown> = {}): Study {
  const first = study.elements.find(({ id }) => id === 't1');
  return withParts(study, { ...first, id: 't2', name: 'T2', ...values } as unknown as StudyElement);
}
