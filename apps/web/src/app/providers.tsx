import { ChakraProvider } from '@chakra-ui/react';
import createCache from '@emotion/cache';
import { CacheProvider } from '@emotion/react';
import type { ReactNode } from 'react';
import { SWRConfig } from 'swr';
import { ColourModeProvider } from '../lib/colour-mode';
import { ShortcutProvider } from '../lib/shortcuts';
import { swrDefaults } from '../lib/swr';
import { system } from './theme';

/** The server writes a fresh nonce into the page; without it the policy refuses every style that emotion makes. */
function styleNonce(): string | undefined {
  const content = document.querySelector<HTMLMetaElement>('meta[name="csp-nonce"]')?.content ?? '';
  return content === '' || content.startsWith('__') ? undefined : content;
}

const nonce = styleNonce();
const styleCache = createCache({ key: 'pp', ...(nonce === undefined ? {} : { nonce }) });

export function Providers({ children }: { children: ReactNode }) {
  return (
    <CacheProvider value={styleCache}>
      <ChakraProvider value={system}>
        <ColourModeProvider>
          <SWRConfig value={swrDefaults}>
            <ShortcutProvider>{children}</ShortcutProvider>
          </SWRConfig>
        </ColourModeProvider>
      </ChakraProvider>
    </CacheProvider>
  );
}
