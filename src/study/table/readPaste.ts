import { type Patch, sameData } from '../edits/edit.ts';
import { fieldOf, seriesKinds } from '../fields/fieldsOf.ts';
import { nameOf } from '../names.ts';
import type { Study } from '../types.ts';
import type { DecimalMark } from '../units/readNumber.ts';
import { cellText } from './cellText.ts';
import { isUnit, readHeads } from './columnHeads.ts';
import { decimalMark, type FoundMark } from './decimalMark.ts';
import { readCell } from './readCell.ts';
import {
  columnValue,
  type TableColumn,
  type TableOwner,
  type TableRecord,
  tableColumns,
  tableRecords,
} from './tableColumns.ts';
import { readTabular, type TabularText } from './tabularText.ts';

/** Where a table is pasted: what stands at the cell and below it, and what a new part stands at. */
export interface PastePlace {
  /** Keys of the columns from the cell to the right, for text without heads. */
  columns: readonly string[];
  /** Ids of the rows from the cell down, for rows without names. */
  rows: readonly string[];
  /** Busbar of new parts whose row names none. */
  bus?: string | undefined;
}

/** What the reader's guesses were changed to. */
export interface PasteChoices {
  /** Whether the first row is heads. */
  header?: boolean | undefined;
  decimal?: DecimalMark | undefined;
  /** Column key, or null to leave the column out, by its place in the text. */
  columns?: Readonly<Record<number, string | null>>;
  /** Lines left out. */
  without?: ReadonlySet<number>;
  /** Mended cells by "line column". */
  cells?: Readonly<Record<string, string>>;
}

export interface PastedColumn {
  /** As its head says; '' without one. */
  head: string;
  column: TableColumn | null;
  /** Of the head or the row of units; '' for the field's own. */
  unit: string;
}

export interface PastedCell {
  text: string;
  /** In the field's unit; undefined where nothing is written, or nothing that could be read. */
  value: unknown;
  /** What it is read as, with every digit; '' where nothing is written. */
  read: string;
  error: string | null;
}

export interface PastedRow {
  line: number;
  cells: PastedCell[];
  /** The part or busbar it changes; undefined for a new one. */
  id?: string | undefined;
  /** Name of what is changed or new, as far as the row says. */
  name: string;
  fate: 'new' | 'change' | 'same' | 'left out' | 'refused';
  /** Why it cannot be used as a whole, as a sentence. */
  error: string | null;
  values: Patch;
}

export interface Paste {
  separator: TabularText['separator'];
  blank: number;
  header: boolean;
  /** The row under the heads gives units. */
  unitRow: boolean;
  mark: FoundMark & { used: DecimalMark | undefined };
  columns: PastedColumn[];
  rows: PastedRow[];
}

/** Signs that stand for a value nobody has. */
const missing: ReadonlySet<string> = new Set(['', '-', '–', '—', '?', 'n/a', 'na', '#n/a', 'n.a.', 'tbd']);

/**
 * What text pasted into a table means: which column is which, by heads or by place, in which unit, with which
 * decimal mark; which row is which part, by name or by place; and every cell's value or what is wrong with it.
 * Every line of the text is a head, a row of units, a blank one or a row here: nothing is dropped unsaid. Empty
 * cells leave a value as it is.
 */
export function readPaste(
  study: Study,
  owner: TableOwner,
  text: string,
  place: PastePlace,
  choices: PasteChoices = {},
): Paste {
  const tabular = readTabular(text);
  const first = tabular.rows[0]?.cells ?? [];
  const header = choices.header ?? looksLikeHeads(owner, tabular);
  const below = tabular.rows.slice(header ? 1 : 0);
  const unitRow = header && below.length > 1 && isUnitRow(below[0]?.cells ?? []);
  const body = unitRow ? below.slice(1) : below;
  const width = Math.max(0, ...tabular.rows.map(({ cells }) => cells.length));
  const units = unitRow ? (below[0]?.cells ?? []) : [];
  const columns = columnsOf(owner, header ? first : null, units, width, place, choices);
  const found = decimalMark(numberCells(columns, body));
  const mark = { ...found, used: choices.decimal ?? found.decimal };
  const rows = rowsOf(study, owner, columns, body, place, choices, mark.used);
  return { separator: tabular.separator, blank: tabular.blank, header, unitRow, mark, columns, rows };
}

/** The first row is heads where it names columns, and holds no numbers where the rows under it do. */
function looksLikeHeads(owner: TableOwner, { rows }: TabularText): boolean {
  const [first, ...others] = rows.map(({ cells }) => cells);
  if (!first) return false;
  const isNumber = (cell: string) => /^[-+−]?[\d.,]/.test(cell);
  if (first.some(isNumber)) return false;
  const known = readHeads(owner, first).filter(({ key }) => key !== null).length;
  const words = first.filter((cell) => cell !== '').length;
  const numbersBelow = others.some((cells) => cells.some(isNumber));
  return known > 0 && (known * 2 >= words || numbersBelow);
}

function isUnitRow(cells: readonly string[]): boolean {
  const written = cells.map(bareUnit).filter((cell) => cell !== '' && cell !== '-');
  return written.length > 0 && written.every(isUnit);
}

function bareUnit(cell: string): string {
  return cell.replace(/^[([]|[)\]]$/g, '').trim();
}

