import { type RefObject, useEffect, useRef } from 'react';
import {
  counted,
  elementKinds,
  nameOf,
  type OriginFilter,
  type RowFilter,
  type Study,
  type StudyCase,
  type TableOwner,
  tableRecords,
} from '../../study/index.ts';
import { ownerWords } from './cellEdits.ts';

export interface TableToolsProps {
  study: Study;
  owner: TableOwner;
  shown: number;
  filter: RowFilter;
  more: boolean;
  variant: StudyCase | undefined;
  caseOnly: boolean;
  finder: RefObject<HTMLInputElement | null>;
  /** Just chosen from the list of tables, which has the keyboard. */
  byChooser: boolean;
  onOwner(owner: TableOwner): void;
  onFilter(filter: RowFilter): void;
  onMore(more: boolean): void;
  onCaseOnly(caseOnly: boolean): void;
  /** Into the table, or out of it back to the drawing. */
  onDown(): void;
  onLeave(): void;
}

const owners: readonly TableOwner[] = ['bus', ...elementKinds];

const origins: readonly (readonly [OriginFilter, string])[] = [
  ['any', 'any origin'],
  ['open', 'typical or assumed'],
  ['typical', 'typical'],
  ['assumed', 'assumed'],
  ['measured', 'measured'],
  ['nameplate', 'nameplate'],
  ['not stated', 'not stated'],
];

/** Which table lies on the paper, which of its rows and columns, and where edits go. */
export function TableTools(props: TableToolsProps) {
  const { study, owner, shown, filter, variant, caseOnly } = props;
  const chooser = useRef<HTMLSelectElement>(null);
  useEffect(() => {
    if (props.byChooser) chooser.current?.focus();
  }, [props.byChooser]);
  const all = tableRecords(study, owner).length;
  return (
    <div
      className="table-tools"
      role="toolbar"
      aria-label="Table"
      onKeyDown={(event) => {
        if (event.key === 'Escape') props.onLeave();
        else if (event.key === 'ArrowDown' && event.target instanceof HTMLInputElement) props.onDown();
        else return;
        event.preventDefault();
        event.stopPropagation();
      }}
    >
      <select
        ref={chooser}
        aria-label="Table of"
        className="table-kind"
        value={owner}
        onChange={(event) => {
          const chosen = owners.find((one) => one === event.target.value);
          if (chosen) props.onOwner(chosen);
        }}
      >
        {owners.map((one) => (
          <option key={one} value={one}>
            {ownerWords(one)} ({tableRecords(study, one).length})
          </option>
        ))}
      </select>
      <input
        ref={props.finder}
        type="search"
        aria-label="Find in the table"
        placeholder="find…"
        value={filter.text}
        onChange={(event) => props.onFilter({ ...filter, text: event.target.value })}
      />
      <select
        aria-label="Rows with values of"
        value={filter.origin}
        onChange={(event) => {
          const origin = origins.find(([one]) => one === event.target.value)?.[0];
          if (origin) props.onFilter({ ...filter, origin });
        }}
      >
        {origins.map(([one, words]) => (
          <option key={one} value={one}>
            {words}
          </option>
        ))}
      </select>
      <label className="slip-check">
        <input
          type="checkbox"
          checked={props.more}
          onChange={(event) => props.onMore(event.target.checked)}
        />
        more data
      </label>
      {variant && (
        <label className="slip-check">
          <input
            type="checkbox"
            checked={caseOnly}
            onChange={(event) => props.onCaseOnly(event.target.checked)}
          />
          change in {nameOf(variant)} only
        </label>
      )}
      <span className="table-said" role="status">
        {shown < all && `${shown} of ${counted(all, 'row')} · `}
        {caseOnly && variant ? `edits go to ${nameOf(variant)}` : variant ? 'edits go to the base study' : ''}
      </span>
    </div>
  );
}
