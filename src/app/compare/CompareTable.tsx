import { VERDICT_WORDS, VerdictMark } from '../../charts/index.ts';
import type { ComparedRow, ComparedValue } from '../../checks/index.ts';
import { comparedText } from '../../checks/index.ts';
import { busSubject, partSubject } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';

interface Props {
  rows: readonly ComparedRow[];
  names: { a: string; b: string };
  /** Rows that read the same and are not listed. */
  hidden: number;
  /** Checks that pass in both. */
  passing: number;
}

const groups: readonly [ComparedRow['group'], string][] = [
  ['verdict', 'Verdicts that do not pass in both'],
  ['pcc', 'At the point of common coupling'],
  ['busbar', 'Busbars'],
  ['correction', 'Banks and filters'],
  ['series', 'Transformers and cables'],
  ['resonance', 'Resonances at the busbar on the rail'],
];

function jumpTo({ subject }: ComparedRow): void {
  const { compareCases, select, setFocusBus } = workbench.getState();
  compareCases(null);
  select([subject.kind === 'bus' ? busSubject(subject.id) : partSubject(subject.id)]);
  if (subject.kind === 'bus') setFocusBus(subject.id);
}

/** The numbers of both states beside each other, the largest change of each group first. */
export function CompareTable({ rows, names, hidden, passing }: Props) {
  const copy = (event: React.ClipboardEvent) => {
    if (window.getSelection()?.toString()) return;
    event.preventDefault();
    event.clipboardData.setData('text/plain', comparedText(rows, names.a, names.b));
  };
  return (
    <div className="compare-table" onCopy={copy}>
      <table>
        <thead>
          <tr>
            <th scope="col">quantity</th>
            <th scope="col">A · {names.a}</th>
            <th scope="col">B · {names.b}</th>
            <th scope="col">B − A</th>
          </tr>
        </thead>
        {groups.map(([group, title]) => {
          const own = rows
            .filter((row) => row.group === group)
            .toSorted((one, other) => other.change - one.change);
          if (own.length === 0) return null;
          return (
            <tbody key={group}>
              <tr>
                <th colSpan={4} scope="rowgroup">
                  {title}
                </th>
              </tr>
              {own.map((row) => (
                <Row key={row.key} row={row} />
              ))}
            </tbody>
          );
        })}
      </table>
      <p className="quiet-line">
        {hidden > 0 && `${hidden} rows read the same in both. `}
        {passing > 0 && `${passing} checks pass in both.`}
      </p>
    </div>
  );
}

function Row({ row }: { row: ComparedRow }) {
  const differs = row.change > 0;
  return (
    <tr data-differs={differs ? '' : undefined}>
      <th scope="row">
        <button type="button" className="link" title="To the part on the drawing" onClick={() => jumpTo(row)}>
          {row.title}
        </button>
      </th>
      <Side value={row.a} unit={row.unit} />
      <Side value={row.b} unit={row.unit} />
      <td className="number">
        {differs && (
          <>
            <span className="differs-mark">
              Δ<span className="visually-hidden"> differs </span>
            </span>{' '}
            {row.group === 'verdict' && row.difference && <span className="quiet">margin </span>}
            {row.difference}
          </>
        )}
      </td>
    </tr>
  );
}

function Side({ value, unit }: { value: ComparedValue; unit: string }) {
  return (
    <td className="number">
      {value.word && (
        <span className={`word-${value.word}`}>
          <VerdictMark verdict={value.word} size={13} hidden /> {VERDICT_WORDS[value.word]}{' '}
        </span>
      )}
      {value.text}
      {value.text !== '–' && unit && <span className="unit">{`\u2009${unit}`}</span>}
      {value.margin && <span className="quiet"> · margin {value.margin}</span>}
    </td>
  );
}
