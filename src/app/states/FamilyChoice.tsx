import { useId } from 'react';
import type { StateFamilies } from '../../sizing/index.ts';
import { workbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import type { WorstQuestion } from '../../worker/index.ts';
import { familyRows } from './familyRows.ts';

interface Props {
  study: Study;
  question: WorstQuestion;
}

const DEFAULT_LIGHT_LOAD = 20;

/** Which operating states are made from the cases. */
export function FamilyChoice({ study, question }: Props) {
  const { families } = question;
  const put = (part: Partial<StateFamilies>): void =>
    workbench.getState().askWorst({ ...question, families: { ...families, ...part } });
  return (
    <fieldset className="states-choice">
      <legend>States, from every case</legend>
      {familyRows(study).map(({ key, words, missing }) => (
        <label key={key} title={missing ?? undefined}>
          <input
            type="checkbox"
            checked={families[key] && missing === null}
            disabled={missing !== null}
            onChange={(event) => put({ [key]: event.target.checked })}
          />
          <span>
            {words}
            {missing !== null && <span className="quiet"> · {missing}</span>}
          </span>
        </label>
      ))}
      <LightLoad
        percent={families.lightLoadPercent}
        onPercent={(lightLoadPercent) => put({ lightLoadPercent })}
      />
    </fieldset>
  );
}

function LightLoad({
  percent,
  onPercent,
}: {
  percent: number | null;
  onPercent(percent: number | null): void;
}) {
  const id = useId();
  return (
    <div className="states-light">
      <label>
        <input
          type="checkbox"
          checked={percent !== null}
          onChange={(event) => onPercent(event.target.checked ? DEFAULT_LIGHT_LOAD : null)}
        />
        <span>light load</span>
      </label>
      {percent !== null && (
        <select
          id={id}
          aria-label="Light load, per cent"
          value={percent}
          onChange={(event) => onPercent(Number(event.target.value))}
        >
          {[5, 10, 20, 30, 50].map((value) => (
            <option key={value} value={value}>
              {value} % of every load
            </option>
          ))}
        </select>
      )}
    </div>
  );
}
