import { browserFiles, refusal, workbench } from '../../store/index.ts';
import { readStudy } from '../../study/index.ts';
import { openDrawer } from './fileDrawer.ts';

/** Asks for a study file and lists its parts beside the drawing; the open study stays. */
export async function pickImport(): Promise<void> {
  const { setNotice, setPlace } = workbench.getState();
  try {
    const file = await browserFiles.open();
    if (!file) return;
    const { study, findings } = readStudy(file.text);
    if (!study) {
      setNotice(refusal(file.name, findings));
      return;
    }
    setPlace('site');
    openDrawer({ kind: 'import', from: study });
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    setNotice({ severity: 'error', title: `The file was not read: ${reason}`, findings: [] });
  }
}
