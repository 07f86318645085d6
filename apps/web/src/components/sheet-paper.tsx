import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';

/** A name on an ink line, or an empty one to be filled in by pen. */
export function Line({ name, children }: { name: string; children: ReactNode }) {
  return (
    <chakra.div alignSelf="start">
      <chakra.p fontWeight="semibold" minHeight="6mm" borderBottom="0.2mm solid #000">
        {name}
      </chakra.p>
      <Small>{children}</Small>
    </chakra.div>
  );
}

/** Paper keeps its own colours and millimetres in both modes. */
export const Paper = chakra('article', {
  base: {
    width: '210mm',
    minHeight: '296mm',
    p: '12mm 14mm 9mm',
    display: 'flex',
    flexDirection: 'column',
    bg: '#ffffff',
    color: '#000000',
    fontSize: '12pt',
    lineHeight: '15pt',
    border: 'hairline',
    '@media print': { border: 'none' },
    // On a narrow screen nothing of it may stand outside: columns come one below the other. What prints stays the page.
    '@media screen and (max-width: 819px)': {
      width: 'full',
      minHeight: '0',
      p: '4mm',
      // The columns are said at each grid; only an important rule reaches them from here.
      '& [data-fold]': { gridTemplateColumns: 'minmax(0, 1fr) !important', rowGap: '3mm' },
      '& > header': { gridTemplateColumns: '26mm minmax(0, 1fr) !important', rowGap: '3mm' },
    },
  },
});
export const Title = chakra('h2', { base: { fontSize: '12pt', lineHeight: '16pt', borderBottom: '0.4mm solid #000', mb: '0.5mm' } });
export const Small = chakra('span', { base: { display: 'block', fontSize: '9pt', lineHeight: '11.5pt', color: '#333333' } });
export const Box = chakra('span', { base: { display: 'block', boxSize: '5mm', border: '0.3mm solid #000' } });
