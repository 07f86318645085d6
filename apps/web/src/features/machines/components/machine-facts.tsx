import { chakra } from '@chakra-ui/react';
import { type PhysicalProfile, SOURCE_KIND_LABELS } from '@proofplate/recipe-model';
import { type Fact, FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { formatNumber } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { HEAD_NUMBERS, SOURCE_NUMBERS } from '../forms/machine-rules';
import type { Machine } from '../machines.api';

/** What the source and the scan head are; what nobody entered is not listed. */
export function MachineFacts({ machine }: { machine: Machine }) {
  const { locale } = useSession().shop;
  const { physical } = machine.profile;
  return (
    <Panel p="5" aria-labelledby="source-title">
      <chakra.h2 id="source-title">What the source is</chakra.h2>
      <chakra.p mb="2" fontSize="sm" lineHeight="sm" color="fg.muted">
        Counts for evidence
      </chakra.p>
      <FactList facts={[...ownFacts(machine), ...physicalFacts(physical, locale)]} />
    </Panel>
  );
}

function ownFacts({ serialNumber, warmUpMinutes, mountedLens }: Machine): Fact[] {
  return [
    ...(serialNumber === '' ? [] : [{ label: 'Serial number', value: serialNumber }]),
    { label: 'Lens now', value: mountedLens?.name ?? 'not set' },
    ...(warmUpMinutes === 0 ? [] : [{ label: 'Warm-up', value: warmUpMinutes, unit: 'min' }]),
  ];
}

export function physicalFacts(physical: PhysicalProfile, locale: string): Fact[] {
  const show = (value: number) => formatNumber(value, { locale });
  const numbers = [...SOURCE_NUMBERS, ...HEAD_NUMBERS].flatMap(({ name, label, unit }) => {
    const value = physical[name];
    return value === undefined ? [] : [{ label, value: show(value), ...(unit === '' ? {} : { unit }) }];
  });
  return [{ label: 'Kind', value: SOURCE_KIND_LABELS[physical.sourceKind] }, ...numbers, ...rangeFacts(physical, show)];
}

function rangeFacts(
  { frequencyRangeKhz, pulseWidthRangeNs, pulseWidthsNs, maxPulseEnergyMj = [] }: PhysicalProfile,
  show: (value: number) => string,
): Fact[] {
  const range = ({ from, to }: { from: number; to: number }) => `${show(from)} to ${show(to)}`;
  return [
    ...(frequencyRangeKhz === undefined ? [] : [{ label: 'Pulse frequency', value: range(frequencyRangeKhz), unit: 'kHz' }]),
    ...(pulseWidthRangeNs === undefined ? [] : [{ label: 'Pulse width', value: range(pulseWidthRangeNs), unit: 'ns' }]),
    ...(pulseWidthsNs === undefined ? [] : [{ label: 'Only these pulse widths', value: pulseWidthsNs.map(show).join(', '), unit: 'ns' }]),
    ...maxPulseEnergyMj.map(({ pulseWidthNs, energyMj }) => ({
      label: pulseWidthNs === null ? 'Largest pulse energy' : `Largest pulse energy at ${show(pulseWidthNs)} ns`,
      value: show(energyMj),
      unit: 'mJ',
    })),
  ];
}
