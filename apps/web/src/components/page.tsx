import { Box, chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, useEffect } from 'react';
import { TextLink } from './text-link';

export type Crumb = { label: string; to?: string };

export type PageProps = {
  /** The thing's own code, or the name of the list. */
  title: string;
  /** The thing's name, lighter beside its code. */
  name?: ReactNode;
  /** Below the second level only. */
  crumbs?: readonly Crumb[];
  /** One line of facts under the title. */
  meta?: ReactNode;
  actions?: ReactNode;
  /** For pages whose first content is the title's work, such as the finder: the title is spoken, not drawn. */
  isTitleHidden?: boolean;
  children: ReactNode;
};

export function Page({ title, name, crumbs, meta, actions, isTitleHidden = false, children }: PageProps) {
  useEffect(() => {
    document.title = `${title} · Proofplate`;
  }, [title]);
  return (
    <>
      {isTitleHidden ? (
        <chakra.h1 srOnly>{title}</chakra.h1>
      ) : (
        <chakra.header mb="4">
          {crumbs !== undefined && <Breadcrumbs crumbs={crumbs} />}
          <Flex align="flex-start" justify="space-between" gap="3" wrap="wrap">
            <chakra.div minW="0" flex={{ lg: '1' }}>
              <chakra.h1 overflowWrap="anywhere" py={{ base: '1', lg: '0.5' }}>
                {title}
                {name !== undefined && (
                  <chakra.span fontWeight="normal" color="fg.muted">
                    {' '}
                    {name}
                  </chakra.span>
                )}
              </chakra.h1>
              {meta !== undefined && (
                <Flex wrap="wrap" columnGap="5" fontSize="sm" lineHeight="sm" color="fg.muted">
                  {meta}
                </Flex>
              )}
            </chakra.div>
            {actions !== undefined && (
              <Flex gap="2" wrap="wrap" align="center">
                {actions}
              </Flex>
            )}
          </Flex>
        </chakra.header>
      )}
      {children}
    </>
  );
}

function Breadcrumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <chakra.nav aria-label="Breadcrumbs" fontSize="sm" lineHeight="sm" color="fg.muted">
      <chakra.ol display="flex" flexWrap="wrap" columnGap="1.5">
        {crumbs.map(({ label, to }, index) => (
          <chakra.li key={label} display="flex" columnGap="1.5">
            {index > 0 && <span aria-hidden="true">/</span>}
            {to === undefined ? (
              <span aria-current="page">{label}</span>
            ) : (
              <TextLink to={to} color="inherit">
                {label}
              </TextLink>
            )}
          </chakra.li>
        ))}
      </chakra.ol>
    </chakra.nav>
  );
}

/** A card: white on paper, one hairline. */
export const Panel = chakra('section', {
  base: { bg: 'bg.panel', border: 'hairline', borderColor: 'border', borderRadius: 'md' },
});

/** Content of one column of form fields. */
export function FormColumn({ children }: { children: ReactNode }) {
  return (
    <Box maxW="form" display="grid" gap="4">
      {children}
    </Box>
  );
}
