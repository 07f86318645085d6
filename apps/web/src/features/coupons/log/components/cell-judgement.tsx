import { Box, chakra, Flex } from '@chakra-ui/react';
import { OUTCOME_LABELS, OUTCOMES, RATING_CAPTIONS, RATINGS } from '@proofplate/recipe-model';
import { type FormEvent, type ReactNode, type Ref, useEffect, useId, useState } from 'react';
import { Button } from '../../../../components/button';
import { Chip } from '../../../../components/chip';
import { SelectField, TextField } from '../../../../components/field';
import { Rating } from '../../../../components/rating';
import type { CellRating, OwnRating } from '../log.api';

const USUAL_TAGS = ['even', 'wipe-proof', 'haze', 'burnt edge', 'raised'];
const MOST_TAGS = 12;

export type CellJudgementProps = {
  address: string;
  own: OwnRating;
  /** Ratings of the cell by other people. */
  others: readonly CellRating[];
  /** Tags in use on the coupon. */
  knownTags: readonly string[];
  onChange: (change: Partial<OwnRating>) => void;
  tags: Ref<HTMLDivElement>;
  note: Ref<HTMLInputElement>;
};

/** Rating, outcome, tags and note of the person at the screen, and what others said. */
export function CellJudgement({ address, own, others, knownTags, onChange, tags, note }: CellJudgementProps) {
  return (
    <Box display="grid" gap="3">
      <Box display={{ base: 'none', lg: 'block' }}>
        <chakra.h3 mb="1.5">Rating</chakra.h3>
        <Rating
          label={`Rating of ${address}`}
          value={own.rating ?? undefined}
          onRate={(rating) => onChange({ rating })}
          hasCaptions={false}
        />
      </Box>
      <RatingCaption rating={own.rating} onClear={() => onChange({ rating: null })} />
      <Tags ref={tags} tags={own.tags} known={knownTags} onChange={(next) => onChange({ tags: next })} />
      <Box display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'minmax(0, 2fr) minmax(0, 3fr)' }} gap="3">
        <SelectField
          name="outcome"
          label="What the mark looks like"
          placeholder="Not said"
          value={own.outcome ?? ''}
          onChange={({ target }) => onChange({ outcome: OUTCOMES.find((code) => code === target.value) ?? null })}
          options={OUTCOMES.map((code) => ({ value: code, label: OUTCOME_LABELS[code] }))}
        />
        <NoteField key={address} ref={note} note={own.note} onSave={(text) => onChange({ note: text })} />
      </Box>
      <Others others={others} />
    </Box>
  );
}

/** What every number of the scale means, before one is chosen; and the way to none. */
function RatingCaption({ rating, onClear }: { rating: number | null; onClear: () => void }) {
  const known = RATINGS.find((each) => each === rating);
  return (
    <Box fontSize="sm" lineHeight="sm" color="fg.muted" mt={{ lg: '-1' }}>
      <chakra.ol
        aria-label="What the ratings mean"
        display="grid"
        gridTemplateColumns={{ base: 'repeat(2, minmax(0, 1fr))', sm: 'repeat(3, minmax(0, 1fr))' }}
        columnGap="3"
      >
        {RATINGS.map((each) => (
          <chakra.li key={each} color={each === known ? 'fg' : undefined} fontWeight={each === known ? 'semibold' : undefined}>
            {each} {RATING_CAPTIONS[each]}
          </chakra.li>
        ))}
      </chakra.ol>
      {known !== undefined && (
        <Button kind="quiet" fontSize="sm" fontWeight="normal" minHeight={{ base: 'touch', lg: '28px' }} px="2" ml="-2" onClick={onClear}>
          Take the {known} away
        </Button>
      )}
    </Box>
  );
}

type TagsProps = { tags: readonly string[]; known: readonly string[]; onChange: (tags: string[]) => void; ref: Ref<HTMLDivElement> };

function Tags({ tags, known, onChange, ref }: TagsProps) {
  const [typed, setTyped] = useState('');
  const titleId = useId();
  const offered = [...new Set([...USUAL_TAGS, ...known, ...tags])];
  const toggle = (tag: string, isOn: boolean) => onChange(isOn ? [...tags, tag] : tags.filter((other) => other !== tag));
  const handleAdd = (event: FormEvent) => {
    event.preventDefault();
    const tag = typed.trim();
    if (tag !== '' && !tags.includes(tag) && tags.length < MOST_TAGS) onChange([...tags, tag]);
    setTyped('');
  };
  return (
    <Box ref={ref} role="group" aria-labelledby={titleId}>
      <chakra.h3 id={titleId} mb="1.5">
        Tags
      </chakra.h3>
      <Flex gap="2" wrap="wrap" align="center">
        {offered.map((tag) => (
          <Chip key={tag} isPressed={tags.includes(tag)} onToggle={(isOn) => toggle(tag, isOn)}>
            {tag}
          </Chip>
        ))}
        <chakra.form onSubmit={handleAdd} noValidate>
          <chakra.input
            aria-label="Another tag"
            placeholder="another tag"
            maxLength={40}
            value={typed}
            onChange={({ target }) => setTyped(target.value)}
            minHeight={{ base: '44px', lg: '32px' }}
            width="112px"
            px="2.5"
            fontSize="sm"
            border="hairline"
            borderColor="border.emphasized"
            borderRadius="md"
            bg="bg.panel"
            color="fg"
            _placeholder={{ color: 'fg.subtle', opacity: 1 }}
          />
        </chakra.form>
      </Flex>
    </Box>
  );
}

/** Kept while it is typed; saved when the field is left or Enter is pressed. A refused save leaves the text where it is. */
function NoteField({ note, onSave, ref }: { note: string; onSave: (text: string) => void; ref: Ref<HTMLInputElement> }) {
  const [typed, setTyped] = useState(note);
  const [saved, setSaved] = useState(note);
  useEffect(() => {
    // somebody else's tab, or an undo, changed it; a text that waits to be saved stays
    if (note !== saved && typed === saved) setTyped(note);
    setSaved(note);
  }, [note, saved, typed]);
  const save = () => {
    if (typed.trim() !== note) onSave(typed.trim());
  };
  return (
    <TextField
      ref={ref}
      name="note"
      label="Note"
      maxLength={1000}
      autoComplete="off"
      value={typed}
      onChange={({ target }) => setTyped(target.value)}
      onBlur={save}
      onKeyDown={({ key }) => key === 'Enter' && save()}
    />
  );
}

function Others({ others }: { others: readonly CellRating[] }) {
  if (others.length === 0) return null;
  return (
    <Box fontSize="sm" lineHeight="sm">
      <chakra.h3 mb="1">Others said</chakra.h3>
      <ul>
        {others.map(({ id, by, rating, outcome, tags, note }) => (
          <chakra.li key={id} py="0.5">
            <b>{rating ?? 'no rating'}</b> {by}
            <Said>{[outcome === null ? '' : OUTCOME_LABELS[outcome].toLowerCase(), ...tags, note]}</Said>
          </chakra.li>
        ))}
      </ul>
    </Box>
  );
}

function Said({ children }: { children: readonly string[] }): ReactNode {
  const words = children.filter((part) => part !== '');
  return words.length === 0 ? null : <chakra.span color="fg.muted">: {words.join(', ')}</chakra.span>;
}
