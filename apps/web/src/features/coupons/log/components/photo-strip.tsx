import { chakra, Flex } from '@chakra-ui/react';
import { type ChangeEvent, type ReactNode, useId } from 'react';
import { Button } from '../../../../components/button';
import { CrossIcon, PhotoIcon } from '../../../../components/icons';
import { PlainPhoto } from '../../../../components/plate/plain-photo';
import { StateMark } from '../../../../components/state-mark';
import { formatDate } from '../../../../lib/format';
import { type Photo, retryPhoto } from '../log.api';
import { type Upload, useUploads } from '../use-uploads';

const TYPES = 'image/jpeg,image/png,image/webp';
const THUMBNAIL_PX = 64;

export type PhotoStripProps = {
  couponId: string;
  photos: readonly Photo[];
  shown: Photo | undefined;
  timeZone: string;
  mayAdd: boolean;
  onShow: (photo: Photo) => void;
  /** More acts beside the one that adds photos. */
  children?: ReactNode;
};

/** Photos of the coupon: what became of each, which one is shown, and new ones on their way. */
export function PhotoStrip({ couponId, photos, shown, timeZone, mayAdd, onShow, children }: PhotoStripProps) {
  const { uploads, add, drop } = useUploads(couponId);
  return (
    <chakra.section aria-label="Photos" ml={{ base: '0', sm: '48px' }} mb="2" fontSize="sm" lineHeight="sm">
      <chakra.ul display="grid" gap="2">
        {photos.map((photo) => (
          <PhotoRow key={photo.id} photo={photo} isShown={photo.id === shown?.id} timeZone={timeZone} onShow={onShow} />
        ))}
        {uploads.map((upload) => (
          <UploadRow key={upload.key} upload={upload} onDrop={() => drop(upload.key)} />
        ))}
      </chakra.ul>
      <Flex gap="2" mt="2" wrap="wrap">
        {mayAdd && <AddPhotos onFiles={add} />}
        {children}
      </Flex>
    </chakra.section>
  );
}

export type PhotoCaptionProps = {
  shown: Photo | undefined;
  hasPhotos: boolean;
  /** The plate was burnt before it was entered, so nothing was planned here. */
  isImported: boolean;
  timeZone: string;
  onCorners: (photo: Photo) => void;
};

/** Which photo lies under the cells, and how it was laid there. */
export function PhotoCaption({ shown, timeZone, onCorners, hasPhotos, isImported }: PhotoCaptionProps) {
  const words =
    shown === undefined
      ? hasPhotos
        ? 'No photo is ready yet.'
        : `No photo yet. The plate is drawn as it was ${isImported ? 'entered' : 'planned'}.`
      : `Photo of ${formatDate(shown.capturedAt ?? shown.createdAt, timeZone)}${cornerWords(shown)}`;
  return (
    <Flex gap="3" align="center" color="fg.muted" fontSize="sm" lineHeight="sm">
      <PhotoIcon />
      <chakra.span flex={{ base: '1', sm: 'none' }}>{words}</chakra.span>
      {shown?.allowedActions.includes('set-corners') === true && (
        <Button
          kind="quiet"
          fontSize="sm"
          minHeight={{ base: 'touch', lg: '32px' }}
          px="2"
          textDecoration="underline"
          onClick={() => onCorners(shown)}
        >
          {shown.corners === null ? 'Set the corners' : 'Corners'}
        </Button>
      )}
    </Flex>
  );
}

function cornerWords({ corners, cornersFoundBy, allowedActions }: Photo): string {
  if (corners === null)
    return allowedActions.includes('set-corners')
      ? '. It can be laid under the cells once its four corners are set.'
      : ', not laid under the cells: its corners were not set. The whole picture opens from the list below.';
  if (cornersFoundBy === 'marks') return ', laid on its four corner marks.';
  return cornersFoundBy === 'render' ? ', an invented picture whose corners are known.' : ', laid on four corners set by hand.';
}

type PhotoRowProps = { photo: Photo; isShown: boolean; timeZone: string; onShow: (photo: Photo) => void };

