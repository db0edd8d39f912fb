import { drawnItems, symbolSets } from '../drawn.ts';
import { marksAmong } from '../marksOf.ts';
import { builtInSpectrum } from '../spectra/builtIn.ts';
import type { Finding, HarmonicRow } from '../types.ts';
import { duplicateIds } from './duplicateIds.ts';
import { listed } from './elementIssues.ts';
import { recordSchema, refusals, valueAt } from './fieldSchema.ts';
import { errorIssue, findingOf, type Issue, isRecord, valueText, warningIssue } from './issue.ts';
import { wordsFor } from './recordWords.ts';
import { refusalCode } from './refusalCode.ts';
import { rowIssues } from './rowIssues.ts';
import { shapeIssues } from './shapeIssues.ts';

/** A list of the study, or nothing where it is absent; anything else is an error. */
export function listOf(
  study: Record<string, unknown>,
  key: string,
  required: boolean,
  findings: Finding[],
): unknown[] {
  const list = study[key];
  if (Array.isArray(list)) return list;
  if (list !== undefined || required) {
    const code = list === undefined ? 'missing' : 'type';
    findings.push(
      findingOf(errorIssue(code, [key], list, `"${key}" is ${valueText(list)}; allowed is a list`), '', []),
    );
  }
  return [];
}

export function busFindings(buses: readonly unknown[]): Finding[] {
  const own = buses.flatMap((bus, index) => {
    const issues = shapeIssues('bus', bus, true);
    return issues.map((issue) => findingOf(issue, wordsFor('busbar', bus, index), ['buses', index]));
  });
  return [...own, ...duplicateIds(buses, 'busbar').map((issue) => findingOf(issue, '', ['buses']))];
}

/** Ids, rows, and the ban on redefining a built-in spectrum. */
export function spectrumFindings(spectra: readonly unknown[], maxOrder: number): Finding[] {
  const own = spectra.flatMap((spectrum, index) =>
    spectrumIssues(spectrum, maxOrder).map((issue) =>
      findingOf(issue, wordsFor('spectrum', spectrum, index), ['spectra', index]),
    ),
  );
  return [...own, ...duplicateIds(spectra, 'spectrum').map((issue) => findingOf(issue, '', ['spectra']))];
}

function spectrumIssues(spectrum: unknown, maxOrder: number): Issue[] {
  const issues = shapeIssues('spectrum', spectrum, true);
  if (!isRecord(spectrum)) return issues;
  if (typeof spectrum.id === 'string' && builtInSpectrum(spectrum.id)) {
    issues.push(
      errorIssue(
        'built-in-spectrum',
        ['id'],
        spectrum.id,
        `the id "${spectrum.id}" belongs to a built-in spectrum; choose another`,
      ),
    );
  }
  if (!Array.isArray(spectrum.orders)) {
    const code = spectrum.orders === undefined ? 'missing' : 'type';
    return [
      ...issues,
      errorIssue(
        code,
        ['orders'],
        spectrum.orders,
        `the orders are ${valueText(spectrum.orders)}; allowed is a list of rows with h and percent`,
      ),
    ];
  }
  const bad = spectrum.orders.flatMap((row: unknown, index) =>
    shapeIssues('harmonicRow', row, false).map((issue) => ({
      ...issue,
      path: ['orders', index, ...issue.path],
    })),
  );
  return [
    ...issues,
    ...bad,
    ...(bad.length > 0 ? [] : rowIssues(spectrum.orders as HarmonicRow[], ['orders'], maxOrder)),
  ];
}

export function scanFindings(scans: readonly unknown[], busIds: ReadonlySet<string>): Finding[] {
  return scans.flatMap((scan, index) => {
    const issues = shapeIssues('scan', scan, false);
    if (isRecord(scan)) {
      if (typeof scan.bus !== 'string' || !busIds.has(scan.bus)) {
        const code =
          typeof scan.bus === 'string' ? 'dangling-id' : scan.bus === undefined ? 'missing' : 'type';
        issues.push(
          errorIssue(
            code,
            ['bus'],
            scan.bus,
            `the busbar of the scan is ${valueText(scan.bus)}; allowed are ${listed(busIds)}`,
          ),
        );
      }
      if (issues.length === 0 && (scan.fromHz as number) >= (scan.toHz as number)) {
        issues.push(
          errorIssue(
            'rule',
            ['toHz'],
            scan.toHz,
            `the scan ends at ${valueText(scan.toHz)} Hz and starts at ${valueText(scan.fromHz)} Hz; allowed is an end above the start`,
          ),
        );
      }
    }
    return issues.map((issue) => findingOf(issue, wordsFor('scan', scan, index), ['scans', index]));
  });
}

