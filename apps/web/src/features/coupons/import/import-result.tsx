import { chakra } from '@chakra-ui/react';
import { couponLayout } from '@proofplate/imaging';
import { PARAMETER_KEYS, PARAMETERS } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import { Panel as Card } from '../../../components/page';
import { Plate } from '../../../components/plate/plate';
import type { PlateCells } from '../../../components/plate/plate-types';
import { responseScale } from '../../../components/plate/response-scale';
import { formatCount, formatNumber } from '../../../lib/format';
import type { ImportPreview } from '../coupons.api';

const CIRCUMSTANCES: Readonly<Record<string, string>> = {
  fill: 'fill',
  assist: 'assist',
  cellMm: 'size of a cell',
  gapMm: 'gap between cells',
  markedAt: 'when it was marked',
  markedBy: 'who marked it',
  profile: 'whether the machine is unchanged',
};

/** A field that nobody knows, in words. */
export function unknownWord(field: string): string {
  const parameter = PARAMETER_KEYS.find((key) => key === field);
  return parameter === undefined ? (CIRCUMSTANCES[field] ?? field) : PARAMETERS[parameter].label.toLowerCase();
}

/** What will be stored, what stays unknown, and every refused row. */
export function ImportResult({ preview }: { preview: ImportPreview }) {
  const { rows, columns, cells, refusedRows, ignoredHeadings, unknownFields } = preview;
  const layout = useMemo(
    () => (rows > 0 && columns > 0 ? couponLayout({ rows, columns, reference: 'import' }) : undefined),
    [rows, columns],
  );
  const scale = responseScale(cells.flatMap(({ dose }) => (dose.value === null ? [] : [dose.value])));
  return (
    <chakra.div display="grid" gap="4">
      {layout !== undefined && (
        <Plate
          layout={layout}
          cells={viewsOf(preview)}
          scale={scale}
          label={`The plate as it will be entered, ${formatCount(cells.length, 'square')}`}
        />
      )}
      <Card p="4" display="grid" gap="1">
        <chakra.p fontWeight="semibold">{formatCount(cells.length, 'square')} can be entered</chakra.p>
        {unknownFields.length > 0 && <chakra.p>Stays unknown: {unknownFields.map(unknownWord).join(', ')}.</chakra.p>}
        {ignoredHeadings.length > 0 && <chakra.p>Left out, since it says nothing here: {ignoredHeadings.join(', ')}.</chakra.p>}
      </Card>
      {refusedRows.length > 0 && (
        <Card p="4" role="region" aria-labelledby="refused-rows" borderColor="oxide.emphasized">
          <chakra.h2 id="refused-rows" fontSize="md" lineHeight="md" color="oxide.fg">
            {formatCount(refusedRows.length, 'row')} cannot be read
          </chakra.h2>
          <chakra.ul mt="2" display="grid" gap="2">
            {refusedRows.map(({ line, text, reason }) => (
              <li key={line}>
                <b>Line {line}</b> <chakra.span color="fg.muted">{text}</chakra.span>
                <chakra.span display="block">{reason}</chakra.span>
              </li>
            ))}
          </chakra.ul>
        </Card>
      )}
    </chakra.div>
  );
}

function viewsOf({ cells }: ImportPreview): PlateCells {
  const views: Record<string, PlateCells[string]> = {};
  for (const { address, dose } of cells) {
    const text = dose.value === null ? '' : formatNumber(dose.value, { significantDigits: 2 });
    views[address] = { fill: dose.value === null ? { kind: 'missing' } : { kind: 'response', value: dose.value, text } };
  }
  return views;
}
