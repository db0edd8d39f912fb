import { workbench } from '../../store/index.ts';
import { type Sample, sampleFile, samples } from './samples.ts';

/** Fetches a sample from the programme's own files and opens it; says so when that fails. */
export async function openSample(sample: Sample): Promise<void> {
  const { openText, setNotice } = workbench.getState();
  const file = sampleFile(sample);
  try {
    const reply = await fetch(`samples/${file}`);
    if (!reply.ok) throw new Error(`the programme's server answered ${reply.status}`);
    openText(await reply.text(), file);
  } catch (cause) {
    const why = cause instanceof Error ? cause.message : String(cause);
    setNotice({
      severity: 'error',
      title: `Sample ${sample.title} could not be opened: ${why}.`,
      findings: [],
    });
  }
}

/** Opens the sample the page's address asks for: /?sample=cold-store. */
export async function openAddressedSample(): Promise<void> {
  const id = new URLSearchParams(window.location.search).get('sample');
  const sample = samples.find((one) => one.id === id);
  if (!sample) return;
  window.history.replaceState(null, '', window.location.pathname);
  await openSample(sample);
}
