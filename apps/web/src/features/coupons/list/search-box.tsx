import { chakra } from '@chakra-ui/react';
import { type FormEvent, useEffect, useRef, useState } from 'react';
import { InputFrame } from '../../../components/field';
import { FindIcon } from '../../../components/icons';

const TYPING_PAUSE_MS = 250;
const WHERE = 'Code, material, lot or place';

const Input = chakra('input', { base: { flex: '1', minW: '0', alignSelf: 'stretch', bg: 'transparent', outline: 'none !important' } });

/** Results follow the typing; Enter does not wait. */
export function SearchBox({ value, onSearch }: { value: string; onSearch: (words: string) => void }) {
  const [typed, setTyped] = useState(value);
  const latest = useRef(onSearch);
  latest.current = onSearch;
  useEffect(() => setTyped(value), [value]);
  useEffect(() => {
    if (typed.trim() === value) return undefined;
    const timer = setTimeout(() => latest.current(typed.trim()), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, value]);
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    onSearch(typed.trim());
  };
  return (
    <chakra.form role="search" onSubmit={handleSubmit} width={{ base: 'full', sm: '300px' }}>
      <InputFrame>
        <chakra.span color="fg.muted" lineHeight="none">
          <FindIcon />
        </chakra.span>
        <Input
          type="search"
          aria-label={WHERE}
          placeholder={WHERE}
          value={typed}
          onChange={(event) => setTyped(event.currentTarget.value)}
        />
      </InputFrame>
    </chakra.form>
  );
}
