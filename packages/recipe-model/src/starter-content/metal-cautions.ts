import { GENERAL_KNOWLEDGE, type ShippedCaution } from './shipped-caution';

/** Metals that need a look first. */
export const METAL_CAUTIONS: readonly ShippedCaution[] = [
  {
    shippedKey: 'zinc-fume',
    level: 'care',
    subject: 'Keep out of the fume of zinc, brass and galvanised steel.',
    text: 'Zinc oxide fume brings on metal fume fever hours later. The limits on file are 5 mg/m³ over a shift (OSHA) and 10 mg/m³ for a short time (NIOSH); the extraction is what keeps you below them.',
    source: 'AWS safety fact sheet 25; OSHA and NIOSH limits as stated there',
    appliesTo: { families: ['galvanised-steel', 'brass', 'zinc'] },
  },
  {
    shippedKey: 'combustible-metal-dust',
    level: 'care',
    subject: 'Collect titanium, magnesium, aluminium and zirconium dust apart, dry, and in a collector that is meant for it.',
    text: 'Their fine dust burns and can explode, water can make it worse, and mixing metals in one collector can light them. Ask for the dust hazard analysis before removing material by the hour.',
    source: 'NFPA 484 and NFPA 652 as explained by makers of dust collectors',
    appliesTo: {
      families: ['titanium', 'magnesium', 'aluminium', 'zirconium'],
      effectKeys: ['shallow-engrave', 'deep-engrave', 'ablate', 'polish', 'cut-mark'],
    },
  },
  {
    shippedKey: 'back-reflection',
    level: 'care',
    subject: 'Read what the manual says about reflecting work before you mark copper, silver, gold or a polished metal.',
    text: 'The beam that comes straight back can damage the source and the optics, and what leaves sideways can leave the marking area.',
    source: `List of a machine shop. ${GENERAL_KNOWLEDGE}`,
    appliesTo: { families: ['copper', 'precious-metal', 'brass', 'bronze', 'aluminium'] },
  },
];
