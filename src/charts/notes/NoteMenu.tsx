import { useRef } from 'react';
import {
  Keyboard,
  Menu,
  MenuItem,
  MenuSection,
  Popover,
  Separator,
  SubmenuTrigger,
  Text,
} from 'react-aria-components';
import { shownKeys } from '../../keys/index.ts';
import type { NoteAction, NoteActions } from './noteActions.ts';

interface NoteMenuProps {
  /** What the menu belongs to, e.g. the title of the note. */
  name: string;
  actions: NoteActions;
  /** The button or title it hangs from. */
  anchor: HTMLElement;
  onClose(): void;
}

/** The menu of one note, hung from its button; one menu serves the whole column. */
export function NoteMenu({ name, actions, anchor, onClose }: NoteMenuProps) {
  const trigger = useRef<HTMLElement>(anchor);
  trigger.current = anchor;
  const groups = actions.filter((group) => group.length > 0);
  const close = (open: boolean) => {
    if (!open) onClose();
  };
  return (
    <Popover className="popover" triggerRef={trigger} isOpen onOpenChange={close} placement="bottom end">
      <Menu
        aria-label={name}
        autoFocus="first"
        onClose={onClose}
        onAction={(id) => {
          onClose();
          groups
            .flat()
            .find((action) => action.id === id)
            ?.run?.();
        }}
      >
        {groups.flatMap((group, at) => [
          ...(at > 0 ? [<Separator key={`rule ${group[0]?.id}`} />] : []),
          <MenuSection key={group[0]?.id} aria-label={`${name}, group ${at + 1}`}>
            {group.map((action) => actionItem(action, onClose))}
          </MenuSection>,
        ])}
      </Menu>
    </Popover>
  );
}

function actionItem(action: NoteAction, onClose: () => void) {
  if (!action.choices) {
    return (
      <MenuItem key={action.id} id={action.id} textValue={action.words}>
        <Text slot="label">{action.words}</Text>
        {action.keys && <Keyboard>{shownKeys(action.keys)}</Keyboard>}
      </MenuItem>
    );
  }
  return (
    <SubmenuTrigger key={action.id}>
      <MenuItem id={action.id} textValue={action.words}>
        <Text slot="label">{action.words}</Text>
        <span aria-hidden="true">▸</span>
      </MenuItem>
      <Popover className="popover">
        <Menu
          aria-label={action.words}
          onAction={(id) => {
            onClose();
            action.choices?.find((one) => one.id === id)?.run?.();
          }}
        >
          {action.choices.map((one) => (
            <MenuItem key={one.id} id={one.id} textValue={one.words}>
              <Text slot="label">{one.words}</Text>
            </MenuItem>
          ))}
        </Menu>
      </Popover>
    </SubmenuTrigger>
  );
}
