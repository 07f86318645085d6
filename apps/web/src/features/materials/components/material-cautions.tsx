import { chakra } from '@chakra-ui/react';
import { CautionList } from '../../../components/caution-list';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { StateShape } from '../../../components/state-mark';
import { type ShopCaution, useCautionsFor } from '../cautions.api';

/** The cautions that work on a material brings with it, never first, the general ones folded. */
export function MaterialCautions({ materialId }: { materialId: string }) {
  const { data, error, mutate } = useCautionsFor(materialId);
  if (data === undefined)
    return error === undefined ? (
      <SkeletonBlock height="160px" label="Loading the cautions" />
    ) : (
      <ReadProblem problem={error} thing="the cautions" onRetry={() => void mutate()} />
    );
  const never = data.items.filter(({ level }) => level === 'never');
  const care = data.items.filter(({ level }) => level === 'care');
  const own = care.filter(isForMaterial);
  const general = care.filter((caution) => !isForMaterial(caution));
  return (
    <chakra.section aria-labelledby="cautions-title" display="grid" gap="3">
      <chakra.h2 id="cautions-title">Cautions</chakra.h2>
      {never.length > 0 && <NeverList cautions={never} />}
      <CautionList cautions={own.map(shown)} label="Cautions of this material" />
      {never.length === 0 && own.length === 0 && <p>None names this material or its family. What holds for all work still holds.</p>}
      <chakra.details>
        <chakra.summary py="2.5" fontWeight="semibold" cursor="pointer">
          What holds for all work, and for some effects ({general.length})
        </chakra.summary>
        <CautionList cautions={general.map(shown)} label="Cautions for all work" />
      </chakra.details>
    </chakra.section>
  );
}

/** Work that is refused: said before everything else, in the colour of refusals. */
export function NeverList({ cautions }: { cautions: readonly Pick<ShopCaution, 'id' | 'subject' | 'text' | 'source'>[] }) {
  return (
    <chakra.ul aria-label="Never" display="grid" gap="2">
      {cautions.map(({ id, subject, text, source }) => (
        <chakra.li
          key={id}
          display="grid"
          gridTemplateColumns="16px minmax(0, 1fr)"
          gap="3"
          p="3.5"
          bg="oxide.subtle"
          border="hairline"
          borderColor="oxide.emphasized"
          borderRadius="md"
        >
          <chakra.span color="oxide.fg" pt="1" lineHeight="none">
            <StateShape state="withdrawn" />
          </chakra.span>
          <div>
            <chakra.b display="block" color="oxide.fg">
              {subject}
            </chakra.b>
            <chakra.span display="block" fontSize="sm" lineHeight="sm">
              {text}
            </chakra.span>
            <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
              {source}
            </chakra.span>
          </div>
        </chakra.li>
      ))}
    </chakra.ul>
  );
}

const isForMaterial = ({ appliesTo }: ShopCaution) => appliesTo.families !== undefined || appliesTo.materialIds !== undefined;

const shown = ({ id, subject, text, source }: ShopCaution) => ({ key: id, act: subject, reason: text, source });
