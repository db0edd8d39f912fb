import { elementById, elementName, fieldsOf, type Study } from '../../../study/index.ts';
import { cells } from '../cells.ts';
import { fieldValue } from '../fieldValue.ts';
import { entered } from '../formatNumber.ts';
import type { Section } from '../model.ts';
import type { CaseView, SheetView } from '../SheetView.ts';

const ROLES = {
  load: 'load',
  light: 'light load',
  export: 'export',
  generator: 'on the generator',
} as const;

function changeWords(study: Study, element: string, set: Readonly<Record<string, unknown>>): string {
  const part = elementById(study, element);
  const fields = part ? fieldsOf(part.kind) : [];
  const words = Object.entries(set).map(([key, value]) => {
    const field = fields.find((candidate) => candidate.key === key);
    if (value === null) return `${field?.label ?? key} as by default`;
    if (key === 'on') return value === true ? 'in service' : 'out of service';
    const text = field ? fieldValue(study, field, value) : JSON.stringify(value);
    return `${field?.label ?? key} ${text ?? JSON.stringify(value)}`;
  });
  return `${elementName(study, element)}: ${words.join(', ')}`;
}

function outcome({ computed }: CaseView): string {
  if (!computed) return 'not computed';
  const { solution } = computed;
  if (!solution.converged) return `not solved: ${solution.error ?? 'no reason given'}`;
  return solution.deenergised.length === 0
    ? 'solved'
    : `solved; without source: ${solution.deenergised.join(', ')}`;
}

/** Every operating state with what it changes against the base study. */
export function casesSection(view: SheetView): Section {
  const warnings = [
    ...new Set(view.cases.flatMap(({ computed }) => computed?.solution.warnings ?? [])),
  ].sort();
  return {
    id: 'cases',
    title: 'Operating cases',
    blocks: [
      {
        kind: 'table',
        columns: [
          { head: 'case', align: 'left', grow: 1 },
          { head: 'role', align: 'left' },
          { head: 'hours a day', unit: 'h', align: 'decimal' },
          { head: 'changed against the base study', align: 'left', grow: 3 },
          { head: 'solution', align: 'left', grow: 1 },
        ],
        rows: view.cases.map((item) =>
          cells(
            item.name,
            ROLES[item.role],
            entered(item.hoursPerDay),
            item.changes.length === 0
              ? 'nothing: the base study'
              : item.changes.map(({ element, set }) => changeWords(view.study, element, set)).join('; '),
            outcome(item),
          ),
        ),
        notes: [],
      },
      ...(warnings.length === 0
        ? []
        : [
            { kind: 'heading' as const, text: 'Said by the solution' },
            { kind: 'list' as const, items: warnings },
          ]),
    ],
  };
}
