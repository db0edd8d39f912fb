import { type Resolved, type ResolvedElement, type Study, spectrumOf } from '../../study/index.ts';
import { bankKvar, bankLaw } from '../models/bank.ts';
import { converterFilterLaw } from '../models/converter.ts';
import { filterLaw } from '../models/filter.ts';
import { shuntLaw } from '../models/freeRLC.ts';
import { loadLaw, reactivePower } from '../models/load.ts';
import { motorLaw, motorPower } from '../models/motor.ts';
import type { PartLaw } from '../models/PartLaw.ts';
import { generatorOhm, sourceLaw, supplyOhm } from '../models/source.ts';
import type { Demand, Phases, ShuntPart } from './Network.ts';
import { orderTable } from './orderTable.ts';
import type { ResolvedSeries } from './readSeries.ts';

export type ResolvedShunt = Exclude<ResolvedElement, ResolvedSeries>;

/** What a shunt part is electrically, before it has its place in the network. */
export type ShuntNature = Pick<ShuntPart, 'phases' | 'law' | 'atFundamental' | 'demand' | 'emf' | 'injector'>;

const passive: ShuntNature = {
  phases: { p: -1, q: -1 },
  law: null,
  atFundamental: 'all',
  demand: null,
  emf: null,
  injector: null,
};

/** The study's surroundings of a part. */
export interface Surroundings {
  study: Study;
  nominalV: number;
  omega: number;
  maxOrder: number;
}

/** Whether the part is electrically there at all: in service, and a bank with a step on. */
export function isPresent(part: ResolvedElement): boolean {
  return part.on && !(part.kind === 'bank' && bankKvar(part.steps) === 0);
}

/** Nature of a shunt part from its data. */
export function shuntNature(part: ResolvedShunt, place: Surroundings): ShuntNature {
  switch (part.kind) {
    case 'supply':
      return supplyNature(part, place);
    case 'generator':
      return generatorNature(part, place);
    case 'load':
      return loadNature(part, place);
    case 'motor':
      return {
        ...passive,
        law: motorLaw(part, place.nominalV),
        atFundamental: 'negative',
        demand: {
          active: motorPower(part),
          reactive: reactivePower(motorPower(part), part.powerFactor, false),
          form: 'motor',
        },
      };
    case 'converter':
      return converterNature(part, place);
    default:
      return { ...passive, law: passiveLaw(part, place) };
  }
}

function passiveLaw(
  part: Extract<ResolvedShunt, { kind: 'bank' | 'filter' | 'shunt' }>,
  place: Surroundings,
): PartLaw {
  if (part.kind === 'bank') return bankLaw(part);
  if (part.kind === 'filter') return filterLaw(part, place.nominalV);
  return shuntLaw(part, place.omega);
}

function supplyNature(part: Resolved<'supply'>, { nominalV, maxOrder }: Surroundings): ShuntNature {
  const base = nominalV / Math.sqrt(3);
  return {
    ...passive,
    law: sourceLaw({ ...part, ohm: supplyOhm(nominalV, part.shortCircuitMVA) }),
    emf: {
      volts: (part.setpointPercent / 100) * base,
      angleRad: (part.angleDeg * Math.PI) / 180,
      backgroundBase: base,
      background: part.background.length > 0 ? orderTable(part.background, maxOrder) : null,
    },
  };
}

function generatorNature(part: Resolved<'generator'>, { nominalV }: Surroundings): ShuntNature {
  const base = nominalV / Math.sqrt(3);
  const ohm = generatorOhm(nominalV, part.xdSubtransientPercent, part.ratedKVA);
  return {
    ...passive,
    law: sourceLaw({ ...part, ohm, skin: [0, 1] }),
    emf: {
      volts: (part.setpointPercent / 100) * base,
      angleRad: ((part.angleDeg ?? 0) * Math.PI) / 180,
      backgroundBase: base,
      background: null,
    },
  };
}

function loadNature(part: Resolved<'load'>, { nominalV }: Surroundings): ShuntNature {
  const active = part.kW * 1e3;
  const reactive = reactivePower(active, part.powerFactor, part.leading);
  const phases = phasesOf(part.connection);
  const volts = phases.p >= 0 && phases.q < 0 ? nominalV / Math.sqrt(3) : nominalV;
  const constantPower = part.model === 'power';
  return {
    ...passive,
    phases,
    law: loadLaw(active, reactive, volts, part.neutral),
    atFundamental: constantPower ? 'none' : 'all',
    demand: constantPower ? { active, reactive, form: demandForm(phases, part.neutral) } : null,
  };
}

function converterNature(part: Resolved<'converter'>, place: Surroundings): ShuntNature {
  const active = part.kW * 1e3;
  const phases = phasesOf(part.connection);
  const threeWire = phases.p < 0 && part.wires === 3;
  return {
    ...passive,
    phases,
    law: part.filterCapacitanceUF > 0 ? converterFilterLaw(part.filterCapacitanceUF, place.omega) : null,
    demand: {
      active,
      reactive: reactivePower(active, part.powerFactor, part.leading),
      form: demandForm(phases, !threeWire),
    },
    injector: {
      table: orderTable(spectrumOf(place.study, part.spectrum), place.maxOrder),
      threeWire,
    },
  };
}

function demandForm({ p, q }: Phases, neutral: boolean): Demand['form'] {
  if (p < 0) return neutral ? 'wye' : 'three-wire';
  return q < 0 ? 'single' : 'pair';
}

/** Phase numbers of a connection: "L1L2L3" −1, −1; "L2" 1, −1; "L3L1" 2, 0. */
export function phasesOf(connection: string): Phases {
  if (connection === 'L1L2L3') return { p: -1, q: -1 };
  const numbers = connection.split('L').slice(1).map(Number);
  return { p: (numbers[0] as number) - 1, q: numbers.length > 1 ? (numbers[1] as number) - 1 : -1 };
}

/** Whether IEEE 1459's four-wire formulas apply at the part's terminal. */
export function isFourWire(part: ResolvedShunt): boolean {
  switch (part.kind) {
    case 'supply':
    case 'generator':
    case 'shunt':
      return part.neutral;
    case 'load':
      return part.connection === 'L1L2L3' ? part.neutral : part.connection.length === 2;
    case 'converter':
      return part.connection === 'L1L2L3' ? part.wires === 4 : part.connection.length === 2;
    case 'bank':
    case 'filter':
      return part.connection === 'star-earthed';
    case 'motor':
      return false;
  }
}
