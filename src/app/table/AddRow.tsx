import type { RefObject } from 'react';
import { kindWords, nameOf, type Study, seriesKinds, type TableOwner } from '../../study/index.ts';

export interface AddRowProps {
  study: Study;
  owner: TableOwner;
  /** Busbar a new part stands at; '' while there is none. */
  place: string;
  button: RefObject<HTMLButtonElement | null>;
  onPlace(bus: string): void;
  onAdd(): void;
  /** Back into the table. */
  onUp(): void;
  onCopy(): void;
  onPaste(): void;
}

/** "new motor on Main board": the line below the last row, and the way to and from a spreadsheet. */
export function AddRow(props: AddRowProps) {
  const { study, owner, place, button, onPlace, onAdd, onUp, onCopy, onPaste } = props;
  const isBus = owner === 'bus';
  const homeless = !isBus && study.buses.length === 0;
  const joint = isBus ? '' : seriesKinds.includes(owner) ? 'below' : 'on';
  return (
    <div className="table-add">
      <button
        ref={button}
        type="button"
        className="slip-small"
        disabled={homeless}
        onClick={onAdd}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowUp' && event.key !== 'Escape') return;
          event.preventDefault();
          onUp();
        }}
      >
        + new {isBus ? 'busbar' : kindWords[owner]}
      </button>
      {joint !== '' && !homeless && (
        <label>
          {joint}{' '}
          <select value={place} onChange={(event) => onPlace(event.target.value)}>
            {study.buses.map((bus) => (
              <option key={bus.id} value={bus.id}>
                {nameOf(bus)}
              </option>
            ))}
          </select>
        </label>
      )}
      {homeless && <span className="unit">there is no busbar yet; the table of busbars adds one</span>}
      <span className="table-sheet">
        <button type="button" className="slip-small" onClick={onCopy}>
          Copy table
        </button>
        <button type="button" className="slip-small" onClick={onPaste}>
          Paste from a sheet…
        </button>
      </span>
    </div>
  );
}
