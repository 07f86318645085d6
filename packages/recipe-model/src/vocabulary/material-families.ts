/** Families of material; what is not listed counts as 'unknown', and an unknown material needs its safety data sheet. */
export type MaterialFamily =
  | 'stainless-steel'
  | 'carbon-steel'
  | 'galvanised-steel'
  | 'aluminium'
  | 'titanium'
  | 'brass'
  | 'copper'
  | 'bronze'
  | 'copper-beryllium'
  | 'nickel-alloy'
  | 'precious-metal'
  | 'magnesium'
  | 'zirconium'
  | 'zinc'
  | 'lead-or-cadmium'
  | 'hard-metal'
  | 'acrylic'
  | 'polycarbonate'
  | 'abs'
  | 'pvc'
  | 'fluoropolymer'
  | 'polyethylene'
  | 'polypropylene'
  | 'polystyrene'
  | 'pet'
  | 'polyamide'
  | 'pom'
  | 'peek'
  | 'polyurethane'
  | 'silicone'
  | 'rubber'
  | 'chlorinated-rubber'
  | 'brominated-laminate'
  | 'glass-fibre-composite'
  | 'carbon-fibre-composite'
  | 'wood'
  | 'mdf'
  | 'chrome-free-leather'
  | 'chrome-tanned-leather'
  | 'paper'
  | 'textile'
  | 'cork'
  | 'glass'
  | 'ceramic'
  | 'stone'
  | 'shell'
  | 'coated-unknown'
  | 'lithium-cell'
  | 'unknown';

export type FamilyMeaning = { label: string; synonyms: readonly string[] };

