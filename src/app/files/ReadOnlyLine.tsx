import { Button } from 'react-aria-components';
import { useWorkbench, workbench, workHere } from '../../store/index.ts';

/** Says that another tab works on this study, and the ways to go on: work here, or make a copy. */
export function ReadOnlyLine() {
  const title = useWorkbench((state) => (state.readOnly ? (state.study?.title ?? '') : null));
  if (title === null) return null;
  return (
    <div className="notice-line" role="status" data-severity="warning">
      <span>“{title}” is being worked on in another tab. Here it can be looked at, not changed.</span>
      <Button onPress={() => void workHere()}>Work here instead</Button>
      <Button onPress={workbench.getState().makeCopy}>Make a copy</Button>
    </div>
  );
}
