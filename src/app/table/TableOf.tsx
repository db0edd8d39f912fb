import { useCallback, useMemo, useRef, useState } from 'react';
import { busSubject, partSubject, readSubject, refusalOf, withOriginWord } from '../../drawing/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import {
  addBus,
  addPart,
  type DataOrigin,
  type Finding,
  type Study,
  type StudyCase,
  setOrigin,
  siteFindings,
  studyInCase,
  type TableOwner,
  type TableRecord,
  tableColumns,
  tableRecords,
} from '../../study/index.ts';
import { setPanels } from '../panels/panelStore.ts';
import { removeChosen } from '../site/removal.ts';
import { AddRow } from './AddRow.tsx';
import { CellBar } from './CellBar.tsx';
import { type CellValue, cellsEdit, originsEdit, ownerWords, recordWords } from './cellEdits.ts';
import type { GridPlace } from './gridMoves.ts';
import { PastePanel } from './PastePanel.tsx';
import { type CellSubject, TableGrid } from './TableGrid.tsx';
import { TableTools } from './TableTools.tsx';
import { tableText } from './tableText.ts';
import { useRows } from './useRows.ts';

export interface TableOfProps {
  study: Study;
  owner: TableOwner;
  /** The open case where it is not the plain base. */
  variant: StudyCase | undefined;
  caseOnly: boolean;
  more: boolean;
  /** Chosen from the list of tables, which keeps the keyboard. */
  byChooser: boolean;
  onOwner(owner: TableOwner): void;
  onCaseOnly(caseOnly: boolean): void;
  onMore(more: boolean): void;
}

