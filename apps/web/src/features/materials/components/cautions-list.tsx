import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { StateShape } from '../../../components/state-mark';
import { useStatusLine } from '../../../components/status-line';
import { type ShopCaution, useCautions } from '../cautions.api';
import { TightenForm } from '../forms/tighten-form';
import { type ScopeNames, scopeWords } from '../scope-words';

/** Every caution of the shop, the refusals first. They get tighter, never looser. */
export function CautionsList({ names }: { names: ScopeNames }) {
  const { data, error, mutate } = useCautions();
  const [edited, setEdited] = useState<ShopCaution>();
  const announce = useStatusLine();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={8} label="Loading the cautions" />
    ) : (
      <ReadProblem problem={error} thing="the cautions" onRetry={() => void mutate()} />
    );
  const handleDone = () => {
    setEdited(undefined);
    announce('The caution is tighter from now on, for everybody in the shop.');
  };
  const never = data.items.filter(({ level }) => level === 'never');
  const care = data.items.filter(({ level }) => level === 'care');
  return (
    <chakra.div display="grid" gap="8">
      <Group
        title="Never"
        note="Planning a coupon, drafting a setting and starting a run are refused."
        cautions={never}
        names={names}
        onTighten={setEdited}
      />
      <Group
        title="Take care"
        note="They stand before the setting wherever it is shown."
        cautions={care}
        names={names}
        onTighten={setEdited}
      />
      {edited !== undefined && (
        <Dialog title="Tighten a caution" onClose={() => setEdited(undefined)}>
          <TightenForm caution={edited} onDone={handleDone} />
        </Dialog>
      )}
    </chakra.div>
  );
}

type GroupProps = {
  title: string;
  note: string;
  cautions: readonly ShopCaution[];
  names: ScopeNames;
  onTighten: (caution: ShopCaution) => void;
};

function Group({ title, note, cautions, names, onTighten }: GroupProps) {
  return (
    <section>
      <h2>{title}</h2>
      <chakra.p mb="2" fontSize="sm" lineHeight="sm" color="fg.muted">
        {note}
      </chakra.p>
      <chakra.ul bg="bg.panel" border="hairline" borderRadius="md">
        {cautions.map((caution) => (
          <Row key={caution.id} caution={caution} names={names} onTighten={() => onTighten(caution)} />
        ))}
      </chakra.ul>
    </section>
  );
}

type RowProps = { caution: ShopCaution; names: ScopeNames; onTighten: () => void };

function Row({ caution, names, onTighten }: RowProps) {
  const { level, subject, text, source, appliesTo, isShipped, allowedActions } = caution;
  const isNever = level === 'never';
  return (
    <chakra.li
      display="grid"
      gridTemplateColumns={{ base: '16px minmax(0, 1fr)', md: '16px minmax(0, 1fr) 220px auto' }}
      columnGap="4"
      rowGap="2"
      px="4"
      py="3"
      borderTop="hairline"
      _first={{ borderTop: 'none' }}
    >
      <chakra.span color={isNever ? 'oxide.fg' : 'straw.fg'} pt="1" lineHeight="none">
        <StateShape state={isNever ? 'withdrawn' : 'caution'} />
      </chakra.span>
      <div>
        <b>{subject}</b>
        <chakra.p fontSize="sm" lineHeight="sm" maxW="72ch">
          {text}
        </chakra.p>
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" maxW="72ch">
          {isShipped ? 'Source: ' : 'Of this shop. Source: '}
          {source}
        </chakra.p>
      </div>
      <chakra.div gridColumn={{ base: '2', md: 'auto' }} fontSize="sm" lineHeight="sm" color="fg.muted" pt={{ md: '0.5' }}>
        {scopeWords(appliesTo, names)}
      </chakra.div>
      <Flex gridColumn={{ base: '2', md: 'auto' }} align="flex-start" justify="flex-end" minW={{ md: '96px' }}>
        {allowedActions.includes('tighten') && (
          <Button kind="quiet" ml={{ base: '-4', md: '0' }} aria-label={`Tighten: ${subject}`} onClick={onTighten}>
            Tighten
          </Button>
        )}
      </Flex>
    </chakra.li>
  );
}
