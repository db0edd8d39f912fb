import type { Study, StudyElement } from '../../src/study/index.ts';
import { seededRandom } from './seededRandom.ts';

/**
 * An invented site of about `busbars` busbars, the same for the same seed: a 20 kV switchboard feeding
 * substations of nine 400 V busbars each (a main board and eight radial boards behind cables), the 20 kV
 * side feeders of cables with a ring every few substations, a cable tie in each substation. Loads, motors,
 * six-pulse drives, detuned and plain banks, and single-phase loads, so that phase coordinates are needed.
 */
export function benchStudy(busbars: number, seed = 1): Study {
  const random = seededRandom(seed);
  const buses: Study['buses'] = [{ id: 'grid', nominalV: 20000 }];
  const elements: StudyElement[] = [
    {
      id: 'grid-supply',
      kind: 'supply',
      bus: 'grid',
      shortCircuitMVA: Math.max(350, 3.5 * busbars),
      xOverR: 8,
      background: [{ h: 5, percent: 1 }],
    },
  ];
  for (let substation = 0; buses.length < busbars; substation++)
    addSubstation(buses, elements, substation, Math.min(10, busbars - buses.length), random);
  return {
    format: 'varwright-study',
    version: 1,
    title: `Site of ${busbars} busbars`,
    frequencyHz: 50,
    buses,
    elements,
  };
}

/** Substations on one 20 kV feeder; a longer chain could not carry its load. */
const FEEDER_SUBSTATIONS = 8;

function addSubstation(
  buses: Study['buses'],
  elements: StudyElement[],
  substation: number,
  size: number,
  random: () => number,
): void {
  const name = (k: number) => `s${substation}b${k}`;
  const above = substation % FEEDER_SUBSTATIONS === 0 ? 'grid' : `s${substation - 1}b0`;
  buses.push({ id: name(0), nominalV: 20000 });
  elements.push(cable(`${name(0)}-feeder`, above, name(0), 200 + 600 * random(), 0.16));
  if (substation % 4 === 3)
    elements.push(cable(`${name(0)}-ring`, `s${substation - 3}b0`, name(0), 900, 0.16));
  for (let k = 1; k < size; k++) {
    buses.push({ id: name(k), nominalV: 400 });
    if (k === 1) elements.push(transformer(`${name(k)}-transformer`, name(0), name(1)));
    else
      elements.push(
        cable(`${name(k)}-cable`, k < 6 ? name(1) : name(k - 3), name(k), 30 + 120 * random(), 0.12),
      );
    addParts(elements, name(k), k, random);
  }
  if (size > 5) elements.push(cable(`${name(4)}-tie`, name(4), name(5), 60, 0.12));
}

function addParts(elements: StudyElement[], bus: string, k: number, random: () => number): void {
  const kW = 10 + 40 * random();
  elements.push({ id: `${bus}-load`, kind: 'load', bus, kW, powerFactor: 0.86 });
  if (k % 3 === 0) elements.push({ id: `${bus}-motor`, kind: 'motor', bus, ratedKW: 15 + 10 * random() });
  if (k % 4 === 2)
    elements.push({
      id: `${bus}-drive`,
      kind: 'converter',
      bus,
      kW: 25 + 20 * random(),
      powerFactor: 0.96,
      spectrum: 'six-pulse-ideal',
    });
  if (k % 5 === 4)
    elements.push({ id: `${bus}-sockets`, kind: 'load', bus, kW: 4, powerFactor: 0.95, connection: 'L2' });
  if (k === 1)
    elements.push({
      id: `${bus}-bank`,
      kind: 'bank',
      bus,
      steps: [{ kvar: 25 }, { kvar: 50 }, { kvar: 50 }],
      ratedV: 440,
      detuningPercent: 7,
    });
}

function transformer(id: string, from: string, to: string): StudyElement {
  return {
    id,
    kind: 'transformer',
    from,
    to,
    ratedKVA: 1000,
    hvV: 20000,
    lvV: 400,
    ukPercent: 6,
    loadLossKW: 10.5,
    vectorGroup: 'Dyn11',
  };
}

function cable(
  id: string,
  from: string,
  to: string,
  lengthM: number,
  resistanceOhmPerKm: number,
): StudyElement {
  return {
    id,
    kind: 'cable',
    from,
    to,
    lengthM,
    resistanceOhmPerKm,
    reactanceOhmPerKm: 0.08,
    capacitanceNFPerKm: 250,
  };
}

/** The study after an edit of one value: the bank of the first substation gets other steps. */
export function editedStudy(study: Study, round: number): Study {
  const elements = study.elements.map((part) =>
    part.id === 's0b1-bank' && part.kind === 'bank'
      ? { ...part, steps: [{ kvar: 100 + (round % 50) }] }
      : part,
  );
  return { ...study, elements };
}
