import type { Verdict } from '../../../checks/index.ts';
import { elementsOfKind, nameOf } from '../../../study/index.ts';
import { correctionOf } from '../correctionParts.ts';
import type { Section } from '../model.ts';
import { caseName, type SheetView, solvedIn, solvedWithout, subjectName } from '../SheetView.ts';

const closed = (text: string): string => (/[.!?]$/.test(text) ? text : `${text}.`);

/** Unknown verdicts that miss the same thing, gathered over the cases. */
function missingData(view: SheetView): string[] {
  const unknown = view.verdicts.filter(({ verdict }) => verdict === 'unknown');
  const groups = new Map<string, Verdict[]>();
  for (const verdict of unknown) {
    const why = verdict.remarks[0] ?? 'the check does not say which data are missing';
    const label = `No verdict on ${verdict.title} at ${subjectName(view.study, verdict)}: ${closed(why)}`;
    groups.set(label, [...(groups.get(label) ?? []), verdict]);
  }
  return [...groups].map(([label, verdicts]) => {
    const names = [...new Set(verdicts.map(({ caseId }) => caseName(view, caseId)))];
    return names.length === view.cases.length
      ? `${label} In every case.`
      : `${label} In ${names.join(', ')}.`;
  });
}

function unsolved(view: SheetView): string[] {
  return view.cases
    .filter((item) => !solvedIn(item))
    .map(({ name, computed }) => {
      const why = computed ? (computed.solution.error ?? 'no reason given') : 'not computed';
      return closed(`Case ${name} has no results: ${why}`);
    });
}

function notCompared(view: SheetView): string[] {
  if (correctionOf(view.study).length === 0) return [];
  const names = view.cases.filter((item) => solvedIn(item) && !solvedWithout(item)).map(({ name }) => name);
  return names.length === 0 ? [] : [`Not computed without the correction: ${names.join(', ')}.`];
}

/** What is not settled: missing data, unsolved cases, what this revision does not look at. */
export function openPointsSection(view: SheetView): Section {
  const minimum = elementsOfKind(view.study, 'supply')
    .filter((part) => part.shortCircuitMVAMin === undefined)
    .map(
      (part) =>
        `The minimum fault level of ${nameOf(part)} is not given; resonance moves with it. Ask the network operator.`,
    );
  const noBackground = elementsOfKind(view.study, 'supply')
    .filter((part) => (part.background ?? []).length === 0)
    .map(
      (part) =>
        `No background distortion is entered at ${nameOf(part)}; the grid's own harmonics load a bank as well.`,
    );
  return {
    id: 'open-points',
    title: 'Open points',
    blocks: [
      {
        kind: 'list',
        items: [
          ...unsolved(view),
          ...missingData(view),
          ...notCompared(view),
          ...minimum,
          ...noBackground,
          'Every part is computed at its entered value in the cases listed. Tolerances of capacitors, reactors, fault level and frequency are not searched on this sheet.',
        ],
      },
    ],
  };
}
