import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatClock, formatDate } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { kindWord, revisionWords, runMark } from '../run-words';
import type { RunSummary } from '../runs.api';

export function RunTable({ runs, onJob }: { runs: readonly RunSummary[]; onJob: (jobReference: string) => void }) {
  const { shop } = useSession();
  return (
    <DataTable
      label="Runs"
      columns={columns(shop.timeZone, onJob)}
      rows={runs}
      rowKey={({ id }) => id}
      isHighlighted={({ state }) => state === 'started'}
    />
  );
}

function columns(timeZone: string, onJob: (jobReference: string) => void): readonly Column<RunSummary>[] {
  return [
    {
      key: 'code',
      header: 'Run',
      onPhone: 'title',
      cell: ({ code, kind }) => (
        <>
          <TextLink
            to={paths.run(code)}
            fontWeight="semibold"
            display="inline-flex"
            alignItems="center"
            minHeight={{ base: 'glove', lg: '6' }}
          >
            {code}
          </TextLink>
          {kind !== 'production' && <chakra.span color="fg.muted"> {kindWord(kind).toLowerCase()}</chakra.span>}
        </>
      ),
    },
    {
      key: 'job',
      header: 'Job',
      cell: ({ jobReference }) =>
        jobReference !== '' && (
          <chakra.button
            type="button"
            color="brand.fg"
            textDecoration="underline"
            cursor="pointer"
            minHeight={{ base: 'glove', lg: '6' }}
            aria-label={`Runs of job ${jobReference}`}
            onClick={() => onJob(jobReference)}
          >
            {jobReference}
          </chakra.button>
        ),
    },
    { key: 'part', header: 'Part', cell: ({ part }) => part, fold: { into: 'job', words: ({ part }) => part } },
    {
      key: 'recipe',
      header: 'Recipe',
      cell: (run) => (
        <>
          {run.recipe.title}
          <chakra.span display="block" color="fg.muted">
            {revisionWords(run)}
          </chakra.span>
        </>
      ),
    },
    {
      key: 'machine',
      header: 'Machine',
      cell: ({ machine }) => machine.name,
      fold: { into: 'recipe', words: ({ machine }) => machine.name },
    },
    { key: 'good', header: 'Good', align: 'end', cell: ({ good, state }) => (state === 'started' ? '' : good) },
    { key: 'scrap', header: 'Scrap', align: 'end', cell: ({ scrap, state }) => (state === 'started' ? '' : scrap) },
    {
      key: 'state',
      header: 'State',
      cell: (run) => {
        const { mark, word } = runMark(run);
        return <StateMark state={mark}>{word}</StateMark>;
      },
    },
    {
      key: 'started',
      header: 'Started',
      cell: ({ startedAt, startedBy }) => (
        <>
          <chakra.span whiteSpace="nowrap">
            {formatDate(startedAt, timeZone)} {formatClock(startedAt, timeZone)}
          </chakra.span>
          <chakra.span display="block" color="fg.muted">
            {startedBy.name}
          </chakra.span>
        </>
      ),
    },
  ];
}
