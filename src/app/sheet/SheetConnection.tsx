import { useEffect, useMemo, useRef, useState } from 'react';
import {
  buildDocument,
  type ExportProgress,
  exportStudySheet,
  type PaperName,
  type SheetInput,
  SheetPlace,
  sheetFileName,
} from '../../sheet/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { fingerprint, type Study } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';
import { programmeVersion } from '../programmeVersion.ts';
import { download } from './download.ts';
import { useDossiers } from './useDossiers.ts';

function sheetInput(study: Study, dossiers: readonly CaseDossier[], paper: PaperName): SheetInput {
  return {
    study,
    fingerprint: fingerprint(study),
    programmeVersion,
    paper,
    pins: study.view?.pins ?? [],
    cases: dossiers.map(({ caseId, solution, without, verdicts, scans }) => ({
      caseId,
      solution,
      without,
      verdicts,
      scans: scans.map((scan) => ({ withCorrection: scan.with, without: scan.without })),
    })),
  };
}

/** The results sheet of the study on the table, and its way out as a PDF. */
export function SheetConnection() {
  const study = useWorkbench((state) => state.study);
  const { dossiers, words } = useDossiers();
  const [paper, setPaper] = useState<PaperName>(study?.frequencyHz === 60 ? 'Letter' : 'A4');
  const [progress, setProgress] = useState<ExportProgress | null>(null);
  const [exporting, setExporting] = useState(false);
  const [error, setError] = useState<string>();
  const stop = useRef<AbortController>(null);
  useEffect(() => () => stop.current?.abort(), []);
  const input = useMemo(
    () => (study && dossiers ? sheetInput(study, dossiers, paper) : null),
    [study, dossiers, paper],
  );

  const exportPdf = async (): Promise<void> => {
    if (!input) return;
    const abort = new AbortController();
    stop.current = abort;
    setExporting(true);
    setError(undefined);
    try {
      const pdf = await exportStudySheet(input, { onProgress: setProgress, signal: abort.signal });
      download(pdf, sheetFileName(buildDocument(input)));
    } catch (cause) {
      if (!abort.signal.aborted) setError(cause instanceof Error ? cause.message : String(cause));
    } finally {
      setExporting(false);
      setProgress(null);
    }
  };
  return (
    <SheetPlace
      input={input}
      waiting={words}
      paper={paper}
      onPaper={setPaper}
      onExport={() => void exportPdf()}
      onCancel={() => stop.current?.abort()}
      exporting={exporting}
      progress={progress}
      error={error}
    />
  );
}
