import { chakra, Flex } from '@chakra-ui/react';
import { couponLayout } from '@proofplate/imaging';
import { PANEL_UNITS } from '@proofplate/physics';
import { PARAMETERS, type Panel } from '@proofplate/recipe-model';
import { memo, type ReactNode, useMemo } from 'react';
import { CautionIcon } from '../../../components/icons';
import { Panel as Card } from '../../../components/page';
import { HeatLegend } from '../../../components/plate/heat-legend';
import { Plate } from '../../../components/plate/plate';
import type { PlateCells } from '../../../components/plate/plate-types';
import { type PlateFactor, PlateWithLevels } from '../../../components/plate/plate-with-levels';
import { responseScale } from '../../../components/plate/response-scale';
import { asSentence, formatEntered, formatLengths, formatNumber, inShopNumbers } from '../../../lib/format';
import { basisWords, headOverheadsOf, timeText, timeWithError } from '../../../lib/time-words';
import type { CouponPreview } from '../coupons.api';

/** Warnings whose cells are flagged on the plate; the others are named in words only. */
const FLAGGED = ['dose', 'pulse-energy', 'out-of-range'];

export type PlanPreviewProps = {
  preview: CouponPreview;
  panel: Panel;
  cellMm: number;
  gapMm: number;
  /** Address of the cell whose numbers are shown. */
  chosen: string | undefined;
  onChoose: (address: string) => void;
};

/** The right half of the plan: what it would give. A plate of many cells is drawn again only when it differs. */
export const PlanPreview = memo(PlanPreviewCells);

function PlanPreviewCells({ preview, panel, cellMm, gapMm, chosen, onChoose }: PlanPreviewProps) {
  const { rows, columns, cells, warnings } = preview;
  const layout = useMemo(() => couponLayout({ rows, columns, cellMm, gapMm, reference: 'plan' }), [rows, columns, cellMm, gapMm]);
  const doses = cells.flatMap(({ dose }) => (dose.value === null ? [] : [dose.value]));
  const scale = responseScale(doses);
  const views = useMemo(() => viewsOf(preview), [preview]);
  const place = cells.find(({ address }) => address === chosen);
  return (
    <chakra.div display="grid" gap="4">
      <PlateWithLevels
        layout={layout}
        rowFactor={factorOf(preview.rowFactor, panel)}
        columnFactor={factorOf(preview.columnFactor, panel)}
        chosen={place === undefined ? undefined : { row: place.rowIndex, column: place.columnIndex }}
      >
        <Plate
          layout={layout}
          cells={views}
          scale={scale}
          chosen={chosen}
          onChoose={onChoose}
          label={`Plan of the plate, ${rows} rows, ${columns} columns, coloured by dose`}
        />
      </PlateWithLevels>
      {scale !== undefined && (
        <chakra.div pl={{ base: '0', sm: '48px' }}>
          <HeatLegend title="Dose, J/mm²" scale={scale} lowText={doseText(scale.min)} highText={doseText(scale.max)} />
        </chakra.div>
      )}
      {place !== undefined && <ChosenCell preview={preview} place={place} />}
      {warnings.map(({ code, title, detail, addresses }) => (
        <Warning key={code + title}>
          <b>{title}</b>
          {addresses.length > 0 && <chakra.span color="fg.muted"> ({namedCells(addresses, FLAGGED.includes(code))})</chakra.span>}.{' '}
          {inShopNumbers(detail)}
        </Warning>
      ))}
    </chakra.div>
  );
}

function Warning({ children }: { children: ReactNode }) {
  return (
    <Flex gap="3" p="3.5" bg="straw.subtle" border="hairline" borderColor="straw.emphasized" borderRadius="md">
      <chakra.span pt="0.5" lineHeight="none">
        <CautionIcon />
      </chakra.span>
      <chakra.p minW="0">{children}</chakra.p>
    </Flex>
  );
}

function ChosenCell({ preview, place }: { preview: CouponPreview; place: CouponPreview['cells'][number] }) {
  const level = (factor: CouponPreview['rowFactor'], index: number) => {
    const value = factor?.levels[index]?.entered;
    if (factor === null || value === undefined) return undefined;
    return `${PARAMETERS[factor.parameter].label.toLowerCase()} ${formatEntered(value.value)} ${PANEL_UNITS[value.unit].symbol}`;
  };
  const words = [level(preview.rowFactor, place.rowIndex), level(preview.columnFactor, place.columnIndex)].filter(
    (word) => word !== undefined,
  );
  const dose = place.dose.value === null ? 'no dose' : `${doseText(place.dose.value)} J/mm²`;
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" role="status">
      <b>{place.address}</b> {[...words, dose].join(', ')}, marked as number {place.runOrder}
    </chakra.p>
  );
}

