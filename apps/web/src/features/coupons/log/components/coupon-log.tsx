import { Box, chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../../components/button';
import { EmptyState } from '../../../../components/empty-state';
import { decimalSignOf } from '../../../../lib/read-number';
import { useSession } from '../../../../lib/session';
import type { Coupon } from '../../coupons.api';
import { spokenSetting } from '../cell-words';
import { MeasureDialog } from '../forms/measure-dialog';
import type { Inspection, Photo } from '../log.api';
import { platePhotoOf, shownPhoto } from '../plate-photos';
import { drawView } from '../plate-views';
import { useLog, whyNot } from '../use-log';
import { type OwnRatings, useOwnRatings } from '../use-own-ratings';
import { type PlateChoice, usePlateChoice } from '../use-plate-choice';
import { BestCells } from './best-cells';
import { CellJudgement } from './cell-judgement';
import { CELL_PANEL_ID, CellPanel } from './cell-panel';
import { CellStatus } from './cell-status';
import { CornerEditor } from './corner-editor';
import { Corrections } from './corrections';
import { CouponPlate } from './coupon-plate';
import { CriteriaPanel } from './criteria-panel';
import { DraftButton } from './draft-button';
import { KeyHints, ListedKeys } from './key-hints';
import { PhotoCaption, PhotoStrip } from './photo-strip';
import { Conflict, NotSaved } from './rating-notices';
import { TouchBar } from './touch-bar';
import { ViewBar } from './view-bar';

export type CouponLogProps = { coupon: Coupon; inspection: Inspection; photos: readonly Photo[] };

/** The plate and the chosen cell: everything that is found on a coupon is entered and read here. */
export function CouponLog({ coupon, inspection, photos }: CouponLogProps) {
  const choice = usePlateChoice(coupon);
  const { member } = useSession();
  const ratings = useOwnRatings(coupon.id, inspection, member.id);
  if (choice === undefined) {
    return (
      <EmptyState kind="none-match" title="This coupon has no cells">
        It was entered without a grid, so there is nothing to look at here.
      </EmptyState>
    );
  }
  return <Log coupon={coupon} inspection={inspection} photos={photos} choice={choice} ratings={ratings} />;
}

type LogProps = CouponLogProps & { choice: PlateChoice; ratings: OwnRatings };

function Log({ coupon, inspection, photos, choice, ratings }: LogProps) {
  const { shop } = useSession();
  const page = useLog({ inspection, choice, ratings });
  const [isRatingShown, setIsRatingShown] = useState(true);
  const [isMeasuring, setIsMeasuring] = useState(false);
  const [photoId, setPhotoId] = useState<string>();
  const [cornersOf, setCornersOf] = useState<Photo>();
  const decimalSign = decimalSignOf(shop.locale);
  const shown = shownPhoto(photos, photoId);
  const platePhoto = shown === undefined ? undefined : platePhotoOf(shown);
  const { cell, grid } = choice;
  const own = ratings.of(cell.id);
  const drawn = drawView(choice.view, {
    cells: choice.cells,
    inspection,
    ratingOf: page.digitOf,
    describe: (each) => spokenSetting(each, grid, coupon.profile.panel),
    hasPhoto: platePhoto !== undefined,
  });
  const criteria = <CriteriaPanel couponId={coupon.id} inspection={inspection} locale={shop.locale} timeZone={shop.timeZone} />;
  const mayJudge = page.mayRate && cell.markState !== 'skipped';
  return (
    <Box display="grid" gap={{ base: '4', lg: '5' }}>
      {inspection.criteria === null && criteria}
      {ratings.refusal !== undefined && <NotSaved coupon={coupon} ratings={ratings} />}
      <Box
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 1fr) minmax(0, 480px)' }}
        gap={{ base: '4', lg: '8' }}
      >
        <chakra.section aria-label="Plate" minW="0">
          <ViewBar
            view={choice.view}
            onView={choice.chooseView}
            isRatingShown={isRatingShown}
            onRatingShown={setIsRatingShown}
            grids={coupon.grids}
            gridNumber={grid.number}
            onGrid={choice.chooseGrid}
          />
          <CouponPlate
            ref={page.plate}
            coupon={coupon}
            choice={choice}
            drawn={drawn}
            photo={platePhoto}
            decimalSign={decimalSign}
            isRatingShown={isRatingShown}
            caption={
              <PhotoCaption
                shown={shown}
                hasPhotos={photos.length > 0}
                isImported={coupon.isImported}
                timeZone={shop.timeZone}
                onCorners={setCornersOf}
              />
            }
            onRate={page.rateAndMove}
            onOpen={openPanel}
          />
          <PhotoStrip
            couponId={coupon.id}
            photos={photos}
            shown={shown}
            timeZone={shop.timeZone}
            mayAdd={inspection.allowedActions.includes('photograph')}
            onShow={({ id }) => setPhotoId(id)}
          >
            {inspection.allowedActions.includes('measure') && inspection.criteria !== null && (
              <Button onClick={() => setIsMeasuring(true)}>Enter measurements</Button>
            )}
          </PhotoStrip>
          <ListedKeys />
          {page.mayRate && <KeyHints move={page.move} onMove={page.setMove} />}
        </chakra.section>
        <Box display="grid" gap="4" alignContent="start" minW="0">
          <CellPanel
            coupon={coupon}
            inspection={inspection}
            choice={choice}
            photo={platePhoto}
            decimalSign={decimalSign}
            onStep={page.step}
            status={
              <CellStatus
                own={own}
                stored={ratings.stored(cell.id)}
                isSkipped={cell.markState === 'skipped'}
                timeZone={shop.timeZone}
                onUndo={page.mayRate ? ratings.undo : undefined}
              />
            }
          >
            <Box display="grid" gap="4">
              {mayJudge && (
                <CellJudgement
                  address={cell.address}
                  own={own}
                  others={inspection.ratings.filter((row) => row.cellId === cell.id && row.memberId !== page.memberId)}
                  knownTags={page.knownTags}
                  onChange={(change) => ratings.change(cell.id, change)}
                  tags={page.tags}
                  note={page.note}
                />
              )}
              {!mayJudge && <chakra.p color="fg.muted">{whyNot(inspection, cell.markState === 'skipped')}</chakra.p>}
              {inspection.allowedActions.includes('draft-recipe') && cell.markState !== 'skipped' && (
                <DraftButton coupon={coupon} cell={cell} />
              )}
            </Box>
          </CellPanel>
        </Box>
      </Box>
      <Box display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'repeat(2, minmax(0, 1fr))' }} gap="4" alignItems="start">
        {inspection.criteria !== null && criteria}
        <BestCells cells={choice.cells} inspection={inspection} onChoose={choice.chooseCell} />
        <Corrections coupon={coupon} inspection={inspection} timeZone={shop.timeZone} />
      </Box>
      {coupon.state !== 'planned' && (
        <TouchBar
          address={cell.address}
          rating={own.rating}
          isDisabled={!mayJudge}
          onRate={(rating) => page.rateAndMove(cell.address, rating)}
          onStep={page.step}
        />
      )}
      {isMeasuring && (
        <MeasureDialog
          couponId={coupon.id}
          grid={grid}
          cells={choice.cells}
          inspection={inspection}
          locale={shop.locale}
          onClose={() => setIsMeasuring(false)}
          onSaved={(count) => {
            setIsMeasuring(false);
            page.announce(`${count} ${count === 1 ? 'value is' : 'values are'} saved.`);
          }}
        />
      )}
      {cornersOf !== undefined && (
        <CornerEditor
          coupon={coupon}
          grid={grid}
          photo={cornersOf}
          onClose={() => setCornersOf(undefined)}
          onSaved={() => {
            setCornersOf(undefined);
            page.announce('The corners are saved.');
          }}
        />
      )}
      <Conflict coupon={coupon} ratings={ratings} />
    </Box>
  );
}

/** Enter leads into the panel; below 1024 px it also comes into view. */
function openPanel(): void {
  const panel = document.getElementById(CELL_PANEL_ID);
  panel?.focus({ preventScroll: true });
  panel?.scrollIntoView?.({ block: 'nearest' });
}
