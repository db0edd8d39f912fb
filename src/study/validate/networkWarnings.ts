import { parallelFindings } from '../findings/parallelTransformers.ts';
import { placedFinding } from '../findings/placedFinding.ts';
import { voltageFindings } from '../findings/voltages.ts';
import type { Finding, Study } from '../types.ts';

/**
 * Voltages that do not belong together and transformers of different shift in parallel, as the base study
 * stands: worth a warning when a study is read, whatever its cases do (study format, 5).
 */
export function networkWarnings(study: Study): Finding[] {
  const state = { base: study, here: study, caseId: null };
  return [...voltageFindings(state), ...parallelFindings(state)].flatMap((said) => {
    if (said.severity !== 'error') return [];
    const { code, path, value = '', message } = placedFinding(study, said, [], []);
    return [{ code, severity: 'warning', path, value, message }];
  });
}
