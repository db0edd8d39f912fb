import { type ClipboardEvent, type KeyboardEvent, type MouseEvent, useEffect, useRef, useState } from 'react';
import {
  cellText,
  columnValue,
  type DataOrigin,
  type Finding,
  nameOf,
  type RowOrder,
  readCell,
  type Study,
  type TableColumn,
  type TableRecord,
  tabularText,
} from '../../study/index.ts';
import { CellEditor, firstDraft, type Leaving } from './CellEditor.tsx';
import type { CellValue } from './cellEdits.ts';
import { columnWidth } from './columnWidth.ts';
import { enter, type GridActions, gridKey, tab } from './gridKeys.ts';
import { type Box, boxOf, type GridPlace } from './gridMoves.ts';
import { gridRoles } from './gridRoles.ts';
import { TableHead } from './TableHead.tsx';
import { TableRow } from './TableRow.tsx';
import { useGridRange } from './useGridRange.ts';
import { useWindowedRows } from './useWindowedRows.ts';

/** A cell the table speaks of elsewhere on the page. */
export interface CellSubject {
  record: TableRecord;
  column: TableColumn;
}

export interface TableGridProps {
  label: string;
  /** The study as the table shows it: the base study, or as it stands in a case. */
  study: Study;
  columns: readonly TableColumn[];
  rows: readonly TableRecord[];
  /** The same records in the base study. */
  baseOf(id: string): TableRecord;
  order: RowOrder | null;
  findings: ReadonlyMap<string, readonly Finding[]>;
  /** The cell that gets the keyboard whenever this is another object. */
  start: GridPlace;
  /** The keyboard is elsewhere and stays there at first. */
  waits: boolean;
  /** Sets cells as one edit; returns why it cannot, as a sentence. */
  onSet(cells: readonly CellValue[]): string | null;
  onOrigin(cells: readonly CellSubject[], word: DataOrigin['origin'] | null): void;
  onSort(column: TableColumn): void;
  /** The cell with the keyboard; null while the heads have it. */
  onCell(subject: CellSubject | null): void;
  onPaste(text: string, at: GridPlace): void;
  onOpen(record: TableRecord): void;
  onRemove(records: readonly TableRecord[]): void;
  onAdd(): void;
  onPastEnd(): void;
  onLeave(): void;
  /** Says why something was not done. */
  onSay(words: string | null): void;
}

interface Writing {
  place: GridPlace;
  draft: string;
  typed: boolean;
  error: string | null;
}

const rowHeight = 28;
const headHeight = 58;

