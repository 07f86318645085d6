import { Box, chakra, Flex } from '@chakra-ui/react';
import { Outlet } from 'react-router';
import { PlateMarkIcon } from '../../components/icons';

/** Frame of the pages for people who are not signed in: the name, one column, one form. */
export function AuthLayout() {
  return (
    <chakra.div minHeight="screen" display="flex" flexDirection="column" alignItems="center" px="4" py={{ base: '6', lg: '12' }}>
      <chakra.header width="full" maxW="form" mb="6">
        <Flex align="center" gap="2.5" fontWeight="bold" fontSize="lg">
          <PlateMarkIcon />
          Proofplate
        </Flex>
        <Box pl="9" fontSize="sm" lineHeight="sm" color="fg.muted">
          Laser settings, proved on a plate and signed
        </Box>
      </chakra.header>
      <chakra.main id="content" width="full" maxW="form">
        <Outlet />
      </chakra.main>
    </chakra.div>
  );
}
