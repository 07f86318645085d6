import { fireEvent, screen } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as ImportPage } from './coupon-import';

const fields = [{ parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s' }];
const list = (items: object[]) => () => ({ body: { items, nextCursor: null } });
const cell = { address: 'A1', rowIndex: 0, columnIndex: 0, parameters: {}, dose: { value: null, missingBecause: 'not known' }, note: '' };
const preview = {
  ...{ rows: 1, columns: 1, cells: [cell], ignoredHeadings: ['Customer'], unknownFields: ['powerPercent', 'markedBy'] },
  refusedRows: [{ line: 3, text: 'A2 | fast', reason: '“fast” is no number.' }],
};

// Every test draws the whole form and its plate.

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

describe('entering a plate burnt earlier', () => {
  it('shows what will be entered, names refused rows and unknown fields, and enters exactly what was looked at', async () => {
    server = fakeServer({
      'GET /api/machines': list([{ id: 'x', name: 'Bench 2', profile: { panel: { fields } } }]),
      'GET /api/machines/x/lenses': list([{ lensId: 'l', lensName: 'F160', isMounted: true }]),
      ...{ 'GET /api/materials': list([{ id: 'm', name: 'Brass' }]), 'GET /api/finishes': list([{ id: 'f', name: 'Brushed' }]) },
      'GET /api/effects': list([{ id: 'e', name: 'Dark mark' }]),
      'POST /api/coupons/import/preview': () => ({ body: preview }),
      'POST /api/coupons/import': () => ({ status: 201, body: { id: 'c', code: 'C-0007' } }),
    });
    const page = (
      <StatusLineProvider>
        <ImportPage />
      </StatusLineProvider>
    );
    const { user } = renderRoutes(
      [
        { path: '/coupons/import', element: page },
        { path: '/coupons/:code', element: <p>the coupon’s page</p> },
      ],
      '/coupons/import',
    );
    await user.click(await screen.findByRole('button', { name: 'Look at what will be entered' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('7 entries need a change');

    await user.selectOptions(screen.getByLabelText('Machine'), 'x');
    await user.selectOptions(await screen.findByLabelText('Lens'), await screen.findByRole('option', { name: 'F160' }));
    for (const [label, id] of [
      ['Material', 'm'],
      ['Finish', 'f'],
      ['Effect', 'e'],
    ] as const)
      await user.selectOptions(screen.getByLabelText(label), id);
    await user.click(await screen.findByRole('radio', { name: 'A pasted table' }));
    fireEvent.change(screen.getByLabelText('Rows from the spreadsheet'), { target: { value: 'Cell\tSpeed\nA1\t800\nA2\tfast' } });
    await user.click(screen.getByRole('button', { name: 'Look at what will be entered' }));

    expect(await screen.findByText('1 row cannot be read')).toBeVisible();
    expect(screen.getByText('Line 3').parentElement).toHaveTextContent('“fast” is no number.');
    expect(screen.getByText('Stays unknown: power, who marked it.')).toBeVisible();
    expect(server.bodies('POST /api/coupons/import')).toEqual([]);

    await user.click(screen.getByRole('button', { name: 'Enter it without 1 refused' }));
    expect(await screen.findByText('the coupon’s page')).toBeVisible();
    expect(server.bodies('POST /api/coupons/import')).toEqual([
      expect.objectContaining({ table: 'Cell\tSpeed\nA1\t800\nA2\tfast', leaveOutRefusedRows: true, markedByMe: false }),
    ]);
  });
});
