export const NUMBERS_CLASS = 'numbers';

/**
 * Part of the theme's global rules, read once: styled elements of its own would cost more than the numbers in them, at every key that
 * is pressed.
 */
export const NUMBERS_STYLE = {
  fontSize: 'sm',
  lineHeight: 'sm',
  '& h4': { fontSize: 'sm', fontWeight: 'semibold', mt: '3', mb: '1' },
  '& .row': { position: 'relative', borderTop: 'hairline', _first: { borderTop: 'none' } },
  '& .row > button': {
    display: 'flex',
    width: 'full',
    justifyContent: 'space-between',
    alignItems: 'center',
    gap: '3',
    minHeight: { base: '44px', lg: '32px' },
    textAlign: 'start',
    borderRadius: 'sm',
    cursor: 'pointer',
    _hover: { bg: 'bg.subtle' },
  },
  '& .label': { color: 'fg.muted', minWidth: '0', textDecoration: 'underline dotted', textUnderlineOffset: '3px' },
  '& .value': { whiteSpace: 'nowrap', display: 'inline-flex', alignItems: 'center' },
  '& .flag': { color: 'straw.fg', mr: '1.5', lineHeight: 'none' },
  '& .unit, & .missing': { color: 'fg.muted' },
  '& .sheet:not([hidden])': {
    position: 'absolute',
    top: '100%',
    insetX: '0',
    zIndex: 'popover',
    bg: 'bg.panel',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    boxShadow: '0 4px 16px rgb(0 0 0 / 0.18)',
    px: '3',
    py: '2.5',
    overflowWrap: 'anywhere',
    '& p + p': { mt: '1' },
    '& a': { display: 'inline-block', py: { base: '2.5', lg: '0.5' } },
  },
  '& details': { mt: '1' },
  '& summary': { py: '2', color: 'brand.fg', cursor: 'pointer', width: 'fit-content', minHeight: { base: '44px', lg: '0' } },
  '& .aside': { color: 'fg.muted', mt: '1.5' },
  '& .notes': { mt: '2', pt: '2', borderTop: 'hairline', color: 'fg.muted', display: 'grid', gap: '1.5', overflowWrap: 'anywhere' },
  '& .look': { display: 'flex', gap: '2', alignItems: 'flex-start', color: 'straw.fg' },
  '& .look > svg': { mt: '0.5' },
  '& .spoken': {
    position: 'absolute',
    width: '1px',
    height: '1px',
    overflow: 'hidden',
    clipPath: 'inset(50%)',
    whiteSpace: 'nowrap',
  },
} as const;
