import { chakra } from '@chakra-ui/react';
import { ChangeTrack } from '../../../components/change-bar';
import { Panel } from '../../../components/page';
import type { Comparison } from '../sign-offs.api';
import { type ChangeLine, whatChanges } from '../what-changes';

/** What changes in percent of the current setting, on one scale; what stays the same is named under it. */
export function ChangeTable({ comparison, before, after }: { comparison: Comparison; before: string; after: string }) {
  const { lines, same } = whatChanges(comparison);
  return (
    <Panel px="1.5" pt="1.5" overflowX="auto" tabIndex={0} aria-label="What changes">
      <chakra.table
        display={{ base: 'none', sm: 'table' }}
        width="full"
        borderCollapse="separate"
        borderSpacing="0"
        fontSize="sm"
        lineHeight="sm"
      >
        <thead>
          <tr>
            <Head>What changes</Head>
            <Head isEnd>{before}</Head>
            <Head isEnd>{after}</Head>
            <Head>
              <chakra.span srOnly>Unit</chakra.span>
            </Head>
            <Head isEnd>Change</Head>
            <Head isWide>
              <chakra.span srOnly>Size and remark</chakra.span>
            </Head>
          </tr>
        </thead>
        <tbody>
          {lines.map((line) => (
            <Line key={line.key} line={line} />
          ))}
        </tbody>
      </chakra.table>
      <chakra.ul display={{ base: 'block', sm: 'none' }} px="2.5" fontSize="sm" lineHeight="sm">
        {lines.map((line) => (
          <Card key={line.key} line={line} />
        ))}
      </chakra.ul>
      <chakra.p px="2.5" py="2" fontSize="sm" lineHeight="sm" color="fg.muted">
        {lines.length === 0 && 'No parameter changes. '}
        {same.length > 0 && `The same in both: ${same.join(', ')}`}
      </chakra.p>
    </Panel>
  );
}

/** Below 600 px a line is a card. */
function Card({ line: { label, before, after, unit, share, change, note, isLit } }: { line: ChangeLine }) {
  return (
    <chakra.li borderBottom="hairline" py="2" bg={isLit ? 'straw.subtle' : undefined}>
      <chakra.span display="flex" justifyContent="space-between" gap="3">
        <b>{label}</b>
        <span>
          {before} → <b>{after}</b> <chakra.span color="fg.muted">{unit}</chakra.span>
        </span>
      </chakra.span>
      <chakra.span display="flex" justifyContent="space-between" alignItems="center" gap="3">
        {share !== undefined && <ChangeTrack change={share} />}
        <chakra.span ml="auto">{change}</chakra.span>
      </chakra.span>
      {(note !== '' || isLit) && <chakra.span color={isLit ? 'straw.fg' : 'fg.muted'}>{isLit ? 'takes longer' : note}</chakra.span>}
    </chakra.li>
  );
}

const cell = { height: '33px', px: '2.5', borderBottom: 'hairline', whiteSpace: 'nowrap' } as const;

function Head({ children, isEnd = false, isWide = false }: { children: React.ReactNode; isEnd?: boolean; isWide?: boolean }) {
  return (
    <chakra.th
      scope="col"
      textAlign={isEnd ? 'end' : 'start'}
      width={isWide ? '45%' : undefined}
      px="2.5"
      py="2"
      color="fg.muted"
      fontWeight="semibold"
      whiteSpace="nowrap"
      borderBottom="hairline"
      borderColor="border.emphasized"
    >
      {children}
    </chakra.th>
  );
}

function Line({ line: { label, before, after, unit, share, change, note, isLit } }: { line: ChangeLine }) {
  return (
    <chakra.tr bg={isLit ? 'straw.subtle' : undefined}>
      <chakra.th scope="row" {...cell} textAlign="start" fontWeight="normal">
        {label}
      </chakra.th>
      <chakra.td {...cell} textAlign="end">
        {before}
      </chakra.td>
      <chakra.td {...cell} textAlign="end" fontWeight="semibold">
        {after}
      </chakra.td>
      <chakra.td {...cell} pl="0" color="fg.muted">
        {unit}
      </chakra.td>
      <chakra.td {...cell} textAlign="end" fontWeight="semibold">
        {change}
      </chakra.td>
      <chakra.td {...cell} whiteSpace="normal">
        <chakra.span display="flex" alignItems="center" gap="2.5">
          {share !== undefined && (
            <chakra.span flex="0 0 120px">
              <ChangeTrack change={share} />
            </chakra.span>
          )}
          <chakra.span whiteSpace="nowrap" color={isLit ? 'straw.fg' : 'fg.muted'} fontWeight={isLit ? 'semibold' : undefined}>
            {isLit ? 'takes longer' : note}
          </chakra.span>
        </chakra.span>
      </chakra.td>
    </chakra.tr>
  );
}
