import { ProblemError } from '../lib/api';
import { useStatusLine } from './status-line';

type Archivable = { id: string; version: number; name: string };

/** Archives or restores at once and offers the way back, instead of asking. */
export function useArchiving<T extends Archivable>(setArchived: (thing: T, isArchived: boolean) => Promise<T>) {
  const announce = useStatusLine();
  return async function archive(thing: T, isArchived: boolean): Promise<void> {
    try {
      const changed = await setArchived(thing, isArchived);
      const text = isArchived ? `${thing.name} is archived.` : `${thing.name} is back in use.`;
      announce({ text, undo: () => void archive(changed, !isArchived) });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`${thing.name} was not changed: ${error.detail}`);
    }
  };
}
