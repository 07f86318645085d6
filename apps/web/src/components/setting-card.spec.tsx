import { screen, within } from '@testing-library/react';
import { useState } from 'react';
import { renderPiece } from '../testing/render';
import { SettingCard, type SettingRow } from './setting-card';

const rows: readonly SettingRow[] = [
  { key: 'power', label: 'Power', note: '5.8 W at the work', value: '30', unit: '%' },
  { key: 'speed', label: 'Speed', value: '900', unit: 'mm/s' },
  { key: 'offset', label: 'Focus offset', value: '+0.5', unit: 'mm' },
];

function Card() {
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set(['power']));
  const handleTick = (key: string, isTicked: boolean) =>
    setTicked(new Set(isTicked ? [...ticked, key] : [...ticked].filter((other) => other !== key)));
  return (
    <SettingCard
      code="R-0031"
      revision={3}
      state="approved"
      caption="In the order of Bench 2’s panel"
      rows={rows}
      ticked={ticked}
      onTick={handleTick}
    />
  );
}

const items = () => screen.getAllByRole('listitem');
const next = () => items().find((item) => item.getAttribute('aria-current') === 'step');

describe('the setting card', () => {
  it('keeps the order of the panel and shows each value with its unit', async () => {
    renderPiece(<Card />);
    await screen.findByRole('region', { name: 'Setting of R-0031 revision 3' });
    expect(items().map((item) => item.textContent)).toEqual(['1Power5.8 W at the work30%', '2Speed900mm/s', '3Focus offset+0.5mm']);
  });

  it('points at the first row that is not set, and counts the others', async () => {
    const { user } = renderPiece(<Card />);
    expect(await screen.findByText('1 of 3 set')).toBeVisible();
    expect(next()).toHaveTextContent('Speed');
    await user.click(screen.getByRole('button', { name: 'Speed is set' }));
    expect(screen.getByRole('button', { name: 'Speed is set' })).toHaveAttribute('aria-pressed', 'true');
    expect(next()).toHaveTextContent('Focus offset');
    await user.click(screen.getByRole('button', { name: 'Power is set' }));
    expect(next()).toHaveTextContent('Power');
    expect(screen.getByText('1 of 3 set')).toBeVisible();
  });

  it('keeps the reason of a short note behind a press', async () => {
    const reason = 'No calibration fits. Add a power calibration to the machine.';
    const power = { key: 'power', label: 'Power', note: 'watts not known', noteReason: reason, value: '30', unit: '%' };
    const { user } = renderPiece(<SettingCard code="R-0031" revision={3} state="draft" caption="Draft" rows={[power]} />);
    const note = await screen.findByText('watts not known');
    expect(note.closest('details')).not.toHaveAttribute('open');
    await user.click(note);
    expect(note.closest('details')).toHaveAttribute('open');
    expect(screen.getByText(reason)).toBeVisible();
  });

  it('has nothing to tick where nobody dials it', async () => {
    renderPiece(<SettingCard code="R-0031" revision={3} state="draft" caption="Draft" rows={rows} />);
    const card = await screen.findByRole('region', { name: 'Setting of R-0031 revision 3' });
    expect(within(card).queryByRole('button')).toBeNull();
    expect(next()).toBeUndefined();
  });
});
