import type { Bank } from '../study/index.ts';
import { nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { dischargeLimitOhm, dischargeSeconds } from './dischargeTime.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { dischargeLimit } from './limits/capacitorLimit.ts';
import { capacitorSetFor } from './limits/choice.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Source, Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

const caution =
  'Discharge devices can fail: isolate, lock, wait, prove dead, earth and short before touching, whatever this row says.';

/** The capacitor of one unit of a step: across a line in delta, to the star point in star. */
interface Unit {
  farad: number;
  ratedV: number;
}

function largestUnit(context: CheckContext, bank: Bank): Unit & { kvar: number } {
  const kvar = Math.max(...bank.steps.map((step) => step.kvar));
  const delta = withDefaults(bank, context.study).connection === 'delta';
  const star = (kvar * 1000) / (2 * Math.PI * context.study.frequencyHz * bank.ratedV ** 2);
  return { kvar, farad: delta ? star / 3 : star, ratedV: delta ? bank.ratedV : bank.ratedV / Math.sqrt(3) };
}

/**
 * Discharge of a bank's largest step (discharge): R ≤ t/(C·ln(√2·U_N/U_r)) across each unit, U_r and t of the
 * capacitor set. A nameplate matter, judged once for all cases.
 */
export function discharge(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    judgedOnce(context, live.bank.id) ? atBank(context, live) : [],
  );
}

function atBank(context: CheckContext, { bank }: LiveBank): Verdict[] {
  const choice = capacitorSetFor(context.study, bank);
  const limit = 'set' in choice ? dischargeLimit(choice.set, bank.ratedV) : null;
  const unit = largestUnit(context, bank);
  if (!limit || Math.SQRT2 * unit.ratedV <= limit.residualV) return [];
  const ohm = dischargeLimitOhm(limit.seconds, unit.farad, unit.ratedV, limit.residualV);
  const row = partRow(context, bank.id, {
    check: 'discharge',
    title: 'discharge resistor',
    unit: 'kΩ',
    source: limit.source,
  });
  row.working.push({
    equation: 'R ≤ t / (C · ln(√2 · U_N / U_r))',
    numbers: `${figure(limit.seconds)} s / (${figure(unit.farad * 1e6)} µF · ln(√2 · ${figure(unit.ratedV)} V / ${figure(limit.residualV)} V)) = ${figure(ohm / 1000)} kΩ, step of ${figure(unit.kvar)} kvar`,
  });
  row.remarks = [caution];
  if (bank.dischargeOhm === undefined) {
    const missing = `enter the discharge resistor of ${nameOf(bank)}, across each unit: at most ${figure(ohm / 1000)} kΩ for its largest step`;
    return [unknown(row, missing, null, ohm / 1000)];
  }
  return [
    judged({
      ...row,
      value: bank.dischargeOhm / 1000,
      limit: ohm / 1000,
      mend: `Order discharge resistors of ${figure((0.9 * ohm) / 1000, 3)} kΩ or less across each unit.`,
    }),
  ];
}

const reconnectionSource: Source = {
  document: 'IEC 60831-1',
  edition: '2014',
  clause: 'residual voltage at energising, 10 % of U_N',
  provenance: 'memory',
};

/**
 * Waiting time before a step may go in again (reconnection): at least R·C·ln(√2·U_N/(0.1·U_N)), so that no
 * more than 10 % of U_N is left. Nothing is said where the resistor is not known: discharge asks for it.
 */
export function reconnection(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    live.bank.dischargeOhm !== undefined && judgedOnce(context, live.bank.id)
      ? [waitOf(context, live.bank, live.bank.dischargeOhm)]
      : [],
  );
}

function waitOf(context: CheckContext, bank: Bank, ohm: number): Verdict {
  const unit = largestUnit(context, bank);
  const limit = dischargeSeconds(ohm, unit.farad);
  const row = partRow(context, bank.id, {
    check: 'reconnection',
    title: 'reconnection delay',
    unit: 's',
    source: reconnectionSource,
  });
  row.working.push({
    equation: 't ≥ R · C · ln(√2 · U_N / (0.1 · U_N))',
    numbers: `${figure(ohm / 1000)} kΩ · ${figure(unit.farad * 1e6)} µF · ln(√2/0.1) = ${figure(limit)} s, step of ${figure(unit.kvar)} kvar`,
  });
  const delay = bank.controller?.reconnectDelayS;
  if (delay === undefined) {
    const missing = `enter the reconnection delay of the controller of ${nameOf(bank)}: at least ${figure(limit)} s`;
    return unknown(row, missing, null, limit);
  }
  return judged({
    ...row,
    value: delay,
    limit,
    sense: 'lower',
    mend: `Set the controller to ${figure(Math.ceil(1.1 * limit), 3)} s or more, or fit faster discharge.`,
  });
}