function columnsOf(
  owner: TableOwner,
  heads: readonly string[] | null,
  units: readonly string[],
  width: number,
  place: PastePlace,
  { columns = {} }: PasteChoices,
): PastedColumn[] {
  const all = tableColumns(owner);
  const read = heads && readHeads(owner, heads);
  const chosen = new Set(Object.values(columns));
  return Array.from({ length: width }, (_, index): PastedColumn => {
    const guess = read ? (read[index]?.key ?? null) : (place.columns[index] ?? null);
    const key = Object.hasOwn(columns, index) ? columns[index] : chosen.has(guess) ? null : guess;
    const unit = bareUnit(units[index] ?? '');
    return {
      head: heads?.[index] ?? '',
      column: all.find((column) => column.key === key) ?? null,
      unit: isUnit(unit) ? unit : (read?.[index]?.unit ?? ''),
    };
  });
}

function numberCells(columns: readonly PastedColumn[], body: TabularText['rows']): string[] {
  return body.flatMap(({ cells }) =>
    cells.filter((_, index) => {
      const type = columns[index]?.column?.field.type;
      return type === 'number' || type === 'integer';
    }),
  );
}

function rowsOf(
  study: Study,
  owner: TableOwner,
  columns: readonly PastedColumn[],
  body: TabularText['rows'],
  place: PastePlace,
  choices: PasteChoices,
  decimal: DecimalMark | undefined,
): PastedRow[] {
  const records = tableRecords(study, owner);
  const byName = new Map<string, TableRecord>();
  for (const record of records.toReversed())
    for (const name of [record.id, nameOf(record)]) byName.set(sameName(name), record);
  const named = columns.findIndex(({ column }) => column?.key === 'name');
  const seen = new Map<string, number>();
  return body.map(({ line, cells: written }, index): PastedRow => {
    const cells = columns.map((column, at) =>
      pastedCell(study, column, choices.cells?.[`${line} ${at}`] ?? written[at] ?? '', decimal),
    );
    const name = named < 0 ? '' : (cells[named]?.text ?? '');
    const own = name === '' ? undefined : byName.get(sameName(name));
    const record = named < 0 ? records.find(({ id }) => id === place.rows[index]) : own;
    // A part found by its name keeps it, however it is written here.
    const { name: _name, ...found } = valuesOf(columns, cells);
    const values = own || !_name ? found : { ...found, name: _name };
    const error = rowError(owner, columns, record, values, place) ?? twice(seen, record?.id ?? name, line);
    const left = choices.without?.has(line) === true;
    return {
      line,
      cells,
      id: record?.id,
      name: name || (record ? nameOf(record) : ''),
      values,
      error: left ? null : error,
      fate: left ? 'left out' : error ? 'refused' : fateOf(owner, record, values),
    };
  });
}

function sameName(name: string): string {
  return name.trim().toLowerCase().replace(/\s+/g, ' ');
}

function pastedCell(
  study: Study,
  { column, unit }: PastedColumn,
  text: string,
  decimal: DecimalMark | undefined,
): PastedCell {
  const nothing = { text, value: undefined, read: '' };
  if (!column || missing.has(text.trim().toLowerCase())) return { ...nothing, error: null };
  const outcome = readCell(study, column.field, text, { decimal, unit });
  if (!outcome.ok) return { ...nothing, error: outcome.error };
  const { value } = outcome;
  return { text, value, read: cellText(study, column.field, value, 'shown'), error: null };
}

/** Values of the cells that could be read; the others stand in the row with their errors. */
function valuesOf(columns: readonly PastedColumn[], cells: readonly PastedCell[]): Patch {
  const entries = columns.flatMap(({ column }, index): [string, unknown][] => {
    const value = cells[index]?.value;
    return column && value !== undefined ? [[column.key, value]] : [];
  });
  return Object.fromEntries(entries);
}

function twice(seen: Map<string, number>, key: string, line: number): string | null {
  if (key === '') return null;
  const before = seen.get(sameName(key));
  if (before === undefined) seen.set(sameName(key), line);
  return before === undefined ? null : `Line ${before} names the same already.`;
}

function rowError(
  owner: TableOwner,
  columns: readonly PastedColumn[],
  record: TableRecord | undefined,
  values: Patch,
  place: PastePlace,
): string | null {
  if (record || owner === 'bus') return null;
  const end = seriesKinds.includes(owner) ? 'from' : 'bus';
  if (values[end] !== undefined) return null;
  const label = fieldOf(owner, end)?.label ?? 'busbar';
  const asked = columns.some(({ column }) => column?.key === end);
  if (place.bus !== undefined && !asked) return null;
  return asked
    ? `A new part needs its ${label}, which this row does not give.`
    : `A new part needs a busbar; choose where new parts stand.`;
}

function fateOf(owner: TableOwner, record: TableRecord | undefined, values: Patch): PastedRow['fate'] {
  if (!record) return 'new';
  const changed = tableColumns(owner).some((column) => {
    if (!Object.hasOwn(values, column.key)) return false;
    const standing = columnValue(record, column);
    const isDefault = column.key === 'on' && standing === undefined && values.on === true;
    return !isDefault && !sameData(standing ?? null, values[column.key] ?? null);
  });
  return changed ? 'change' : 'same';
}
