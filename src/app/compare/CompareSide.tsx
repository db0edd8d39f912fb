import { ImpedancePair } from '../../charts/index.ts';
import { busName, differencesBetween, fullNameOf, type Study } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';
import { stateOf } from './stateOf.ts';

interface Props {
  study: Study;
  a: CaseDossier;
  b: CaseDossier;
  names: { a: string; b: string };
}

/** Beside the numbers: the impedance seen in both states, and the data in which they differ. */
export function CompareSide({ study, a, b, names }: Props) {
  const [scanA, scanB] = [a.scans[0]?.with, b.scans[0]?.with];
  const differences = differencesBetween(study, stateOf(study, a.caseId), stateOf(study, b.caseId));
  const seen = scanA && scanB && scanA.error === undefined && scanB.error === undefined;
  return (
    <div className="compare-side">
      <h3>Impedance seen at {busName(study, scanA?.bus ?? '')}</h3>
      {seen ? (
        <ImpedancePair
          a={{ name: names.a, scan: scanA }}
          b={{ name: names.b, scan: scanB }}
          frequencyHz={study.frequencyHz}
          maxOrder={study.maxOrder ?? 50}
          height={210}
        />
      ) : (
        <p className="quiet-line">{scanA?.error ?? scanB?.error ?? 'No busbar is looked at.'}</p>
      )}
      <h3>Data that differ</h3>
      {differences.length === 0 && <p className="quiet-line">None: both are the same state.</p>}
      <table className="compare-data">
        <tbody>
          {differences.map((one) => (
            <tr key={`${one.element.id} ${one.field}`}>
              <th scope="row">
                <span className="capital">{fullNameOf(one.element)}</span>
                <span className="quiet"> {one.label}</span>
              </th>
              <td>{one.baseWords}</td>
              <td>{one.caseWords}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
