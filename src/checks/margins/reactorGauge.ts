import type { CheckContext } from '../CheckContext.ts';
import { liveBanks } from '../liveBanks.ts';
import { linearLimitOf, shareOn } from '../reactorDuty.ts';
import { heaviestRms } from './capacitorGauge.ts';
import { type Gauge, NOT_FORMED } from './Gauge.ts';

/** Detuning reactors: rms current against the rating where one is entered, and the linear range. */
export function reactorGauges(context: CheckContext): Gauge[] {
  return liveBanks(context).flatMap((live) => {
    if (!(live.p > 0)) return [];
    const { bank } = live;
    const subject = { kind: 'element' as const, id: bank.id };
    const ratedA = bank.ratedReactorA === undefined ? null : bank.ratedReactorA * shareOn(live);
    const rms: Gauge = {
      measures: [{ key: `reactor-duty|${bank.id}|rms`, check: 'reactor-duty', subject }],
      read({ solved }, out, at) {
        const terminal = solved.terminal(bank.id, bank.bus);
        out[at] =
          terminal === undefined || ratedA === null ? NOT_FORMED : 1 - heaviestRms(solved, terminal) / ratedA;
      },
    };
    const linear: Gauge = {
      measures: [{ key: `reactor-duty|${bank.id}|linear`, check: 'reactor-duty', subject }],
      read({ solved }, out, at) {
        out[at] = NOT_FORMED;
        const terminal = solved.terminal(bank.id, bank.bus);
        if (terminal === undefined) return;
        const sums = [0, 0, 0];
        for (let phase = 0; phase < 3; phase++)
          for (let h = 1; h <= solved.maxOrder; h++) sums[phase]! += solved.amperes(terminal, h, phase);
        const sum = Math.max(...sums);
        const fundamentalA = solved.amperes(terminal, 1, sums.indexOf(sum));
        out[at] = 1 - sum / fundamentalA / linearLimitOf(live, fundamentalA);
      },
    };
    return ratedA === null ? [linear] : [rms, linear];
  });
}
