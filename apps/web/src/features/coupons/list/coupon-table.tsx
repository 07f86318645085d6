import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatDate } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { couponMark, groundWords, lowerFirst } from '../coupon-words';
import type { CouponSummary } from '../coupons.api';
import { CouponFace } from './coupon-face';

const NOTHING = '—';

export function CouponTable({ coupons }: { coupons: readonly CouponSummary[] }) {
  const { shop } = useSession();
  return <DataTable label="Coupons" columns={columns(shop.timeZone)} rows={coupons} rowKey={({ id }) => id} />;
}

function columns(timeZone: string): readonly Column<CouponSummary>[] {
  return [
    {
      key: 'face',
      header: 'Plate',
      isHeaderHidden: true,
      width: '66px',
      onPhone: 'picture',
      cell: ({ face, code }) => face !== null && <CouponFace face={face} code={code} />,
    },
    { key: 'code', header: 'Code', onPhone: 'title', cell: (coupon) => <CodeLink coupon={coupon} /> },
    {
      key: 'title',
      header: 'For',
      cell: ({ title }) => (title === '' ? NOTHING : title),
      fold: { into: 'code', words: ({ title }) => title },
    },
    { key: 'material', header: 'Material and finish', cell: groundWords },
    {
      key: 'effect',
      header: 'Effect',
      cell: ({ effect }) => lowerFirst(effect.name),
      fold: { into: 'material', words: ({ effect }) => lowerFirst(effect.name) },
    },
    { key: 'machine', header: 'Machine, lens', cell: ({ machine, lens }) => `${machine.name}, ${lens.name}` },
    { key: 'state', header: 'State', cell: (coupon) => <CouponState coupon={coupon} /> },
    { key: 'rated', header: 'Rated', align: 'end', cell: ({ ratedCount, cellCount }) => <Whole>{`${ratedCount} of ${cellCount}`}</Whole> },
    {
      key: 'best',
      header: 'Best',
      align: 'end',
      cell: ({ bestRating }) => bestRating ?? NOTHING,
      fold: { into: 'rated', words: ({ bestRating }) => bestRating !== null && `best ${bestRating}` },
    },
    {
      key: 'marked',
      header: 'Marked',
      align: 'end',
      cell: ({ markedAt }) => <Whole>{markedAt === null ? NOTHING : formatDate(markedAt, timeZone)}</Whole>,
      fold: { into: 'state', words: ({ markedAt }) => markedAt !== null && <Whole>marked {formatDate(markedAt, timeZone)}</Whole> },
    },
  ];
}

/** Words that stay on one line. */
const Whole = chakra('span', { base: { whiteSpace: 'nowrap' } });

/** A planned coupon leads on to the machine, every other one to its page. */
function CodeLink({ coupon: { code, title, material, state } }: { coupon: CouponSummary }) {
  const name = title === '' ? material.name : title;
  return (
    <TextLink
      to={state === 'planned' ? paths.markCoupon(code) : paths.coupon(code)}
      color="fg"
      fontWeight="semibold"
      textDecoration="none"
      whiteSpace="nowrap"
      py="3"
      aria-label={state === 'planned' ? `Mark ${code} ${name}` : `${code} ${name}`}
    >
      {code}
    </TextLink>
  );
}

function CouponState({ coupon: { state, purpose, isImported } }: { coupon: CouponSummary }) {
  const { shape, word } = couponMark(state);
  const second = [purpose === 'confirmation' ? 'proof of a draft' : '', isImported ? 'burnt earlier' : ''].filter((part) => part !== '');
  return (
    <chakra.span display="inline-grid" justifyItems="start" py="1">
      <StateMark state={shape}>{word}</StateMark>
      {second.length > 0 && (
        <chakra.span fontSize="sm" color="fg.muted" whiteSpace="nowrap">
          {second.join(', ')}
        </chakra.span>
      )}
    </chakra.span>
  );
}
