import { errorsAfter } from '../edits/errorsAfter.ts';
import { type SetTableOptions, setTable } from '../edits/setTable.ts';
import type { DataOrigin, Edit, Finding, Study } from '../types.ts';
import type { Paste, PastedRow } from './readPaste.ts';
import { type TableOwner, tableRecords } from './tableColumns.ts';

export interface TablePaste {
  /** One step of undo; null where no row is left to be used. */
  edit: Edit | null;
  /** The rows with those the study's rules refuse marked, each with the reason. */
  rows: PastedRow[];
  /** What is refused and belongs to no one row. */
  errors: string[];
}

const used: ReadonlySet<PastedRow['fate']> = new Set(['new', 'change']);

/**
 * The edit that takes the rows of a paste into the study. Rows that would make the study unsound are found by
 * its own rules, marked with what those say, and left out of the edit.
 */
export function tablePaste(
  study: Study,
  owner: TableOwner,
  paste: Paste,
  options: Omit<SetTableOptions, 'words'> & {
    words: (rows: readonly PastedRow[]) => string;
    origin?: DataOrigin;
  },
): TablePaste {
  let rows = paste.rows;
  for (let round = 0; round < 3; round += 1) {
    const taken = rows.filter(({ fate }) => used.has(fate));
    if (taken.length === 0) return { edit: null, rows, errors: [] };
    const edit = setTable(study, owner, taken, { ...options, words: options.words(taken) });
    const errors = errorsAfter(study, edit);
    if (errors.length === 0) return { edit, rows, errors: [] };
    const refused = byRow(study, owner, edit, taken, errors);
    if (refused.size === 0) return { edit: null, rows, errors: errors.map(({ message }) => message) };
    rows = rows.map((row) => {
      const error = refused.get(row.line);
      return error === undefined ? row : { ...row, fate: 'refused' as const, error };
    });
  }
  return { edit: null, rows, errors: ['The rows contradict each other; leave some out.'] };
}

/** The first error of each row, by line. */
function byRow(
  study: Study,
  owner: TableOwner,
  edit: Edit,
  taken: readonly PastedRow[],
  errors: readonly Finding[],
): Map<number, string> {
  const after = edit.apply(study);
  const before = new Set(tableRecords(study, owner).map(({ id }) => id));
  const fresh = tableRecords(after, owner).filter(({ id }) => !before.has(id));
  const newRows = taken.filter(({ id }) => id === undefined);
  const lineOf = new Map<string, number>();
  for (const row of taken) if (row.id !== undefined) lineOf.set(row.id, row.line);
  for (const [index, row] of newRows.entries()) {
    const record = fresh[index];
    if (record) lineOf.set(record.id, row.line);
  }
  const refused = new Map<number, string>();
  for (const { path, message } of errors) {
    const match = /^\$\.(elements|buses)\[(\d+)\]/.exec(path);
    const list = match?.[1] === 'buses' ? after.buses : after.elements;
    const record = match ? list[Number(match[2])] : undefined;
    const line = record && lineOf.get(record.id);
    if (line !== undefined && !refused.has(line)) refused.set(line, message);
  }
  return refused;
}
