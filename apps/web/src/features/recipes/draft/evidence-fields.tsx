import { chakra, Flex } from '@chakra-ui/react';
import { COUPON_STATE_LABELS } from '@proofplate/recipe-model';
import { useId, useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { Checkbox } from '../../../components/facets';
import { Panel } from '../../../components/page';
import { CellCloseUp } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { shapeOf } from '../../../components/plate/proof-marks';
import { ProblemNotice } from '../../../components/problem-notice';
import { SkeletonBlock } from '../../../components/skeletons';
import { StateMark } from '../../../components/state-mark';
import { ProblemError } from '../../../lib/api';
import { formatCount, formatNumber } from '../../../lib/format';
import { EvidencePlates } from '../components/evidence-plates';
import { type EvidenceCell, type EvidenceChoice, type Revision, setEvidence, useEvidenceCandidates } from '../recipes.api';
import type { Draft } from './use-draft';

/** What the draft rests on and what proved it, and the way to choose other cells. */
export function EvidenceFields({ revision, draft }: { revision: Revision; draft: Draft }) {
  const [isChoosing, setIsChoosing] = useState(false);
  return (
    <Panel px="5" py="4" aria-label="Evidence">
      <Flex justify="space-between" align="center" gap="3" wrap="wrap" mb="2">
        <h2>Evidence</h2>
        <Button onClick={() => setIsChoosing(true)}>Choose cells</Button>
      </Flex>
      <EvidencePlates evidence={revision.evidence} />
      <ProofOffers revision={revision} draft={draft} />
      {isChoosing && <EvidenceDialog revision={revision} draft={draft} onClose={() => setIsChoosing(false)} />}
    </Panel>
  );
}

/** Marks that prove exactly this setting and are cited by nobody yet: one act cites all of a coupon. */
function ProofOffers({ revision, draft }: { revision: Revision; draft: Draft }) {
  const { data } = useEvidenceCandidates(revision.id);
  const [problem, setProblem] = useState<ProblemError>();
  const { basis, confirmation } = revision.evidence;
  const cited = confirmation.map(({ cellId }) => cellId);
  const offers = byCoupon(data?.confirmation.filter(({ cellId }) => !cited.includes(cellId)) ?? []);
  const handleCite = async (cells: readonly EvidenceCell[]) => {
    const confirmationCellIds = [...cited, ...cells.map(({ cellId }) => cellId)];
    try {
      await draft.changeWith((version) =>
        setEvidence(revision.id, version, { basisCellIds: basis.map(({ cellId }) => cellId), confirmationCellIds }),
      );
      setProblem(undefined);
    } catch (failure) {
      if (!(failure instanceof ProblemError)) throw failure;
      setProblem(failure);
    }
  };
  return (
    <>
      {problem !== undefined && (
        <ProblemNotice what={`Nothing was changed. ${problem.title}.`} todo={problem.errors[0]?.detail ?? problem.detail} />
      )}
      {offers.map((cells) => (
        <Flex key={cells[0]?.couponId} justify="space-between" align="center" gap="3" wrap="wrap" mt="3">
          <span>
            <b>{cells[0]?.couponCode}</b> has {formatCount(cells.length, 'later mark')} with exactly this setting.
          </span>
          <Button onClick={() => void handleCite(cells)}>{cells.length === 1 ? 'Cite its mark' : `Cite its ${cells.length} marks`}</Button>
        </Flex>
      ))}
    </>
  );
}

function byCoupon(cells: readonly EvidenceCell[]): EvidenceCell[][] {
  const ids = [...new Set(cells.map(({ couponId }) => couponId))];
  return ids.map((id) => cells.filter(({ couponId }) => couponId === id));
}

type EvidenceDialogProps = { revision: Revision; draft: Draft; onClose: () => void };

function EvidenceDialog({ revision, draft, onClose }: EvidenceDialogProps) {
  const { data, error } = useEvidenceCandidates(revision.id);
  const [choice, setChoice] = useState<EvidenceChoice>(() => ({
    basisCellIds: revision.evidence.basis.map(({ cellId }) => cellId),
    confirmationCellIds: revision.evidence.confirmation.map(({ cellId }) => cellId),
  }));
  const [problem, setProblem] = useState<ProblemError>();
  const [isBusy, setIsBusy] = useState(false);
  const handleSave = async () => {
    setIsBusy(true);
    try {
      await draft.changeWith((version) => setEvidence(revision.id, version, choice));
      onClose();
    } catch (failure) {
      if (!(failure instanceof ProblemError)) throw failure;
      setProblem(failure);
      setIsBusy(false);
    }
  };
  const { basis, confirmation } = revision.evidence;
  return (
    <Dialog
      title="Cells that are cited"
      width="broad"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Leave as it is</Button>
          <Button kind="primary" isBusy={isBusy} onClick={() => void handleSave()}>
            Cite these cells
          </Button>
        </>
      }
    >
      {problem !== undefined && (
        <ProblemNotice what={`Nothing was changed. ${problem.title}.`} todo={problem.errors[0]?.detail ?? problem.detail} />
      )}
      {error !== undefined && <ProblemNotice what="The cells could not be read." todo={error.detail} />}
      {data === undefined && error === undefined && <SkeletonBlock height="240px" label="Looking for cells" />}
      {data !== undefined && (
        <chakra.div display="grid" gap="5">
          <CellChoice
            title="Where the setting comes from"
            help="Best rated cells of this material, finish, machine and lens. Only a sealed coupon counts."
            cells={withCited(basis, data.basis)}
            chosen={choice.basisCellIds}
            onChange={(basisCellIds) => setChoice({ ...choice, basisCellIds })}
          />
          <CellChoice
            title="What proved it again"
            help="Later marks with exactly the essential parameters of this draft."
            cells={withCited(confirmation, data.confirmation)}
            chosen={choice.confirmationCellIds}
            onChange={(confirmationCellIds) => setChoice({ ...choice, confirmationCellIds })}
          />
        </chakra.div>
      )}
    </Dialog>
  );
}

