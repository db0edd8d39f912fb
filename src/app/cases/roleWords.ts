import { type CaseRole, fieldOf } from '../../study/index.ts';

/** What a case's role is called on screen: the words of its field. */
export function roleWords(role: CaseRole): string {
  const field = fieldOf('case', 'role');
  const option = field?.type === 'choice' ? field.options.find(({ value }) => value === role) : undefined;
  return option?.label ?? role;
}
