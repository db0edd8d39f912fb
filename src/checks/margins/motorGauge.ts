import { busById, isOn } from '../../study/index.ts';
import type { CheckContext } from '../CheckContext.ts';
import { motorLimit } from '../limits/motorLimits.ts';
import { worstVoltageFactor } from '../motorHvf.ts';
import { type Gauge, NOT_FORMED } from './Gauge.ts';

/** Below this last order the factor is not formed. */
const LOWEST_LAST_ORDER = 13;

/** Harmonic voltage factor at each motor in service. */
export function motorGauges(context: CheckContext): Gauge[] {
  if (context.solved.maxOrder < LOWEST_LAST_ORDER) return [];
  return context.study.elements.flatMap((part) => {
    const bus = part.kind === 'motor' && isOn(part) ? busById(context.study, part.bus) : undefined;
    if (part.kind !== 'motor' || !bus || !context.solved.energised(bus.id)) return [];
    const rule = motorLimit(part.voltageFactorDesign, context.study.frequencyHz);
    return [
      {
        measures: [
          {
            key: `motor-hvf|${part.id}`,
            check: 'motor-hvf',
            subject: { kind: 'element' as const, id: part.id },
          },
        ],
        read({ solved, actual }, out, at) {
          const running = actual.elements.find(({ id }) => id === part.id);
          out[at] =
            running && isOn(running)
              ? 1 - worstVoltageFactor(solved, bus.id, bus.nominalV, rule.oddOnly).value / rule.value
              : NOT_FORMED;
        },
      } satisfies Gauge,
    ];
  });
}
