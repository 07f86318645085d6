import { screen, within } from '@testing-library/react';
import { renderPiece } from '../../../../testing/render';
import type { Photo } from '../log.api';
import { PhotoCaption, PhotoStrip } from './photo-strip';

const photo = (id: string, rest: Partial<Photo> = {}): Photo => ({
  ...{ id, couponId: 'c', state: 'ready', refusedReason: null, widthPx: 1200, heightPx: 900, colourProfile: null, cornersFoundBy: null },
  ...{
    lightNotes: '',
    flags: [],
    createdBy: 'Hanne Voss',
    version: 1,
    receivedSha256: 'r',
    masterSha256: 'm',
    corners: null,
    allowedActions: [],
  },
  ...{ urls: { master: `/${id}.jpg`, small: `/${id}-small.jpg`, large: `/${id}-large.jpg` } },
  ...{ createdAt: '2026-05-13T08:00:00Z', capturedAt: '2026-05-13T07:00:00Z' },
  ...rest,
});
const corners = [
  { x: 0.1, y: 0.1 },
  { x: 0.9, y: 0.1 },
  { x: 0.9, y: 0.9 },
  { x: 0.1, y: 0.9 },
];

describe('photos of a coupon', () => {
  it('shows every ready photo small and whole, with corners or without', async () => {
    const shown = photo('bare');
    const strip = (
      <PhotoStrip
        {...{ couponId: 'c', timeZone: 'UTC', mayAdd: false, onShow: () => undefined, shown }}
        photos={[shown, photo('flat', { corners })]}
      />
    );
    const { user } = renderPiece(strip);
    const [bare, flat] = await screen.findAllByRole('listitem');
    expect(bare).toHaveTextContent('not laid flat: without corners');
    expect(flat).toHaveTextContent('can be laid under the cells');
    await user.click(within(bare ?? document.body).getByRole('button', { name: /whole picture/ }));
    const dialog = screen.getByRole('dialog', { name: /^Photo of 13 May/ });
    expect(within(dialog).getByRole('img')).toHaveAttribute('src', '/bare-large.jpg');
  });

  it('promises corners only where they can still be set', async () => {
    const caption = (shown: Photo) => (
      <PhotoCaption {...{ shown, hasPhotos: true, isImported: false, timeZone: 'UTC', onCorners: () => undefined }} />
    );
    const { unmount } = renderPiece(caption(photo('open', { allowedActions: ['set-corners'] })));
    expect(await screen.findByText(/can be laid under the cells once its four corners are set/)).toBeVisible();
    unmount();
    renderPiece(caption(photo('sealed')));
    expect(await screen.findByText(/not laid under the cells: its corners were not set/)).toBeVisible();
  });

  it('says of a plate burnt earlier that it is drawn as it was entered', async () => {
    renderPiece(
      <PhotoCaption {...{ shown: undefined, hasPhotos: false, isImported: true, timeZone: 'UTC', onCorners: () => undefined }} />,
    );
    expect(await screen.findByText(/drawn as it was entered/)).toBeVisible();
  });
});
