import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { StateShape } from '../../../components/state-mark';
import type { Material } from '../materials.api';

/** The cautions of a material in a row: a `never` in words, the others counted with their first line. */
export function CautionSummary({ cautions }: Pick<Material, 'cautions'>) {
  const never = cautions.find(({ level }) => level === 'never');
  if (never !== undefined)
    return (
      <Line tone="oxide.fg" shape="withdrawn">
        <b>Never</b> · {never.subject}
      </Line>
    );
  const [first, ...others] = cautions;
  if (first === undefined) return <chakra.span color="fg.muted">only what holds for all work</chakra.span>;
  return (
    <Line tone="straw.fg" shape="caution">
      {first.subject}
      {others.length > 0 && <chakra.span color="fg.muted"> and {others.length} more</chakra.span>}
    </Line>
  );
}

type LineProps = { tone: string; shape: 'withdrawn' | 'caution'; children: ReactNode };

function Line({ tone, shape, children }: LineProps) {
  return (
    <chakra.span display="grid" gridTemplateColumns="16px minmax(0, 1fr)" gap="2" alignItems="start" py="1">
      <chakra.span color={tone} pt="2px" lineHeight="none">
        <StateShape state={shape} />
      </chakra.span>
      <span>{children}</span>
    </chakra.span>
  );
}