/** Title, frequency, limits, criteria and the rest of the study's own fields. */
export function frameFindings(study: Record<string, unknown>): Finding[] {
  const own = refusals(recordSchema('study'), study).map(({ path, message }) => {
    const value = valueAt(study, path);
    const code = refusalCode('study', path, value);
    return findingOf(errorIssue(code, path, value, message), '', []);
  });
  return [
    ...own,
    ...originFindings(study.origins),
    ...viewFindings(study.view),
    ...markWarnings(study.view),
    ...proposalFindings(study.proposals),
  ];
}

const originWords = ['measured', 'nameplate', 'typical', 'assumed'];

function originFindings(origins: unknown): Finding[] {
  if (origins === undefined) return [];
  if (!isRecord(origins))
    return [
      findingOf(
        errorIssue(
          'type',
          ['origins'],
          origins,
          `the origins are ${valueText(origins)}; allowed is a record of paths`,
        ),
        '',
        [],
      ),
    ];
  return Object.entries(origins).flatMap(([path, entry]) => {
    const word = isRecord(entry) ? entry.origin : undefined;
    if (typeof word === 'string' && originWords.includes(word)) return [];
    return [
      findingOf(
        errorIssue(
          'choice',
          ['origins', path],
          entry,
          `the origin of ${path} is ${valueText(entry)}; allowed is a record whose origin is ${originWords.join(', ')}`,
        ),
        '',
        [],
      ),
    ];
  });
}

function proposalFindings(proposals: unknown): Finding[] {
  if (proposals === undefined || Array.isArray(proposals)) return [];
  return [
    findingOf(
      errorIssue(
        'type',
        ['proposals'],
        proposals,
        `the proposals are ${valueText(proposals)}; allowed is a list`,
      ),
      '',
      [],
    ),
  ];
}

/** The view never decides a number, but what is there has the shape its readers expect. */
function viewFindings(view: unknown): Finding[] {
  if (view === undefined) return [];
  if (!isRecord(view))
    return [
      findingOf(
        errorIssue('type', ['view'], view, `the view is ${valueText(view)}; allowed is a record`),
        '',
        [],
      ),
    ];
  const wrong: [string, boolean, string][] = [
    [
      'pins',
      view.pins === undefined || (Array.isArray(view.pins) && view.pins.every(isPin)),
      'a list of pins',
    ],
    ['orderAlong', view.orderAlong === undefined || isOrder(view.orderAlong), 'lists of part ids by busbar'],
    // A set or an item this version does not know is drawn as by default, never refused.
    ['marks', view.marks === undefined || Array.isArray(view.marks), 'a list of marks on the drawing'],
    ['phases', view.phases === undefined || isRecord(view.phases), 'a record of labels and colours'],
    ['symbols', view.symbols === undefined || typeof view.symbols === 'string', symbolSets.join(' or ')],
    [
      'hidden',
      view.hidden === undefined || isTexts(view.hidden),
      `a list of what the drawing leaves out: ${drawnItems.join(', ')}`,
    ],
    ['focusBus', view.focusBus === undefined || typeof view.focusBus === 'string', 'the id of a busbar'],
    ['caseId', view.caseId === undefined || typeof view.caseId === 'string', 'the id of a case'],
  ];
  return wrong
    .filter(([, sound]) => !sound)
    .map(([key, , allowed]) =>
      findingOf(
        errorIssue(
          'type',
          ['view', key],
          view[key],
          `${key} is ${valueText(view[key])}; allowed is ${allowed}`,
        ),
        '',
        [],
      ),
    );
}

/** Marks of a later version, or a broken one, are no reason to refuse a study. */
function markWarnings(view: unknown): Finding[] {
  if (!isRecord(view) || !Array.isArray(view.marks)) return [];
  const unread = view.marks.length - marksAmong(view.marks).length;
  if (unread === 0) return [];
  const which = unread === 1 ? 'one of the marks' : `${unread} of the marks`;
  const text = `${which} on the drawing cannot be drawn here; what is not understood is kept in the file`;
  return [findingOf(warningIssue('unknown-mark', ['view', 'marks'], undefined, text), '', [])];
}

function isPin(pin: unknown): boolean {
  if (!isRecord(pin) || typeof pin.bus !== 'string') return false;
  return pin.quantity === 'voltage' || (pin.quantity === 'current' && typeof pin.element === 'string');
}

function isTexts(list: unknown): boolean {
  return Array.isArray(list) && list.every((item) => typeof item === 'string');
}

function isOrder(order: unknown): boolean {
  return isRecord(order) && Object.values(order).every(isTexts);
}
