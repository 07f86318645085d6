import { type EnteredPart, lengthMm, type PartResults } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { degrees, lengthText, numberValue } from '../part-words';
import { seamWords } from './part-facts';

export type Tone = {
  readonly ink: string;
  readonly line: string;
  readonly body: string;
  readonly ground: string;
  readonly mark: string;
  readonly beam: string;
};
export type PartDrawing = {
  readonly title: string;
  readonly label: string;
  readonly width: number;
  readonly height: number;
  readonly shapes: ReactNode;
};
type Subject = { readonly part: EnteredPart; readonly results: PartResults; readonly locale: string; readonly tone: Tone };

const WIDTH = 280;
const HEIGHT = 236;
const CENTRE = { x: WIDTH / 2, y: 122 };
const RADIUS = 72;
/** More ticks would be a grey ring. */
const MOST_TICKS = 72;
const LETTERS = 14;

/** From its end: the circle, the arc of the artwork, the strip under the beam and the index steps, angles true to scale. */
export function drawEnd({ part, results, locale, tone }: Subject): PartDrawing {
  const value = (key: string) => numberValue(results, key);
  const isInside = part.side === 'inside';
  const marked = isInside && part.shape !== 'cone' ? RADIUS * (innerShare(part) ?? 1) : RADIUS;
  const wrap = Math.min(360, value('wrapAngle') ?? 0);
  const strip = Math.min(180, value('indexAngle') ?? 0);
  // The beam comes from above: it meets an outer surface on top and an inner one at the bottom.
  const crown = isInside ? 180 : 0;
  const diameter = `Ø ${lengthText(value('rotaryDiameter') ?? 0, part.shownIn, locale)}`;
  const hit = at(crown, marked);
  const [left, right] = [at(crown - strip / 2, marked), at(crown + strip / 2, marked)];
  return {
    title: 'From its end',
    label: `The part from its end: ${diameter}, artwork round ${Math.round(wrap)}° of the ${part.side}${stepWords(results)}.`,
    ...{ width: WIDTH, height: HEIGHT },
    shapes: (
      <>
        <circle cx={CENTRE.x} cy={CENTRE.y} r={RADIUS} fill={tone.body} stroke={tone.line} strokeWidth="1.5" />
        {innerShare(part) !== undefined && (
          <circle
            cx={CENTRE.x}
            cy={CENTRE.y}
            r={RADIUS * (innerShare(part) ?? 0)}
            fill={tone.ground}
            stroke={tone.line}
            strokeWidth="1.5"
          />
        )}
        <path d={arc(crown, wrap, marked)} fill="none" stroke={tone.mark} strokeWidth="6" strokeLinecap="butt" />
        <Ticks steps={value('indexSteps')} wrap={wrap} crown={crown} radius={marked} tone={tone} />
        {strip > 0 && <path d={`M${left.x} ${left.y}L${right.x} ${right.y}`} stroke={tone.beam} strokeWidth="2" />}
        <path
          d={`M${CENTRE.x} 20V${hit.y - 5}M${CENTRE.x - 5} ${hit.y - 12}l5 7 5-7`}
          fill="none"
          stroke={tone.beam}
          strokeWidth="1.5"
          strokeDasharray={isInside ? '5 4' : undefined}
        />
        <text x={CENTRE.x} y="14" textAnchor="middle" fontSize={LETTERS} fill={tone.ink}>
          beam
        </text>
        <text
          x={CENTRE.x}
          y={CENTRE.y + (isInside ? -8 : 6)}
          textAnchor="middle"
          fontSize={LETTERS}
          fontWeight="600"
          fill={tone.ink}
          stroke={innerShare(part) === undefined ? tone.body : tone.ground}
          strokeWidth="5"
          paintOrder="stroke"
        >
          {diameter}
        </text>
        <text x={CENTRE.x} y={HEIGHT - 8} textAnchor="middle" fontSize={LETTERS} fill={tone.ink}>
          {part.side}: {seamWords(results, part.shownIn, locale)}
        </text>
      </>
    ),
  };
}

function Ticks({ steps, wrap, crown, radius, tone }: { steps: number | null; wrap: number; crown: number; radius: number; tone: Tone }) {
  if (steps === null || steps > MOST_TICKS) return null;
  const edges = Array.from({ length: steps + 1 }, (_, index) => crown - wrap / 2 + (wrap * index) / steps);
  return edges.map((angle) => {
    const [from, to] = [at(angle, radius - 9), at(angle, radius + 9)];
    return <path key={angle} d={`M${from.x} ${from.y}L${to.x} ${to.y}`} stroke={tone.line} strokeWidth="1" />;
  });
}

