import { screen } from '@testing-library/react';
import { useState } from 'react';
import { renderPiece } from '../testing/render';
import { ActiveFilters, type FacetChoice, Facets } from './facets';

const facets = [
  {
    key: 'material',
    title: 'Material',
    values: ['brass', 'titanium', 'slate', 'acrylic', 'oak', 'walnut', 'leather'].map((label, index) => ({
      value: label,
      label,
      count: index === 1 ? 0 : 9 - index,
    })),
  },
];

function Filters() {
  const [chosen, setChosen] = useState<FacetChoice>({ material: ['walnut'] });
  const all = { facets, chosen, onChange: setChosen };
  return (
    <>
      <ActiveFilters {...all} onClear={() => setChosen({})} />
      <Facets {...all} />
    </>
  );
}

describe('the filters', () => {
  it('count every value, disable those without a result, and hide the tail but never a chosen one', async () => {
    const { user } = renderPiece(<Filters />);
    expect(await screen.findByRole('checkbox', { name: /brass/ })).toHaveAccessibleName('brass 9');
    expect(screen.getByRole('checkbox', { name: /titanium/ })).toBeDisabled();
    expect(screen.getByRole('checkbox', { name: /walnut/ })).toBeChecked();
    expect(screen.queryByRole('checkbox', { name: /leather/ })).toBeNull();
    await user.click(screen.getByRole('button', { name: '1 more' }));
    expect(screen.getByRole('checkbox', { name: /leather/ })).toBeVisible();
  });

  it('are taken away one by one or all at once', async () => {
    const { user } = renderPiece(<Filters />);
    await user.click(await screen.findByRole('checkbox', { name: /brass/ }));
    await user.click(screen.getByRole('button', { name: 'Remove the filter walnut' }));
    expect(screen.getByRole('checkbox', { name: /brass/ })).toBeChecked();
    await user.click(screen.getByRole('button', { name: 'Clear all' }));
    expect(screen.queryAllByRole('checkbox', { checked: true })).toEqual([]);
  });
});
