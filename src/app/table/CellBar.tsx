import { FindingLine, Formula, OriginField } from '../../drawing/index.ts';
import {
  type DataOrigin,
  type Finding,
  hintOf,
  nameOf,
  originOf,
  type Study,
  type TableColumn,
  type TableRecord,
  takesOrigin,
} from '../../study/index.ts';

export interface CellBarProps {
  study: Study;
  /** As it stands in the base study. */
  record: TableRecord | null;
  column: TableColumn | null;
  findings: readonly Finding[];
  /** Why the last thing was not done. */
  said: string | null;
  onOrigin(origin: DataOrigin | null): void;
  /** Back to the cell. */
  onDone(): void;
}

/** What the cell with the keyboard is: its part and field, what it takes, and where its value comes from. */
export function CellBar(props: CellBarProps) {
  const { study, record, column, findings, said } = props;
  if (!record || !column)
    return (
      <div className="cell-bar">
        <p className="cell-bar-words">{said}</p>
      </div>
    );
  const hint = hintOf(column.field);
  const marked = takesOrigin(column.field) && column.group === null;
  return (
    <fieldset
      className="cell-bar slip-form"
      aria-label="The cell"
      onKeyDown={(event) => {
        if (event.key !== 'Escape' && event.key !== 'Enter') return;
        if (event.target instanceof HTMLSelectElement || event.key === 'Escape') props.onDone();
        event.stopPropagation();
      }}
    >
      <div className="cell-bar-words">
        <p>
          <b>{nameOf(record)}</b> · <Formula text={column.label} />
          {hint !== '' && <span className="unit"> · {hint}</span>}
        </p>
        {said === null ? (
          <p className="unit">
            <Formula text={column.field.help} />
          </p>
        ) : (
          <p className="slip-error" role="alert">
            {said}
          </p>
        )}
        {findings.map((finding) => (
          <FindingLine key={finding.code + finding.path} finding={finding} />
        ))}
      </div>
      {marked && (
        <div className="cell-bar-origin">
          <span className="unit">origin</span>
          <OriginField
            key={`${record.id} ${column.key}`}
            id="cell-origin"
            label={`${column.label} of ${nameOf(record)}`}
            origin={originOf(study, record, column.key)}
            onChange={props.onOrigin}
            onFocus={() => undefined}
          />
        </div>
      )}
    </fieldset>
  );
}
