import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { useArchiving } from '../../../components/use-archiving';
import { useSession } from '../../../lib/session';
import { criterionWords } from '../criterion-words';
import { type Effect, setEffectArchived, useEffects } from '../effects.api';
import { EffectForm } from '../forms/effect-form';
import { CatalogueActs } from './catalogue-acts';

/** What a mark should be, and what it must meet. */
export function EffectList() {
  const { locale } = useSession().shop;
  const [isArchived, setIsArchived] = useState(false);
  const [edited, setEdited] = useState<Effect>();
  const { data, error, mutate } = useEffects(isArchived);
  const archive = useArchiving(setEffectArchived);
  const announce = useStatusLine();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={8} label="Loading the effects" />
    ) : (
      <ReadProblem problem={error} thing="the effects" onRetry={() => void mutate()} />
    );
  const handleDone = () => {
    setEdited(undefined);
    announce('The effect is saved. Coupons keep the criteria that were recorded on them.');
  };
  return (
    <>
      {data.items.length === 0 ? (
        <EmptyState kind="none-match" title={isArchived ? 'No effect is archived' : 'No effect in use'}>
          {isArchived ? 'Effects that were taken out of the choices would stand here.' : 'Restore an archived effect, or add one.'}
        </EmptyState>
      ) : (
        <DataTable
          label={isArchived ? 'Archived effects' : 'Effects'}
          columns={columns({ locale, onEdit: setEdited, onArchive: (effect, isNow) => void archive(effect, isNow) })}
          rows={data.items}
          rowKey={({ id }) => id}
        />
      )}
      <Button kind="quiet" mt="2" ml="-4" onClick={() => setIsArchived(!isArchived)}>
        {isArchived ? 'Show the effects in use' : 'Show archived effects'}
      </Button>
      {edited !== undefined && (
        <Dialog title={`Change ${edited.name}`} onClose={() => setEdited(undefined)}>
          <EffectForm effect={edited} onDone={handleDone} />
        </Dialog>
      )}
    </>
  );
}

type ColumnOptions = { locale: string; onEdit: (effect: Effect) => void; onArchive: (effect: Effect, isArchived: boolean) => void };

function columns({ locale, onEdit, onArchive }: ColumnOptions): readonly Column<Effect>[] {
  return [
    {
      key: 'name',
      header: 'Effect',
      onPhone: 'title',
      cell: ({ name, isShipped }) => (
        <>
          <b>{name}</b>
          {!isShipped && <chakra.span color="fg.muted"> of this shop</chakra.span>}
        </>
      ),
    },
    {
      key: 'criteria',
      header: 'A mark must meet',
      cell: ({ criteria }) =>
        criteria.length === 0 ? (
          <chakra.span color="fg.muted">nothing measured: ratings only</chakra.span>
        ) : (
          <chakra.ul py="1">
            {criteria.map((criterion) => (
              <li key={`${criterion.quantity} ${criterion.comparison}`}>{criterionWords(criterion, locale)}</li>
            ))}
          </chakra.ul>
        ),
    },
    {
      key: 'notes',
      header: 'Where they come from',
      width: '28%',
      cell: ({ notes }) => (
        <chakra.div color="fg.muted" py="1.5">
          {notes}
        </chakra.div>
      ),
    },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (effect) => (
        <CatalogueActs
          name={effect.name}
          allowedActions={effect.allowedActions}
          onEdit={() => onEdit(effect)}
          onArchive={(isArchived) => onArchive(effect, isArchived)}
        />
      ),
    },
  ];
}
