import type { Bus, Study } from '../study/index.ts';
import { busById, elementsOfKind, isOn, isSeries } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { networkSideOf } from './inflow.ts';
import { isFirstCase } from './judgedOnce.ts';
import { commonPractice } from './source.ts';
import type { Verdict } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

const LIMIT = 0.4;

/**
 * Ripple control (ripple-signal): the impedance of the whole site at the signal frequency over U²/S_agreed,
 * at least 0.4 (common practice, the operator's rule prevails), and the signal voltage at the PCC with over
 * without the correction, shown beside. Asked at 50 Hz sites with correction in service on a supply.
 */
export function rippleSignal(context: CheckContext): Verdict[] {
  const { study } = context;
  const asked = study.criteria?.rippleControlHz !== undefined;
  if (context.correction.size === 0 || !elementsOfKind(study, 'supply').some(isOn)) return [];
  if (!asked && (study.frequencyHz === 60 || !isFirstCase(context))) return [];
  return [...context.pccBuses].flatMap((id) => {
    const bus = busById(study, id);
    return bus && context.solved.energised(id) ? [atPcc(context, bus)] : [];
  });
}

interface Ohm {
  re: number;
  im: number;
}

/** Parts of the site: all that is not a supply, nor a series part between busbars of the network side. */
function siteParts(study: Study, bus: string): Set<string> {
  const outside = new Set([...networkSideOf(study, bus), bus]);
  return new Set(
    study.elements
      .filter((part) =>
        isSeries(part)
          ? !(outside.has(part.from) && outside.has(part.to))
          : part.kind !== 'supply' && !(outside.has(part.bus) && part.bus !== bus),
      )
      .map(({ id }) => id),
  );
}

function ohmAt(context: CheckContext, bus: string, hertz: number, without: ReadonlySet<string>): Ohm | null {
  const scan = context.scan({ bus, sequence: 'positive', frequencyHz: Float64Array.of(hertz) }, without);
  return scan.error === undefined ? { re: scan.re[0] ?? 0, im: scan.im[0] ?? 0 } : null;
}

const size = ({ re, im }: Ohm): number => Math.hypot(re, im);

const inverse = (z: Ohm): Ohm => ({ re: z.re / size(z) ** 2, im: -z.im / size(z) ** 2 });

function atPcc(context: CheckContext, bus: Bus): Verdict {
  const { criteria } = context.study;
  const row: Row = {
    check: 'ripple-signal',
    title: 'ripple-control signal',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source: commonPractice,
    working: [],
    remarks: ["The operator's own rule prevails."],
  };
  const hertz = criteria?.rippleControlHz;
  if (hertz === undefined)
    return unknown(
      row,
      'enter the ripple-control frequency, or ask the network operator whether there is one',
    );
  const whole = ohmAt(context, bus.id, hertz, new Set());
  const bare = ohmAt(context, bus.id, hertz, context.correction);
  const network = ohmAt(context, bus.id, hertz, siteParts(context.study, bus.id));
  if (!whole || !bare || !network) return unknown(row, 'no impedance is seen at the PCC');
  row.working.push({
    equation: '|U with / U without| the correction, at the PCC',
    numbers: `${figure(hertz)} Hz: ${figure(size(whole))} Ω / ${figure(size(bare))} Ω = ${figure(size(whole) / size(bare))}`,
  });
  const [a, b] = [inverse(whole), inverse(network)];
  const site = 1 / Math.hypot(a.re - b.re, a.im - b.im);
  if (criteria?.agreedKVA === undefined)
    return unknown(
      row,
      `enter the agreed power: the site's impedance at ${figure(hertz)} Hz, ${figure(site)} Ω, is measured against it`,
    );
  const reference = bus.nominalV ** 2 / (criteria.agreedKVA * 1000);
  const value = site / reference;
  return judged({
    ...row,
    value,
    limit: LIMIT,
    sense: 'lower',
    working: [
      {
        equation: '|Z_site| / (U² / S_agreed) at the signal frequency',
        numbers: `${figure(site)} Ω / (${figure(bus.nominalV)} V)² · ${figure(criteria.agreedKVA)} kVA = ${figure(value)}`,
      },
      ...row.working,
    ],
    mend: `Choose a detuning whose series resonance lies well away from ${figure(hertz)} Hz (p = 14 % below 250 Hz signals, 7 % or less well above), or fit a blocking circuit agreed with the operator.`,
  });
}
