import { screen } from '@testing-library/react';
import { useState } from 'react';
import { renderPiece } from '../testing/render';
import { Rating } from './rating';

function RatedCell() {
  const [value, setValue] = useState<number>();
  return <Rating label="Rating of B4" value={value} onRate={setValue} />;
}

const checked = () => screen.queryByRole('radio', { checked: true })?.textContent;

describe('the rating', () => {
  it('says what the ends of the scale mean', async () => {
    renderPiece(<RatedCell />);
    expect(await screen.findByText('no mark')).toBeVisible();
    expect(screen.getByText('reference')).toBeVisible();
  });

  it('is one tab stop; digits and arrows rate, and arrows go round', async () => {
    const { user } = renderPiece(<RatedCell />);
    await screen.findByRole('radiogroup', { name: 'Rating of B4' });
    await user.tab();
    expect(checked()).toBeUndefined();
    await user.keyboard('4');
    expect(checked()).toBe('4');
    await user.click(screen.getByRole('radio', { name: '0' }));
    await user.keyboard('{ArrowLeft}');
    expect(checked()).toBe('5');
    expect(document.activeElement).toHaveTextContent('5');
    await user.keyboard('{ArrowRight}');
    expect(checked()).toBe('0');
  });
});