/** A table of parts to be read and written like a sheet: one tab stop, arrows from cell to cell. */
export function TableGrid(props: TableGridProps) {
  const { study, columns, rows, findings } = props;
  const grid = useRef<HTMLDivElement>(null);
  const [writing, setWriting] = useState<Writing | null>(null);
  const [runStart, setRunStart] = useState<number | null>(null);
  const seen = useWindowedRows(grid, rows.length, rowHeight);
  const size = { rows: rows.length, columns: columns.length, page: seen.page };
  const { range, go, mark, hold } = useGridRange(grid, size, props.start, props.waits);
  const { focus } = range;
  const box = boxOf(range);
  const dragging = useRef(false);

  const focused = rows[focus.row];
  const focusedColumn = columns[focus.column];
  const { onCell } = props;
  useEffect(() => {
    onCell(focused && focusedColumn ? { record: focused, column: focusedColumn } : null);
  }, [onCell, focused, focusedColumn]);
  useEffect(() => {
    const drop = () => {
      dragging.current = false;
    };
    window.addEventListener('mouseup', drop);
    return () => window.removeEventListener('mouseup', drop);
  }, []);

  const textAt = ({ row, column }: GridPlace): string => {
    const [record, one] = [rows[row], columns[column]];
    if (!record || !one) return '';
    const value = one.key === 'name' ? nameOf(record) : columnValue(record, one);
    return cellText(study, one.field, value, 'plain');
  };
  const cellsIn = ({ top, bottom, left, right }: Box): CellSubject[] =>
    rows
      .slice(top, bottom + 1)
      .flatMap((record) => columns.slice(left, right + 1).map((column) => ({ record, column })));
  const set = (cells: readonly CellValue[]): string | null => {
    const outcome = cells.length === 0 ? null : props.onSet(cells);
    props.onSay(outcome);
    return outcome;
  };
  const write = (place: GridPlace, letter: string | null) => {
    const column = columns[place.column];
    if (!column || !rows[place.row]) return;
    const draft = letter === null ? textAt(place) : firstDraft(study, column, letter);
    props.onSay(null);
    setWriting({ place, draft, typed: letter !== null, error: null });
  };
  /** Takes what was written into a cell; false where its field or the study refuses it. */
  const take = (place: GridPlace, draft: string): boolean => {
    const [record, column] = [rows[place.row], columns[place.column]];
    if (!record || !column) return true;
    if (draft.trim() !== textAt(place)) {
      const read = readCell(study, column.field, draft);
      const outcome = read.ok ? set([{ id: record.id, column, value: read.value }]) : read.error;
      if (outcome !== null) {
        setWriting({ place, draft, typed: false, error: outcome });
        return false;
      }
    }
    setWriting(null);
    return true;
  };
  const actions: GridActions = {
    size,
    range,
    go,
    mark,
    runStart,
    setRunStart,
    write,
    sort: (column) => columns[column] && props.onSort(columns[column]),
    toggle: (place) => {
      const [record, column] = [rows[place.row], columns[place.column]];
      if (!record || column?.field.type !== 'boolean') return false;
      const standing = textAt(place) === '' ? String(column.field.default === true) : textAt(place);
      const on = standing === 'yes' || standing === 'true';
      set([{ id: record.id, column, value: !on }]);
      return true;
    },
    clear: (marked) => {
      const cells = cellsIn(marked);
      const needed = cells.find(({ column }) => column.field.required);
      if (needed) props.onSay(`${needed.column.label} is needed and cannot be emptied.`);
      else set(cells.map(({ record, column }) => ({ id: record.id, column, value: undefined })));
    },
    fillDown: ({ top, bottom, left, right }) => {
      const source = rows[top];
      if (!source) return;
      const below = cellsIn({ top: top + 1, bottom, left, right }).filter(
        ({ column }) => column.key !== 'name',
      );
      set(below.map(({ record, column }) => ({ id: record.id, column, value: columnValue(source, column) })));
    },
    setOrigin: (marked, word) => props.onOrigin(cellsIn(marked), word),
    open: (row) => rows[row] && props.onOpen(rows[row]),
    remove: ({ top, bottom }) => props.onRemove(rows.slice(top, bottom + 1)),
    add: props.onAdd,
    pastEnd: props.onPastEnd,
    leave: () => {
      if (box.top !== box.bottom || box.left !== box.right) go(focus, false);
      else props.onLeave();
    },
  };
  const leaveCell = (place: GridPlace, draft: string, leaving: Leaving): boolean => {
    if (!take(place, draft)) return false;
    if (leaving === 'down' || leaving === 'up') enter(leaving === 'up', actions);
    else if ((leaving === 'right' || leaving === 'left') && !tab(leaving === 'left', actions)) hold();
    return true;
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (writing || !gridKey(event, actions)) return;
    event.preventDefault();
    event.stopPropagation();
  };
  const onCopy = (event: ClipboardEvent) => {
    if (writing || focus.row < 0) return;
    const { top, bottom, left, right } = box;
    const lines = Array.from({ length: bottom - top + 1 }, (_, row) =>
      Array.from({ length: right - left + 1 }, (__, column) =>
        textAt({ row: top + row, column: left + column }),
      ),
    );
    event.clipboardData.setData('text/plain', tabularText(lines));
    event.preventDefault();
  };
  const onPaste = (event: ClipboardEvent) => {
    const text = event.clipboardData.getData('text').replace(/\r?\n$/, '');
    const many = /[\t\n]/.test(text);
    if (text === '' || (writing && !many)) return;
    event.preventDefault();
    if (many) {
      setWriting(null);
      props.onPaste(text, { row: Math.max(0, box.top), column: box.left });
    } else if (focus.row >= 0) take(focus, text.trim());
  };
  const onPress = (event: MouseEvent, row: number, column: number) => {
    if (event.button !== 0 || (writing?.place.row === row && writing.place.column === column)) return;
    event.preventDefault();
    dragging.current = true;
    setRunStart(null);
    go({ row, column }, event.shiftKey);
  };
  const editor = writing && {
    column: writing.place.column,
    node: (
      <CellEditor
        study={study}
        column={columns[writing.place.column] as TableColumn}
        label={`${columns[writing.place.column]?.label} of ${nameOf(rows[writing.place.row] ?? { id: '' })}`}
        draft={writing.draft}
        typed={writing.typed}
        error={writing.error}
        above={writing.place.row > 2 && writing.place.row >= rows.length - 2}
        onDraft={(draft) => setWriting({ ...writing, draft, error: null })}
        onTake={(draft, leaving) => leaveCell(writing.place, draft, leaving)}
        onGiveUp={() => {
          setWriting(null);
          hold();
        }}
      />
    ),
  };
  const widths = columns.map(columnWidth);
  const drawn = rows.map((_, index) => index).filter((index) => index >= seen.first && index <= seen.last);
  // The row with the keyboard stays, however far one scrolls.
  if (focus.row >= 0 && focus.row < rows.length && !drawn.includes(focus.row)) drawn.push(focus.row);
  const template = widths.map((width) => `${width}px`).join(' ');
  return (
    <div
      ref={grid}
      className="table-grid"
      {...gridRoles.grid(props.label, rows.length, columns.length)}
      style={{ '--columns': template, '--head': `${headHeight}px`, '--name': `${widths[0]}px` } as object}
      {...{ onKeyDown, onCopy, onPasteCapture: onPaste }}
    >
      <div className="table-heads" {...gridRoles.group}>
        <TableHead
          columns={columns}
          order={props.order}
          focus={focus.row < 0 || rows.length === 0 ? focus.column : null}
          onSort={actions.sort}
        />
      </div>
      <div className="table-body" style={{ height: rows.length * rowHeight }} {...gridRoles.group}>
        {drawn.map((index) => {
          const record = rows[index] as TableRecord;
          const marked = index >= box.top && index <= box.bottom && focus.row >= 0;
          return (
            <TableRow
              key={record.id}
              index={index}
              top={index * rowHeight}
              record={record}
              base={props.baseOf(record.id)}
              columns={columns}
              study={study}
              marked={marked ? [box.left, box.right] : null}
              focus={focus.row === index ? focus.column : null}
              found={new Set((findings.get(record.id) ?? []).map(({ path }) => keyOf(path)))}
              editor={writing?.place.row === index ? editor : null}
              onPress={onPress}
              onDrag={(row, column) => dragging.current && go({ row, column }, true)}
              onOpen={(row, column) => write({ row, column }, null)}
            />
          );
        })}
      </div>
    </div>
  );
}

/** The field a finding's path speaks of: "$.elements[3].ukPercent". */
function keyOf(path: string): string {
  return /^\$\.\w+\[\d+\]\.(\w+)/.exec(path)?.[1] ?? '';
}