function PhotoRow({ photo, isShown, timeZone, onShow }: PhotoRowProps) {
  const { id, state, urls, corners, refusedReason, createdAt, capturedAt, allowedActions } = photo;
  const label = `Photo of ${formatDate(capturedAt ?? createdAt, timeZone)}`;
  return (
    <Row>
      {urls !== null && <PlainPhoto urls={urls} label={label} sizePx={THUMBNAIL_PX} />}
      <chakra.div flex="1" minW="0">
        <div>{label}</div>
        {state === 'refused' ? (
          <chakra.div color="oxide.fg">
            <StateMark state="fails">Refused</StateMark>
            <chakra.div>{refusedReason}</chakra.div>
          </chakra.div>
        ) : state === 'ready' ? (
          <chakra.span color="fg.muted">{readyWords(isShown, corners !== null)}</chakra.span>
        ) : (
          <chakra.span color="fg.muted" role="status">
            being processed, you may leave the page
          </chakra.span>
        )}
      </chakra.div>
      {state === 'ready' && !isShown && <Button onClick={() => onShow(photo)}>Show</Button>}
      {allowedActions.includes('retry') && (
        <Button aria-label={`Process the photo ${id.slice(-4)} again`} onClick={() => void retryPhoto(photo)}>
          Process again
        </Button>
      )}
    </Row>
  );
}

function readyWords(isShown: boolean, hasCorners: boolean): string {
  if (!hasCorners) return 'not laid flat: without corners';
  return isShown ? 'under the cells' : 'can be laid under the cells';
}

function UploadRow({ upload: { name, share, problem }, onDrop }: { upload: Upload; onDrop: () => void }) {
  const percent = Math.round(share * 100);
  return (
    <Row>
      <chakra.div flex="1" minW="0">
        <chakra.div overflowWrap="anywhere">{name}</chakra.div>
        {problem === undefined ? (
          <Flex align="center" gap="2" color="fg.muted">
            <chakra.progress value={percent} max={100} aria-label={`Sending ${name}`} flex="1" height="8px" accentColor="brand.solid" />
            <span>{percent === 100 ? 'sent, being checked' : `${percent} %`}</span>
          </Flex>
        ) : (
          <chakra.div color="oxide.fg" role="alert">
            <StateMark state="fails">{problem.title}</StateMark>
            <chakra.div>{problem.status === 0 ? 'The connection was lost. Send it again: it is stored once.' : problem.detail}</chakra.div>
          </chakra.div>
        )}
      </chakra.div>
      <Button
        kind="quiet"
        shape="square"
        aria-label={problem === undefined ? `Cancel ${name}` : `Put ${name} away`}
        icon={<CrossIcon />}
        onClick={onDrop}
      />
    </Row>
  );
}

function AddPhotos({ onFiles }: { onFiles: (files: readonly File[]) => void }) {
  const handleChange = (event: ChangeEvent<HTMLInputElement>) => {
    onFiles([...(event.target.files ?? [])]);
    event.target.value = '';
  };
  return (
    <>
      <FileButton label="Add photos" isMany onChange={handleChange} />
      <chakra.div display={{ base: 'block', lg: 'none' }}>
        <FileButton label="Take a photo" isCamera onChange={handleChange} />
      </chakra.div>
    </>
  );
}

type FileButtonProps = { label: string; isMany?: boolean; isCamera?: boolean; onChange: (event: ChangeEvent<HTMLInputElement>) => void };

/** A label that looks like a button: the input itself cannot be dressed. */
function FileButton({ label, isMany = false, isCamera = false, onChange }: FileButtonProps) {
  const id = useId();
  return (
    <>
      <chakra.input
        id={id}
        srOnly
        type="file"
        accept={TYPES}
        multiple={isMany}
        onChange={onChange}
        {...(isCamera ? { capture: 'environment' as const } : {})}
        css={{ '&:focus-visible + label': { outline: '2px solid', outlineColor: 'brand.focusRing', outlineOffset: '2px' } }}
      />
      <chakra.label
        htmlFor={id}
        display="inline-flex"
        alignItems="center"
        gap="2"
        minHeight={{ base: 'touch', lg: 'control' }}
        px="4"
        border="hairline"
        borderColor="border.emphasized"
        borderRadius="md"
        bg="bg.panel"
        color="fg"
        fontSize="md"
        fontWeight="semibold"
        cursor="pointer"
        _hover={{ bg: 'bg.subtle' }}
      >
        <PhotoIcon />
        {label}
      </chakra.label>
    </>
  );
}

const Row = chakra('li', {
  base: { display: 'flex', gap: '3', alignItems: 'center', p: '2', border: 'hairline', borderRadius: 'md', bg: 'bg.panel' },
});
