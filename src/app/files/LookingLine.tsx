import { Button } from 'react-aria-components';
import { backToNow, goBackToIt, useLooked } from './looking.ts';
import { momentWords } from './momentWords.ts';

/** Says that the drawing shows a former state, and how to go back to it or to return. */
export function LookingLine() {
  const revision = useLooked();
  if (!revision) return null;
  const { at, words, name } = revision;
  return (
    <div className="notice-line" role="status" data-severity="warning">
      <span>
        Looking at the state of {momentWords(at, Date.now())} ({name ? `“${name}”, ` : ''}after “{words}”).
        The study is as it was left.
      </span>
      <Button onPress={goBackToIt}>Go back to this state</Button>
      <Button onPress={backToNow}>Return to the present</Button>
    </div>
  );
}
