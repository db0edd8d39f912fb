import { partSubject } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';
import {
  type CaseDifference,
  caseDifferences,
  casesOf,
  counted,
  fullNameOf,
  nameOf,
  resetInCase,
  type Study,
} from '../../study/index.ts';
import { focusSlipField } from '../findings/focusSlipField.ts';

interface Props {
  study: Study;
  caseId: string;
}

function byPart(differences: readonly CaseDifference[]): [CaseDifference['element'], CaseDifference[]][] {
  const groups = new Map<CaseDifference['element'], CaseDifference[]>();
  for (const one of differences) groups.set(one.element, [...(groups.get(one.element) ?? []), one]);
  return [...groups];
}

function jumpTo({ element, field }: CaseDifference): void {
  const { setPlace, select, openSlip } = workbench.getState();
  const subject = partSubject(element.id);
  setPlace('site');
  select([subject]);
  openSlip(subject);
  focusSlipField(field);
}

/** What the case has otherwise than the base study, part by part; each leads to its field and can be taken back by itself. */
export function DifferenceList({ study, caseId }: Props) {
  const differences = caseDifferences(study, caseId);
  const item = casesOf(study).find(({ id }) => id === caseId);
  if (!item) return null;
  return (
    <section aria-label={`What differs in ${nameOf(item)}`}>
      <h3>
        {nameOf(item)}{' '}
        <span className="quiet">
          {differences.length === 0
            ? 'is as the base study'
            : `differs from the base study in ${counted(differences.length, 'value')}`}
        </span>
      </h3>
      {differences.length === 0 && (
        <p className="quiet-line">
          To change a part in this case alone, tick “change in {nameOf(item)} only” on its slip.
        </p>
      )}
      <ul className="difference-list">
        {byPart(differences).map(([element, own]) => (
          <li key={element.id}>
            <b className="capital">{fullNameOf(element)}</b>
            {own.map((one) => (
              <div key={one.field} className="difference">
                <button type="button" className="difference-jump" onClick={() => jumpTo(one)}>
                  <span className="quiet">{one.label === one.baseWords ? '' : one.label}</span>
                  <span>
                    {one.baseWords} <span aria-hidden="true">→</span>
                    <span className="visually-hidden"> becomes </span> <b>{one.caseWords}</b>
                  </span>
                </button>
                <button
                  type="button"
                  className="small-button take-back"
                  title="Put back to the base study"
                  aria-label={`Take back: ${one.label} of ${fullNameOf(element)}`}
                  onClick={() => workbench.getState().edit(resetInCase(study, caseId, element.id, one.field))}
                >
                  take back
                </button>
              </div>
            ))}
          </li>
        ))}
      </ul>
    </section>
  );
}
