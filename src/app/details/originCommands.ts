import { selectedIds } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';
import { confirmTypical, elementById, nameOf, originTally, type Study } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';

/** What can be done to the origins of the selected parts' values. */
export function originCommands(study: Study, selection: readonly string[]): Command[] {
  const parts = selectedIds(selection).parts.flatMap((id) => elementById(study, id) ?? []);
  const open = parts.filter((part) => originTally(study, part).typical > 0);
  const whose = open.length === 1 && open[0] ? nameOf(open[0]) : `${open.length} selected parts`;
  return [
    {
      id: 'edit.confirmTypical',
      words:
        open.length === 0
          ? 'Confirm typical values of the selected parts as nameplate data'
          : `Confirm typical values of ${whose} as nameplate data`,
      keys: 'Shift+N',
      enabled: open.length > 0,
      run: () =>
        workbench.getState().edit(
          confirmTypical(
            study,
            open.map(({ id }) => id),
          ),
        ),
    },
  ];
}
