import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { useParams } from 'react-router';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { Page, Panel } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { TextLink } from '../components/text-link';
import { useArchiving } from '../components/use-archiving';
import { MaterialCautions } from '../features/materials/components/material-cautions';
import { MaterialFacts } from '../features/materials/components/material-facts';
import { MaterialForm } from '../features/materials/forms/material-form';
import {
  changeMaterial,
  type Material,
  type MaterialBody,
  setMaterialArchived,
  useMaterial,
  useMaterialGroups,
} from '../features/materials/materials.api';
import { paths } from '../lib/paths';

export function Component() {
  const { materialId = '' } = useParams();
  const { data: material, error, mutate } = useMaterial(materialId);
  const name = material?.name ?? 'Material';
  return (
    <Page
      title={name}
      crumbs={[{ label: 'Materials', to: paths.materials }, { label: name }]}
      meta={material !== undefined && <Meta material={material} />}
      actions={material !== undefined && <Acts material={material} />}
    >
      {material === undefined && error === undefined && <SkeletonBlock height="360px" label="Loading the material" />}
      {material === undefined && error !== undefined && <ReadProblem problem={error} thing="this material" onRetry={() => void mutate()} />}
      {material !== undefined && (
        <chakra.div
          display="grid"
          gap="6"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) minmax(0, 420px)' }}
          alignItems="start"
        >
          <MaterialCautions materialId={material.id} />
          <chakra.div display="grid" gap="4" minW="0">
            <MaterialFacts material={material} />
            <Groups materialId={material.id} />
          </chakra.div>
        </chakra.div>
      )}
    </Page>
  );
}

function Meta({ material: { familyLabel, archivedAt } }: { material: Material }) {
  return (
    <>
      <span>{familyLabel}</span>
      {archivedAt !== null && <b>Archived: it is no choice for new work</b>}
    </>
  );
}

function Acts({ material }: { material: Material }) {
  const [isEditing, setIsEditing] = useState(false);
  const archive = useArchiving(setMaterialArchived);
  const announce = useStatusLine();
  const submit = async (body: MaterialBody) => {
    const changed = await changeMaterial(material, body);
    setIsEditing(false);
    announce(`${changed.name} is saved.`);
  };
  return (
    <>
      {material.allowedActions.includes('archive') && (
        <Button kind="quiet" onClick={() => void archive(material, true)}>
          Archive
        </Button>
      )}
      {material.allowedActions.includes('restore') && <Button onClick={() => void archive(material, false)}>Restore</Button>}
      {material.allowedActions.includes('edit') && (
        <Button kind="primary" onClick={() => setIsEditing(true)}>
          Change
        </Button>
      )}
      {isEditing && (
        <Dialog title={`Change ${material.name}`} onClose={() => setIsEditing(false)}>
          <MaterialForm material={material} onSubmit={submit} />
        </Dialog>
      )}
    </>
  );
}

/** Groups that name this material: one approval may cover the others of the group too. */
function Groups({ materialId }: { materialId: string }) {
  const { data } = useMaterialGroups();
  const own = (data?.items ?? []).filter(({ materials }) => materials.some(({ id }) => id === materialId));
  return (
    <Panel p="5" aria-labelledby="groups-title">
      <chakra.h2 id="groups-title" mb="1">
        Groups
      </chakra.h2>
      {own.length === 0 ? (
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          None: an approval on this material covers this material alone. <TextLink to={paths.materialGroups}>Groups of materials</TextLink>
        </chakra.p>
      ) : (
        <chakra.ul>
          {own.map(({ id, name, materials }) => (
            <chakra.li key={id} py="1">
              <b>{name}</b>
              <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
                {materials.map((other) => other.name).join(', ')}
              </chakra.span>
            </chakra.li>
          ))}
        </chakra.ul>
      )}
    </Panel>
  );
}
