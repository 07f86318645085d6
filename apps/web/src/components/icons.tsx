import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';

const IconFrame = chakra('svg', {
  base: { flexShrink: 0, fill: 'none', stroke: 'currentColor', strokeWidth: '1.5', strokeLinecap: 'round', strokeLinejoin: 'round' },
});

export type IconProps = { size?: number };

/** Line icons stand beside a word and are hidden from screen readers. */
export type Icon = (props: IconProps) => ReactNode;

function icon(drawing: ReactNode): Icon {
  return ({ size = 20 }) => (
    <IconFrame viewBox="0 0 20 20" width={`${size}px`} height={`${size}px`} aria-hidden="true" focusable="false">
      {drawing}
    </IconFrame>
  );
}

const path = (d: string) => icon(<path d={d} />);

export const MachineIcon = icon(
  <>
    <rect x="3" y="11.5" width="14" height="5" />
    <path d="M10 2.5v5M7.5 5.5 10 8l2.5-2.5M6 14h8" />
  </>,
);
export const CouponIcon = icon(
  <>
    <rect x="2.75" y="2.75" width="14.5" height="14.5" rx="1" />
    <path d="M6 6h2v2H6zM12 6h2v2h-2zM6 12h2v2H6zM12 12h2v2h-2z" />
  </>,
);
export const RecipeIcon = path('M4.5 2.75h11v14.5h-11zM7.5 6.5h5M7.5 10h5M7.5 13.5h3');
export const SignOffIcon = path('M3 17.25h14M5.5 13.5l.6-3 7.2-7.2 2.4 2.4-7.2 7.2z');
export const RunIcon = path('M4 4v12M8 4v12M12 4v12M16 4v12M2.5 13.5l15-7');
export const RoundPartIcon = icon(
  <>
    <circle cx="10" cy="11.5" r="5.75" />
    <path d="M10 2.5v3M5.5 5.2A8 8 0 0 1 10 3.6M10 11.5h.01" />
  </>,
);
export const EquipmentIcon = icon(
  <>
    <rect x="5.5" y="2.5" width="9" height="6" />
    <path d="M7.5 8.5v3h5v-3M10 11.5v6M6 17.5h8" />
  </>,
);
export const MaterialIcon = path('M10 3 2.5 6.5 10 10l7.5-3.5zM3 10.2 10 13.5l7-3.3M3 13.7 10 17l7-3.3');
export const PeopleIcon = icon(
  <>
    <circle cx="7.5" cy="7" r="2.75" />
    <path d="M2.5 16.5c.4-3 2.4-4.5 5-4.5s4.6 1.5 5 4.5M13 4.6a2.5 2.5 0 0 1 0 4.8M14.5 12.3c1.7.6 2.7 2 3 4.2" />
  </>,
);
export const LedgerIcon = path('M8 12l4-4M9 5.5l1.6-1.6a3.4 3.4 0 0 1 4.8 4.8L14 10M11 14.5l-1.6 1.6a3.4 3.4 0 0 1-4.8-4.8L6 10');
export const ScienceIcon = path('M7.5 2.75h5M8.5 2.75v5l-5 8.5a.75.75 0 0 0 .6 1h11.8a.75.75 0 0 0 .6-1l-5-8.5v-5M6 12.5h8');
export const ShopIcon = path('M3.5 8.5v8.5h13V8.5M2.5 8.5 4 3.5h12l1.5 5zM8 17v-5h4v5');
export const MoreIcon = icon(<path d="M4 10h.01M10 10h.01M16 10h.01" strokeWidth="2.5" />);
export const FindIcon = icon(
  <>
    <circle cx="9" cy="9" r="5.5" />
    <path d="m13.2 13.2 4 4" />
  </>,
);
export const PlusIcon = path('M10 4v12M4 10h12');
export const CrossIcon = path('m5 5 10 10M15 5 5 15');
export const TickIcon = path('m4 10.5 4 4 8-9');
export const ChevronDownIcon = path('m5 8 5 5 5-5');
export const ChevronLeftIcon = path('m12 5-5 5 5 5');
export const ChevronRightIcon = path('m8 5 5 5-5 5');
export const DownloadIcon = path('M10 3v10M6 9.5l4 4 4-4M3.5 17h13');
export const UploadIcon = path('M10 13.5v-10M6 7l4-4 4 4M3.5 17h13');
export const PrintIcon = path('M6 7V3h8v4M6 14H3.5V7h13v7H14M6 11.5h8V17H6z');
export const StartIcon = path('M6 4v12l10-6z');
export const SealIcon = icon(
  <>
    <rect x="4.5" y="9" width="11" height="8" />
    <path d="M7 9V6.5a3 3 0 0 1 6 0V9" />
  </>,
);
export const DraftIcon = path('M4 16.5h12M6 13l.5-2.5 6-6 2 2-6 6z');
export const PhotoIcon = icon(
  <>
    <path d="M3 6.5h3.5L8 4.5h4l1.5 2H17v9H3z" />
    <circle cx="10" cy="10.8" r="2.8" />
  </>,
);
export const SignOutIcon = path('M12 6V3.5H3.5v13H12V14M8 10h9M14 7l3 3-3 3');
export const LightIcon = icon(
  <>
    <circle cx="10" cy="10" r="3.2" />
    <path d="M10 2.5v2M10 15.5v2M2.5 10h2M15.5 10h2M4.7 4.7l1.4 1.4M13.9 13.9l1.4 1.4M15.3 4.7l-1.4 1.4M6.1 13.9l-1.4 1.4" />
  </>,
);

/** Caution triangle: the one filled icon, straw in both modes. */
export function CautionIcon({ size = 24 }: IconProps) {
  return (
    <chakra.svg viewBox="0 0 24 24" width={`${size}px`} height={`${size}px`} flexShrink={0} aria-hidden="true" focusable="false">
      <chakra.path d="M12 2.5 23 21.5H1z" fill="straw.solid" />
      <chakra.path d="M12 9v6.5M12 18.2v.3" stroke="straw.contrast" strokeWidth="2.2" strokeLinecap="round" />
    </chakra.svg>
  );
}

/** The product's mark: a plate with its chosen cell. */
export function PlateMarkIcon({ size = 26 }: IconProps) {
  const faded: readonly [x: number, y: number, opacity: number][] = [
    [5, 5, 1],
    [10.8, 5, 0.7],
    [16.6, 5, 0.4],
    [5, 10.8, 0.7],
    [16.6, 10.8, 0.25],
    [5, 16.6, 0.4],
    [10.8, 16.6, 0.25],
    [16.6, 16.6, 0.15],
  ];
  return (
    <chakra.svg viewBox="0 0 26 26" width={`${size}px`} height={`${size}px`} flexShrink={0} aria-hidden="true" focusable="false">
      <rect x="1" y="1" width="24" height="24" rx="2.5" fill="none" stroke="currentColor" strokeWidth="1.6" />
      {faded.map(([x, y, opacity]) => (
        <rect key={`${x},${y}`} x={x} y={y} width="4.4" height="4.4" opacity={opacity} fill="currentColor" />
      ))}
      <chakra.rect x="10.2" y="10.2" width="5.6" height="5.6" fill="straw.solid" />
    </chakra.svg>
  );
}
