import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { CellCloseUp, EvidencePlate } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { besidePanel, settingRows, stepTitle } from '../../../components/setting-rows';
import { Box, Line, Paper, Small, Title } from '../../../components/sheet-paper';
import { formatDate, formatTime } from '../../../lib/format';
import { decimalSignOf } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { FinderAnswer, FinderCaution, ReferenceCell } from '../finder.api';
import { inSentence } from '../sentence';
import { limitWords } from './cautions';
import { measurementWords } from './mark-to-match';
import { SheetCodePicture } from './sheet-code';

const MOST_MEASUREMENTS = 3;

export type SheetProps = { answer: FinderAnswer; cautions: readonly FinderCaution[]; time: ReactNode };

/** One revision for one part on one page of A4, black on white: what is pinned to the machine. */
export function Sheet({ answer, cautions, time }: SheetProps) {
  return (
    <Paper aria-label={`Set-up sheet of ${answer.code}`}>
      <Head answer={answer} />
      <SheetCautions cautions={cautions} />
      <chakra.div data-fold="" display="grid" gridTemplateColumns="minmax(0, 1fr) 56mm" columnGap="8mm" mt="4mm">
        <Settings answer={answer} />
        <chakra.div>
          {answer.reference !== null && <Match reference={answer.reference} />}
          <Limits answer={answer} />
          <chakra.p mt="3mm" fontSize="10pt" lineHeight="13pt" _empty={{ display: 'none' }}>
            {time}
          </chakra.p>
        </chakra.div>
      </chakra.div>
      <SetUp steps={answer.setUpSteps} />
      <Foot answer={answer} />
    </Paper>
  );
}

function Head({ answer }: { answer: FinderAnswer }) {
  const { shop } = useSession();
  const { code, revisionNumber, title, material, finish, effect, machine, profileNumber, lens, reference } = answer;
  return (
    <chakra.header display="grid" gridTemplateColumns="26mm minmax(0, 1fr) 34mm" columnGap="5mm" alignItems="start">
      <div>
        <SheetCodePicture recipeId={answer.recipeId} />
        <Small>Opens what holds now</Small>
      </div>
      <div>
        <p>Set-up sheet, {shop.name}</p>
        <chakra.p fontSize="22pt" lineHeight="27pt">
          <b>{code}</b> revision {revisionNumber}
        </chakra.p>
        <p>
          <b>{title}</b>
        </p>
        <p>
          {material.name}, {inSentence('finish', finish.name)}, {inSentence('effect', effect.name)}
        </p>
        <Small>
          {machine.name}, profile {profileNumber} · Lens {lens.name}
        </Small>
      </div>
      {reference !== null && (
        <div>
          <EvidencePlate
            shape={{ ...reference.plate, code: reference.couponCode }}
            photo={platePhotoOf(reference.photo, 'small')}
            chosen={reference.address}
          />
          <Small>
            {reference.couponCode}, cell {reference.address}
          </Small>
        </div>
      )}
    </chakra.header>
  );
}

function SheetCautions({ cautions }: { cautions: readonly FinderCaution[] }) {
  const own = cautions.filter(({ isGeneral }) => !isGeneral);
  const general = cautions.filter(({ isGeneral }) => isGeneral);
  return (
    <chakra.section border="0.6mm solid #000" mt="4mm">
      <chakra.h2 bg="#000" color="#fff" px="3mm" fontSize="11pt" lineHeight="6mm" css={{ printColorAdjust: 'exact' }}>
        ⚠ Cautions, read first
      </chakra.h2>
      {own.length > 0 && (
        <chakra.ul
          data-fold=""
          display="grid"
          gridTemplateColumns={`repeat(${Math.min(3, own.length)}, minmax(0, 1fr))`}
          columnGap="4mm"
          px="3mm"
          pt="1.5mm"
        >
          {own.map(({ id, subject, text }) => (
            <chakra.li key={id} fontSize="9pt" lineHeight="11.5pt" pb="1.5mm">
              <b>{subject}</b> {text}
            </chakra.li>
          ))}
        </chakra.ul>
      )}
      {general.length > 0 && (
        <chakra.p px="3mm" py="1.5mm" fontSize="9pt" lineHeight="11.5pt" borderTop={own.length > 0 ? '0.2mm solid #000' : undefined}>
          <b>With every job:</b> {general.map(({ subject }) => subject).join(' ')} Follow the machine’s manual and the laser safety officer.
        </chakra.p>
      )}
    </chakra.section>
  );
}