export const MATERIAL_FAMILIES: Readonly<Record<MaterialFamily, FamilyMeaning>> = {
  'stainless-steel': {
    label: 'Stainless steel',
    synonyms: ['inox', 'stainless', '304', '304L', '316', '316L', '303', '430', '1.4301', '1.4404'],
  },
  'carbon-steel': { label: 'Carbon or tool steel', synonyms: ['mild steel', 'steel', 'tool steel', 'carbon steel', 'spring steel'] },
  'galvanised-steel': { label: 'Galvanised steel', synonyms: ['galvanized steel', 'zinc-plated steel', 'hot-dip galvanised'] },
  aluminium: {
    label: 'Aluminium',
    synonyms: ['aluminum', 'alu', 'anodised aluminium', 'anodized aluminum', '6061', '6082', '5754', '7075'],
  },
  titanium: { label: 'Titanium', synonyms: ['ti', 'ti-6al-4v', 'grade 2 titanium', 'grade 5 titanium'] },
  brass: { label: 'Brass', synonyms: ['cz121', 'cuzn39pb3', 'naval brass'] },
  copper: { label: 'Copper', synonyms: ['cu', 'etp copper'] },
  bronze: { label: 'Bronze', synonyms: ['tin bronze', 'phosphor bronze', 'aluminium bronze'] },
  'copper-beryllium': { label: 'Copper-beryllium, beryllium oxide', synonyms: ['beryllium copper', 'becu', 'cube2', 'beo', 'beryllia'] },
  'nickel-alloy': { label: 'Nickel alloy', synonyms: ['nickel', 'nickel-chromium alloy'] },
  'precious-metal': { label: 'Gold, silver, platinum', synonyms: ['gold', 'silver', 'platinum', 'palladium'] },
  magnesium: { label: 'Magnesium', synonyms: ['mg', 'az31', 'az91'] },
  zirconium: { label: 'Zirconium', synonyms: ['zr'] },
  zinc: { label: 'Zinc', synonyms: ['zamak', 'zinc die-cast'] },
  'lead-or-cadmium': { label: 'Lead, lead paint, cadmium plating', synonyms: ['lead', 'lead paint', 'cadmium', 'cadmium plated'] },
  'hard-metal': { label: 'Hard metal', synonyms: ['carbide', 'tungsten carbide', 'cemented carbide'] },
  acrylic: { label: 'Acrylic (PMMA)', synonyms: ['pmma', 'acrylic', 'cast acrylic', 'acrylic glass'] },
  polycarbonate: { label: 'Polycarbonate', synonyms: ['pc'] },
  abs: { label: 'ABS', synonyms: ['acrylonitrile butadiene styrene', 'abs/pc', 'pc/abs'] },
  pvc: { label: 'PVC', synonyms: ['vinyl', 'polyvinyl chloride', 'pvc-u', 'upvc', 'artificial leather', 'leatherette', 'vinyl film'] },
  fluoropolymer: { label: 'Fluoropolymer (PTFE)', synonyms: ['ptfe', 'fep', 'pfa', 'pvdf', 'etfe'] },
  polyethylene: { label: 'Polyethylene', synonyms: ['pe', 'hdpe', 'ldpe', 'uhmwpe'] },
  polypropylene: { label: 'Polypropylene', synonyms: ['pp', 'pp foam', 'epp'] },
  polystyrene: { label: 'Polystyrene', synonyms: ['ps', 'ps foam', 'eps', 'xps'] },
  pet: { label: 'PET', synonyms: ['polyester film', 'petg', 'pbt', 'polyester'] },
  polyamide: { label: 'Polyamide', synonyms: ['nylon', 'pa', 'pa6', 'pa66', 'pa12'] },
  pom: { label: 'POM (acetal)', synonyms: ['acetal', 'polyoxymethylene'] },
  peek: { label: 'PEEK', synonyms: ['polyetheretherketone'] },
  polyurethane: { label: 'Polyurethane', synonyms: ['pu', 'pur', 'tpu'] },
  silicone: { label: 'Silicone', synonyms: ['silicone rubber', 'lsr'] },
  rubber: { label: 'Rubber', synonyms: ['natural rubber', 'stamp rubber', 'epdm', 'nbr'] },
  'chlorinated-rubber': { label: 'Chlorinated rubber', synonyms: ['chloroprene', 'polychloroprene', 'cr rubber'] },
  'brominated-laminate': { label: 'FR4, brominated laminate', synonyms: ['fr4', 'fr-4', 'circuit board', 'pcb'] },
  'glass-fibre-composite': { label: 'Glass-fibre composite', synonyms: ['grp', 'gfrp', 'fibreglass', 'fiberglass'] },
  'carbon-fibre-composite': { label: 'Carbon-fibre composite', synonyms: ['cfrp', 'carbon fibre', 'carbon fiber'] },
  wood: { label: 'Wood', synonyms: ['plywood', 'birch ply', 'oak', 'walnut', 'bamboo', 'veneer'] },
  mdf: { label: 'MDF', synonyms: ['fibreboard', 'medium density fibreboard', 'hdf', 'chipboard'] },
  'chrome-free-leather': { label: 'Leather, declared free of chrome', synonyms: ['vegetable-tanned leather'] },
  'chrome-tanned-leather': { label: 'Leather, chrome-tanned or not declared', synonyms: ['leather', 'suede', 'nubuck'] },
  paper: { label: 'Paper, card', synonyms: ['card', 'cardboard', 'paperboard'] },
  textile: { label: 'Textile', synonyms: ['fabric', 'cotton', 'denim', 'felt', 'wool'] },
  cork: { label: 'Cork', synonyms: [] },
  glass: { label: 'Glass', synonyms: ['soda-lime glass', 'borosilicate', 'crystal glass', 'quartz'] },
  ceramic: { label: 'Ceramic', synonyms: ['porcelain', 'alumina', 'zirconia', 'tile'] },
  stone: { label: 'Stone', synonyms: ['slate', 'granite', 'marble'] },
  shell: { label: 'Shell', synonyms: ['mother of pearl', 'nacre', 'abalone'] },
  'coated-unknown': { label: 'Painted or coated, coating unknown', synonyms: ['painted', 'coated', 'unknown paint', 'unknown coating'] },
  'lithium-cell': { label: 'Lithium cell, or a device with its cell fitted', synonyms: ['battery', 'lithium battery', 'li-ion'] },
  unknown: { label: 'Unknown: ask for the safety data sheet', synonyms: [] },
};

// Object.keys is typed string[]; the record has no other keys than the families.
export const MATERIAL_FAMILY_KEYS = Object.keys(MATERIAL_FAMILIES) as MaterialFamily[];

/** The family that a word stands for ("vinyl" is PVC), by its code, label or synonym; every other word is 'unknown', never a guess. */
export function materialFamilyOf(word: string): MaterialFamily {
  const wanted = plainWord(word);
  if (wanted === '') return 'unknown';
  const found = MATERIAL_FAMILY_KEYS.find((family) => {
    const { label, synonyms } = MATERIAL_FAMILIES[family];
    return [family, label, ...synonyms].some((known) => plainWord(known) === wanted);
  });
  return found ?? 'unknown';
}

function plainWord(word: string): string {
  return word
    .toLowerCase()
    .replace(/[-_/\s]+/gu, ' ')
    .trim();
}
