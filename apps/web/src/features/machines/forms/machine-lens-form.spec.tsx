import { screen } from '@testing-library/react';
import { openSession } from '../../../lib/session';
import { renderPiece } from '../../../testing/render';
import { makeSessionAnswer } from '../../../testing/sessions';
import { AddMachineLensForm } from './machine-lens-form';

describe('a lens on a machine', () => {
  it('says that a typed spot needs its method and day, and that they are optional without one', async () => {
    openSession(makeSessionAnswer('lead'));
    const { user } = renderPiece(<AddMachineLensForm machineId="m1" lenses={[{ id: 'l1', name: 'F163' }]} onDone={() => undefined} />);
    expect(await screen.findByLabelText('How the spot was measured optional')).toBeVisible();
    await user.type(screen.getByLabelText(/^Measured spot/), '45');
    expect(screen.getByLabelText('How the spot was measured')).toHaveAccessibleDescription(/^Needed with a measured spot/);
    expect(screen.getByLabelText('Measured on')).toHaveAccessibleDescription('Needed with a measured spot.');
  });
});
