import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import Markdown, { type Components } from 'react-markdown';
import remarkGfm from 'remark-gfm';
import { TextLink } from '../../components/text-link';
import { scienceLink } from './science-link';

const PLUGINS = [remarkGfm];
const COMPONENTS: Components = {
  a: ({ href, children }) => <PageLink to={scienceLink(href)}>{children}</PageLink>,
  // wider than a phone, so it scrolls, and what scrolls must be reached by keyboard
  pre: ({ children }) => (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls needs the focus to be scrolled with keys
    <pre tabIndex={0}>{children}</pre>
  ),
  table: ({ children }) => (
    <chakra.div overflowX="auto" tabIndex={0} role="region" aria-label="Table" my="3">
      <table>{children}</table>
    </chakra.div>
  ),
};

/** A science page. Markdown only: HTML in a page stays text, so that nothing but our own elements reaches the document. */
export function ScienceText({ body }: { body: string }) {
  return (
    <chakra.div css={TEXT_STYLE}>
      <Markdown remarkPlugins={PLUGINS} components={COMPONENTS}>
        {body}
      </Markdown>
    </chakra.div>
  );
}

/** What the application does not show stays words. */
function PageLink({ to, children }: { to: string | undefined; children: ReactNode }) {
  return to === undefined ? <span>{children}</span> : <TextLink to={to}>{children}</TextLink>;
}

const TEXT_STYLE = {
  maxWidth: '80ch',
  overflowWrap: 'anywhere',
  '& > * + *': { mt: '3' },
  '& h2': { mt: '6' },
  '& h3': { mt: '4' },
  '& ul, & ol': { pl: '5' },
  '& ul': { listStyle: 'disc' },
  '& ol': { listStyle: 'decimal' },
  '& code': { fontFamily: 'mono', fontSize: 'sm', bg: 'bg.muted', px: '1', borderRadius: 'sm' },
  '& pre': { overflowX: 'auto', p: '3', bg: 'bg.muted', borderRadius: 'md' },
  '& pre code': { bg: 'transparent', px: '0' },
  '& table': { borderCollapse: 'collapse', fontSize: 'sm', lineHeight: 'sm', overflowWrap: 'normal' },
  '& th, & td': { border: 'hairline', px: '2.5', py: '1.5', textAlign: 'start', verticalAlign: 'top' },
  '& th': { bg: 'bg.subtle', fontWeight: 'semibold' },
} as const;
