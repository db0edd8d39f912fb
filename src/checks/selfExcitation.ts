import type { Bus, Motor, Study, StudyElement } from '../study/index.ts';
import { elementsAt, isOn, isSeries, nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Source, Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

const source: Source = {
  document: 'IEC 60831-1',
  edition: '2014',
  clause: 'capacitors on motors, annex',
  provenance: 'memory',
};

const LIMIT = 0.9;

/** Largest kvar behind a motor's own switch: 0.9·√3·U·I_0, kvar; line-to-line volts, no-load amperes. */
export function motorCapacitorKvar(volts: number, noLoadA: number): number {
  if (!(volts > 0 && noLoadA > 0)) throw new RangeError(`${volts} V, ${noLoadA} A: both must be above 0`);
  return (LIMIT * Math.sqrt(3) * volts * noLoadA) / 1000;
}

/**
 * Self-excitation of a motor whose bank hangs behind its own switch (self-excitation): Q_c/(√3·U·I_0) ≤ 0.9.
 * Such a bank is one on a busbar with nothing but that motor and a single feeder. Judged once.
 */
export function selfExcitation(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) => {
    const motor = motorBehindSwitch(context.study, live.bus);
    return motor && judgedOnce(context, live.bank.id) ? [atBank(context, live, motor)] : [];
  });
}

function motorBehindSwitch(study: Study, bus: Bus): Motor | null {
  const parts = elementsAt(study, bus.id).filter(isOn);
  const feeders = parts.filter(isSeries);
  const others = parts.filter((part): part is StudyElement => !isSeries(part) && part.kind !== 'bank');
  const [only] = others;
  return feeders.length === 1 && others.length === 1 && only?.kind === 'motor' ? only : null;
}

function atBank(context: CheckContext, { bank, bus, p }: LiveBank, motor: Motor): Verdict {
  const full = withDefaults(motor, context.study);
  const ratedA =
    (full.ratedKW * full.count * 1000) / (Math.sqrt(3) * bus.nominalV * full.efficiency * full.powerFactor);
  const noLoadA = full.noLoadCurrentRatio * ratedA;
  const total = bank.steps.reduce((sum, { kvar }) => sum + kvar, 0);
  const kvar = (total * (bus.nominalV / bank.ratedV) ** 2) / (1 - p);
  const noLoadKvar = (Math.sqrt(3) * bus.nominalV * noLoadA) / 1000;
  const value = kvar / noLoadKvar;
  const row = partRow(context, bank.id, {
    check: 'self-excitation',
    title: 'self-excitation of the motor',
    unit: 'p.u.',
    source,
  });
  row.working.push({
    equation: 'Q_c / (√3 · U · I_0)',
    numbers: `${figure(kvar)} kvar / (√3 · ${figure(bus.nominalV)} V · ${figure(noLoadA)} A) = ${figure(value)}`,
  });
  if (motor.noLoadCurrentRatio === undefined) {
    const missing = `enter the no-load current of ${nameOf(motor)}; with the customary ${figure(full.noLoadCurrentRatio)} of its rated current the ratio would be as shown`;
    return unknown(row, missing, value, LIMIT);
  }
  return judged({
    ...row,
    value,
    limit: LIMIT,
    remarks: ['Where switch and motor part, an over-excited motor raises its voltage as it runs down.'],
    mend: `Put at most ${figure(motorCapacitorKvar(bus.nominalV, noLoadA), 3)} kvar behind the motor's switch, or switch the bank by its own contactor.`,
  });
}
