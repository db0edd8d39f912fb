import { migrate } from '../migrate.ts';
import { builtInSpectra } from '../spectra/builtIn.ts';
import type { Finding, Study, StudyElement } from '../types.ts';
import { caseFindings } from './caseFindings.ts';
import { duplicateIds, idSet } from './duplicateIds.ts';
import { elementIssues, type Surroundings } from './elementIssues.ts';
import { findingOf, isRecord } from './issue.ts';
import { networkWarnings } from './networkWarnings.ts';
import { wordsFor } from './recordWords.ts';
import { busFindings, frameFindings, listOf, scanFindings, spectrumFindings } from './studyFrame.ts';
import { unknownFieldWarnings } from './unknownFields.ts';

export interface ReadOutcome {
  /** The study, or null where a finding is an error. */
  study: Study | null;
  findings: Finding[];
}

/**
 * Checks data against the study format and every rule of its parts, in the base study and in each case.
 * Any error refuses the study; warnings do not. Unknown fields stay on their records. Never throws.
 */
export function checkStudy(value: unknown): ReadOutcome {
  const migrated = migrate(value);
  if (!migrated.study) return { study: null, findings: migrated.findings };
  const raw = migrated.study;
  const findings: Finding[] = [...migrated.findings, ...frameFindings(raw)];
  const buses = listOf(raw, 'buses', true, findings);
  const elements = listOf(raw, 'elements', true, findings);
  const spectra = listOf(raw, 'spectra', false, findings);
  const cases = listOf(raw, 'cases', false, findings);
  const scans = listOf(raw, 'scans', false, findings);
  const maxOrder = typeof raw.maxOrder === 'number' ? raw.maxOrder : 50;
  const surroundings: Surroundings = {
    busIds: idSet(buses),
    spectrumIds: new Set([...idSet(spectra), ...builtInSpectra.map((spectrum) => spectrum.id)]),
    maxOrder,
  };
  findings.push(...busFindings(buses), ...spectrumFindings(spectra, maxOrder));
  findings.push(...partFindings(elements, surroundings), ...caseListFindings(cases, elements, surroundings));
  findings.push(...scanFindings(scans, surroundings.busIds));
  findings.push(...unknownFieldWarnings(raw));
  if (findings.some((finding) => finding.severity === 'error')) return { study: null, findings };
  const study = withChangeLists(raw as unknown as Study);
  findings.push(...networkWarnings(study));
  return { study, findings };
}

function partFindings(elements: readonly unknown[], surroundings: Surroundings): Finding[] {
  const own = elements.flatMap((element, index) =>
    elementIssues(element, surroundings).map((issue) =>
      findingOf(issue, wordsFor('part', element, index), ['elements', index]),
    ),
  );
  return [...own, ...duplicateIds(elements, 'part').map((issue) => findingOf(issue, '', ['elements']))];
}

function caseListFindings(
  cases: readonly unknown[],
  elements: readonly unknown[],
  surroundings: Surroundings,
): Finding[] {
  if (cases.length === 0) return [];
  const base = new Map<string, { element: StudyElement; sound: boolean }>();
  for (const element of elements) {
    if (!isRecord(element) || typeof element.id !== 'string') continue;
    const sound = elementIssues(element, surroundings).every((issue) => issue.severity !== 'error');
    base.set(element.id, { element: element as unknown as StudyElement, sound });
  }
  const own = cases.flatMap((record, index) => caseFindings(record, index, base, surroundings));
  return [...own, ...duplicateIds(cases, 'case').map((issue) => findingOf(issue, '', ['cases']))];
}

/** A case written without changes changes nothing; readers can rely on the list. */
function withChangeLists(study: Study): Study {
  if (!study.cases?.some((item) => item.changes === undefined)) return study;
  return {
    ...study,
    cases: study.cases.map((item) =>
      item.changes === undefined ? Object.assign({}, item, { changes: [] }) : item,
    ),
  };
}
