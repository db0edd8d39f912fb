import {
  type CaseDifference,
  caseDifferences,
  casesOf,
  type ElementKind,
  type Study,
  type StudyElement,
  studyInCase,
} from '../../study/index.ts';
import { nameplate } from './nameplate.ts';

/** Stands before everything that a case has otherwise than the base study. */
export const differenceMark = 'Δ\u00a0';

/** Fields a nameplate tells by itself; a difference in any other is put before it. */
const told: Readonly<Record<ElementKind, readonly string[]>> = {
  supply: ['shortCircuitMVA', 'xOverR'],
  generator: ['ratedKVA', 'xdSubtransientPercent'],
  transformer: ['ratedKVA', 'vectorGroup', 'ukPercent'],
  cable: ['lengthM', 'runs', 'ratedA'],
  reactor: ['inductanceMH'],
  coupler: ['on'],
  branch: ['resistanceOhm', 'inductanceMH', 'capacitanceUF'],
  load: ['kW', 'powerFactor', 'leading', 'connection'],
  motor: ['ratedKW', 'count', 'loadPercent'],
  converter: ['kW', 'spectrum', 'connection'],
  bank: ['steps', 'ratedV', 'detuningPercent'],
  filter: ['kvar', 'tunedOrder', 'type'],
  shunt: ['resistanceOhm', 'inductanceMH', 'capacitanceUF'],
};

const separators = /( · |, )/;

/**
 * The nameplate as it stands in a case, each piece that differs from the base study's marked with a Δ, and what
 * no nameplate tells put before it in words: "Δ off · 60 kW", "5 × 90 kW · Δ 55 % load".
 */
export function plateInCase(
  part: StudyElement,
  study: Study,
  differences: readonly CaseDifference[],
): string {
  const plate = nameplate(part, study);
  const base = differences[0]?.element;
  if (!base) return plate;
  const before = new Set(nameplate(base, study).split(separators));
  const marked = plate
    .split(separators)
    .map((piece) => (before.has(piece) ? piece : `${differenceMark}${piece}`))
    .join('');
  const untold = differences.filter(({ field }) => !told[part.kind].includes(field));
  return [...untold.map((one) => `${differenceMark}${untoldWords(one)}`), marked].join(' · ');
}

function untoldWords({ field, mark, label, caseWords }: CaseDifference): string {
  return field === 'on' ? mark : `${label} ${caseWords}`;
}

/** The differences of a case by part. */
export function differencesByPart(study: Study, caseId: string): ReadonlyMap<string, CaseDifference[]> {
  const byPart = new Map<string, CaseDifference[]>();
  for (const one of caseDifferences(study, caseId))
    byPart.set(one.element.id, [...(byPart.get(one.element.id) ?? []), one]);
  return byPart;
}

const remembered = new WeakMap<Study, ReadonlyMap<string, readonly string[]>>();

/** By part: its nameplate in every case that changes it, so that its room is the same in all of them. */
export function platesInCases(study: Study): ReadonlyMap<string, readonly string[]> {
  const known = remembered.get(study);
  if (known) return known;
  const plates = new Map<string, string[]>();
  for (const { id, changes } of casesOf(study)) {
    if (changes.length === 0) continue;
    const changed = new Map(studyInCase(study, id).elements.map((element) => [element.id, element]));
    for (const [part, differences] of differencesByPart(study, id)) {
      const here = changed.get(part);
      if (here) plates.set(part, [...(plates.get(part) ?? []), plateInCase(here, study, differences)]);
    }
  }
  remembered.set(study, plates);
  return plates;
}