function withCited(cited: readonly EvidenceCell[], candidates: readonly EvidenceCell[]): EvidenceCell[] {
  return [...cited, ...candidates.filter(({ cellId }) => !cited.some((own) => own.cellId === cellId))];
}

type CellChoiceProps = {
  title: string;
  help: string;
  cells: readonly EvidenceCell[];
  chosen: readonly string[];
  onChange: (cellIds: readonly string[]) => void;
};

function CellChoice({ title, help, cells, chosen, onChange }: CellChoiceProps) {
  return (
    <chakra.fieldset minW="0">
      <chakra.legend fontWeight="semibold">{title}</chakra.legend>
      <chakra.p fontSize="sm" color="fg.muted" mb="2">
        {help}
      </chakra.p>
      {cells.length === 0 && <p>There is no such cell yet.</p>}
      <chakra.div display="grid" gap="2" gridTemplateColumns="repeat(auto-fill, minmax(200px, 1fr))">
        {cells.map((cell) => (
          <CellOption
            key={cell.cellId}
            cell={cell}
            isChosen={chosen.includes(cell.cellId)}
            onToggle={(isOn) => onChange(isOn ? [...chosen, cell.cellId] : chosen.filter((id) => id !== cell.cellId))}
          />
        ))}
      </chakra.div>
    </chakra.fieldset>
  );
}

function CellOption({ cell, isChosen, onToggle }: { cell: EvidenceCell; isChosen: boolean; onToggle: (isOn: boolean) => void }) {
  const { couponCode, address, couponState, meanRating, essentialDifferences, meets } = cell;
  // The same cell may stand in both lists, so its own id would not tell the boxes apart.
  const boxId = useId();
  return (
    <chakra.label
      htmlFor={boxId}
      display="grid"
      gridTemplateColumns="26px 52px minmax(0, 1fr)"
      gap="2"
      alignItems="center"
      p="2"
      border="hairline"
      borderColor={isChosen ? 'brand.solid' : 'border.emphasized'}
      borderRadius="md"
      bg={isChosen ? 'brand.subtle' : undefined}
      fontSize="sm"
      lineHeight="sm"
      cursor="pointer"
    >
      <Checkbox id={boxId} checked={isChosen} onChange={(event) => onToggle(event.currentTarget.checked)} />
      <CellCloseUp shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'small')} address={address} />
      <span>
        <b>
          {couponCode} {address}
        </b>
        <br />
        {meanRating === null ? 'not rated' : `rated ${formatNumber(Number(meanRating.toFixed(1)))}`},{' '}
        {COUPON_STATE_LABELS[couponState].toLowerCase()}
        {meets === false && <StateMark state="fails">outside criteria</StateMark>}
        {essentialDifferences.length > 0 && (
          <chakra.span display="block" color="straw.fg">
            differs: {essentialDifferences.join(', ')}
          </chakra.span>
        )}
      </span>
    </chakra.label>
  );
}
