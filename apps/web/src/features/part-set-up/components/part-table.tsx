import { chakra } from '@chakra-ui/react';
import type { LengthUnit, PartNumber, PartResults } from '@proofplate/recipe-model';
import { DataTable } from '../../../components/data-table';
import { TextLink } from '../../../components/text-link';
import { inShopNumbers } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { inputText, numberLabel, valueText } from '../part-words';

export type PartTableProps = { results: PartResults; shownIn: LengthUnit; locale: string };

/** Everything the picture shows and all that it rests on: value, formula, what went in, source. */
export function PartTable({ results, shownIn, locale }: PartTableProps) {
  const rows = results.numbers.filter(({ isRuledOutByMode }) => !isRuledOutByMode);
  return (
    <DataTable<PartNumber>
      label="All measures of the part"
      density="dense"
      rows={rows}
      rowKey={({ key }) => key}
      columns={[
        { key: 'measure', header: 'Measure', cell: ({ key }) => numberLabel(key), onPhone: 'title' },
        { key: 'value', header: 'Value', cell: (number) => <Value number={number} shownIn={shownIn} locale={locale} /> },
        { key: 'formula', header: 'Formula', cell: ({ formula }) => formula },
        { key: 'inputs', header: 'From', cell: ({ inputs }) => inputText(inputs, locale), onPhone: 'hidden' },
        { key: 'source', header: 'Source', cell: ({ source }) => <Source source={source} /> },
      ]}
    />
  );
}

/** A page of docs/science, which the application shows itself. */
const SCIENCE_PAGE = /(?:; )?docs\/science\/([a-z-]+)\.md$/u;

function Source({ source }: { source: string }) {
  const page = SCIENCE_PAGE.exec(source)?.[1];
  if (page === undefined) return source;
  return (
    <span>
      {source.replace(SCIENCE_PAGE, '')} <TextLink to={paths.science(page)}>{page}</TextLink>
    </span>
  );
}

function Value({ number, shownIn, locale }: { number: PartNumber; shownIn: LengthUnit; locale: string }) {
  if (number.value === null)
    return <chakra.span color="fg.muted">not known because {inShopNumbers(number.missingBecause ?? '')}</chakra.span>;
  return (
    <>
      <chakra.b whiteSpace="nowrap">{valueText(number, shownIn, locale)}</chakra.b>
      {number.outOfRange !== null && (
        <chakra.span display="block" color="straw.fg">
          Outside the formula’s range: {inShopNumbers(number.outOfRange)}
        </chakra.span>
      )}
    </>
  );
}
