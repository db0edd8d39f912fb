import {
  type Bank,
  type Connection,
  type Converter,
  connectionWords,
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

function bankPlate(bank: Bank, someOff: boolean): string {
  const all = bank.steps.reduce((sum, step) => sum + step.kvar, 0);
  const on = bank.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  const size = on === all && !someOff ? n(all) : `${n(on)} of\u00a0${n(all)}`;
  const p = bank.detuningPercent ?? 0;
  return `${size}\u00a0kvar at\u00a0${tradeVolts(bank.ratedV)}, ${p > 0 ? `${n(p)}\u00a0%` : 'plain'}`;
}

function converterPlate(part: Converter, study: Study): string {
  const { spectrum } = part;
  const named = typeof spectrum === 'string' ? study.spectra?.find((s) => s.id === spectrum) : undefined;
  const words =
    typeof spectrum === 'string' ? (named ? nameOf(named) : spectrum.replaceAll('-', ' ')) : 'own spectrum';
  return `${phases(part, study)}${n(part.kW)}\u00a0kW · ${words}`;
}

function phases({ connection = 'L1L2L3' }: { connection?: Connection }, study: Study): string {
  return connection === 'L1L2L3' ? '' : `${connectionWords(study, connection)} · `;
}

function freeRlc(part: ElementOf<'branch'> | ElementOf<'shunt'>): string {
  const values = [
    part.resistanceOhm === undefined ? '' : `${n(part.resistanceOhm)}\u00a0Ω`,
    part.inductanceMH === undefined ? '' : `${n(part.inductanceMH)}\u00a0mH`,
    part.capacitanceUF === undefined ? '' : `${n(part.capacitanceUF)}\u00a0µF`,
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
      return `${n(part.shortCircuitMVA)}\u00a0MVA · X/R\u00a0${n(part.xOverR)}`;
    case 'generator':
      return `${n(part.ratedKVA)}\u00a0kVA · x″d\u00a0${n(part.xdSubtransientPercent)}\u00a0%`;
    case 'transformer':
      return `${n(part.ratedKVA)}\u00a0kVA · ${part.vectorGroup} · ${n(part.ukPercent)}\u00a0%`;
    case 'cable': {
      const runs = part.runs ?? 1;
      const rated = part.ratedA === undefined ? '' : ` · ${n(part.ratedA)}\u00a0A`;
      return `${n(part.lengthM)}\u00a0m${runs > 1 ? ` · ${n(runs)}\u00a0runs` : ''}${rated}`;
    }
    case 'reactor':
      return `${n(part.inductanceMH)}\u00a0mH`;
    case 'coupler':
      return part.on === false ? 'open' : 'closed';
    case 'branch':
    case 'shunt':
      return freeRlc(part);
    case 'load':
      return `${phases(part, study)}${n(part.kW)}\u00a0kW · ${part.powerFactor === 1 ? 'cos\u00a0φ\u00a01' : `${n(part.powerFactor)}\u00a0${part.leading ? 'lead' : 'lag'}`}`;
    case 'motor': {
      const count = part.count ?? 1;
      return `${count > 1 ? `${n(count)}\u00a0×\u00a0` : ''}${n(part.ratedKW)}\u00a0kW · ${n(part.loadPercent ?? 75)}\u00a0% load`;
    }
    case 'converter':
      return converterPlate(part, study);
    case 'bank':
      return bankPlate(part, false);
    case 'filter':
      return `${n(part.kvar)}\u00a0kvar · h\u00a0${n(part.tunedOrder)} · ${part.type}`;
  }
}

/** The longest the nameplate becomes in any case: a bank's steps are switched, other data stay. */
export function widestNameplate(part: StudyElement, study: Study): string {
  return part.kind === 'bank' && part.steps.length > 1 ? bankPlate(part, true) : nameplate(part, study);
}
