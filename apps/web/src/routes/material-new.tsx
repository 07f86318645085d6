import { useNavigate } from 'react-router';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { MaterialForm } from '../features/materials/forms/material-form';
import { createMaterial, type MaterialBody } from '../features/materials/materials.api';
import { paths } from '../lib/paths';

export function Component() {
  const navigate = useNavigate();
  const announce = useStatusLine();
  const submit = async (body: MaterialBody, { idempotencyKey }: { idempotencyKey: string }) => {
    const material = await createMaterial(body, idempotencyKey);
    announce(`${material.name} is added.`);
    await navigate(paths.material(material.id));
  };
  return (
    <Page title="Add a material" crumbs={[{ label: 'Materials', to: paths.materials }, { label: 'Add a material' }]}>
      <MaterialForm onSubmit={submit} />
    </Page>
  );
}
