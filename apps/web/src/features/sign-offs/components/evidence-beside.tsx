import { chakra, Flex } from '@chakra-ui/react';
import { couponLayout } from '@proofplate/imaging';
import { ROUTE_KIND_LABELS } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { CellCloseUp, EvidencePlate } from '../../../components/plate/evidence-plate';
import { PlainPhoto } from '../../../components/plate/plain-photo';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { ProofMarks, shapeOf } from '../../../components/plate/proof-marks';
import { type MarkState, StateMark } from '../../../components/state-mark';
import { Swatch } from '../../../components/swatch';
import { TextLink } from '../../../components/text-link';
import { colourDifference, cssColour, labOf, measured } from '../../../lib/colour-difference';
import { formatNumber } from '../../../lib/format';
import { markedCellOf } from '../../../lib/marked-cell';
import { decimalsOf } from '../../../lib/measurement-words';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import type { EvidenceCell, Revision } from '../sign-offs.api';

export type EvidenceBesideProps = { current: Revision | undefined; proposed: Revision };

/** Evidence comes first: both plates in one scale, both cells, how they differ, and the marks that proved it again. */
export function EvidenceBeside({ current, proposed }: EvidenceBesideProps) {
  const { shop } = useSession();
  const cells = [current && shownCell(current), shownCell(proposed)] as const;
  const widestMm = Math.max(0, ...cells.map((cell) => (cell === undefined ? 0 : plateWidthMm(cell))));
  const { confirmation, runs } = proposed.evidence;
  const isOpen = proposed.state === 'in_review';
  return (
    <Panel aria-label="Evidence">
      <chakra.div display="grid" gridTemplateColumns={`repeat(auto-fit, minmax(min(100%, ${LEAST_SIDE}), 1fr))`} overflow="hidden">
        {current !== undefined && (
          <Side
            title={`${isOpen ? 'Current' : 'Before'}, revision ${current.number}`}
            mark={<StateMark state={MARK_OF[current.state]} />}
            revision={current}
            cell={cells[0]}
            widestMm={widestMm}
          />
        )}
        <Side
          title={`${isOpen ? 'Proposed, revision' : 'Revision'} ${proposed.number}`}
          mark={<StateMark state={MARK_OF[proposed.state]} />}
          revision={proposed}
          cell={cells[1]}
          widestMm={widestMm}
        />
      </chakra.div>
      {current !== undefined && <Difference current={current} proposed={proposed} />}
      <Strip>
        {confirmation.length > 0 ? (
          <ProofMarks cells={confirmation} timeZone={shop.timeZone} />
        ) : (
          runs.length === 0 && <chakra.span color="fg.muted">Nothing has proved it again yet.</chakra.span>
        )}
        {runs.map(({ runId, code, pieceCount, meetingCount }) => (
          <p key={runId}>
            <b>Proved again on </b>
            <TextLink to={paths.run(code)}>{code}</TextLink>: {meetingCount} of {pieceCount} pieces within the criteria
          </p>
        ))}
      </Strip>
    </Panel>
  );
}

/** The mark of this very setting; a setting that nobody marked yet shows where it comes from, and says so. */
const shownCell = ({ evidence }: Revision) => markedCellOf(evidence) ?? evidence.basis[0];

const MARK_OF: Record<Revision['state'], MarkState> = {
  draft: 'draft',
  in_review: 'inReview',
  returned: 'returned',
  scheduled: 'approved',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

/** A side holds a plate and its cell's numbers; two that do not fit stand one below the other, whatever the screen. */
const LEAST_SIDE = '256px';
const LEAST_PIECE = '104px';

type SideProps = { title: string; mark: ReactNode; revision: Revision; cell: EvidenceCell | undefined; widestMm: number };

function Side({ title, mark, revision, cell, widestMm }: SideProps) {
  return (
    // The line towards a neighbour falls on the panel's own where there is none.
    <chakra.div px="4" py="3" ml="-1px" mt="-1px" borderLeft="hairline" borderTop="hairline">
      <Flex justify="space-between" gap="3" wrap="wrap">
        <b>{title}</b>
        {mark}
      </Flex>
      {cell === undefined ? (
        <NoCoupon revision={revision} />
      ) : (
        <chakra.div
          display="grid"
          gridTemplateColumns={`repeat(auto-fit, minmax(${LEAST_PIECE}, 1fr))`}
          gap="3.5"
          mt="2"
          alignItems="start"
        >
          <chakra.div maxW="200px">
            <EvidencePlate shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'large')} chosen={cell.address} widestMm={widestMm} />
            <chakra.p fontSize="sm" lineHeight="sm" pt="1.5">
              <TextLink color="fg.muted" to={`${paths.coupon(cell.couponCode)}?cell=${cell.address}`}>
                {cell.couponCode}, cell {cell.address}
              </TextLink>
              {cell.essentialDifferences.length > 0 && (
                <chakra.span display="block" color="straw.fg">
                  no mark of this setting yet: {cell.essentialDifferences.join(', ').toLowerCase()} differs
                </chakra.span>
              )}
            </chakra.p>
          </chakra.div>
          <chakra.div maxW="148px">
            <CellPicture cell={cell} />
            <CellNumbers cell={cell} />
          </chakra.div>
        </chakra.div>
      )}
    </chakra.div>
  );
}

