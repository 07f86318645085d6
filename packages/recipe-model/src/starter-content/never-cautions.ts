import type { ShippedCaution } from './shipped-caution';

/** Materials that are never marked; planning, drafting and running are refused. */
export const NEVER_CAUTIONS: readonly ShippedCaution[] = [
  {
    shippedKey: 'pvc',
    level: 'never',
    subject: 'Do not mark PVC, vinyl or artificial leather.',
    text: 'The beam sets free hydrogen chloride and chlorinated compounds, with benzene, toluene and styrene among them. They harm people and corrode optics and machine. Ask the supplier for a chlorine-free material.',
    source: 'Univ. of Illinois Chicago laser list of materials; NIOSH study of 1976 as quoted at the laser safety conference of 1990',
    appliesTo: { families: ['pvc'] },
  },
  {
    shippedKey: 'chlorinated-rubber',
    level: 'never',
    subject: 'Do not mark chlorinated rubber.',
    text: 'It holds chlorine as PVC does and sets free hydrogen chloride in the beam.',
    source: 'Follows from the chlorine in it, as for PVC; no page on laser marking on file. Ask the laser safety officer.',
    appliesTo: { families: ['chlorinated-rubber'] },
  },
  {
    shippedKey: 'fluoropolymer',
    level: 'never',
    subject: 'Do not mark PTFE or other fluoropolymers.',
    text: 'Above about 330 °C they give off hazardous fumes, above about 450 °C hydrogen fluoride, carbonyl fluoride and carbon monoxide; polymer fume fever follows small amounts.',
    source: 'Guide of the plastics industry on handling fluoropolymers; NIOSH criteria document 77-193',
    appliesTo: { families: ['fluoropolymer'] },
  },
  {
    shippedKey: 'copper-beryllium',
    level: 'never',
    subject: 'Do not mark copper-beryllium or beryllium oxide.',
    text: 'Its dust and fume cause chronic beryllium disease at less than a microgram in a cubic metre of air. Only a process that was approved for it in writing may touch it, and that is outside this record.',
    source: 'OSHA beryllium rule of 2017',
    appliesTo: { families: ['copper-beryllium'] },
  },
  {
    shippedKey: 'lead-or-cadmium',
    level: 'never',
    subject: 'Do not mark lead, lead paint or cadmium plating.',
    text: 'Their fume is toxic and settles in the machine and in the room.',
    source: 'Welding-fume guidance of AWS and NIOSH; no page on laser marking on file. Ask the laser safety officer.',
    appliesTo: { families: ['lead-or-cadmium'] },
  },
  {
    shippedKey: 'lithium-cell',
    level: 'never',
    subject: 'Do not mark a lithium cell, nor a device with its cell fitted.',
    text: 'Heat or a pierced wall can start a thermal runaway that cannot be put out. Take the cell out first, or mark the housing before it is fitted.',
    source: 'OSHA safety pages on lithium batteries',
    appliesTo: { families: ['lithium-cell'] },
  },
];
