import { Box, chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Button } from '../../../../components/button';
import { ChevronLeftIcon, ChevronRightIcon } from '../../../../components/icons';
import { Panel } from '../../../../components/page';
import { CellCloseUp } from '../../../../components/plate/evidence-plate';
import type { PlatePhoto } from '../../../../components/plate/flat-photo';
import type { Coupon, CouponCell } from '../../coupons.api';
import type { Inspection } from '../log.api';
import type { PlateChoice } from '../use-plate-choice';
import { CellFacts } from './cell-facts';
import { CellSettings } from './cell-settings';
import { CellVerdictLine } from './cell-verdict-line';

export type CellPanelProps = {
  coupon: Coupon;
  inspection: Inspection;
  choice: PlateChoice;
  photo: PlatePhoto | undefined;
  decimalSign: '.' | ',';
  /** "rated 5 by you, 09:24". */
  status: ReactNode;
  onStep: (step: 1 | -1) => void;
  /** Rating, tags, note and the acts. */
  children: ReactNode;
};

export const CELL_PANEL_ID = 'cell';
const Section = chakra('div', { base: { borderTop: 'hairline', mx: '-5', px: '5', py: '3' } });

/** Everything about the chosen cell. */
export function CellPanel({ coupon, inspection, choice, photo, decimalSign, status, onStep, children }: CellPanelProps) {
  const { cell } = choice;
  return (
    <Panel id={CELL_PANEL_ID} tabIndex={-1} aria-label={`Cell ${cell.address}`} px="5" pt="3.5" pb="5" outline="none">
      <Flex align="center" gap="3" mb="2.5">
        <chakra.h2 fontSize={{ base: '3xl', sm: '5xl' }} lineHeight={{ base: '2xl', sm: '5xl' }} fontWeight="bold">
          {cell.address}
        </chakra.h2>
        <chakra.div color="fg.muted" flex="1" minW="0" pt="2">
          {status}
        </chakra.div>
        <Flex gap="2" display={{ base: 'none', lg: 'flex' }}>
          <Button shape="square" aria-label="Cell before" icon={<ChevronLeftIcon />} onClick={() => onStep(-1)} />
          <Button shape="square" aria-label="Next cell" icon={<ChevronRightIcon />} onClick={() => onStep(1)} />
        </Flex>
      </Flex>
      <Box display="grid" gridTemplateColumns={{ base: '84px minmax(0, 1fr)', sm: '132px minmax(0, 1fr)' }} gap="5" pb="3">
        <CellPicture coupon={coupon} choice={choice} photo={photo} />
        <CellFacts coupon={coupon} cell={cell} inspection={inspection} />
      </Box>
      <CellVerdictLine verdict={inspection.verdicts.find(({ cellId }) => cellId === cell.id)} count={judgedCount(inspection)} />
      <Section>
        <CellSettings coupon={coupon} cell={cell} decimalSign={decimalSign} />
        <MarkNote cell={cell} />
      </Section>
      <Section pb="0">{children}</Section>
    </Panel>
  );
}

function CellPicture({ coupon, choice: { grid, cell }, photo }: Pick<CellPanelProps, 'coupon' | 'choice' | 'photo'>) {
  const { rows, columns, cellMm, gapMm } = grid;
  return <CellCloseUp shape={{ rows, columns, cellMm, gapMm, code: coupon.code }} photo={photo} address={cell.address} />;
}

function MarkNote({ cell }: { cell: CouponCell }) {
  if (cell.markState !== 'skipped' && cell.markNote === '') return null;
  const word = cell.markState === 'skipped' ? 'Skipped when the plate was marked' : 'Noted when the plate was marked';
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mt="1.5">
      {word}
      {cell.markNote === '' ? '.' : `: ${cell.markNote}`}
    </chakra.p>
  );
}

const judgedCount = ({ verdicts }: Inspection) => verdicts.filter(({ rank }) => rank !== null).length;
