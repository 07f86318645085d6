import { type RenderResult, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { createMemoryRouter, type RouteObject } from 'react-router';
import { RouterProvider } from 'react-router/dom';
import { SWRConfig } from 'swr';
import { Providers } from '../app/providers';
import { StatusLineProvider } from '../components/status-line';

type Rendered = RenderResult & { user: ReturnType<typeof userEvent.setup>; router: ReturnType<typeof createMemoryRouter> };

/** Draws routes at an address, with everything that main.tsx puts around them and an empty cache: the one that acts revalidate. */
export function renderRoutes(routes: RouteObject[], at: string): Rendered {
  const router = createMemoryRouter(routes, { initialEntries: [at] });
  const user = userEvent.setup();
  const { cache } = SWRConfig.defaultValue;
  for (const key of [...cache.keys()]) cache.delete(key);
  const result = render(
    <Providers>
      <SWRConfig value={{ dedupingInterval: 0 }}>
        <RouterProvider router={router} />
      </SWRConfig>
    </Providers>,
  );
  return { ...result, user, router };
}

/** Draws one piece on a page of its own. */
export function renderPiece(piece: ReactNode): Rendered {
  return renderRoutes([{ path: '*', element: <StatusLineProvider>{piece}</StatusLineProvider> }], '/');
}
