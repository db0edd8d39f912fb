import { workbench } from '../../store/index.ts';
import { casesOf } from '../../study/index.ts';

/** Shows the case whose number was pressed; false for any other key and for a number no case has. */
export function showNthCase(event: {
  key: string;
  ctrlKey: boolean;
  metaKey: boolean;
  altKey: boolean;
}): boolean {
  if (!/^[1-9]$/.test(event.key) || event.ctrlKey || event.metaKey || event.altKey) return false;
  const { study, setCase } = workbench.getState();
  const chosen = study && casesOf(study)[Number(event.key) - 1];
  if (!chosen) return false;
  setCase(chosen.id);
  return true;
}
