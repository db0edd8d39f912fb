import { describe, expect, it } from 'vitest';
import {
  elementKinds,
  type Field,
  type FieldOwner,
  fieldsOf,
  newStudy,
  type StudyElement,
  typicalValues,
  withDefaults,
} from '../../src/study/index.ts';
import { filledKeys } from '../../src/study/withDefaults.ts';
import { exampleStudy, studyFiles } from './exampleStudies.ts';

const owners: FieldOwner[] = [
  ...elementKinds,
  'bus',
  'study',
  'case',
  'criteria',
  'limits',
  'scan',
  'spectrum',
  'harmonicRow',
  'step',
  'controller',
];

/** Defaults of the study format, §3 and §4, by kind. */
const formatDefaults: Record<string, Record<string, unknown>> = {
  transformer: {
    tapPercent: 0,
    z0OverZ1: 1,
    neutralOhm: 0,
    noLoadLossKW: 0,
    noLoadCurrentPercent: 0,
    skin: [1 / 11, 1.5],
  },
  cable: { capacitanceNFPerKm: 0, r0OverR1: 4, x0OverX1: 3, c0OverC1: 1, runs: 1, skin: [0.26, 0.5] },
  reactor: { resistanceOhm: 0, skin: [0, 1] },
  coupler: { resistanceMOhm: 0.02, reactanceMOhm: 0.1 },
  branch: {},
  supply: { z0OverZ1: 1, setpointPercent: 100, angleDeg: 0, skin: [0, 1], background: [], neutral: true },
  generator: { xOverR: 20, z0OverZ1: 0.5, setpointPercent: 100, neutral: true },
  load: { leading: false, model: 'power', connection: 'L1L2L3', neutral: true },
  motor: {
    count: 1,
    loadPercent: 75,
    efficiency: 0.94,
    powerFactor: 0.85,
    lockedRotorRatio: 6,
    lockedRotorPowerFactor: 0.3,
    noLoadCurrentRatio: 0.35,
  },
  converter: { leading: false, wires: 3, connection: 'L1L2L3', filterCapacitanceUF: 0 },
  bank: {
    detuningPercent: 0,
    reactorQ: 50,
    reactorSkin: [0, 1],
    lossWPerKvar: 0.3,
    connection: 'delta',
    tolerancePercent: [-5, 10],
    reactorTolerancePercent: [-3, 3],
  },
  filter: { lossWPerKvar: 0.3, connection: 'delta' },
  shunt: { neutral: true },
};

function bare(kind: StudyElement['kind']): StudyElement {
  const values = typicalValues(kind, { nominalV: 400, frequencyHz: 50 });
  return { id: 'x', kind, bus: 'b', from: 'a', to: 'b', ...values } as unknown as StudyElement;
}

describe('The field catalogue', () => {
  it.each(owners)('describes every field of %s once, in words and with a formula or reason', (owner) => {
    const fields: readonly Field[] = fieldsOf(owner);
    expect(new Set(fields.map((field) => field.key)).size).toBe(fields.length);
    for (const field of fields) {
      expect(field.label.length, field.key).toBeGreaterThan(0);
      expect(field.help.length, field.key).toBeGreaterThan(8);
      expect(field.help, field.key).not.toMatch(/\n/);
    }
  });

  it('knows every field the three example studies use', () => {
    for (const name of studyFiles) {
      for (const element of exampleStudy(name).elements) {
        const known = ['id', 'kind', ...fieldsOf(element.kind).map((field) => field.key)];
        expect(known).toEqual(expect.arrayContaining(Object.keys(element)));
      }
    }
  });

  it('refuses an owner it does not describe', () => {
    expect(() => fieldsOf('toString' as FieldOwner)).toThrow(RangeError);
  });
});

describe('Defaults are those of the study format', () => {
  it.each(elementKinds)('for a %s at 400 V', (kind) => {
    expect(withDefaults(bare(kind), 400)).toMatchObject({ on: true, ...formatDefaults[kind] });
  });

  it.each(elementKinds)('and the typed list of filled keys of a %s is the catalogue’s', (kind) => {
    const stripped = Object.fromEntries(
      Object.entries(bare(kind)).filter(([key]) => ['id', 'kind', 'bus', 'from', 'to'].includes(key)),
    );
    const filled = Object.keys(
      withDefaults({ ...stripped, vectorGroup: 'Yyn0' } as unknown as StudyElement, 400),
    );
    const added = filled.filter((key) => key !== 'vectorGroup' && !(key in stripped));
    expect(added.sort()).toEqual([...filledKeys[kind]].sort());
  });

  it('a neutral is assumed up to 1000 V nominal and not above', () => {
    expect(withDefaults(bare('load'), 1000)).toHaveProperty('neutral', true);
    expect(withDefaults(bare('load'), 1001)).toHaveProperty('neutral', false);
    expect(withDefaults(bare('shunt'), 6600)).toHaveProperty('neutral', false);
  });

  it('the busbar is found in the study, and a part at no busbar is a programming error', () => {
    const study = { ...newStudy(), buses: [{ id: 'b', nominalV: 11000 }] };
    expect(withDefaults(bare('load'), study)).toHaveProperty('neutral', false);
    expect(() => withDefaults(bare('load'), newStudy())).toThrow(RangeError);
  });

  it('a zigzag secondary has Z0 = 0.1 Z1, and Yyn none', () => {
    const transformer = (vectorGroup: string) =>
      withDefaults({ ...bare('transformer'), vectorGroup } as StudyElement, 400);
    for (const group of ['Dzn0', 'Yzn11', 'YNzn5'])
      expect(transformer(group)).toHaveProperty('z0OverZ1', 0.1);
    for (const group of ['Dyn11', 'YNd1', 'YNyn0']) expect(transformer(group)).toHaveProperty('z0OverZ1', 1);
    expect(transformer('Yyn0')).not.toHaveProperty('z0OverZ1');
  });

  it('given values stay, also false and 0', () => {
    expect(withDefaults({ ...bare('load'), neutral: false, on: false } as StudyElement, 400)).toMatchObject({
      neutral: false,
      on: false,
    });
  });
});
