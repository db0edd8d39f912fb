import { figure, type Verdict } from '../../checks/index.ts';
import { freshAnswer, useWorkbench } from '../../store/index.ts';
import { elementsOfKind, nameOf, type Study, studyInCase, withDefaults } from '../../study/index.ts';

/** The least favourable verdict of one check on one part. */
function verdictOn(verdicts: readonly Verdict[], element: string, check: string): Verdict | undefined {
  return verdicts.find(
    (one) => one.subject.kind === 'element' && one.subject.id === element && one.check === check,
  );
}

function Against({ verdict }: { verdict: Verdict | undefined }) {
  if (!verdict || verdict.value === null || verdict.limit === null) return <td>–</td>;
  return (
    <td data-verdict={verdict.verdict}>
      {figure(verdict.value)} <span className="unit">of {figure(verdict.limit)}</span> {verdict.verdict}
    </td>
  );
}

/** Banks and filters of the case on screen: kvar, detuning, and duty against its limits. */
export function BankTable({ study }: { study: Study }) {
  const caseId = useWorkbench((state) => state.view.caseId);
  const answer = useWorkbench(freshAnswer);
  const here = studyInCase(study, caseId);
  const banks = elementsOfKind(here, 'bank');
  const filters = elementsOfKind(here, 'filter');
  const verdicts = answer?.verdicts ?? [];
  if (banks.length + filters.length === 0) return <p className="hint">None on the drawing yet.</p>;
  return (
    <table className="plain-table">
      <thead>
        <tr>
          <th scope="col">part</th>
          <th scope="col">in service, kvar</th>
          <th scope="col">tuning</th>
          <th scope="col">current, of rated</th>
          <th scope="col">voltage, of rated</th>
        </tr>
      </thead>
      <tbody>
        {banks.map((bank) => {
          const p = withDefaults(bank, here).detuningPercent;
          const on = bank.steps.filter((step) => step.on !== false);
          return (
            <tr key={bank.id}>
              <th scope="row">{nameOf(bank)}</th>
              <td>
                {on.reduce((sum, step) => sum + step.kvar, 0)}{' '}
                <span className="unit">at {bank.ratedV} V</span>
              </td>
              <td>{p > 0 ? `p ${figure(p)} %, n ${figure(Math.sqrt(100 / p))}` : 'plain'}</td>
              <Against verdict={verdictOn(verdicts, bank.id, 'bank-current')} />
              <Against verdict={verdictOn(verdicts, bank.id, 'bank-voltage')} />
            </tr>
          );
        })}
        {filters.map((filter) => (
          <tr key={filter.id}>
            <th scope="row">{nameOf(filter)}</th>
            <td>
              {filter.kvar} <span className="unit">net</span>
            </td>
            <td>
              {filter.type}, n {figure(filter.tunedOrder)}
            </td>
            <Against verdict={verdictOn(verdicts, filter.id, 'bank-current')} />
            <Against verdict={verdictOn(verdicts, filter.id, 'bank-voltage')} />
          </tr>
        ))}
      </tbody>
    </table>
  );
}
