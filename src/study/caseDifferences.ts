import { studyInCase } from './cases.ts';
import { sameData } from './edits/edit.ts';
import { fieldOf } from './fields/fieldsOf.ts';
import { valueWords } from './fields/valueWords.ts';
import { busById, homeBusOf } from './lookup.ts';
import type { Study, StudyElement } from './types.ts';
import { defaultOf } from './withDefaults.ts';

/** One field of a part that a case has otherwise than the base study. */
export interface CaseDifference {
  element: StudyElement;
  field: string;
  /** Trade words of the field. */
  label: string;
  /** Values in words with their units; an absent one by its default. */
  baseWords: string;
  caseWords: string;
  /** The case's value as it is marked on the drawing: "off", "2 of 4 steps", "60 % load". */
  mark: string;
}

const remembered = new WeakMap<Study, Map<string, readonly CaseDifference[]>>();

/**
 * Everything a case has otherwise than the base study, part by part in study order. What a change repeats
 * of the base study, and what it sets on a part that is gone, is no difference. Remembered per study.
 */
export function caseDifferences(study: Study, caseId: string): readonly CaseDifference[] {
  const known = remembered.get(study) ?? new Map<string, readonly CaseDifference[]>();
  remembered.set(study, known);
  const found = known.get(caseId) ?? differencesBetween(study, study, studyInCase(study, caseId));
  known.set(caseId, found);
  return found;
}

/** What two states of one study have otherwise; `from` is told as base. */
export function differencesBetween(study: Study, from: Study, to: Study): readonly CaseDifference[] {
  if (from === to) return [];
  const others = new Map(to.elements.map((element) => [element.id, element]));
  return from.elements.flatMap((element) => {
    const other = others.get(element.id);
    return other && other !== element ? elementDifferences(study, element, other) : [];
  });
}

/** Whether two states of one study are the same, defaults counted as values. */
export function isSameState(study: Study, from: Study, to: Study): boolean {
  if (from === to) return true;
  const others = new Map(to.elements.map((element) => [element.id, element]));
  return from.elements.every((element) => {
    const other = others.get(element.id);
    return (
      !other ||
      other === element ||
      keysOf(element, other).every((key) => !differs(study, element, other, key))
    );
  });
}

function keysOf(from: StudyElement, to: StudyElement): string[] {
  return [...new Set([...Object.keys(from), ...Object.keys(to)])];
}

function fieldValue(part: StudyElement, key: string): unknown {
  return Object.hasOwn(part, key) ? part[key as keyof StudyElement] : undefined;
}

function differs(study: Study, from: StudyElement, to: StudyElement, key: string): boolean {
  const [before, after] = [fieldValue(from, key), fieldValue(to, key)];
  if (before === after) return false;
  return !sameData(resolved(study, from, key, before), resolved(study, to, key, after));
}

function elementDifferences(study: Study, from: StudyElement, to: StudyElement): CaseDifference[] {
  return keysOf(from, to).flatMap((key) => {
    if (!differs(study, from, to, key)) return [];
    const base = resolved(study, from, key, fieldValue(from, key));
    const here = resolved(study, to, key, fieldValue(to, key));
    return [
      {
        element: from,
        field: key,
        label: fieldOf(from.kind, key)?.label ?? key,
        baseWords: valueWords(study, from.kind, key, base),
        caseWords: valueWords(study, from.kind, key, here),
        mark: markWords(study, from, to, key, here),
      },
    ];
  });
}

/** The value, or the default that stands for an absent one. */
function resolved(study: Study, owner: StudyElement, key: string, value: unknown): unknown {
  if (value !== undefined) return value;
  const field = fieldOf(owner.kind, key);
  const nominalV = busById(study, homeBusOf(owner))?.nominalV;
  return (field && defaultOf(field, { owner: { ...owner }, nominalV })) ?? null;
}

function markWords(study: Study, from: StudyElement, to: StudyElement, key: string, value: unknown): string {
  if (key === 'on') {
    if (to.kind === 'coupler') return value === false ? 'open' : 'closed';
    return value === false ? 'off' : 'in service';
  }
  if (key === 'steps' && to.kind === 'bank' && from.kind === 'bank') {
    const on = to.steps.filter((step) => step.on !== false).length;
    return `${on} of ${to.steps.length} steps`;
  }
  if (key === 'loadPercent') return `${valueWords(study, to.kind, key, value)} load`;
  if (key === 'count') return `${String(value)} in number`;
  const field = fieldOf(to.kind, key);
  return typeof value === 'number' && field && 'unit' in field && field.unit !== ''
    ? valueWords(study, to.kind, key, value)
    : `${field?.label ?? key} ${valueWords(study, to.kind, key, value)}`;
}
