import type { ResolvedElement } from '../../study/index.ts';
import { bankKvar } from '../models/bank.ts';
import { Jet } from './Jet.ts';

/** A number of a part that its impedance depends on, in the study's unit. */
export interface PartParameter {
  /** Field of the part; "kvar" of a bank is the total of its steps that are on; "skin[0]" is s, "skin[1]" e. */
  field: string;
  value: number;
}

const fieldsByKind: Record<ResolvedElement['kind'], readonly string[]> = {
  supply: ['shortCircuitMVA', 'xOverR', 'z0OverZ1', 'skin[0]', 'skin[1]'],
  generator: ['ratedKVA', 'xdSubtransientPercent', 'xOverR', 'z0OverZ1'],
  transformer: [
    'ratedKVA',
    'hvV',
    'lvV',
    'ukPercent',
    'loadLossKW',
    'tapPercent',
    'z0OverZ1',
    'neutralOhm',
    'noLoadLossKW',
    'noLoadCurrentPercent',
    'skin[0]',
    'skin[1]',
  ],
  cable: [
    'lengthM',
    'resistanceOhmPerKm',
    'reactanceOhmPerKm',
    'capacitanceNFPerKm',
    'r0OverR1',
    'x0OverX1',
    'c0OverC1',
    'runs',
    'skin[0]',
    'skin[1]',
  ],
  reactor: ['inductanceMH', 'resistanceOhm', 'skin[0]', 'skin[1]'],
  coupler: ['resistanceMOhm', 'reactanceMOhm'],
  branch: ['resistanceOhm', 'inductanceMH', 'capacitanceUF'],
  load: ['kW', 'powerFactor'],
  motor: ['ratedKW', 'count', 'efficiency', 'powerFactor', 'lockedRotorRatio', 'lockedRotorPowerFactor'],
  converter: ['filterCapacitanceUF'],
  bank: ['kvar', 'ratedV', 'detuningPercent', 'reactorQ', 'lossWPerKvar', 'reactorSkin[0]', 'reactorSkin[1]'],
  filter: ['kvar', 'tunedOrder', 'qFactor', 'lossWPerKvar'],
  shunt: ['resistanceOhm', 'inductanceMH', 'capacitanceUF'],
};

/**
 * The parameters of a part at which its admittance has a derivative. Left out: what the part does not
 * have, a power factor at 1 (the reactive part changes there without bound) and a magnetising branch's
 * data where there is no no-load current.
 */
export function parametersOf(part: ResolvedElement): PartParameter[] {
  const found: PartParameter[] = [];
  for (const field of fieldsByKind[part.kind]) {
    const value = numberAt(part, field);
    if (value === undefined) continue;
    if (part.kind === 'load' && field === 'powerFactor' && value === 1) continue;
    if (field === 'lockedRotorPowerFactor' && value === 1) continue;
    if (field.startsWith('noLoad') && !hasMagnetisingSlope(part)) continue;
    if (field === 'filterCapacitanceUF' && value === 0) continue;
    found.push({ field, value });
  }
  return found;
}

/** A part's numbers as jets, the one named `varied` being the parameter p. */
export type Quantities = (field: string, otherwise?: number) => Jet;

export function quantitiesOf(part: ResolvedElement, varied?: string): Quantities {
  return (field, otherwise) => {
    const value = numberAt(part, field) ?? otherwise;
    if (value === undefined) throw new RangeError(`part "${part.id}" has no number "${field}"`);
    return field === varied ? Jet.parameter(value) : Jet.constant(value);
  };
}

function numberAt(part: ResolvedElement, field: string): number | undefined {
  if (part.kind === 'bank' && field === 'kvar') return bankKvar(part.steps);
  if (part.kind === 'transformer' && field === 'z0OverZ1') return part.z0OverZ1 ?? 1;
  const place = /^(\w+)\[(\d)\]$/.exec(field);
  const value: unknown = Reflect.get(part, place?.[1] ?? field);
  const item: unknown = place && Array.isArray(value) ? value[Number(place[2])] : value;
  return typeof item === 'number' ? item : undefined;
}

function hasMagnetisingSlope(part: ResolvedElement): boolean {
  if (part.kind !== 'transformer') return false;
  const size = (part.noLoadCurrentPercent / 100) * part.ratedKVA;
  return size > 0 && part.noLoadLossKW < size;
}
