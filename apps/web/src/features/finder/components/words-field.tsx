import { chakra } from '@chakra-ui/react';
import { type FormEvent, useEffect, useRef, useState } from 'react';
import { InputFrame } from '../../../components/field';
import { FindIcon } from '../../../components/icons';

const TYPING_PAUSE_MS = 150;

export type WordsFieldProps = { words: string; onWords: (words: string) => void };

/** Words that narrow every slot at once. It has the focus on arrival; a letter typed anywhere on the page lands here, and so does a scanner. */
export function WordsField({ words, onWords }: WordsFieldProps) {
  const field = useRef<HTMLInputElement>(null);
  const [typed, setTyped] = useState(words);
  const latest = useRef(onWords);
  latest.current = onWords;
  useEffect(() => setTyped(words), [words]);
  useEffect(() => {
    if (typed.trim() === words) return undefined;
    const timer = setTimeout(() => latest.current(typed.trim()), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, words]);
  useEffect(() => field.current?.focus({ preventScroll: true }), []);
  useEffect(() => {
    const handleKeyDown = (event: KeyboardEvent) => {
      if (!isLetter(event) || isTakenElsewhere(event.target)) return;
      // The field takes the focus before the letter arrives, so that it is typed there.
      field.current?.focus({ preventScroll: true });
    };
    document.addEventListener('keydown', handleKeyDown);
    return () => document.removeEventListener('keydown', handleKeyDown);
  }, []);
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    onWords(typed.trim());
  };
  return (
    <chakra.form role="search" onSubmit={handleSubmit} width={{ base: 'full', sm: '220px' }} flexShrink={0}>
      <chakra.label htmlFor="finder-words" srOnly>
        Narrow by words or a scanned code
      </chakra.label>
      <InputFrame size="touch" minHeight={{ base: 'glove', lg: 'control' }}>
        <chakra.span color="fg.muted" lineHeight="none">
          <FindIcon />
        </chakra.span>
        <Input
          ref={field}
          id="finder-words"
          type="search"
          autoComplete="off"
          spellCheck={false}
          enterKeyHint="search"
          placeholder="Type or scan"
          value={typed}
          onChange={(event) => setTyped(event.currentTarget.value)}
        />
      </InputFrame>
    </chakra.form>
  );
}

const Input = chakra('input', {
  base: {
    flex: '1',
    minW: '0',
    alignSelf: 'stretch',
    bg: 'transparent',
    outline: 'none !important',
    _placeholder: { color: 'fg.subtle', opacity: '1' },
  },
});

function isLetter({ key, ctrlKey, metaKey, altKey, isComposing }: KeyboardEvent): boolean {
  return /^[\p{Letter}\p{Number}]$/u.test(key) && !ctrlKey && !metaKey && !altKey && !isComposing;
}

/** Fields and open dialogs keep their letters. */
function isTakenElsewhere(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest('input, textarea, select, dialog, [role=dialog], [contenteditable=true]') !== null;
}
