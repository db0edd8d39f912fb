import { useMemo } from 'react';
import { Formula } from '../../drawing/index.ts';
import { quickSite } from '../../sizing/index.ts';
import { answerIssues, formatQuantity, type SiteAnswers } from '../../study/index.ts';

/** What the answers come to, followed key by key: the result in one line, the working under it. */
export function QuickPreview({ answers }: { answers: SiteAnswers }) {
  const site = useMemo(() => (isReadable(answers) ? quickSite(answers) : null), [answers]);
  if (!site) return <div className="quick-preview" />;
  const { figures, kvar, working, drawn } = site;
  const { bank } = drawn;
  const power = `${formatQuantity(figures.kW, 'kW')} at cos φ ${formatQuantity(figures.cosPhi, '', { digits: 3 })}`;
  const wanted =
    kvar > 0
      ? `${formatQuantity(kvar, 'kvar', { digits: 3 })} wanted for cos φ ${formatQuantity(figures.targetPF, '')}`
      : `better than cos φ ${formatQuantity(figures.targetPF, '')}: no correction wanted`;
  const steps = bank
    ? `bank of ${bank.steps} × ${formatQuantity(bank.stepKvar, 'kvar')} at ${formatQuantity(bank.ratedV, 'V')}, ${
        bank.detuningPercent > 0 ? `detuned ${bank.detuningPercent} %` : 'plain'
      }`
    : null;
  return (
    <div className="quick-preview">
      <output>{[power, wanted, steps].filter(Boolean).join(' · ')}</output>
      <dl>
        {working.map(({ equation, numbers }) => (
          <div key={equation}>
            <dt>
              <Formula text={equation} />
            </dt>
            <dd>{numbers}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

/** A bill misread, or a site far beyond its transformer, is said at its field and not computed from. */
function isReadable(answers: SiteAnswers): boolean {
  return answerIssues(answers).every(({ severity }) => severity !== 'error');
}
