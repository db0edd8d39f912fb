import type { Verdict } from '../../checks/index.ts';
import { NoteFrame, type NoteHandlers } from './NoteFrame.tsx';
import { verdictText } from './noteText.ts';
import { VerdictMark } from './VerdictMark.tsx';
import {
  limitValue,
  marginWords,
  sourceWords,
  VERDICT_WORDS,
  verdictHeadline,
  verdictValue,
  withoutCorrectionWords,
} from './verdictWords.ts';

export interface VerdictNoteProps extends NoteHandlers {
  verdict: Verdict;
  /** Name of the part or busbar judged. */
  subjectName: string;
  letter: string;
  /** The case it was judged in, where several are shown. */
  caseName?: string | undefined;
  folded: boolean;
  lit?: boolean;
  tabStop?: boolean;
  onJump?: ((verdict: Verdict) => void) | undefined;
  /** Moves the rail to the verdict's order. */
  onOrder?: ((order: number) => void) | undefined;
  /** Tries what would mend it. */
  onTry?: ((verdict: Verdict) => void) | undefined;
}

/** One verdict: mark and headline; opened, its working, source and what would mend it. */
export function VerdictNote(props: VerdictNoteProps) {
  const { verdict, subjectName } = props;
  return (
    <NoteFrame
      {...props}
      noteKey={verdict.key}
      state={props.folded ? 'line' : 'card'}
      className={`verdict verdict-${verdict.verdict}`}
      mark={<VerdictMark verdict={verdict.verdict} />}
      title={verdictHeadline(verdict, subjectName)}
      lit={props.lit ?? false}
      tabStop={props.tabStop ?? true}
      text={() => verdictText(verdict, subjectName, props.caseName)}
    >
      <VerdictBody {...props} />
    </NoteFrame>
  );
}

function VerdictBody(props: VerdictNoteProps) {
  const { verdict, caseName, onJump, onOrder, onTry } = props;
  const { order, mend } = verdict;
  const without = withoutCorrectionWords(verdict);
  const word = verdict.screening
    ? `${VERDICT_WORDS[verdict.verdict]}, screening rule`
    : VERDICT_WORDS[verdict.verdict];
  return (
    <>
      <p className="verdict-sum">
        <strong className={`word-${verdict.verdict}`}>{word}</strong> · value{' '}
        {verdictValue(verdict.value, verdict.unit)} · limit {limitValue(verdict.limit, verdict.unit)} · margin{' '}
        {marginWords(verdict.margin)}
      </p>
      {verdict.working.map((working) => (
        <p key={working.equation} className="verdict-working">
          {working.equation}
          <br />
          {working.numbers}
        </p>
      ))}
      <p className="verdict-source">Source: {sourceWords(verdict.source)}</p>
      {caseName && <p className="verdict-remark">Case: {caseName}.</p>}
      {verdict.remarks.map((remark) => (
        <p key={remark} className="verdict-remark">
          {remark}
        </p>
      ))}
      {without && <p className="verdict-remark">{without}</p>}
      <div className="verdict-foot">
        {mend && <p className="verdict-mend">Mend: {mend}</p>}
        <span className="verdict-links">
          {onJump && (
            <button type="button" onClick={() => onJump(verdict)}>
              jump to the part
            </button>
          )}
          {onOrder && order !== undefined && (
            <button type="button" onClick={() => onOrder(order)}>
              rail to h {Number(order.toFixed(2))}
            </button>
          )}
          {onTry && mend && (
            <button type="button" onClick={() => onTry(verdict)}>
              try
            </button>
          )}
        </span>
      </div>
    </>
  );
}
