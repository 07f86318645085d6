import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { TextLink } from '../../../components/text-link';
import { formatLength } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import type { Material } from '../materials.api';
import { CautionSummary } from './caution-summary';

export function MaterialTable({ materials, label }: { materials: readonly Material[]; label: string }) {
  return <DataTable label={label} columns={COLUMNS} rows={materials} rowKey={({ id }) => id} />;
}

const COLUMNS: readonly Column<Material>[] = [
  {
    key: 'name',
    header: 'Material',
    onPhone: 'title',
    cell: ({ id, name }) => (
      <TextLink to={paths.material(id)} fontWeight="semibold" display="inline-block" py="2">
        {name}
      </TextLink>
    ),
  },
  { key: 'family', header: 'Family', cell: ({ familyLabel }) => familyLabel },
  {
    key: 'grade',
    header: 'Grade',
    cell: ({ grade, standardDesignation }) => [grade, standardDesignation].filter(Boolean).join(', ') || <NotEntered />,
  },
  {
    key: 'thickness',
    header: 'Thickness',
    align: 'end',
    cell: ({ thicknessMm }) => (thicknessMm === null ? <NotEntered /> : formatLength(thicknessMm)),
  },
  { key: 'cautions', header: 'Cautions', width: '40%', cell: ({ cautions }) => <CautionSummary cautions={cautions} /> },
];

/** Said, never left as a hole. */
function NotEntered() {
  return <chakra.span color="fg.muted">not entered</chakra.span>;
}
