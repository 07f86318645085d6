import { chakra } from '@chakra-ui/react';

/** Words for screen readers only. */
export const VisuallyHidden = chakra('span', { base: { srOnly: true } });
