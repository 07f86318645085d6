import { Box, chakra } from '@chakra-ui/react';
import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import { CORNER_NAMES, type Corners, nudgeOf } from '../corner-history';
import type { PhotoCorner } from '../log.api';

const LOUPE_PX = { small: 88, large: 132 };
/** Below this width of the picture the large loupe would hide half of it. */
const SMALL_STAGE_PX = 480;
/** Over the scale of the stage. */
const LOUPE_ZOOM = 4;
const HANDLE_PX = 44;

export type CornerStageProps = {
  url: string;
  /** Pixels of the picture whose steps the arrow keys make. */
  widthPx: number;
  heightPx: number;
  corners: Corners;
  active: number;
  /** The buttons beside it move the corner. */
  isNudging: boolean;
  onActive: (index: number) => void;
  onPlace: (point: PhotoCorner) => void;
  /** `isStart`: the change begins here and Undo leads back before it. */
  onMove: (index: number, point: PhotoCorner, isStart: boolean) => void;
};

/** The upright photo with its numbered handles: tap to place, drag, or nudge with the arrow keys. */
export function CornerStage({ url, widthPx, heightPx, corners, active, isNudging, onActive, onPlace, onMove }: CornerStageProps) {
  const [isHeld, setIsHeld] = useState(false);
  const stage = useRef<HTMLDivElement>(null);
  const isDragging = useRef(false);
  const pointOf = ({ clientX, clientY }: { clientX: number; clientY: number }): PhotoCorner => {
    const box = stage.current?.getBoundingClientRect();
    if (box === undefined || box.width === 0) return { x: 0, y: 0 };
    return { x: (clientX - box.left) / box.width, y: (clientY - box.top) / box.height };
  };
  const handleDown = (index: number) => (event: PointerEvent<HTMLButtonElement>) => {
    event.currentTarget.setPointerCapture(event.pointerId);
    isDragging.current = false;
    setIsHeld(true);
    onActive(index);
  };
  const handleDrag = (index: number) => (event: PointerEvent<HTMLButtonElement>) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    onMove(index, pointOf(event), !isDragging.current);
    isDragging.current = true;
  };
  const handleKey = (index: number) => (event: KeyboardEvent) => {
    const step = nudgeOf(event.key, event.shiftKey);
    const corner = corners[index];
    if (step === undefined || corner === undefined) return;
    event.preventDefault();
    setIsHeld(true);
    onMove(index, { x: corner.x + step.x / widthPx, y: corner.y + step.y / heightPx }, true);
  };
  const shown = corners[active];
  return (
    <Box
      ref={stage}
      position="relative"
      userSelect="none"
      touchAction="none"
      lineHeight="none"
      cursor={corners.length < 4 ? 'crosshair' : 'default'}
      style={{ aspectRatio: `${widthPx} / ${heightPx}` }}
      onClick={(event) => event.target instanceof HTMLElement && event.target.closest('button') === null && onPlace(pointOf(event))}
    >
      <chakra.img src={url} alt="The photo, upright" width="full" height="full" display="block" draggable={false} />
      <Outline corners={corners} />
      {corners.map((corner, index) => (
        <Handle
          // a corner is its place in the order
          key={CORNER_NAMES[index]}
          number={index + 1}
          name={CORNER_NAMES[index] ?? ''}
          corner={corner}
          isActive={index === active}
          onFocus={() => onActive(index)}
          onKeyDown={handleKey(index)}
          onPointerDown={handleDown(index)}
          onPointerMove={handleDrag(index)}
          onLostPointerCapture={() => setIsHeld(false)}
          onBlur={() => setIsHeld(false)}
        />
      ))}
      {shown !== undefined && (isHeld || isNudging) && <Loupe url={url} corner={shown} aspect={heightPx / widthPx} stage={stage.current} />}
    </Box>
  );
}

function Outline({ corners }: { corners: Corners }) {
  const points = corners.map(({ x, y }) => `${x * 100},${y * 100}`).join(' ');
  return (
    <chakra.svg
      viewBox="0 0 100 100"
      preserveAspectRatio="none"
      position="absolute"
      inset="0"
      width="full"
      height="full"
      pointerEvents="none"
      aria-hidden="true"
    >
      <polygon points={points} fill="none" stroke="#14161A" strokeWidth="4" vectorEffect="non-scaling-stroke" />
      <polygon points={points} fill="none" stroke="#FFC94A" strokeWidth="2" vectorEffect="non-scaling-stroke" />
    </chakra.svg>
  );
}

type HandleProps = {
  number: number;
  name: string;
  corner: PhotoCorner;
  isActive: boolean;
  onFocus: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
  onPointerDown: (event: PointerEvent<HTMLButtonElement>) => void;
  onPointerMove: (event: PointerEvent<HTMLButtonElement>) => void;
  onLostPointerCapture: () => void;
  onBlur: () => void;
};

function Handle({ number, name, corner, isActive, ...on }: HandleProps) {
  return (
    <chakra.button
      type="button"
      aria-label={`Corner ${number}, ${name}`}
      aria-pressed={isActive}
      position="absolute"
      boxSize={`${HANDLE_PX}px`}
      ml={`${-HANDLE_PX / 2}px`}
      mt={`${-HANDLE_PX / 2}px`}
      style={{ left: `${corner.x * 100}%`, top: `${corner.y * 100}%` }}
      borderRadius="full"
      border={isActive ? '3px solid #FFC94A' : '2px solid #FFC94A'}
      boxShadow="0 0 0 1px #14161A, inset 0 0 0 1px #14161A"
      bg="transparent"
      cursor="grab"
      touchAction="none"
      {...on}
    >
      <chakra.span
        position="absolute"
        right="-8px"
        top="-8px"
        boxSize="20px"
        lineHeight="20px"
        borderRadius="full"
        bg="#14161A"
        color="#FFFFFF"
        fontSize="13px"
        fontWeight="bold"
        aria-hidden="true"
      >
        {number}
      </chakra.span>
    </chakra.button>
  );
}

/** Magnifies the corner while it is moved, in the middle of the picture: away from the finger, and off the cells as soon as it rests. */
function Loupe({ url, corner, aspect, stage }: { url: string; corner: PhotoCorner; aspect: number; stage: HTMLDivElement | null }) {
  const stagePx = stage?.clientWidth ?? 600;
  const loupePx = stagePx < SMALL_STAGE_PX ? LOUPE_PX.small : LOUPE_PX.large;
  const widthPx = stagePx * LOUPE_ZOOM;
  const heightPx = widthPx * aspect;
  return (
    <Box
      aria-hidden="true"
      position="absolute"
      top="50%"
      left="50%"
      transform="translate(-50%, -50%)"
      boxSize={`${loupePx}px`}
      borderRadius="full"
      border="3px solid #14161A"
      boxShadow="0 0 0 2px #FFC94A"
      pointerEvents="none"
      bg="#14161A"
      backgroundRepeat="no-repeat"
      style={{
        backgroundImage: `url("${url}")`,
        backgroundSize: `${widthPx}px ${heightPx}px`,
        backgroundPosition: `${loupePx / 2 - 3 - corner.x * widthPx}px ${loupePx / 2 - 3 - corner.y * heightPx}px`,
      }}
    >
      <chakra.svg viewBox="0 0 126 126" width="full" height="full">
        <path d="M63 40v18M63 68v18M40 63h18M68 63h18" stroke="#14161A" strokeWidth="4" />
        <path d="M63 40v18M63 68v18M40 63h18M68 63h18" stroke="#FFC94A" strokeWidth="2" />
      </chakra.svg>
    </Box>
  );
}
