import { useMemo } from 'react';
import { type DimensionKind, defaultTolerances } from '../../sizing/index.ts';
import { workbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import type { WorstQuestion } from '../../worker/index.ts';
import { toleranceRows } from './toleranceRows.ts';

interface Props {
  study: Study;
  question: WorstQuestion;
}

/** Which tolerances are searched in every state. */
export function ToleranceChoice({ study, question }: Props) {
  const { tolerances } = question;
  const { askWorst } = workbench.getState();
  const rows = useMemo(() => toleranceRows(study, tolerances ?? defaultTolerances), [study, tolerances]);
  const put = (kind: DimensionKind, on: boolean): void => {
    if (tolerances)
      askWorst({ ...question, tolerances: { ...tolerances, on: { ...tolerances.on, [kind]: on } } });
  };
  return (
    <fieldset className="states-choice">
      <legend>
        <label>
          <input
            type="checkbox"
            checked={tolerances !== null}
            onChange={(event) =>
              askWorst({ ...question, tolerances: event.target.checked ? defaultTolerances : null })
            }
          />
          <span>Tolerances, searched in every state</span>
        </label>
      </legend>
      {rows.map(({ kind, words, range }) => (
        <label key={kind}>
          <input
            type="checkbox"
            checked={range !== null && (tolerances?.on[kind] ?? false)}
            disabled={range === null || tolerances === null}
            onChange={(event) => put(kind, event.target.checked)}
          />
          <span>
            {words} <span className="quiet">{range ?? '· none on this site'}</span>
          </span>
        </label>
      ))}
    </fieldset>
  );
}
