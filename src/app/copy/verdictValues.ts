import { byMargin, type FigureValues, sourceWords, VERDICT_WORDS } from '../../charts/index.ts';
import type { Verdict } from '../../checks/index.ts';
import { busName, casesOf, elementName, nameOf, type Study } from '../../study/index.ts';

const cell = (value: number | null): string => (value === null ? '' : String(Number(value.toPrecision(6))));

/** Every verdict of a case, the worst first, with its source and what would mend it. */
export function verdictValues(study: Study, verdicts: readonly Verdict[]): FigureValues {
  const cases = new Map(casesOf(study).map((one) => [one.id, nameOf(one)]));
  return [
    ['verdict', 'at', 'check', 'value', 'limit', 'unit', 'margin', 'case', 'source', 'mend'],
    ...[...verdicts]
      .sort(byMargin)
      .map((one) => [
        VERDICT_WORDS[one.verdict],
        one.subject.kind === 'bus' ? busName(study, one.subject.id) : elementName(study, one.subject.id),
        one.title,
        cell(one.value),
        cell(one.limit),
        one.unit,
        cell(one.margin),
        cases.get(one.caseId) ?? one.caseId,
        sourceWords(one.source),
        one.mend ?? '',
      ]),
  ];
}
