import { roleAtLeast } from '@proofplate/recipe-model';
import { useCallback } from 'react';
import { useSearchParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { MaterialFinder } from '../features/materials/components/material-finder';
import { MaterialsTabs } from '../features/materials/components/materials-tabs';
import type { MaterialFilter } from '../features/materials/materials.api';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

/** Materials of the shop; the filter lives in the address. */
export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [params, setParams] = useSearchParams();
  const handleFilter = useCallback((filter: MaterialFilter) => setParams(paramsOf(filter), { replace: true }), [setParams]);
  const addButton = mayAdd && (
    <ButtonLink kind="primary" icon={<PlusIcon />} to={paths.newMaterial}>
      Add a material
    </ButtonLink>
  );
  return (
    <Page title="Materials" actions={addButton}>
      <MaterialsTabs />
      <MaterialFinder filter={filterOf(params)} onFilter={handleFilter} addButton={addButton} />
    </Page>
  );
}

function filterOf(params: URLSearchParams): MaterialFilter {
  const words = params.get('q') ?? '';
  const families = params.getAll('family');
  return {
    ...(families.length === 0 ? {} : { family: families }),
    ...(words === '' ? {} : { q: words }),
    ...(params.get('archived') === 'true' ? { archived: true } : {}),
  };
}

function paramsOf({ family = [], q = '', archived = false }: MaterialFilter): URLSearchParams {
  const params = new URLSearchParams(family.map((value) => ['family', value]));
  if (q !== '') params.set('q', q);
  if (archived) params.set('archived', 'true');
  return params;
}
