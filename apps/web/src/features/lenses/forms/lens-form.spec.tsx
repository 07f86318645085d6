import { screen } from '@testing-library/react';
import { openSession } from '../../../lib/session';
import { fakeServer } from '../../../testing/fake-server';
import { renderPiece } from '../../../testing/render';
import { makeSessionAnswer } from '../../../testing/sessions';
import type { Lens } from '../lenses.api';
import { LensForm } from './lens-form';

const lens = { id: 'l1', name: 'F163', focalLengthMm: 162.56, fieldSizeMm: 110, notes: '', version: 1 } as Lens;
const inShop = (unitSystem: 'metric' | 'inch') =>
  openSession({ ...makeSessionAnswer('lead'), shop: { ...makeSessionAnswer().shop, unitSystem, locale: 'de-DE' } });

let server: ReturnType<typeof fakeServer>;
beforeEach(() => {
  server = fakeServer({ 'POST /api/lenses': () => ({ status: 201, body: lens }) });
});
afterEach(() => server.restore());

describe('a lens', () => {
  it('says under the field what a length in another unit is in its own', async () => {
    inShop('metric');
    const { user } = renderPiece(<LensForm onDone={() => undefined} />);
    await user.type(await screen.findByLabelText('Focal length, mm'), '6,4 in');
    expect(screen.getByLabelText('Focal length, mm')).toHaveAccessibleDescription('= 162,56\u00A0mm');
  });

  it('is typed in inches in a shop that works in them, and stored in millimetres', async () => {
    inShop('inch');
    const { user } = renderPiece(<LensForm onDone={() => undefined} />);
    await user.type(await screen.findByLabelText('Name'), 'F163');
    await user.type(screen.getByLabelText('Focal length, in'), '6,4');
    await user.type(screen.getByLabelText('Side of the marking field, in'), '110 mm');
    await user.click(screen.getByRole('button', { name: 'Add the lens' }));
    await screen.findByRole('button', { name: 'Add the lens' });
    expect(server.bodies('POST /api/lenses')).toEqual([{ name: 'F163', focalLengthMm: 162.56, fieldSizeMm: 110, notes: '' }]);
  });

  it('shows what is stored in the shop’s unit', async () => {
    inShop('inch');
    renderPiece(<LensForm lens={lens} onDone={() => undefined} />);
    expect(await screen.findByLabelText('Focal length, in')).toHaveValue('6,4');
  });
});