/** A table and what stands round it: tools above, a new row below, the cell's own line at the foot. */
export function TableOf(props: TableOfProps) {
  const { study, owner, variant } = props;
  const caseId = props.caseOnly && owner !== 'bus' ? variant?.id : undefined;
  const shown = caseId === undefined ? study : studyInCase(study, caseId);
  const columns = useMemo(
    () => tableColumns(owner).filter((column) => props.more || column.essential || column.key === 'on'),
    [owner, props.more],
  );
  const records = tableRecords(shown, owner);
  const { rows, filter, order, onFilter, onSort } = useRows(shown, records, columns);
  const findings = useFindings(study);
  const selected = useWorkbench((state) => readSubject(state.view.selection.at(-1) ?? '')?.id);
  const focusBus = useWorkbench((state) => state.view.focusBus);
  const [cell, setCell] = useState<CellSubject | null>(null);
  const [said, setSaid] = useState<string | null>(null);
  const [place, setPlace] = useState(focusBus || (study.buses[0]?.id ?? ''));
  const [start, setStart] = useState<GridPlace>(() => ({
    row: Math.max(
      0,
      records.findIndex(({ id }) => id === selected),
    ),
    column: 0,
  }));
  const [paste, setPaste] = useState<{ text: string; at: GridPlace } | null>(null);
  const [waits, setWaits] = useState(props.byChooser);
  const finder = useRef<HTMLInputElement>(null);
  const adder = useRef<HTMLButtonElement>(null);
  const hadCell = cell && rows.find(({ id }) => id === cell.record.id);
  const baseOf = (id: string): TableRecord =>
    tableRecords(study, owner).find((record) => record.id === id) ?? { id, nominalV: 0 };
  const { edit, select } = workbench.getState();

  const onSet = (cells: readonly CellValue[]): string | null => {
    const next = cellsEdit(study, owner, cells, caseId);
    const first = cells[0] && baseOf(cells[0].id);
    const refusal = refusalOf(study, next, first && cells.length === 1 ? recordWords(study, first) : '');
    if (refusal === null && next.apply(study) !== study) edit(next);
    return refusal;
  };
  const onCell = useCallback(
    (subject: CellSubject | null) => {
      setCell(subject);
      if (!subject) return;
      const { id } = subject.record;
      const item = owner === 'bus' ? busSubject(id) : partSubject(id);
      const now = workbench.getState().view.selection;
      if (now.length !== 1 || now[0] !== item) workbench.getState().select([item]);
    },
    [owner],
  );
  const toCell = (at: GridPlace) => {
    setWaits(false);
    setStart({ ...at });
  };
  const onAdd = () => {
    const next = owner === 'bus' ? addBus(study) : addPart(study, { kind: owner, bus: place });
    edit(next);
    setSaid(null);
    toCell({ row: rows.length, column: 0 });
  };
  const toDrawing = () => {
    setPanels({ paper: 'drawing' });
  };
  const onOpen = (record: TableRecord) => {
    const item = owner === 'bus' ? busSubject(record.id) : partSubject(record.id);
    select([item]);
    workbench.getState().openSlip(item);
    toDrawing();
  };
  const onRemove = (gone: readonly TableRecord[]) =>
    removeChosen(
      owner === 'bus'
        ? { parts: [], buses: gone.map(({ id }) => id) }
        : { parts: gone.map(({ id }) => id), buses: [] },
    );
  const onOrigin = (cells: readonly CellSubject[], word: DataOrigin['origin'] | null) => {
    const marked = cells.map(({ record, column }) => ({ id: record.id, column }));
    const next = originsEdit(study, owner, marked, (before) => withOriginWord(before, word ?? ''));
    if (next) edit(next);
    else setSaid('These cells have no origin: it is noted for values, not for names, places and choices.');
  };
  const copyAll = () => void navigator.clipboard.writeText(tableText(shown, columns, rows));

  if (paste)
    return (
      <PastePanel
        study={study}
        owner={owner}
        text={paste.text}
        place={{
          columns: columns.slice(paste.at.column).map(({ key }) => key),
          rows: rows.slice(paste.at.row).map(({ id }) => id),
          bus: place || undefined,
        }}
        caseId={caseId}
        caseName={caseId === undefined ? undefined : (variant?.name ?? caseId)}
        onEdit={edit}
        onClose={() => {
          setPaste(null);
          toCell(paste.at);
        }}
      />
    );
  return (
    <div className="table-place">
      <TableTools
        study={study}
        owner={owner}
        shown={rows.length}
        filter={filter}
        more={props.more}
        variant={owner === 'bus' ? undefined : variant}
        caseOnly={props.caseOnly}
        finder={finder}
        byChooser={waits}
        onOwner={props.onOwner}
        onFilter={onFilter}
        onMore={props.onMore}
        onCaseOnly={props.onCaseOnly}
        onDown={() => toCell({ row: 0, column: 0 })}
        onLeave={toDrawing}
      />
      <TableGrid
        label={`Table of ${ownerWords(owner)}`}
        study={shown}
        columns={columns}
        rows={rows}
        baseOf={baseOf}
        order={order}
        findings={findings}
        start={start}
        waits={waits}
        onSet={onSet}
        onOrigin={onOrigin}
        onSort={onSort}
        onCell={onCell}
        onPaste={(text, at) => setPaste({ text, at })}
        onOpen={onOpen}
        onRemove={onRemove}
        onAdd={onAdd}
        onPastEnd={() => adder.current?.focus()}
        onLeave={() => finder.current?.focus()}
        onSay={setSaid}
      />
      <AddRow
        study={study}
        owner={owner}
        place={place}
        button={adder}
        onPlace={setPlace}
        onAdd={onAdd}
        onUp={() => toCell({ row: rows.length - 1, column: 0 })}
        onCopy={copyAll}
        onPaste={() => setPaste({ text: '', at: { row: 0, column: 0 } })}
      />
      <CellBar
        study={study}
        record={hadCell ? baseOf(hadCell.id) : null}
        column={cell?.column ?? null}
        findings={cell ? findingsOf(findings, cell) : []}
        said={said}
        onOrigin={(origin) => cell && edit(setOrigin(study, baseOf(cell.record.id), cell.column.key, origin))}
        onDone={() =>
          cell && toCell({ row: rows.indexOf(hadCell ?? cell.record), column: columns.indexOf(cell.column) })
        }
      />
    </div>
  );
}

/** What is to be said about each record of the base study, by its id. */
function useFindings(study: Study): ReadonlyMap<string, readonly Finding[]> {
  return useMemo(() => {
    const byId = new Map<string, Finding[]>();
    for (const finding of siteFindings(study)) {
      const match = /^\$\.(elements|buses)\[(\d+)\]/.exec(finding.path);
      const record = match && study[match[1] as 'elements' | 'buses'][Number(match[2])];
      if (record) byId.set(record.id, [...(byId.get(record.id) ?? []), finding]);
    }
    return byId;
  }, [study]);
}

function findingsOf(
  findings: ReadonlyMap<string, readonly Finding[]>,
  { record, column }: CellSubject,
): Finding[] {
  const key = column.group ?? column.key;
  return (findings.get(record.id) ?? []).filter(({ path }) => {
    const field = /^\$\.\w+\[\d+\]\.?(\w*)/.exec(path)?.[1] ?? '';
    return field === key || (field === '' && column.key === 'name');
  });
}
