import { chakra } from '@chakra-ui/react';
import { Link } from 'react-router';

export const TextLink = chakra(Link, {
  base: { color: 'brand.fg', textDecoration: 'underline', borderRadius: 'sm', _hover: { textDecorationThickness: '2px' } },
});