function Settings({ answer: { steps, panel, machine } }: { answer: FinderAnswer }) {
  const { shop } = useSession();
  const sign = decimalSignOf(shop.locale);
  return (
    <section>
      <Title>Settings, in the order of {machine.name}’s panel</Title>
      {steps.map((step, index) => {
        const rows = settingRows(step, panel, sign);
        const isTight = rows.length * steps.length > MOST_LARGE_ROWS;
        return (
          // Steps are known by their place.
          <chakra.div key={`${index + 1} ${step.purpose}`} mb="2mm">
            {steps.length > 1 && <Small>{stepTitle(step, index, steps.length)}</Small>}
            <ol>
              {rows.map(({ key, label, note, value, unit }, place) => (
                <chakra.li
                  key={key}
                  display="grid"
                  gridTemplateColumns="6mm minmax(0, 1fr) auto 16mm 6mm"
                  alignItems="center"
                  minHeight={isTight ? '9mm' : '12mm'}
                  borderBottom="0.2mm solid #777"
                >
                  <Small>{place + 1}</Small>
                  <span>
                    {label}
                    {note !== undefined && <Small>{note}</Small>}
                  </span>
                  <chakra.b fontSize={isTight ? '18pt' : '28pt'} lineHeight="1">
                    {value}
                  </chakra.b>
                  <chakra.span pl="2mm">{unit}</chakra.span>
                  <Box />
                </chakra.li>
              ))}
            </ol>
            <Small>
              {besidePanel(step, panel, sign)
                .map(({ label, value, unit }) => `${label} ${String(value).toLowerCase()}${unit === undefined ? '' : ` ${unit}`}`)
                .join(', ')}
            </Small>
          </chakra.div>
        );
      })}
    </section>
  );
}

const MOST_LARGE_ROWS = 8;

function Match({ reference }: { reference: ReferenceCell }) {
  const { shop } = useSession();
  const { photo, lot } = reference;
  const taken = photo === null ? 'No photo' : `Photo of ${formatDate(photo.takenAt, shop.timeZone)}`;
  return (
    <section>
      <Title>The mark to match</Title>
      <CellCloseUp
        shape={{ ...reference.plate, code: reference.couponCode }}
        photo={platePhotoOf(photo, 'large')}
        address={reference.address}
      />
      {reference.measurements.slice(0, MOST_MEASUREMENTS).map((measurement) => (
        <Small key={`${measurement.quantity} ${measurement.method}`}>{measurementWords(measurement)}</Small>
      ))}
      <Small>
        {taken}
        {lot === '' ? '' : `, lot ${lot}`}
      </Small>
    </section>
  );
}

function Limits({ answer }: { answer: FinderAnswer }) {
  const words = limitWords(answer.limits);
  if (words === '') return null;
  return (
    <chakra.p mt="3mm" fontSize="10pt" lineHeight="13pt">
      <b>Holds for</b> {words}
    </chakra.p>
  );
}

function SetUp({ steps }: { steps: FinderAnswer['setUpSteps'] }) {
  if (steps.length === 0) return null;
  return (
    <chakra.section mt="3mm">
      <Title>Set-up</Title>
      <ol>
        {steps.map(({ text, caution }, index) => (
          <chakra.li
            // Steps are known by their place.
            key={`${index + 1} ${text}`}
            display="grid"
            gridTemplateColumns="6mm minmax(0, 1fr) 6mm"
            alignItems="center"
            minHeight="8mm"
            borderBottom="0.2mm solid #777"
          >
            <Small>{index + 1}</Small>
            <span>
              {text} {caution !== undefined && caution !== '' && <b>{caution}</b>}
            </span>
            <Box />
          </chakra.li>
        ))}
      </ol>
    </chakra.section>
  );
}

function Foot({ answer }: { answer: FinderAnswer }) {
  const { shop, member } = useSession();
  const { signature, holdsUntil, contentHash, isOverdue } = answer;
  const until =
    holdsUntil === null ? '' : `${isOverdue ? 'Was to be proved again by' : 'Holds until'} ${formatDate(holdsUntil, shop.timeZone)}. `;
  return (
    <chakra.footer mt="auto">
      <chakra.div data-fold="" display="grid" gridTemplateColumns="1.2fr 1fr 1fr" columnGap="8mm" alignItems="end">
        <Line name={signature?.printedName ?? ''}>
          {signature === null
            ? ''
            : `Approved for use${signature.isByAuthor ? ', signed by its author' : ''}, ${formatTime(signature.signedAt, shop.timeZone)}. `}
          {until}Digest {contentHash.slice(0, 4)} {contentHash.slice(4, 8)}
        </Line>
        <Line name="">Set up by, date</Line>
        <Line name="">Good / scrapped</Line>
      </chakra.div>
      <chakra.p
        display="flex"
        flexWrap="wrap"
        justifyContent="space-between"
        gap="4mm"
        mt="4mm"
        pt="1.5mm"
        borderTop="0.6mm solid #000"
        fontSize="9pt"
        lineHeight="12pt"
      >
        <b>Uncontrolled when printed. Scan the code before use.</b>
        <span>
          Printed by {member.printedName}, {formatTime(new Date(), shop.timeZone)}
        </span>
        <span>1 of 1</span>
      </chakra.p>
    </chakra.footer>
  );
}