/** The cell out of the photo; a photo without corners stands as it was taken, since no cell can be cut out of it. */
function CellPicture({ cell }: { cell: EvidenceCell }) {
  const photo = platePhotoOf(cell.photo, 'large');
  const urls = cell.photo?.urls ?? null;
  if (photo !== undefined || urls === null) return <CellCloseUp shape={shapeOf(cell)} photo={photo} address={cell.address} />;
  return (
    <>
      <PlainPhoto urls={urls} label={`Photo of ${cell.couponCode}`} />
      <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
        The whole plate as it was taken: its corners are not set.
      </chakra.p>
    </>
  );
}

/** Another route: its grounds are the evidence, in the words of the lead who gave them. */
function NoCoupon({ revision: { route, grounds, groundsBy } }: { revision: Revision }) {
  return (
    <>
      <chakra.p mt="2">
        <chakra.b color="straw.fg">{ROUTE_KIND_LABELS[route]}.</chakra.b> It rests on no coupon.
      </chakra.p>
      {route !== 'coupons' && (
        <chakra.p mt="1" overflowWrap="break-word">
          {grounds === '' ? (
            <chakra.span color="oxide.fg">No lead has written grounds.</chakra.span>
          ) : (
            <>
              <b>Grounds{groundsBy === null ? '' : ` of ${groundsBy.name}`}: </b>
              {grounds}
            </>
          )}
        </chakra.p>
      )}
    </>
  );
}

const SHOWN = ['lightness', 'contrast', 'evenness', 'depth'] as const;

function CellNumbers({ cell }: { cell: EvidenceCell }) {
  const lab = labOf(cell);
  const facts = SHOWN.flatMap((quantity) => {
    const value = measured(cell, quantity);
    if (value === undefined) return [];
    const text = formatNumber(value, { decimals: decimalsOf(quantity) });
    const label = quantity === 'lightness' ? 'L*' : quantity.charAt(0).toUpperCase() + quantity.slice(1);
    return [
      {
        label,
        value:
          quantity === 'lightness' && lab !== undefined ? (
            <chakra.span display="inline-flex" gap="1" alignItems="center">
              <Swatch colour={cssColour(lab)} />
              {text}
            </chakra.span>
          ) : (
            text
          ),
      },
    ];
  });
  const rating = cell.meanRating === null ? [] : [{ label: 'Rating', value: formatNumber(Number(cell.meanRating.toFixed(1))) }];
  return <FactList facts={[...facts, ...rating]} />;
}

/** ΔE00 is named as such: other colour differences are in use. */
function Difference({ current, proposed }: { current: Revision; proposed: Revision }) {
  const difference = colourDifference(markedCellOf(current.evidence), markedCellOf(proposed.evidence));
  return (
    <Strip>
      <Flex justify="space-between" gap="3" wrap="wrap">
        <span>
          {difference === undefined ? (
            <chakra.span color="fg.muted">The colour of both cells was not measured, so their difference is not known.</chakra.span>
          ) : (
            <>
              {difference.deltaE !== undefined && (
                <b>
                  ΔE<chakra.sub fontSize="0.75em">00</chakra.sub> {formatNumber(difference.deltaE, { decimals: 1 })}{' '}
                </b>
              )}
              between the two cells: {difference.words}
            </>
          )}
        </span>
        <TextLink to={`${paths.compareRevisions(proposed.recipe.code)}?ids=${current.id},${proposed.id}`}>Compare closely</TextLink>
      </Flex>
    </Strip>
  );
}

function Strip({ children }: { children: ReactNode }) {
  return (
    <chakra.div borderTop="hairline" px="4" py="2.5">
      {children}
    </chakra.div>
  );
}

function plateWidthMm(cell: EvidenceCell): number {
  const { code, ...shape } = shapeOf(cell);
  return couponLayout({ ...shape, reference: code }).plate.widthMm;
}
