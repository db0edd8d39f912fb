import type { Bus } from '../study/index.ts';
import { elementsAt, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { isFirstCase } from './judgedOnce.ts';
import type { Source, Verdict } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

const source: Source = {
  document: 'IEC 60909-0',
  clause: 'initial symmetrical short-circuit current, voltage factor c_max',
  provenance: 'memory',
};

/** Voltage factor c_max: 1.05 up to 1 kV (voltage tolerance 6 %), 1.10 above. */
const voltageFactor = (nominalV: number): number => (nominalV <= 1000 ? 1.05 : 1.1);

/**
 * Initial symmetrical short-circuit current with every coupler closed against the board's withstand
 * (fault-level): I″k = c·U_n/(√3·|Z|). Boards with a withstand entered are judged; one that a coupler joins
 * and that has none is left open, once. Nothing is said of other boards.
 */
export function faultLevel(context: CheckContext): Verdict[] {
  return context.study.buses.flatMap((bus) => {
    if (!context.solved.energised(bus.id)) return [];
    const coupled = elementsAt(context.study, bus.id).some(({ kind }) => kind === 'coupler');
    const asked = coupled && isFirstCase(context);
    return bus.withstandKA !== undefined || asked ? atBus(context, bus) : [];
  });
}

function atBus(context: CheckContext, bus: Bus): Verdict[] {
  const ohm = context.coupledOhm(bus.id);
  if (!ohm) return [];
  const c = voltageFactor(bus.nominalV);
  const size = Math.hypot(ohm.re, ohm.im);
  const value = (c * bus.nominalV) / (Math.sqrt(3) * size) / 1000;
  const row: Row = {
    check: 'fault-level',
    title: 'fault level, couplers closed',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: 'kA',
    source,
    working: [
      {
        equation: 'I″k = c · U_n / (√3 · |Z|)',
        numbers: `${figure(c)} · ${figure(bus.nominalV)} V / (√3 · ${figure(size * 1000)} mΩ) = ${figure(value)} kA`,
      },
    ],
    remarks: [
      'From the network as drawn, motors by their locked-rotor impedance, capacitors left out; the peak and the breaking current need a short-circuit study.',
    ],
  };
  if (bus.withstandKA === undefined)
    return [unknown(row, `enter the short-time withstand current of ${nameOf(bus)}`, value)];
  return [
    judged({
      ...row,
      value,
      limit: bus.withstandKA,
      mend: 'Keep the coupler open by an interlock, choose a transformer of higher impedance, or a board of higher withstand.',
    }),
  ];
}
