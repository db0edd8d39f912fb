import type { Verdict } from '../../checks/index.ts';
import { Equation } from './Equation.tsx';
import { NoteFrame, type NoteHandlers } from './NoteFrame.tsx';
import { verdictText } from './noteText.ts';
import { VerdictMark } from './VerdictMark.tsx';
import {
  limitValue,
  marginWords,
  shortSourceWords,
  VERDICT_WORDS,
  valueAgainstLimit,
  verdictHeadline,
  verdictValue,
  type WorstCase,
  withoutCorrectionWords,
  worstWords,
} from './verdictWords.ts';

export interface VerdictNoteProps extends NoteHandlers {
  verdict: Verdict;
  /** Name of the part or busbar judged. */
  subjectName: string;
  letter: string;
  /** The case it was judged in. */
  caseName?: string | undefined;
  /** Notes of several cases stand together: the title names the case. */
  namesCase?: boolean;
  /** The case in which this check ends worst, where all are judged. */
  worst?: WorstCase | undefined;
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
  const { verdict, subjectName, folded, caseName } = props;
  const prefix = props.namesCase && caseName ? `${caseName}: ` : '';
  const headline = `${prefix}${verdictHeadline(verdict, subjectName)}`;
  return (
    <NoteFrame
      {...props}
      noteKey={verdict.key}
      state={folded ? 'line' : 'card'}
      className={`verdict verdict-${verdict.verdict}`}
      mark={<VerdictMark verdict={verdict.verdict} />}
      title={folded ? `${prefix}${subjectName} · ${verdict.title}` : headline}
      name={headline}
      figure={folded && <span title={headline}>{valueAgainstLimit(verdict)}</span>}
      lit={props.lit ?? false}
      tabStop={props.tabStop ?? true}
      text={() => verdictText(verdict, subjectName, caseName)}
    >
      <VerdictBody {...props} />
    </NoteFrame>
  );
}

function VerdictBody(props: VerdictNoteProps) {
  const { verdict, worst } = props;
  const said = [
    worst && worstWords(verdict, worst),
    ...verdict.remarks,
    withoutCorrectionWords(verdict),
  ].filter((words) => typeof words === 'string');
  const word = verdict.screening
    ? `${VERDICT_WORDS[verdict.verdict]}, screening rule`
    : VERDICT_WORDS[verdict.verdict];
  return (
    <>
      {verdict.working.map(({ equation, numbers }) => (
        <p key={equation} className="verdict-working">
          <Equation text={equation} />
          {isShort(equation, numbers) ? ' = ' : <br />}
          <Equation text={numbers} />
        </p>
      ))}
      <p className="verdict-sum">
        <strong className={`word-${verdict.verdict}`}>{word}</strong> · limit{' '}
        {limitValue(verdict.limit, verdict.unit)} · margin {marginWords(verdict.margin)}
        {verdict.value === null && ` · value ${verdictValue(null, verdict.unit)}`}
        {' · '}
        <span className="verdict-source">{shortSourceWords(verdict.source)}</span>
      </p>
      {said.map((words) => (
        <p key={words} className="verdict-remark">
          {words}
        </p>
      ))}
      <VerdictFoot {...props} />
    </>
  );
}

const SHORT = 48;

/** A formula without further words and its numbers share a line where both are short. */
function isShort(equation: string, numbers: string): boolean {
  return equation.length + numbers.length <= SHORT && !/[,:]/.test(equation);
}

/** What would mend it, and where it leads. */
function VerdictFoot({ verdict, onJump, onOrder, onTry }: VerdictNoteProps) {
  const { order, mend } = verdict;
  return (
    <div className="verdict-foot">
      {mend && <p className="verdict-mend">Mend: {mend}</p>}
      <span className="verdict-links">
        {onTry && mend && (
          <button type="button" onClick={() => onTry(verdict)}>
            try
          </button>
        )}
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
      </span>
    </div>
  );
}
