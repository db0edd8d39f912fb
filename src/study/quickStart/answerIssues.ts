import { formatQuantity } from '../units/formatQuantity.ts';
import type { AnswerKey } from './answerFields.ts';
import { figuresOf, type SiteAnswers } from './SiteAnswers.ts';

/** What does not fit together among the answers, at the field that most likely mends it. */
export interface AnswerIssue {
  key: AnswerKey;
  /** An error keeps the site from being drawn; a warning does not. */
  severity: 'error' | 'warning';
  message: string;
}

/** A site beyond this share of its transformer has more than one, or a figure is wrong. */
const mostLoading = 1.5;
/** tan φ beyond which a bill is rather misread: cos φ below 0.32. */
const mostTanPhi = 3;

/** Checks the answers against each other; each alone is inside its field's range. */
export function answerIssues(answers: SiteAnswers): AnswerIssue[] {
  const { kW, kvar, ratedKVA, tanPhi, hours } = figuresOf(answers);
  const issues: AnswerIssue[] = [];
  const kVA = Math.hypot(kW, kvar);
  const loading = kVA / ratedKVA;
  if (tanPhi > mostTanPhi) {
    const message = `${formatQuantity(tanPhi, '')} times the active energy; look whether kWh and kvarh are exchanged`;
    issues.push({ key: 'reactiveKvarh', severity: 'error', message });
  }
  if (loading > 1) {
    const severity = loading > mostLoading ? 'error' : 'warning';
    const percent = formatQuantity(100 * loading, '%', { digits: 3 });
    const message = `${formatQuantity(kVA, 'kVA')} load this transformer with ${percent}; check the rating, the bill and the hours`;
    issues.push({ key: tanPhi > mostTanPhi ? 'ratedKVA' : 'peakKW', severity, message });
  }
  if (hours > 8784) {
    const message = `the energy needs ${formatQuantity(hours, 'h')} at this peak; a year has 8784 h`;
    issues.push({ key: 'peakKW', severity: 'error', message });
  }
  return issues;
}
