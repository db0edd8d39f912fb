import fc from 'fast-check';
import {
  drawnItems,
  type ElementKind,
  type Study,
  type StudyElement,
  symbolSets,
} from '../../src/study/index.ts';

const SERIES: ElementKind[] = ['transformer', 'cable', 'reactor', 'coupler', 'branch'];
const HANGING: ElementKind[] = [
  'supply',
  'generator',
  'load',
  'motor',
  'converter',
  'bank',
  'filter',
  'shunt',
];

/** Enough data of a kind for the drawing; the numbers play no part in it. */
export function part(kind: ElementKind, id: string, a: string, b: string): StudyElement {
  const ends = SERIES.includes(kind) ? { from: a, to: b } : { bus: a };
  const data = {
    id,
    kind,
    ...ends,
    name: `${kind} ${id}`,
    shortCircuitMVA: 250,
    xOverR: 10,
    ratedKVA: 630,
    xdSubtransientPercent: 12,
    vectorGroup: 'Dyn11',
    ukPercent: 6,
    lengthM: 120,
    inductanceMH: 0.2,
    kW: 90,
    powerFactor: 0.9,
    ratedKW: 55,
    spectrum: 'six-pulse-ideal',
    steps: [{ kvar: 25 }, { kvar: 50 }],
    ratedV: 440,
    type: 'single-tuned',
    kvar: 100,
    tunedOrder: 4.8,
    arrangement: 'series',
  };
  // The drawing reads a part's own fields only; the others of this union of data are unknown fields to it.
  return data as unknown as StudyElement;
}

export function study(buses: [string, number][], elements: StudyElement[]): Study {
  return {
    format: 'varwright-study',
    version: 1,
    title: 'Site',
    frequencyHz: 50,
    buses: buses.map(([id, nominalV]) => ({ id, name: `Board ${id}`, nominalV })),
    elements,
  };
}

const NAMES = [
  '',
  'Fans',
  'Compressors 1 to 4',
  'Lighting, sockets and trace heating of the north hall',
  'Umrichterantriebstechnikverteilung',
];

/** Any site: islands, rings, ties, parallel parts, several supplies, parts in any order. */
export const anyStudy = fc
  .record({
    volts: fc.array(fc.constantFrom(33_000, 11_000, 690, 400), { minLength: 0, maxLength: 9 }),
    series: fc.array(fc.tuple(fc.constantFrom(...SERIES), fc.nat(), fc.nat()), { maxLength: 14 }),
    hanging: fc.array(fc.tuple(fc.constantFrom(...HANGING), fc.nat()), { maxLength: 24 }),
    mix: fc.nat({ max: 1000 }),
    names: fc.array(fc.constantFrom(...NAMES), { minLength: 1, maxLength: 7 }),
    hidden: fc.subarray([...drawnItems]),
    symbols: fc.constantFrom(...symbolSets),
  })
  .map(({ volts, series, hanging, mix, names, hidden, symbols }) => {
    const count = volts.length;
    const parts = [
      ...series.map(([kind, a, b], i) => part(kind, `s${i}`, `b${a % (count || 1)}`, `b${b % (count || 1)}`)),
      ...hanging.map(([kind, a], i) => part(kind, `h${i}`, `b${a % (count || 1)}`, '')),
    ];
    const turned = parts.map((_, i) => parts[(i + mix) % parts.length]).filter((p) => p !== undefined);
    const named = <T extends { name?: string }>(list: T[]): T[] =>
      list.map((item, i) => {
        const name = names[i % names.length];
        return name ? { ...item, name } : item;
      });
    const site = study(
      volts.map((v, i) => [`b${i}`, v]),
      count > 0 ? named(turned) : [],
    );
    return { ...site, buses: named(site.buses), view: { hidden, symbols } };
  });
