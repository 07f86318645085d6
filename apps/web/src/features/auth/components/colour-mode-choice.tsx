import { Segmented } from '../../../components/segmented';
import { useColourMode } from '../../../lib/colour-mode';

const CHOICES = [
  { value: 'system', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
] as const;

export function ColourModeChoice() {
  const { choice, setChoice } = useColourMode();
  return <Segmented label="Light or dark" choices={CHOICES} value={choice} onChange={setChoice} />;
}
