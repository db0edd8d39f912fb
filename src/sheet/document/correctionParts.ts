import { type Bank, busName, type Filter, isOn, nameOf, type Study } from '../../study/index.ts';
import { entered } from './formatNumber.ts';

/** A bank or filter as one line names it. */
export interface CorrectionPart {
  part: Bank | Filter;
  /** Rated kvar: of all steps of a bank, net of a filter. */
  kvar: number;
  summary: string;
}

/** Equal steps gathered: "2 × 25 + 3 × 50". */
export function stepsInWords(steps: readonly { kvar: number }[]): string {
  const runs: { kvar: number; count: number }[] = [];
  for (const { kvar } of steps) {
    const last = runs.at(-1);
    if (last?.kvar === kvar) last.count += 1;
    else runs.push({ kvar, count: 1 });
  }
  return runs.map(({ kvar, count }) => `${count} × ${entered(kvar)}`).join(' + ');
}

export const ratedKvar = (part: Bank | Filter): number =>
  part.kind === 'bank' ? part.steps.reduce((sum, step) => sum + step.kvar, 0) : part.kvar;

function summaryOf(study: Study, part: Bank | Filter): string {
  const kvar = ratedKvar(part);
  const name = nameOf(part);
  const named = name.toLowerCase().includes(part.kind) ? name : `${part.kind} ${name}`;
  const where = `${named}, ${entered(kvar)} kvar at ${busName(study, part.bus)}`;
  const out = isOn(part) ? '' : ' (out of service in the base study)';
  if (part.kind === 'filter')
    return `${where}, ${part.type}, tuned to order ${entered(part.tunedOrder)}${out}`;
  const detuned = part.detuningPercent ? `${entered(part.detuningPercent)} % detuned` : 'plain';
  const steps = part.steps.length > 1 ? `, steps ${stepsInWords(part.steps)}` : '';
  return `${where}, ${detuned}${steps}${out}`;
}

/** Every bank and filter of the study, in study order. */
export function correctionOf(study: Study): CorrectionPart[] {
  return study.elements.flatMap((element) =>
    element.kind === 'bank' || element.kind === 'filter'
      ? [{ part: element, kvar: ratedKvar(element), summary: summaryOf(study, element) }]
      : [],
  );
}
