import {
  type Bank,
  type Converter,
  type ElementOf,
  nameOf,
  type Study,
  type StudyElement,
} from '../../study/index.ts';
import { tradeNumber, tradeVolts } from './tradeNumber.ts';

const n = tradeNumber;

/** Nominal voltage of a busbar as printed beside its name. */
export function nominalVoltage(nominalV: number): string {
  return tradeVolts(nominalV);
}

function bankPlate(bank: Bank): string {
  const all = bank.steps.reduce((sum, step) => sum + step.kvar, 0);
  const on = bank.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  const size = on === all ? n(all) : `${n(on)} of ${n(all)}`;
  const p = bank.detuningPercent ?? 0;
  return `${size} kvar at ${tradeVolts(bank.ratedV)}, ${p > 0 ? `${n(p)} %` : 'plain'}`;
}

function converterPlate(part: Converter, study: Study): string {
  const { spectrum } = part;
  const named = typeof spectrum === 'string' ? study.spectra?.find((s) => s.id === spectrum) : undefined;
  const words =
    typeof spectrum === 'string' ? (named ? nameOf(named) : spectrum.replaceAll('-', ' ')) : 'own spectrum';
  return `${phases(part)}${n(part.kW)} kW · ${words}`;
}

function phases(part: { connection?: string }): string {
  const connection = part.connection ?? 'L1L2L3';
  if (connection === 'L1L2L3') return '';
  return `${connection.length > 2 ? `${connection.slice(0, 2)}–${connection.slice(2)}` : connection} · `;
}

function freeRlc(part: ElementOf<'branch'> | ElementOf<'shunt'>): string {
  const values = [
    part.resistanceOhm === undefined ? '' : `${n(part.resistanceOhm)} Ω`,
    part.inductanceMH === undefined ? '' : `${n(part.inductanceMH)} mH`,
    part.capacitanceUF === undefined ? '' : `${n(part.capacitanceUF)} µF`,
  ].filter(Boolean);
  return values.join(part.arrangement === 'series' ? ' + ' : ' ∥ ');
}

/**
 * The one line of nameplate data printed with a part, in trade units: what an engineer would write
 * beside the symbol. Pure; live values never stand here.
 */
export function nameplate(part: StudyElement, study: Study): string {
  switch (part.kind) {
    case 'supply':
      return `${n(part.shortCircuitMVA)} MVA · X/R ${n(part.xOverR)}`;
    case 'generator':
      return `${n(part.ratedKVA)} kVA · x″d ${n(part.xdSubtransientPercent)} %`;
    case 'transformer':
      return `${n(part.ratedKVA)} kVA · ${part.vectorGroup} · ${n(part.ukPercent)} %`;
    case 'cable': {
      const runs = part.runs ?? 1;
      const rated = part.ratedA === undefined ? '' : ` · ${n(part.ratedA)} A`;
      return `${n(part.lengthM)} m${runs > 1 ? ` · ${n(runs)} runs` : ''}${rated}`;
    }
    case 'reactor':
      return `${n(part.inductanceMH)} mH`;
    case 'coupler':
      return part.on === false ? 'open' : 'closed';
    case 'branch':
    case 'shunt':
      return freeRlc(part);
    case 'load':
      return `${phases(part)}${n(part.kW)} kW · ${part.powerFactor === 1 ? 'cos φ 1' : `${n(part.powerFactor)} ${part.leading ? 'leading' : 'lagging'}`}`;
    case 'motor': {
      const count = part.count ?? 1;
      return `${count > 1 ? `${n(count)} × ` : ''}${n(part.ratedKW)} kW · ${n(part.loadPercent ?? 75)} % load`;
    }
    case 'converter':
      return converterPlate(part, study);
    case 'bank':
      return bankPlate(part);
    case 'filter':
      return `${n(part.kvar)} kvar · h ${n(part.tunedOrder)} · ${part.type}`;
  }
}
