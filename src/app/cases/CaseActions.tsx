import { workbench } from '../../store/index.ts';
import {
  caseDifferences,
  casesOf,
  duplicateCase,
  nameOf,
  removeCase,
  resetCase,
  type Study,
} from '../../study/index.ts';
import { comparisonFrom } from '../compare/comparisonFrom.ts';
import { setCaseForm } from './caseForms.ts';

interface Props {
  study: Study;
  caseId: string;
}

/** What can be done with the case on screen. */
export function CaseActions({ study, caseId }: Props) {
  const item = casesOf(study).find(({ id }) => id === caseId);
  if (!item) return null;
  const { edit, setCase, compareCases } = workbench.getState();
  const duplicate = () => {
    const copy = duplicateCase(study, caseId);
    edit(copy);
    setCase(copy.caseId);
  };
  return (
    <>
      {item.description && <p className="case-description">{item.description}</p>}
      <div className="case-actions">
        <button type="button" className="small-button" onClick={() => setCaseForm('new')}>
          New case…
        </button>
        <button type="button" className="small-button" onClick={duplicate}>
          Duplicate
        </button>
        <button type="button" className="small-button" onClick={() => setCaseForm('details')}>
          Name, role…
        </button>
        <button
          type="button"
          className="small-button"
          onClick={() => compareCases(comparisonFrom(study, caseId))}
        >
          Compare…
        </button>
        <button
          type="button"
          className="small-button"
          disabled={casesOf(study).length < 2}
          onClick={() => edit(removeCase(study, caseId))}
        >
          Remove <span className="visually-hidden">{nameOf(item)}</span>
        </button>
        {caseDifferences(study, caseId).length > 1 && (
          <button type="button" className="small-button" onClick={() => edit(resetCase(study, caseId))}>
            Take all back
          </button>
        )}
      </div>
    </>
  );
}
