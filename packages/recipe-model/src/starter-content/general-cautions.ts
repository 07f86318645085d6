import { GENERAL_KNOWLEDGE, type ShippedCaution } from './shipped-caution';

/** What holds for all work, and for ways of working. */
export const GENERAL_CAUTIONS: readonly ShippedCaution[] = [
  {
    shippedKey: 'class-4-beam',
    level: 'care',
    subject: 'Keep the enclosure shut and the interlocks working while the beam can fire.',
    text: 'An open marking laser hurts eyes and skin directly and by reflection, sets fire, and makes ultraviolet and blue light in the plume. Before opening, aligning or bridging anything, the manual and the laser safety officer say how, and with which eyewear.',
    source:
      'IEC 60825-1 (laser classes); ISO 11553-1:2020 (processing machines); EN 207, ISO 19818-1:2021 (eyewear); Iowa State Univ. laser safety manual',
    appliesTo: {},
  },
  {
    shippedKey: 'attended-work',
    level: 'care',
    subject: 'Stay with the machine while it marks, and watch for fire until the part is cool.',
    text: 'A fire starts between two glances. Keep an extinguisher that suits the material within reach, and know where the stop is before you start.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: {},
  },
  {
    shippedKey: 'fume-extraction',
    level: 'care',
    subject: 'Run the extraction at the mark before the first pulse and after the last.',
    text: 'Fume is mostly particles below 5 µm. Above 1000 W/cm² it needs an industrial hygienist’s evaluation, above 10 000 W/cm² enclosure and ventilation; breathing protection does not replace them.',
    source: 'Univ. of California laser manual on laser-generated air contaminants, quoting ANSI Z136.1, 7.3; HSE RR878',
    appliesTo: {},
  },
  {
    shippedKey: 'closed-parts',
    level: 'care',
    subject: 'Open, empty and clean any closed, pressurised or fuel-bearing part, or leave it unmarked.',
    text: 'Heat raises the pressure inside and can light what is left in it. Ask where the part has been.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: {},
  },
  {
    shippedKey: 'contact-claims',
    level: 'care',
    subject: 'Make no claim about food, skin or implant contact.',
    text: 'A mark changes the surface, and nothing in this record tests for contact. Whoever answers for the part must prove it by the rules of its use.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: {},
  },
  {
    shippedKey: 'rotary-entanglement',
    level: 'care',
    subject: 'Keep sleeves, hair and gloves away from a turning part, and check that it cannot fly off.',
    text: 'A rotary drags in what it catches, and a part that is out of balance or badly gripped leaves it. Turn it slowly by hand once before you start.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: { roundPart: true },
  },
  {
    shippedKey: 'rotary-beam-past-edge',
    level: 'care',
    subject: 'Catch the beam that passes the edge of a round part.',
    text: 'Where the field is wider than the part, the beam goes past it and strikes what lies behind: the bed, the rotary, a reflecting wall. Limit the field, and put a stop behind the part that the manual names.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: { roundPart: true },
  },
  {
    shippedKey: 'depth-is-a-notch',
    level: 'care',
    subject: 'Engrave a part that carries fatigue loads or pressure only where its drawing allows it.',
    text: 'Depth is a notch, and the heated rim may crack first. The drawing says where and how deep; if it is silent, ask whoever answers for the part.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: { effectKeys: ['shallow-engrave', 'deep-engrave', 'ablate', 'cut-mark'] },
  },
  {
    shippedKey: 'stored-heat',
    level: 'care',
    subject: 'Let the part cool before you touch, stack or pack it.',
    text: 'Annealed and deeply engraved parts hold heat for minutes, and thin ones warp. A pause between passes belongs to the setting.',
    source: GENERAL_KNOWLEDGE,
    appliesTo: { effectKeys: ['dark-anneal', 'colour-anneal', 'deep-engrave', 'ablate', 'cut-mark'] },
  },
];
