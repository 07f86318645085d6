import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Box, Line, Paper, Small, Title } from '../../../components/sheet-paper';
import { formatNumber, formatQuantity, formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import type { SavedPart } from '../part-set-up.api';
import { FIELD_LABELS, SHAPE_WORDS } from '../part-words';
import { lengthsOf } from '../typed-part';
import { NotChecked } from './not-checked';
import { partFacts } from './part-facts';
import { PartPicture } from './part-picture';

export type PartSheetProps = {
  saved: SavedPart;
  run: { code: string; jobReference: string; part: string; recipe: { code: string; title: string } };
  cautions: readonly { id: string; subject: string; text: string }[];
  /** How long the marking takes, in a line. */
  time: ReactNode;
};

/** The round part of a run on one page of A4, black on white. */
export function PartSheet({ saved, run, cautions, time }: PartSheetProps) {
  const { shop, member } = useSession();
  const { entered, ground, results } = saved;
  return (
    <Paper aria-label={`Part set-up of ${run.code}`}>
      <header>
        <p>Part set-up, {shop.name}</p>
        <chakra.p fontSize="22pt" lineHeight="27pt">
          <b>{run.code}</b> {run.jobReference}
        </chakra.p>
        <p>
          {run.part === '' ? SHAPE_WORDS[entered.shape] : run.part}, marked {entered.side}. {run.recipe.code} {run.recipe.title}
        </p>
        <Small>
          {ground.machine.name} · Lens {ground.lens.name}
        </Small>
      </header>
      <SheetCautions cautions={cautions} />
      <chakra.section mt="4mm">
        <Title>Enter and check</Title>
        <ol>
          {partFacts({ results, shownIn: entered.shownIn, locale: shop.locale }).map(({ label, value, note }) => (
            <chakra.li
              key={label}
              display="grid"
              gridTemplateColumns="46mm minmax(0, 1fr) 6mm"
              alignItems="center"
              minHeight="11mm"
              borderBottom="0.2mm solid #777"
            >
              <span>{label}</span>
              <span>
                <chakra.b fontSize="18pt" lineHeight="1.1" css={{ '& *': { color: '#000 !important' } }}>
                  {value}
                </chakra.b>
                {note !== undefined && <Small>{note}</Small>}
              </span>
              <Box />
            </chakra.li>
          ))}
        </ol>
        <chakra.p mt="2mm" _empty={{ display: 'none' }}>
          {time}
        </chakra.p>
      </chakra.section>
      <chakra.section mt="4mm">
        <Title>The part</Title>
        <PartPicture part={entered} results={results} locale={shop.locale} tone="paper" />
        <Small>{typedWords(saved, shop.locale)}</Small>
      </chakra.section>
      <chakra.footer mt="auto">
        <chakra.div css={{ '& *': { color: '#333 !important' } }}>
          <NotChecked side={entered.side} />
        </chakra.div>
        <chakra.div display="grid" gridTemplateColumns="1fr 1fr" columnGap="8mm" mt="4mm">
          <Line name={saved.savedBy}>Worked out, {formatTime(saved.savedAt, shop.timeZone)}</Line>
          <Line name="">Set up by, date</Line>
        </chakra.div>
        <chakra.p display="flex" justifyContent="space-between" gap="4mm" mt="3mm" pt="1.5mm" borderTop="0.6mm solid #000" fontSize="9pt">
          <b>Uncontrolled when printed.</b>
          <span>
            Printed by {member.printedName}, {formatTime(new Date(), shop.timeZone)}
          </span>
        </chakra.p>
      </chakra.footer>
    </Paper>
  );
}

function SheetCautions({ cautions }: Pick<PartSheetProps, 'cautions'>) {
  return (
    <chakra.section border="0.6mm solid #000" mt="4mm">
      <chakra.h2 bg="#000" color="#fff" px="3mm" fontSize="11pt" lineHeight="6mm" css={{ printColorAdjust: 'exact' }}>
        ⚠ Cautions, read first
      </chakra.h2>
      <chakra.ul px="3mm" py="1.5mm" fontSize="9pt" lineHeight="11.5pt">
        {cautions.map(({ id, subject, text }) => (
          <li key={id}>
            <b>{subject}</b> {text}
          </li>
        ))}
        <li>Follow the manuals of the machine and the rotary, and the laser safety officer.</li>
      </chakra.ul>
    </chakra.section>
  );
}

/** "Outside diameter 20 mm, wall 2 mm": as it was typed, each in its own unit. */
function typedWords({ entered }: SavedPart, locale: string): string {
  const wrap = entered.artworkWidth === undefined ? 'whole turn' : 'part of a turn';
  const lengths = lengthsOf({ shape: entered.shape, wrap }).flatMap((field) => {
    const length = entered[field];
    if (length === undefined) return [];
    return [`${FIELD_LABELS[field].toLowerCase()} ${formatQuantity(length.value, length.unit, { locale })}`];
  });
  return `Typed: ${lengths.join(', ')}; ${entered.allowance} ${formatNumber(entered.allowancePercent, { locale })} %.`;
}
