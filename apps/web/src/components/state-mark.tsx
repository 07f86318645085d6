import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';

/** Every state that is shown, always as word and shape, never by colour alone. */
export type MarkState =
  | 'draft'
  | 'inReview'
  | 'approved'
  | 'superseded'
  | 'returned'
  | 'withdrawn'
  | 'reproveDue'
  | 'passes'
  | 'fails'
  | 'caution'
  | 'unknown';

type Look = { word: string; colour: string; shape: ReactNode };

const LINE = { fill: 'none', stroke: 'currentColor', strokeWidth: 1.6 } as const;
const TICK = <path d="m2.5 8.5 3.6 3.6 7.4-8.4" {...LINE} strokeWidth={2.2} />;

const LOOKS: Record<MarkState, Look> = {
  draft: { word: 'Draft', colour: 'fg.muted', shape: <rect x="2" y="2" width="12" height="12" {...LINE} strokeDasharray="2.6 2" /> },
  inReview: {
    word: 'In review',
    colour: 'straw.fg',
    shape: (
      <>
        <rect x="2" y="2" width="12" height="12" {...LINE} />
        <path d="M2 14V2l12 12z" fill="currentColor" />
      </>
    ),
  },
  approved: {
    word: 'Approved',
    colour: 'brand.fg',
    shape: (
      <>
        <rect x="1.2" y="1.2" width="13.6" height="13.6" fill="currentColor" />
        <chakra.path d="m4.3 8.3 2.6 2.6 4.8-5.6" fill="none" stroke="bg.panel" strokeWidth="1.8" />
      </>
    ),
  },
  superseded: {
    word: 'Superseded',
    colour: 'fg.muted',
    shape: (
      <>
        <path d="M5 5V1.8h9.2V11H11" {...LINE} />
        <rect x="1.8" y="5" width="9.2" height="9.2" {...LINE} />
      </>
    ),
  },
  returned: {
    word: 'Returned',
    colour: 'straw.fg',
    shape: (
      <>
        <rect x="1.8" y="1.8" width="12.4" height="12.4" {...LINE} />
        <path d="M11.5 10.5V8H5M7 5.6 4.6 8 7 10.4" {...LINE} strokeWidth={1.5} />
      </>
    ),
  },
  withdrawn: {
    word: 'Withdrawn',
    colour: 'oxide.fg',
    shape: (
      <>
        <path d="M5 1.2h6L14.8 5v6L11 14.8H5L1.2 11V5z" fill="currentColor" />
        <chakra.path d="M4.5 8h7" stroke="bg.panel" strokeWidth="2" />
      </>
    ),
  },
  reproveDue: {
    word: 'Re-prove due',
    colour: 'straw.fg',
    shape: (
      <>
        <path d="M8 1.2 14.8 8 8 14.8 1.2 8z" {...LINE} />
        <path d="M8 4.8V8.5M8 10.5v.4" {...LINE} />
      </>
    ),
  },
  passes: { word: 'Passes', colour: 'brand.fg', shape: TICK },
  fails: { word: 'Fails', colour: 'oxide.fg', shape: <path d="m3 3 10 10M13 3 3 13" {...LINE} strokeWidth={2.2} /> },
  caution: {
    word: 'Caution',
    colour: 'straw.fg',
    shape: (
      <>
        <chakra.path d="M8 1.6 15.2 14.4H.8z" fill="straw.solid" />
        <chakra.path d="M8 6v4.4M8 12.2v.2" stroke="straw.contrast" strokeWidth="1.6" strokeLinecap="round" />
      </>
    ),
  },
  unknown: {
    word: 'Not known',
    colour: 'fg.muted',
    shape: (
      <>
        <circle cx="8" cy="8" r="6.2" {...LINE} strokeDasharray="2.6 2" />
        <path d="M8 4.8V8.5M8 10.8v.4" {...LINE} />
      </>
    ),
  },
};

export type StateMarkProps = {
  state: MarkState;
  /** Replaces the usual word, for example "4 in review". */
  children?: ReactNode;
};

export function StateMark({ state, children }: StateMarkProps) {
  const { word, colour } = LOOKS[state];
  return (
    <chakra.span display="inline-flex" alignItems="center" gap="1.5" whiteSpace="nowrap" verticalAlign="middle" color={colour}>
      <StateShape state={state} />
      {children ?? word}
    </chakra.span>
  );
}

/** The shape alone, for places where the word stands elsewhere. */
export function StateShape({ state, size = 16 }: { state: MarkState; size?: number }) {
  return (
    <chakra.svg viewBox="0 0 16 16" width={`${size}px`} height={`${size}px`} flexShrink={0} aria-hidden="true" focusable="false">
      {LOOKS[state].shape}
    </chakra.svg>
  );
}
