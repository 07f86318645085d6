import { chakra } from '@chakra-ui/react';
import { CellCloseUp } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { shapeOf } from '../../../components/plate/proof-marks';
import { StateMark } from '../../../components/state-mark';
import { Swatch } from '../../../components/swatch';
import { TextLink } from '../../../components/text-link';
import { colourDifference, cssColour, labOf } from '../../../lib/colour-difference';
import { formatNumber } from '../../../lib/format';
import { markedCellOf } from '../../../lib/marked-cell';
import { paths } from '../../../lib/paths';
import type { Revision } from '../recipes.api';
import { markOf, revisionName } from '../revision-words';

export type ColumnHeadProps = {
  revision: Revision;
  reference: Revision | undefined;
  onRemove: ((revisionId: string) => void) | undefined;
};

/** The cell that stands for a revision, its name, its state, and how far its colour is from the reference's. */
export function ColumnHead({ revision, reference, onRemove }: ColumnHeadProps) {
  const cell = markedCellOf(revision.evidence);
  const name = revisionName(revision);
  return (
    <chakra.div display="grid" gridTemplateColumns="88px minmax(0, 1fr)" gap="3.5">
      {cell === undefined ? (
        <chakra.span color="fg.muted">{noMarkWords(revision)}</chakra.span>
      ) : (
        <CellCloseUp shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'large')} address={cell.address} />
      )}
      <div>
        <TextLink
          to={paths.recipeRevision(revision.recipe.code, revision.id)}
          color="fg"
          textDecoration="none"
          fontSize="lg"
          fontWeight="semibold"
        >
          {name}
        </TextLink>
        <chakra.div>
          <StateMark state={markOf(revision)} />
        </chakra.div>
        {cell !== undefined && (
          <chakra.div color="fg.muted">
            {cell.couponCode} {cell.address}
          </chakra.div>
        )}
        <Colour revision={revision} reference={reference} />
        {onRemove !== undefined && (
          <chakra.button
            type="button"
            onClick={() => onRemove(revision.id)}
            minHeight={{ base: '44px', lg: '28px' }}
            color="brand.fg"
            textDecoration="underline"
            cursor="pointer"
          >
            Leave out<chakra.span srOnly> {name.toLowerCase()}</chakra.span>
          </chakra.button>
        )}
      </div>
    </chakra.div>
  );
}

/** The picture of another setting would be no evidence of this one. */
function noMarkWords({ evidence: { basis, confirmation }, state }: Revision): string {
  if (basis.length + confirmation.length === 0) return 'no coupon';
  return state === 'draft' || state === 'in_review' ? 'no mark of this setting yet' : 'no coupon cell of this setting';
}

function Colour({ revision, reference }: Pick<ColumnHeadProps, 'revision' | 'reference'>) {
  const cell = markedCellOf(revision.evidence);
  const lab = labOf(cell);
  const difference = revision.id === reference?.id ? undefined : colourDifference(reference && markedCellOf(reference.evidence), cell);
  return (
    <chakra.div display="flex" gap="1.5" alignItems="center" mt="1" whiteSpace="nowrap">
      {lab !== undefined && <Swatch colour={cssColour(lab)} />}
      {revision.id === reference?.id && <chakra.span color="fg.muted">the reference</chakra.span>}
      {difference?.deltaE !== undefined && (
        <span>
          ΔE<chakra.sub fontSize="0.75em">00</chakra.sub> <b>{formatNumber(difference.deltaE, { decimals: 1 })}</b>
        </span>
      )}
      {difference !== undefined && difference.deltaE === undefined && difference.words}
    </chakra.div>
  );
}
