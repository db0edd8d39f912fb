import { withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { bankXc } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { supplyRaise } from './highestSupply.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { unitVoltages } from './unitVoltages.ts';
import { judged } from './verdict.ts';

/** Volts on what is left over U_N (common practice). */
const LIMIT = 1.1;

/**
 * One unit of a bank out, by its can or its fuse (lost-unit): fundamental volts on the units that are left over
 * their U_N, at the case's busbar voltage raised to the highest supply; with the tuning and the unbalance it
 * leaves. Units in parallel per phase or branch: as entered, else one for each step on.
 */
export function lostUnit(context: CheckContext): Verdict[] {
  return liveBanks(context).map((live) => atBank(context, live));
}

function atBank(context: CheckContext, { bank, bus, terminal, p }: LiveBank): Verdict {
  const { connection } = withDefaults(bank, bus);
  const stepsOn = bank.steps.filter((step) => step.on !== false).length;
  const units = bank.unitsPerPhase ?? stepsOn;
  const capacitorOhm = bankXc(bank) ?? Number.NaN;
  const volts = busVolts(context, bus.id) * supplyRaise(context.actualStudy);
  const common = { connection, volts, reactorOhm: p * capacitorOhm, capacitorOhm };
  const left = (units - 1) / units;
  const across = unitVoltages({ ...common, shares: [left, 1, 1] });
  const whole = unitVoltages({ ...common, shares: [1, 1, 1] })[0];
  const ratedV = connection === 'delta' ? bank.ratedV : bank.ratedV / Math.sqrt(3);
  const worstV = Math.max(...across);
  const value = worstV / ratedV;
  const row = partRow(context, bank.id, { check: 'lost-unit', title: 'one unit out', unit: 'p.u.' });
  return judged({
    ...row,
    value,
    limit: LIMIT,
    working: () => [
      {
        equation: `volts on what is left, one of ${figure(units)} units per ${connection === 'delta' ? 'branch' : 'phase'} out`,
        numbers: `${figure(whole)} V whole, then ${across.map((v) => (v > 0 ? `${figure(v)} V` : 'out')).join(', ')}; ${figure(worstV)} V / ${figure(ratedV)} V = ${figure(value)}`,
      },
      ...(p > 0 && left > 0
        ? [
            {
              equation: 'tuning of the phase hit, n/√(share left)',
              numbers: `${figure(1 / Math.sqrt(p), 3)} → ${figure(1 / Math.sqrt(p * tunedShare(connection, left)), 3)}`,
            },
          ]
        : []),
      {
        equation: 'unbalance it leaves: current of the line hit against the whole bank',
        numbers: `about ${figure(100 * (1 - tunedShare(connection, left)), 3)} % less than ${figure(lineAmperes(context, terminal))} A`,
      },
    ],
    remarks: () => [
      ...(bank.unitsPerPhase === undefined
        ? ['Units in parallel are not entered; one for each step on is taken (common practice).']
        : []),
      'A fuse that has blown is not seen from outside: measure the current of every phase at each inspection.',
    ],
    mend: 'Choose capacitors of a higher rated voltage, more units in parallel, or protection that takes the bank off by unbalance.',
  });
}

/** What is left of a line's star-equivalent capacitance: a delta line loses half of what its branch does. */
const tunedShare = (connection: string, left: number): number =>
  connection === 'delta' ? (1 + left) / 2 : left;

function busVolts({ solved }: CheckContext, busId: string): number {
  const bus = solved.bus(busId);
  return Math.max(...[0, 1, 2].map((pair) => solved.lineVolts(bus, 1, pair)));
}

const lineAmperes = ({ solved }: CheckContext, terminal: number): number =>
  Math.max(...[0, 1, 2].map((phase) => solved.amperes(terminal, 1, phase)));
