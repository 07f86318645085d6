import { roleAtLeast } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { Navigate, useLocation } from 'react-router';
import { ButtonLink } from '../../components/button';
import { EmptyState } from '../../components/empty-state';
import { Page } from '../../components/page';
import { paths } from '../../lib/paths';
import { roleWord } from '../../lib/roles';
import type { Role } from '../../lib/session';
import { pageRight, recipeInAddress } from '../page-rights';

/** In the place of a page that the role does not have: who has it, and the way back. A link to a recipe leads to its setting instead. */
export function RoleGate({ role, children }: { role: Role; children: ReactNode }) {
  const { pathname } = useLocation();
  const right = pageRight(pathname);
  if (right === undefined || roleAtLeast(role, right.from)) return children;
  const recipe = recipeInAddress(pathname);
  if (recipe !== undefined) return <Navigate to={paths.machineWith(recipe)} replace />;
  return (
    <Page title="Not for your role">
      <EmptyState
        kind="no-right"
        title="Your role does not show this"
        actions={
          <ButtonLink kind="primary" to={paths.machine}>
            Go to the machine
          </ButtonLink>
        }
      >
        {right.what} You are signed in as {roleWord(role)}. Ask an owner of the shop for another role.
      </EmptyState>
    </Page>
  );
}