/** Along the axis: length, bore, taper, and where the artwork lies. */
export function drawSide({ part, results, locale, tone }: Subject): PartDrawing {
  const mm = (field: 'diameter' | 'smallDiameter' | 'largeDiameter' | 'length' | 'artworkHeight') =>
    lengthMm(part[field] ?? { value: 0, unit: 'mm' });
  const [first, second] = part.shape === 'cone' ? [mm('largeDiameter'), mm('smallDiameter')] : [mm('diameter'), mm('diameter')];
  const scale = Math.min(220 / mm('length'), 130 / Math.max(first, second));
  const [length, high, low] = [mm('length') * scale, (first * scale) / 2, (second * scale) / 2];
  const x = (WIDTH - length) / 2;
  const middle = 96;
  const slant = numberValue(results, 'slantLength') ?? mm('length');
  const share = Math.min(1, mm('artworkHeight') / slant);
  const half = (along: number) => high + (low - high) * along;
  const [from, to] = [(1 - share) / 2, (1 + share) / 2];
  const bore = innerShare(part);
  const lengthWords = lengthText(mm('length'), part.shownIn, locale);
  const heightWords = lengthText(mm('artworkHeight'), part.shownIn, locale);
  return {
    title: 'From the side',
    label: `The part from the side: ${lengthWords} long, artwork ${heightWords} high in the middle of it.`,
    ...{ width: WIDTH, height: HEIGHT },
    shapes: (
      <>
        <path
          d={`M${x} ${middle - high}L${x + length} ${middle - low}V${middle + low}L${x} ${middle + high}Z`}
          fill={tone.body}
          stroke={tone.line}
          strokeWidth="1.5"
        />
        <path
          d={`M${x + length * from} ${middle - half(from)}L${x + length * to} ${middle - half(to)}V${middle + half(to)}L${x + length * from} ${middle + half(from)}Z`}
          fill={tone.mark}
          fillOpacity={part.side === 'inside' ? 0.15 : 0.35}
          stroke={tone.mark}
          strokeDasharray={part.side === 'inside' ? '4 3' : undefined}
        />
        {bore !== undefined && part.shape !== 'cone' && (
          <path
            d={`M${x} ${middle - high * bore}h${length}M${x} ${middle + high * bore}h${length}`}
            stroke={tone.line}
            strokeDasharray="4 3"
            fill="none"
          />
        )}
        <path d={`M${x - 12} ${middle}h${length + 24}`} stroke={tone.line} strokeDasharray="10 3 2 3" />
        <Measure x1={x + length * from} x2={x + length * to} y={178} words={heightWords} tone={tone} />
        <Measure x1={x} x2={x + length} y={214} words={lengthWords} tone={tone} />
      </>
    ),
  };
}

/** The artwork flat, as it is drawn: its size, and a letter that shows whether it is mirrored. */
export function drawFlat({ part, results, locale, tone }: Subject): PartDrawing {
  const [widthMm, heightMm] = [numberValue(results, 'artworkWidth') ?? 1, numberValue(results, 'artworkHeight') ?? 1];
  const scale = Math.min(220 / widthMm, 130 / heightMm);
  // A long narrow band keeps a line that can be seen.
  const [width, height] = [Math.max(6, widthMm * scale), Math.max(6, heightMm * scale)];
  const [x, y] = [(WIDTH - width) / 2, 96 - height / 2];
  const letter = Math.max(10, Math.min(64, height * 0.8, width * 0.6));
  const widthWords = lengthText(widthMm, part.shownIn, locale);
  const heightWords = lengthText(heightMm, part.shownIn, locale);
  const turn = degrees(numberValue(results, 'wrapAngle') ?? 0, 1, locale);
  return {
    title: 'Artwork, flat',
    label: `The artwork flat: ${widthWords} wide, ${heightWords} high, ${results.isMirrored ? 'mirrored' : 'not mirrored'}.`,
    ...{ width: WIDTH, height: HEIGHT },
    shapes: (
      <>
        <rect x={x} y={y} width={width} height={height} fill={tone.mark} fillOpacity="0.12" stroke={tone.mark} strokeWidth="1.5" />
        <g transform={`translate(${WIDTH / 2} 96)${results.isMirrored ? ' scale(-1 1)' : ''}`}>
          <text textAnchor="middle" dominantBaseline="central" fontSize={letter} fontWeight="700" fill={tone.mark}>
            R
          </text>
        </g>
        <text x={WIDTH / 2} y={y - 10} textAnchor="middle" fontSize={LETTERS} fill={tone.ink}>
          {heightWords} high
        </text>
        <Measure x1={x} x2={x + width} y={y + height + 16} words={widthWords} tone={tone} />
        <text x={WIDTH / 2} y={HEIGHT - 8} textAnchor="middle" fontSize={LETTERS} fill={tone.ink}>
          {turn} of turn, {results.isMirrored ? 'mirrored' : 'not mirrored'}
        </text>
      </>
    ),
  };
}

function Measure({ x1, x2, y, words, tone }: { x1: number; x2: number; y: number; words: string; tone: Tone }) {
  return (
    <>
      <path d={`M${x1} ${y - 6}v12M${x2} ${y - 6}v12M${x1} ${y}H${x2}`} stroke={tone.line} fill="none" />
      <text x={(x1 + x2) / 2} y={y + 18} textAnchor="middle" fontSize={LETTERS} fontWeight="600" fill={tone.ink}>
        {words}
      </text>
    </>
  );
}

/** Inner radius over outer one, where there is a wall. */
function innerShare({ shape, diameter, wall }: EnteredPart): number | undefined {
  if ((shape !== 'ring' && shape !== 'tube') || diameter === undefined || wall === undefined) return undefined;
  return 1 - (2 * lengthMm(wall)) / lengthMm(diameter);
}

function stepWords(results: PartResults): string {
  const steps = numberValue(results, 'indexSteps');
  return steps === null ? '' : `, ${steps} index steps`;
}

/** A point of the end view, degrees from the top, clockwise. */
function at(angleDeg: number, radius: number): { x: number; y: number } {
  const angle = (angleDeg * Math.PI) / 180;
  return { x: round(CENTRE.x + radius * Math.sin(angle)), y: round(CENTRE.y - radius * Math.cos(angle)) };
}

function arc(middleDeg: number, spanDeg: number, radius: number): string {
  // A whole turn as two halves: an arc that ends where it begins is drawn as nothing.
  const [from, middle, to] = [at(middleDeg - spanDeg / 2, radius), at(middleDeg, radius), at(middleDeg + spanDeg / 2, radius)];
  return `M${from.x} ${from.y}A${radius} ${radius} 0 0 1 ${middle.x} ${middle.y}A${radius} ${radius} 0 0 1 ${to.x} ${to.y}`;
}

const round = (value: number) => Math.round(value * 100) / 100;
