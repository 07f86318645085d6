import type { PlatePhoto } from '../../../components/plate/flat-photo';
import type { Photo } from './log.api';

/** A photo that can be laid under the cells: ready, with the corners of the plate. */
export function platePhotoOf({ urls, corners, widthPx, heightPx }: Photo): PlatePhoto | undefined {
  if (urls === null || corners === null || widthPx === null || heightPx === null) return undefined;
  return { url: urls.large, widthPx, heightPx, corners };
}

/** The photo that is shown: the chosen one, else the newest with corners, else the newest that is ready. */
export function shownPhoto(photos: readonly Photo[], chosenId: string | undefined): Photo | undefined {
  const ready = photos.filter(({ state }) => state === 'ready');
  return ready.find(({ id }) => id === chosenId) ?? ready.find(({ corners }) => corners !== null) ?? ready[0];
}
