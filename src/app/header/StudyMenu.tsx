import {
  Button,
  Keyboard,
  Menu,
  MenuItem,
  MenuTrigger,
  Popover,
  Separator,
  Text,
} from 'react-aria-components';
import { isUnsaved, useWorkbench } from '../../store/index.ts';
import { type Command, shownKeys } from '../commands/command.ts';

interface Props {
  commands: readonly Command[];
}

const inMenu = [
  ['study.new', 'study.open', 'study.save', 'study.saveAs'],
  ['edit.undo', 'edit.redo', 'study.details'],
  ['sample.cold-store', 'sample.office-tower'],
  ['theme.light', 'theme.dark', 'theme.system'],
];

/** The open study by its title; files, history and samples behind it. */
export function StudyMenu({ commands }: Props) {
  const title = useWorkbench((state) => state.study?.title ?? 'No study yet');
  const unsaved = useWorkbench((state) => state.study !== null && isUnsaved(state));
  const byId = new Map(commands.map((command) => [command.id, command]));
  return (
    <MenuTrigger>
      <Button className="menu-button study-title">
        <span className="clipped">
          {title}
          {unsaved && <span className="quiet"> · not in a file yet</span>}
        </span>{' '}
        <span aria-hidden="true">▾</span>
      </Button>
      <Popover className="popover">
        <Menu aria-label="Study" onAction={(id) => byId.get(String(id))?.run()}>
          {inMenu.flatMap((group, index) => [
            ...(index > 0 ? [<Separator key={group[0]} />] : []),
            ...group.flatMap((id) => {
              const command = byId.get(id);
              return command
                ? [
                    <MenuItem
                      key={id}
                      id={id}
                      isDisabled={command.enabled === false}
                      textValue={command.words}
                    >
                      <Text slot="label">{command.words}</Text>
                      {command.keys && <Keyboard>{shownKeys(command.keys)}</Keyboard>}
                    </MenuItem>,
                  ]
                : [];
            }),
          ])}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
