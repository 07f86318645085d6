import { type NumberedSetting, type PhysicalProfile, stepNumbers } from '@proofplate/recipe-model';
import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { renderPiece } from '../../testing/render';
import { numberLabel, numbersGroups } from '../setting-numbers';
import { NumbersPanel } from './numbers-panel';

const physical: PhysicalProfile = {
  ...{ sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 60, m2: 1.3, beamDiameterMm: 10 },
  maxPulseEnergyMj: [{ pulseWidthNs: 200, energyMj: 0.4 }],
};
const value = (number: number, unit: 'mm/s' | 'kHz' | 'ns' | 'um' | 'count') => ({ entered: { value: number, unit }, physical: number });
const setting: NumberedSetting = {
  values: {
    speedMmPerS: value(1000, 'mm/s'),
    frequencyKhz: value(60, 'kHz'),
    pulseWidthNs: value(200, 'ns'),
    lineSpacingUm: value(20, 'um'),
    passes: value(2, 'count'),
  },
  fill: 'both directions',
  power: { watts: 30, basis: 'calibration' },
};

function show(step: NumberedSetting = setting, on: PhysicalProfile = physical) {
  const numbers = stepNumbers(step, { optics: { physical: on, focalLengthMm: 163, measuredSpotUm: null } });
  renderPiece(<NumbersPanel label="Numbers" groups={numbersGroups([numbers])} />);
  return numbers.numbers;
}
const rowOf = (key: string) => {
  const button = screen.getByText(numberLabel(key), { selector: '.label' }).closest('button');
  if (button === null) throw new Error(`${key} has no row to press`);
  return button;
};

const { beamDiameterMm: _, ...beamless } = physical;
const { pulseWidthNs: __, ...withoutPulseWidth } = setting.values;
const MISSING: readonly (readonly [string, NumberedSetting, PhysicalProfile])[] = [
  ['the beam diameter', setting, beamless],
  ['the pulse width', { ...setting, values: withoutPulseWidth }, physical],
  ['a calibration', { ...setting, power: { watts: null, reason: 'No calibration fits.' } }, physical],
];

describe('the numbers panel', () => {
  it.each(MISSING)('without %s shows no number that rests on it, and says the reason of each', (_what, step, on) => {
    const missing = show(step, on).filter(
      (number) => number.missingBecause !== undefined && !number.isRuledOutByMode && number.key !== 'markingTime',
    );
    expect(missing.length).toBeGreaterThan(2);
    const notes = screen.getByText(/not known because/).textContent?.toLowerCase() ?? '';
    for (const { key } of missing) {
      expect(rowOf(key)).toHaveTextContent(`${numberLabel(key)} not known`);
      expect(notes).toContain(numberLabel(key).toLowerCase());
    }
  });

  it('shows a number with its unit, and its formula, inputs and source on demand', async () => {
    show();
    await userEvent.click(rowOf('arealDose'));
    expect(rowOf('arealDose')).toHaveAccessibleName(/^Dose 3.J\/mm²$/);
    const row = within(rowOf('arealDose').closest('li') ?? document.body);
    expect(row.getByText('n P / (v h), n scans (a crossed pass counts 2)')).toBeVisible();
    expect(row.getByText('From power 30 W, speed 1000 mm/s, line spacing 20 µm, scans 2.')).toBeVisible();
    expect(row.getByText('Source: energy balance')).toBeVisible();
    expect(row.getByRole('link', { name: /More about this/ })).toHaveAttribute('href', '/science/scanning');
  });

  it('opens and closes by keyboard, one at a time, and gives the focus back', async () => {
    show();
    rowOf('pulsePitch').focus();
    await userEvent.keyboard('{Enter}');
    expect(rowOf('pulsePitch')).toHaveAttribute('aria-expanded', 'true');
    await userEvent.click(rowOf('peakFluence'));
    expect(rowOf('pulsePitch')).toHaveAttribute('aria-expanded', 'false');
    await userEvent.tab();
    expect(screen.getByRole('link', { name: /More about this/ })).toHaveFocus();
    await userEvent.keyboard('{Escape}');
    expect(rowOf('peakFluence')).toHaveAttribute('aria-expanded', 'false');
    expect(rowOf('peakFluence')).toHaveFocus();
  });

  it('marks a value that needs a second look on its row and says why in sight', () => {
    show();
    expect(rowOf('pulseEnergy')).toHaveAccessibleName(/look at this/);
    expect(screen.getByText(/Above the source’s largest pulse energy at this pulse width, 0.4 mJ/)).toBeVisible();
  });

  it('says what the mode has none of instead of showing it as missing', () => {
    show({ ...setting, fill: 'outline' });
    expect(screen.queryByText('Dose', { selector: '.label' })).toBeNull();
    expect(screen.getByText(/Has none of .*dose.*: outline only: no area is filled\./)).toBeInTheDocument();
  });
});
