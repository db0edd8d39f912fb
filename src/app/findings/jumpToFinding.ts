import { busSubject, partSubject } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';
import type { SiteFinding, Study } from '../../study/index.ts';
import { focusSlipField } from './focusSlipField.ts';

/**
 * Goes to what a finding speaks of: its case, its part on the drawing and the field on its slip; the case in the
 * margin; the field among the study's details.
 */
export function jumpToFinding(
  study: Study,
  finding: SiteFinding,
  onDetails: (field: string | null) => void,
): void {
  const { setPlace, setCase, setMargin, select, setFocusBus, openSlip, view } = workbench.getState();
  const [firstCase] = finding.cases;
  if (firstCase !== undefined && !finding.cases.includes(view.caseId)) setCase(firstCase);
  const { subject } = finding;
  if (subject) {
    const selected = subject.kind === 'bus' ? busSubject(subject.id) : partSubject(subject.id);
    setPlace('site');
    select([selected]);
    if (subject.kind === 'bus') setFocusBus(subject.id);
    openSlip(selected);
    if (finding.field) focusSlipField(finding.field);
    return;
  }
  const [, list, at] = /^\$\.(\w+)(?:\[(\d+)\])?/.exec(finding.path) ?? [];
  if (list === 'cases') {
    const named = study.cases?.[Number(at)];
    if (named) setCase(named.id);
    setPlace('site');
    setMargin('cases');
  } else if (list === 'buses' || list === 'elements') setPlace('site');
  else onDetails(/^\$\.(\w+)\.(\w+)/.exec(finding.path)?.slice(1).join('-') ?? null);
}