/** Marking time and plate, as far as they are known, with what they rest on. */
export function PlanFacts({ preview, children }: { preview: CouponPreview; children: ReactNode }) {
  const { cells, markingTime, plate, powerBasis, spotUm } = preview;
  const { totalS, errorS, missingBecause, quickestCellS, slowestCellS } = markingTime;
  return (
    <Card p="5" display="flex" flexWrap="wrap" alignItems="center" gap="4" rowGap="3">
      <Fact
        label={`${cells.length} cells, marking time`}
        note={missingBecause === null ? cellTimeWords(quickestCellS, slowestCellS) : inShopNumbers(missingBecause)}
      >
        {totalS === null ? 'not known' : timeWithError({ totalS, errorS })}
      </Fact>
      <Fact label="Plate needed">{formatLengths(Math.ceil(plate.widthMm), Math.ceil(plate.heightMm))}</Fact>
      <chakra.p flexBasis="full" order="3" fontSize="sm" lineHeight="sm" color="fg.muted">
        {BASIS_WORDS[powerBasis]}
        {spotUm !== null && `, spot ${formatNumber(spotUm, { decimals: 0 })} µm`}. Time{' '}
        {asSentence(basisWords(headOverheadsOf(markingTime.overheads)))} Labels not counted.
      </chakra.p>
      <Flex gap="2" wrap="wrap" ml="auto" align="center">
        {children}
      </Flex>
    </Card>
  );
}

/** One cell, or from the quickest to the slowest. */
function cellTimeWords(quickestS: number | null, slowestS: number | null): string | undefined {
  if (quickestS === null || slowestS === null) return undefined;
  const [quickest, slowest] = [timeText(quickestS), timeText(slowestS)];
  return quickest === slowest ? `${quickest} a cell` : `${quickest} to ${slowest} a cell`;
}

const BASIS_WORDS: Readonly<Record<CouponPreview['powerBasis'], string>> = {
  calibration: 'Watts from the newest power calibration',
  'not calibrated': 'Watts from the rated power, not calibrated',
  mixed: 'Watts from the calibration in some cells only',
  unknown: 'Watts not known',
};

function Fact({ label, note, children }: { label: string; note?: string | undefined; children: ReactNode }) {
  return (
    <chakra.div minW="0">
      <chakra.div fontSize="sm" lineHeight="sm" color="fg.muted">
        {label}
      </chakra.div>
      <chakra.div fontSize="2xl" lineHeight="title" fontWeight="semibold" whiteSpace="nowrap">
        {children}
      </chakra.div>
      {note !== undefined && (
        <chakra.div fontSize="sm" lineHeight="sm" color="fg.muted" maxW="260px">
          {note}
        </chakra.div>
      )}
    </chakra.div>
  );
}

function viewsOf({ cells, warnings, rowFactor, columnFactor }: CouponPreview): PlateCells {
  const flagged = new Set(warnings.filter(({ code }) => FLAGGED.includes(code)).flatMap(({ addresses }) => addresses));
  const spoken = (factor: CouponPreview['rowFactor'], index: number) => {
    const value = factor?.levels[index]?.entered;
    return factor === null || value === undefined
      ? undefined
      : `${PARAMETERS[factor.parameter].label.toLowerCase()} ${formatEntered(value.value)} ${PANEL_UNITS[value.unit].spoken}`;
  };
  const views: Record<string, PlateCells[string]> = {};
  for (const { address, rowIndex, columnIndex, dose } of cells) {
    const factors = [spoken(rowFactor, rowIndex), spoken(columnFactor, columnIndex)];
    const words = [...factors, dose.value === null ? undefined : `dose ${doseText(dose.value)}`].filter((part) => part !== undefined);
    views[address] = {
      fill: dose.value === null ? { kind: 'blank' } : { kind: 'response', value: dose.value, text: doseText(dose.value) },
      description: words.join(', '),
      isFlagged: flagged.has(address),
    };
  }
  return views;
}

/** Two figures are enough to see where a cell lies; 10 and more have one decimal. */
function doseText(value: number): string {
  return formatNumber(value, value >= 10 ? { decimals: value >= 100 ? 0 : 1 } : { significantDigits: 2 });
}

const MOST_NAMED = 12;

function namedCells(addresses: readonly string[], isFlagged: boolean): string {
  const named = addresses.slice(0, MOST_NAMED).join(', ');
  const rest = addresses.length > MOST_NAMED ? ` and ${addresses.length - MOST_NAMED} more` : '';
  return `${named}${rest}${isFlagged ? ', marked at the corner' : ''}`;
}

function factorOf(factor: CouponPreview['rowFactor'], panel: Panel): PlateFactor {
  const [first] = factor?.levels ?? [];
  if (factor === null || first === undefined) return { title: '', levels: [''] };
  const label = panel.fields.find(({ parameter }) => parameter === factor.parameter)?.label ?? PARAMETERS[factor.parameter].label;
  const title = `${label}, ${PANEL_UNITS[first.entered.unit].symbol}`;
  return { title, levels: factor.levels.map(({ entered }) => formatEntered(entered.value)) };
}
