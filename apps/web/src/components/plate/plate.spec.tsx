import { couponLayout } from '@proofplate/imaging';
import { screen } from '@testing-library/react';
import { useState } from 'react';
import { renderPiece } from '../../testing/render';
import { Plate } from './plate';
import type { PlateCells } from './plate-types';

const layout = couponLayout({ rows: 3, columns: 4, reference: 'C-0117' });
const cells: PlateCells = {
  B2: { fill: { kind: 'response', value: 26, text: '26' }, description: 'power 50 percent, speed 200 millimetres per second', rating: 4 },
  C4: { fill: { kind: 'missing' }, isFlagged: true },
};

type Seen = { opened: string[]; rated: [string, number][] };

function ChoosablePlate({ seen }: { seen: Seen }) {
  const [chosen, setChosen] = useState('B2');
  return (
    <Plate
      layout={layout}
      cells={cells}
      scale={{ min: 20, max: 30, isLogarithmic: false }}
      label="Coupon C-0117"
      chosen={chosen}
      onChoose={setChosen}
      onOpen={(address) => seen.opened.push(address)}
      onRate={(address, rating) => seen.rated.push([address, rating])}
    />
  );
}

async function openPlate() {
  const seen: Seen = { opened: [], rated: [] };
  const { user } = renderPiece(<ChoosablePlate seen={seen} />);
  await screen.findByRole('grid', { name: 'Coupon C-0117' });
  await user.tab();
  return { user, seen };
}

const focused = () => document.activeElement?.getAttribute('data-address');

describe('the plate as a grid', () => {
  it('is one tab stop, the chosen cell', async () => {
    const { user } = await openPlate();
    expect(focused()).toBe('B2');
    expect(screen.getAllByRole('gridcell').filter((cell) => cell.getAttribute('tabindex') === '0')).toHaveLength(1);
    await user.tab();
    expect(focused()).toBeNull();
  });

  it.each([
    ['{ArrowRight}', 'B3'],
    ['{ArrowLeft}', 'B1'],
    ['{ArrowUp}', 'A2'],
    ['{ArrowDown}', 'C2'],
    ['{Home}', 'B1'],
    ['{End}', 'B4'],
    ['{Control>}{Home}{/Control}', 'A1'],
    ['{Control>}{End}{/Control}', 'C4'],
    ['{PageUp}', 'A2'],
    ['{PageDown}', 'C2'],
    ['{ArrowUp}{ArrowUp}{ArrowUp}', 'A2'],
    ['{ArrowRight}{ArrowRight}{ArrowRight}{ArrowRight}', 'B4'],
  ])('moves with %s from B2 to %s and stops at the edges', async (keys, address) => {
    const { user } = await openPlate();
    await user.keyboard(keys);
    expect(focused()).toBe(address);
    expect(screen.getByRole('gridcell', { selected: true })).toHaveAttribute('data-address', address);
  });

  it('rates the cell that has the focus with the digits 0 to 5 and with no other', async () => {
    const { user, seen } = await openPlate();
    await user.keyboard('4{ArrowRight}07');
    expect(seen.rated).toEqual([
      ['B2', 4],
      ['B3', 0],
    ]);
  });

  it('opens with Enter, and with a press on the chosen cell, but only chooses another', async () => {
    const { user, seen } = await openPlate();
    await user.keyboard('{Enter}');
    await user.click(screen.getByRole('gridcell', { name: /^A1/ }));
    expect(seen.opened).toEqual(['B2']);
    expect(focused()).toBe('A1');
    await user.click(screen.getByRole('gridcell', { name: /^A1/ }));
    expect(seen.opened).toEqual(['B2', 'A1']);
  });

  it('speaks a cell’s address, setting, rating and flag', async () => {
    await openPlate();
    expect(screen.getByRole('gridcell', { name: 'B2, power 50 percent, speed 200 millimetres per second, rated 4' })).toBeVisible();
    expect(screen.getByRole('gridcell', { name: 'C4, not measured, above a limit' })).toBeVisible();
  });

  it('is a picture without tab stop when nothing can be chosen', async () => {
    renderPiece(<Plate layout={layout} cells={cells} label="Coupon C-0117" />);
    expect(await screen.findByRole('img', { name: 'Coupon C-0117' })).toBeVisible();
    expect(screen.queryByRole('gridcell')).toBeNull();
  });
});
