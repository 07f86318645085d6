import { chakra } from '@chakra-ui/react';
import type { EnteredPart, PartResults } from '@proofplate/recipe-model';
import { drawEnd, drawFlat, drawSide, type PartDrawing, type Tone } from './part-drawing';

export type PartPictureProps = { part: EnteredPart; results: PartResults; locale: string; tone?: 'screen' | 'paper' };

/** Paper is black on white in both modes. */
const TONES: Readonly<Record<'screen' | 'paper', Tone>> = {
  screen: {
    ink: 'var(--pp-colors-fg)',
    line: 'var(--pp-colors-fg-muted)',
    body: 'var(--pp-colors-bg-muted)',
    ground: 'var(--pp-colors-bg-panel)',
    mark: 'var(--pp-colors-brand-solid)',
    beam: 'var(--pp-colors-oxide-solid)',
  },
  paper: { ink: '#000000', line: '#444444', body: '#e4e4e4', ground: '#ffffff', mark: '#000000', beam: '#000000' },
};

/** The part with its measures, three ways: from its end, from the side, and the artwork flat. The table holds the same numbers. */
export function PartPicture({ part, results, locale, tone = 'screen' }: PartPictureProps) {
  const subject = { part, results, locale, tone: TONES[tone] };
  return (
    <chakra.div
      display="grid"
      gap="4"
      gridTemplateColumns={tone === 'paper' ? 'repeat(3, minmax(0, 1fr))' : 'repeat(auto-fit, minmax(min(220px, 100%), 1fr))'}
    >
      {[drawEnd(subject), drawSide(subject), drawFlat(subject)].map((drawing) => (
        <View key={drawing.title} drawing={drawing} tone={subject.tone} />
      ))}
    </chakra.div>
  );
}

function View({ drawing: { title, label, width, height, shapes }, tone }: { drawing: PartDrawing; tone: Tone }) {
  return (
    <chakra.figure minW="0" maxW="340px">
      <chakra.svg role="img" aria-label={label} viewBox={`0 0 ${width} ${height}`} width="full" height="auto" display="block">
        {shapes}
      </chakra.svg>
      <figcaption style={{ color: tone.line, fontSize: '0.875em', textAlign: 'center' }}>{title}</figcaption>
    </chakra.figure>
  );
}
