import { type Bus, phaseNamesOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { bandSetFor } from './limits/choice.ts';
import type { VoltageBand } from './limits/types.ts';
import { citation } from './limits/voltageLimit.ts';
import { margin, verdictWord } from './margin.ts';
import type { SolvedCase } from './SolvedCase.ts';
import type { Verdict } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

const SQRT3 = Math.sqrt(3);

interface Worst {
  phase: number;
  percent: number;
  limit: number;
  margin: number;
}

/**
 * The phase nearest to (or furthest beyond) an end of the band. Values in per cent of U_n/√3; the
 * reference of both ends is 100 %.
 */
function worstOfBand(
  percents: readonly number[],
  band: Pick<VoltageBand, 'lowPercent' | 'highPercent'>,
): Worst {
  const all = percents.flatMap((percent, phase) => [
    { phase, percent, limit: band.highPercent, margin: margin(percent, band.highPercent, 100, 'upper') },
    { phase, percent, limit: band.lowPercent, margin: margin(percent, band.lowPercent, 100, 'lower') },
  ]);
  const worst = all.sort((a, b) => a.margin - b.margin)[0];
  if (!worst) throw new RangeError('no phase voltages: at least one is needed');
  return worst;
}

/** Steady fundamental voltage per busbar and phase (bus-voltage): one verdict a busbar, its worst phase. */
export function busVoltage(context: CheckContext): Verdict[] {
  return context.study.buses.map((bus) => atBus(context, bus));
}

function percentsAt(solved: SolvedCase, bus: Bus): number[] {
  const index = solved.bus(bus.id);
  return [0, 1, 2].map((phase) => (solved.volts(index, 1, phase) / (bus.nominalV / SQRT3)) * 100);
}

function atBus(context: CheckContext, bus: Bus): Verdict {
  const set = bandSetFor(context.study, context.pccBuses.has(bus.id));
  const band = set.band;
  if (!band) throw new RangeError(`limit set ${set.id} has no voltage band`);
  const row: Row = {
    check: 'bus-voltage',
    title: 'steady voltage',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: citation(set, band),
    working: [],
    remarks: band.note && bus.nominalV > 600 && set.id === 'ansi-c84.1' ? [band.note] : [],
  };
  if (!context.solved.energised(bus.id))
    return unknown(row, 'the busbar has no path to a source in this case');
  const worst = worstOfBand(percentsAt(context.solved, bus), band);
  const volts = (worst.percent / 100) * bus.nominalV;
  const low = worst.limit === band.lowPercent;
  return judged({
    ...row,
    ...beforeCorrection(context, bus, band),
    value: worst.percent,
    limit: worst.limit,
    reference: 100,
    sense: low ? 'lower' : 'upper',
    working: () => [
      {
        equation: 'U1 / U_n, worst phase',
        numbers: `${phaseNamesOf(context.study)[worst.phase]}: ${figure(volts / SQRT3)} V / (${figure(bus.nominalV)} V/√3) = ${figure(worst.percent)} %, band ${band.lowPercent} to ${band.highPercent} %`,
      },
    ],
    mend: low
      ? 'Raise the transformer tap or the supply setpoint, add correction, or shorten the feeder.'
      : 'Lower the transformer tap or the supply setpoint, or switch steps off at light load.',
  });
}

function beforeCorrection(
  context: CheckContext,
  bus: Bus,
  band: VoltageBand,
): Pick<Row, 'withoutCorrection'> {
  const without = context.without();
  if (!without?.energised(bus.id)) return {};
  const worst = worstOfBand(percentsAt(without, bus), band);
  return { withoutCorrection: { value: worst.percent, verdict: verdictWord(worst.margin) } };
}
