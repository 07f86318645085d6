import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import type { ShopCaution } from '../features/materials/cautions.api';
import type { Effect } from '../features/materials/effects.api';
import type { Material } from '../features/materials/materials.api';
import { closeSession, openSession, type Role } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as MaterialPage } from './material';
import { Component as NewMaterial } from './material-new';
import { Component as Materials } from './materials';
import { Component as Cautions } from './materials-cautions';
import { Component as Effects } from './materials-effects';

// Typing into whole forms takes jsdom a while on a slow machine.

const inShop = (page: React.ReactNode) => <StatusLineProvider>{page}</StatusLineProvider>;
const routes = [
  { path: '/materials', element: inShop(<Materials />) },
  { path: '/materials/new', element: inShop(<NewMaterial />) },
  { path: '/materials/cautions', element: inShop(<Cautions />) },
  { path: '/materials/effects', element: inShop(<Effects />) },
  { path: '/materials/:materialId', element: inShop(<MaterialPage />) },
];

const vinyl: Material = {
  id: 'v1',
  name: 'Vinyl cover',
  family: 'pvc',
  familyLabel: 'PVC',
  grade: '',
  standardDesignation: '',
  supplier: '',
  thicknessMm: 0.8,
  properties: {},
  notes: '',
  cautions: [{ id: 'c1', level: 'never', subject: 'Do not mark PVC.' }],
  archivedAt: null,
  version: 1,
  allowedActions: ['edit', 'archive'],
};
const pvc: ShopCaution = {
  id: 'c1',
  level: 'never',
  subject: 'Do not mark PVC.',
  text: 'Hydrogen chloride.',
  source: 'A list of materials',
  appliesTo: { families: ['pvc'] },
  isShipped: true,
  version: 1,
  allowedActions: ['tighten'],
};
const mdf: ShopCaution = {
  ...pvc,
  id: 'c2',
  level: 'care',
  subject: 'Extract well on MDF.',
  appliesTo: { families: ['mdf'], finishIds: ['f1'] },
  version: 4,
};
const foam: Effect = {
  id: 'e1',
  key: 'foam',
  isShipped: true,
  name: 'Foam',
  criteria: [{ quantity: 'depth', comparison: 'between', value: 5, upper: 50, unit: 'µm' }],
  notes: 'Common practice, no source.',
  archivedAt: null,
  version: 2,
  allowedActions: ['edit', 'archive'],
};
const listOf =
  (...items: unknown[]) =>
  () => ({ body: { items, nextCursor: null } });
const facets = () => ({ body: { families: [{ family: 'pvc', label: 'PVC', count: 1 }] } });

let server: ReturnType<typeof fakeServer>;
function open(at: string, handlers: Parameters<typeof fakeServer>[0], role: Role = 'lead') {
  const empty = listOf();
  server = fakeServer({
    'GET /api/materials': empty,
    'GET /api/materials/facets': facets,
    'GET /api/finishes': empty,
    'GET /api/effects': empty,
    'GET /api/material-groups': empty,
    ...handlers,
  });
  openSession(makeSessionAnswer(role));
  return renderRoutes(routes, at);
}
afterEach(() => {
  server.restore();
  closeSession('left');
});

