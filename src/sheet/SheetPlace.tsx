import type { PaperName, SheetInput } from './document/index.ts';
import type { ExportProgress } from './ExportOptions.ts';
import { LazyPage, leafId } from './LazyPage.tsx';
import type { SheetPage } from './pages/marks.ts';
import { useSheetPages } from './useSheetPages.ts';
import './sheet.css';

export interface SheetPlaceProps {
  /** What the sheet is made from; null while it is not computed. */
  input: SheetInput | null;
  /** Words for what is being waited for, or why there is no sheet. */
  waiting?: string | undefined;
  paper: PaperName;
  onPaper(paper: PaperName): void;
  onExport(): void;
  onCancel(): void;
  exporting: boolean;
  progress: ExportProgress | null;
  /** Why the last export failed, in words. */
  error?: string | undefined;
}

const PAPERS: readonly PaperName[] = ['A4', 'Letter'];

function PaperChoice({ paper, onPaper }: Pick<SheetPlaceProps, 'paper' | 'onPaper'>) {
  return (
    <fieldset className="sheet-paper">
      <legend>Paper</legend>
      {PAPERS.map((name) => (
        <label key={name}>
          <input type="radio" name="sheet-paper" checked={paper === name} onChange={() => onPaper(name)} />
          {name}
        </label>
      ))}
    </fieldset>
  );
}

function Exporting({ progress, onCancel }: Pick<SheetPlaceProps, 'progress' | 'onCancel'>) {
  return (
    <div className="sheet-exporting">
      <progress
        aria-label="Writing the PDF"
        max={progress?.total ?? 1}
        {...(progress ? { value: progress.done } : {})}
      />
      <span role="status">{progress ? `Writing ${progress.what}` : 'Loading the PDF writer'}</span>
      <button type="button" onClick={onCancel}>
        Stop
      </button>
    </div>
  );
}

/** The sheet's pages as the PDF will have them, with paper choice and export. */
export function SheetPlace(props: SheetPlaceProps) {
  const { input, waiting, paper, onPaper, onExport, onCancel, exporting, progress, error } = props;
  return (
    <section className="sheet-place" aria-label="Results sheet">
      <div className="sheet-bar">
        <PaperChoice paper={paper} onPaper={onPaper} />
        {exporting ? (
          <Exporting progress={progress} onCancel={onCancel} />
        ) : (
          <button type="button" className="sheet-export" onClick={onExport} disabled={!input}>
            Export PDF
          </button>
        )}
        {error !== undefined && (
          <p className="sheet-error" role="alert">
            {error}
          </p>
        )}
      </div>
      {input ? (
        <Pages input={input} />
      ) : (
        <p className="sheet-waiting">{waiting ?? 'The sheet is not computed yet.'}</p>
      )}
    </section>
  );
}

function Pages({ input }: { input: SheetInput }) {
  const sheet = useSheetPages(input);
  if (!sheet) return <p className="sheet-waiting">Setting the pages</p>;
  const { pages, paper, figures, compose } = sheet;
  return (
    <div className="sheet-pages" aria-busy={sheet.input !== input}>
      <Contents pages={pages} />
      {pages.map((page) => (
        <LazyPage
          key={`${paper} ${page.number}`}
          page={page}
          count={pages.length}
          figures={figures}
          compose={compose}
        />
      ))}
    </div>
  );
}

/** The sections with their pages; a click brings the page into view. */
function Contents({ pages }: { pages: readonly SheetPage[] }) {
  return (
    <nav className="sheet-contents" aria-label="Contents of the sheet">
      {pages.flatMap(({ number, sections }) =>
        sections.map(({ id, title }) => (
          <button
            type="button"
            key={id}
            onClick={() => document.getElementById(leafId(number))?.scrollIntoView({ block: 'start' })}
          >
            {title} <span className="unit">{number}</span>
          </button>
        )),
      )}
    </nav>
  );
}
