import { VerdictMark, verdictHeadline } from '../../charts/index.ts';
import { statesOf, type WorstVerdict } from '../../sizing/index.ts';
import { freshWorst, useWorkbench, workbench } from '../../store/index.ts';
import { busName, casesOf, elementName, type Study } from '../../study/index.ts';
import { promote } from './promote.ts';

/** What fails or is worth watching at its worst, under the state and the tolerance point that govern it. */
export function WorstList({ study }: { study: Study }) {
  const result = useWorkbench(freshWorst);
  if (!result) return null;
  const shown = result.verdicts.filter(
    ({ verdict, screening }) => !screening && (verdict === 'fail' || verdict === 'watch'),
  );
  const [unsolved] = result.unsolved;
  return (
    <section aria-label="The worst of all">
      <h3>
        The worst of all{' '}
        <span className="quiet">
          {shown.length === 0 ? 'nothing fails' : `${shown.length} fail or are near it`}
        </span>
      </h3>
      {shown.length === 0 && (
        <p className="quiet-line">
          In no state and at no tolerance point searched does a check fail or come near its limit.
        </p>
      )}
      {unsolved && (
        <p className="states-too-many">
          Without a solution: {unsolved.stateName}, {unsolved.point} ({unsolved.error}).
        </p>
      )}
      <ul className="worst-list">
        {byPlace(shown).map((own) => (
          <PlaceRow key={own[0]?.key} study={study} verdicts={own} />
        ))}
      </ul>
    </section>
  );
}

/** Verdicts that one state and point govern together; the place of the worst first. */
function byPlace(verdicts: readonly WorstVerdict[]): WorstVerdict[][] {
  const places = new Map<string, WorstVerdict[]>();
  for (const verdict of verdicts) {
    const key = `${verdict.governing.stateId}\n${verdict.governing.point}`;
    places.set(key, [...(places.get(key) ?? []), verdict]);
  }
  return [...places.values()];
}

function PlaceRow({ study, verdicts }: { study: Study; verdicts: WorstVerdict[] }) {
  const governing = verdicts[0]?.governing;
  if (!governing) return null;
  const isCase = casesOf(study).some(({ id }) => id === governing.stateId);
  return (
    <li className="worst-place">
      <p>
        <b>{governing.stateName}</b>
        <br />
        {governing.point}
      </p>
      <ul>
        {verdicts.map((verdict) => (
          <li key={verdict.key}>
            <button type="button" className="finding-jump" onClick={() => jumpTo(verdict)}>
              <VerdictMark verdict={verdict.verdict} />
              <span>{verdictHeadline(verdict, subjectName(study, verdict))}</span>
            </button>
          </li>
        ))}
      </ul>
      {!isCase && (
        <button type="button" className="small-button" onClick={() => makeCase(study, governing.stateId)}>
          make this state a case
        </button>
      )}
    </li>
  );
}

const subjectName = (study: Study, { subject }: WorstVerdict): string =>
  subject.kind === 'bus' ? busName(study, subject.id) : elementName(study, subject.id);

/** To the part and the order, in the case the state is made from. */
function jumpTo({ governing, subject, order }: WorstVerdict): void {
  const { setPlace, setCase, select, setFocusBus, setOrder } = workbench.getState();
  setPlace('site');
  setCase(governing.caseId);
  select([`${subject.kind}:${subject.id}`]);
  if (subject.kind === 'bus') setFocusBus(subject.id);
  if (order !== undefined) setOrder(order);
}

function makeCase(study: Study, stateId: string): void {
  const { worstQuestion, edit, setCase } = workbench.getState();
  const state = statesOf(study, worstQuestion.families).states?.find(({ id }) => id === stateId);
  if (!state) return;
  const added = promote(study, state);
  edit(added);
  setCase(added.caseId);
}