describe('the materials page', () => {
  it('shows in the row that a material must never be marked', async () => {
    open('/materials', { 'GET /api/materials': listOf(vinyl) });
    const row = within((await screen.findByRole('link', { name: 'Vinyl cover' })).closest('tr') ?? document.body);
    expect(row.getByText('Never')).toBeVisible();
    expect(row.getByText(/Do not mark PVC\./)).toBeVisible();
  });

  it('keeps the chosen family in the address and asks the server for it', async () => {
    const { user, router } = open('/materials', { 'GET /api/materials': listOf(vinyl) });
    await user.click((await screen.findAllByRole('checkbox', { name: /PVC/ }))[0] ?? document.body);
    await waitFor(() => expect(router.state.location.search).toBe('?family=pvc'));
    await waitFor(() => expect(server.requests.some(({ query }) => query.getAll('family').join() === 'pvc')).toBe(true));
    expect(screen.getByRole('button', { name: 'Remove the filter PVC' })).toBeVisible();
  });

  it('tells nothing yet from nothing that matches', async () => {
    const { unmount } = open('/materials', {});
    expect(await screen.findByText('No material yet')).toBeVisible();
    unmount();
    server.restore();
    const { user } = open('/materials?q=zzz', {});
    expect(await screen.findByText('No material matches')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Show all materials' }));
    expect(await screen.findByText('No material yet')).toBeVisible();
  });
});

describe('adding a material', () => {
  it('says at once which family a word of the trade stands for', async () => {
    const { user } = open('/materials/new', { 'GET /api/cautions': () => ({ body: { items: [pvc], nextCursor: null } }) });
    const family = await screen.findByLabelText('What it is');
    await user.type(family, 'vinyl');
    expect(screen.getByText('This counts as: PVC.')).toBeVisible();
    expect(await screen.findByRole('alert')).toHaveTextContent('Never. Do not mark PVC.Hydrogen chloride.Source: A list of materials.');
    await user.clear(family);
    await user.type(family, 'mystery alloy');
    expect(screen.getByText(/This counts as: Unknown/)).toBeVisible();
  });

  it('sends what was typed, in millimetres, with the source of each number', async () => {
    const { user } = open('/materials/new', {
      'POST /api/materials': () => ({ status: 201, body: vinyl }),
      'GET /api/materials/v1': () => ({ body: vinyl }),
      'GET /api/cautions/for': () => ({ body: { isForbidden: true, items: [pvc] } }),
    });
    await user.type(await screen.findByLabelText('Name'), 'Vinyl cover');
    await user.type(screen.getByLabelText('What it is'), 'vinyl');
    await user.type(screen.getByLabelText(/^Usual thickness/), '0.0315 in');
    await user.type(screen.getByLabelText(/^Density/), '1380');
    await user.click(screen.getByRole('button', { name: 'Add the material' }));
    expect(await screen.findByRole('link', { name: /^Source of the density: Say where/ })).toBeVisible();
    await user.type(screen.getByLabelText('Source of the density'), 'data sheet 7');
    await user.click(screen.getByRole('button', { name: 'Add the material' }));
    await screen.findByText('Hydrogen chloride.');
    const [body] = server.bodies('POST /api/materials');
    expect(body).toMatchObject({
      name: 'Vinyl cover',
      family: 'vinyl',
      properties: { densityKgPerM3: { value: 1380, source: 'data sheet 7' } },
    });
    expect(body).toHaveProperty('thicknessMm', expect.closeTo(0.8001, 9));
  });
});

describe('the cautions page', () => {
  const handlers = { 'GET /api/cautions': listOf(pvc, mdf), 'PATCH /api/cautions/c2': () => ({ body: mdf }) };

  it('shows the refusals first, each with its source and what it applies to', async () => {
    open('/materials/cautions', handlers, 'operator');
    const headings = await screen.findAllByRole('heading', { level: 2 });
    expect(headings.map(({ textContent }) => textContent)).toEqual(['Never', 'Take care']);
    expect(screen.getAllByText(/A list of materials/)).toHaveLength(2);
    expect(screen.getByText('PVC')).toBeVisible();
  });

  it('lets a lead make one stricter; what it applied to stays, and the words are not sent', async () => {
    const { user } = open('/materials/cautions', handlers);
    await user.click(await screen.findByRole('button', { name: 'Tighten: Extract well on MDF.' }));
    const dialog = within(await screen.findByRole('dialog', { name: 'Tighten a caution' }));
    expect(dialog.getByRole('checkbox', { name: 'MDF' })).toBeDisabled();
    await user.click(dialog.getByRole('checkbox', { name: 'Wood' }));
    await user.click(dialog.getByRole('switch', { name: 'Never mark what it applies to' }));
    await user.click(dialog.getByRole('button', { name: 'Tighten the caution' }));
    await waitFor(() => expect(server.bodies('PATCH /api/cautions/c2')).toHaveLength(1));
    expect(server.bodies('PATCH /api/cautions/c2')).toEqual([
      { level: 'never', appliesTo: { families: ['mdf', 'wood'], finishIds: ['f1'] } },
    ]);
    expect(server.requests.find(({ method }) => method === 'PATCH')?.headers.get('if-match')).toBe('"v4"');
  });
});

describe('the effects page', () => {
  it('says what a mark must meet and saves a changed limit against the version that was read', async () => {
    const { user } = open('/materials/effects', { 'GET /api/effects': listOf(foam), 'PATCH /api/effects/e1': () => ({ body: foam }) });
    expect(await screen.findByText(/Depth between 5 and 50/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Change Foam' }));
    const dialog = within(await screen.findByRole('dialog', { name: 'Change Foam' }));
    const upper = dialog.getByLabelText(/^Upper limit/);
    await user.clear(upper);
    await user.type(upper, '4');
    await user.click(dialog.getByRole('button', { name: 'Save the effect' }));
    expect(await dialog.findByRole('link', { name: /upper limit: Enter an upper limit above/ })).toBeVisible();
    await user.clear(upper);
    await user.type(upper, '40 µm');
    await user.click(dialog.getByRole('button', { name: 'Save the effect' }));
    await waitFor(() => expect(server.bodies('PATCH /api/effects/e1')).toHaveLength(1));
    expect(server.bodies('PATCH /api/effects/e1')[0]).toMatchObject({
      criteria: [{ quantity: 'depth', comparison: 'between', value: 5, upper: 40, unit: 'µm' }],
    });
  });
});
