import type { Caution } from './caution';

/** Stands above every list of cautions: they are prompts, not clearances. */
export const CAUTION_DEFERENCE =
  'These are prompts. The machine’s manual and the laser safety officer decide; ask them before you mark. Nothing here clears a material.';

const LABORATORY_LISTS = 'University and workshop lists of materials for laser machines';

/** The cautions that every shop starts with; a shop may add to them and tighten them, never loosen them. */
export const SHIPPED_CAUTIONS: readonly Caution[] = [
  never('pvc', 'PVC, vinyl, artificial leather', {
    text: 'Gives off hydrogen chloride and other chlorinated compounds. They harm people and corrode optics and machine.',
    source: 'University laboratory lists; study of laser fumes, ILSC 1990',
    appliesTo: { families: ['pvc'] },
  }),
  never('chlorinated-rubber', 'Chlorinated rubber', {
    text: 'Gives off hydrogen chloride, as PVC does.',
    source: 'By analogy with PVC; ask for the safety data sheet',
    appliesTo: { families: ['chlorinated-rubber'] },
  }),
  never('fluoropolymer', 'PTFE and other fluoropolymers', {
    text: 'Overheated, they give off hydrogen fluoride, carbonyl fluoride and carbon monoxide; polymer fume fever.',
    source: 'NIOSH criteria document 77-193; guide of the plastics industry',
    appliesTo: { families: ['fluoropolymer'] },
  }),
  never('copper-beryllium', 'Copper-beryllium, beryllium oxide', {
    text: 'Dust and fume cause chronic beryllium disease. Only in a process approved for it, outside of this product.',
    source: 'OSHA beryllium rule, 2017',
    appliesTo: { families: ['copper-beryllium'] },
  }),
  never('lead-cadmium', 'Lead, lead paint, cadmium plating', {
    text: 'Toxic fume.',
    source: 'General knowledge of toxic metal fume; ask for the safety data sheet',
    appliesTo: { families: ['lead-or-cadmium'] },
  }),
  never('lithium-cell', 'Lithium cells', {
    text: 'Heat or a puncture can set off thermal runaway. Not on a cell, and not on a device with its cell fitted.',
    source: 'Safety pages on lithium cells',
    appliesTo: { families: ['lithium-cell'] },
  }),
  care('attendance', 'Every job', {
    text: 'Never unattended. Extraction on, fire watch, extinguisher within reach.',
    source: 'Laser safety manuals of universities',
    appliesTo: {},
  }),
  care('class-4', 'The beam', {
    text: 'Direct and scattered light harm eye and skin and can start fires. Interlocks closed; eyewear only as the laser safety officer says.',
    source: 'IEC 60825-1; laser safety manuals of universities',
    appliesTo: {},
  }),
  care('closed-parts', 'Closed, pressurised or fuel-bearing parts', {
    text: 'Do not heat a closed volume, a part under pressure or one that has held fuel before somebody responsible has released it.',
    source: 'General workshop practice',
    appliesTo: {},
  }),
  care('unknown', 'Unknown material', {
    text: 'Ask for the safety data sheet before anything else.',
    source: LABORATORY_LISTS,
    appliesTo: { families: ['unknown'] },
  }),
  care('coated-unknown', 'Painted or coated, coating unknown', {
    text: 'The coating’s decomposition is unknown. Ask for its safety data sheet.',
    source: LABORATORY_LISTS,
    appliesTo: { families: ['coated-unknown'] },
  }),
  care('rotary', 'Round parts', {
    text: 'Hair, sleeves and gloves get caught; the part can fly off; the beam can pass the part’s edge. Clamp, shield, check the path.',
    source: 'General workshop practice',
    appliesTo: { roundPart: true },
  }),
  care('notch', 'Depth', {
    text: 'A groove is a notch on parts that bear fatigue or pressure. Only where the drawing allows it.',
    source: 'General design practice',
    appliesTo: { effectKeys: ['deep-engrave', 'shallow-engrave', 'ablate', 'cut-mark'] },
  }),
  care('contact', 'Food, skin, implants', {
    text: 'No claim is made for contact with food, skin or tissue. That needs its own proof.',
    source: 'Policy of this product',
    appliesTo: {},
  }),
  care('abs', 'ABS', {
    text: 'Melts and burns; hydrogen cyanide and styrene are among the products of decomposition.',
    source: 'HSE research report RR797',
    appliesTo: { families: ['abs'] },
  }),
  care('polycarbonate', 'Polycarbonate', {
    text: 'Absorbs infrared, discolours, chars and catches fire.',
    source: LABORATORY_LISTS,
    appliesTo: { families: ['polycarbonate'] },
  }),
  care('foams', 'Polystyrene, polypropylene, polyethylene', {
    text: 'Melt and burn; foams are the first cause of fires in laser machines.',
    source: LABORATORY_LISTS,
    appliesTo: { families: ['polystyrene', 'polypropylene', 'polyethylene'] },
  }),
  care('leather', 'Leather', {
    text: 'Whether chromium(VI) forms on chrome-tanned leather is disputed in print. Extraction on; prefer leather declared free of chrome.',
    source: 'Contact Dermatitis 2024, abstract; testing bodies',
    appliesTo: { families: ['chrome-tanned-leather'] },
  }),
  care('zinc', 'Galvanised steel, brass, zinc', {
    text: 'Zinc oxide fume causes metal fume fever. Extraction on.',
    source: 'Welding fact sheet 25 on metal fume fever',
    appliesTo: { families: ['galvanised-steel', 'brass', 'zinc'] },
  }),
  care('fibres', 'Carbon fibre, glass fibre', {
    text: 'Respirable fibrous particles and organic gases.',
    source: 'Walter et al., Physics Procedia 56 (2014) 1153; 83 (2016) 1021',
    appliesTo: { families: ['carbon-fibre-composite', 'glass-fibre-composite'] },
  }),
  care('brominated', 'FR4, brominated laminates', {
    text: 'Brominated resin and glass fibre: corrosive, toxic fume and respirable dust. Ask for the safety data sheet.',
    source: 'By analogy with halogenated plastics and fibre composites',
    appliesTo: { families: ['brominated-laminate'] },
  }),
  care('mdf', 'MDF', {
    text: 'The binder gives off formaldehyde; fine dust; it glows on after the job.',
    source: 'General knowledge of wood-based panels; ask for the safety data sheet',
    appliesTo: { families: ['mdf'] },
  }),
  care('mineral-dust', 'Stone, shell, glass, ceramic', {
    text: 'Fine dust, with silica in many stones and glasses. Extraction with a filter made for it.',
    source: 'Study of laser fumes, ILSC 1990 (respirable silica)',
    appliesTo: { families: ['stone', 'shell', 'glass', 'ceramic'] },
  }),
  care('metal-dust', 'Titanium, magnesium, aluminium, zirconium', {
    text: 'Their dust burns and can explode; water can make it worse. Do not mix metals in one collector.',
    source: 'NFPA 484, NFPA 652',
    appliesTo: { families: ['titanium', 'magnesium', 'aluminium', 'zirconium'] },
  }),
  care('back-reflection', 'Copper, brass, precious and polished metal', {
    text: 'Back reflection can damage source and optics; reflections leave the work in any direction.',
    source: 'Lists of machine shops; general',
    appliesTo: { families: ['copper', 'brass', 'bronze', 'precious-metal'] },
  }),
  care('hot-parts', 'Annealed and deeply engraved parts', {
    text: 'Parts stay hot and thin parts warp. Let them cool before handling.',
    source: 'General workshop practice',
    appliesTo: { effectKeys: ['dark-anneal', 'colour-anneal', 'deep-engrave'] },
  }),
  care('plastics-fume', 'Plastics and resins', {
    text: 'Complex vapours, some of them harmful. Extraction with a filter for gas.',
    source: 'HSE research report RR878; makers of fume extraction',
    appliesTo: { families: ['acrylic', 'pet', 'polyamide', 'pom', 'peek', 'polyurethane', 'silicone', 'rubber'] },
  }),
];

type Body = Pick<Caution, 'text' | 'source' | 'appliesTo'>;

function never(id: string, subject: string, body: Body): Caution {
  return { id, level: 'never', subject, ...body };
}

function care(id: string, subject: string, body: Body): Caution {
  return { id, level: 'care', subject, ...body };
}
