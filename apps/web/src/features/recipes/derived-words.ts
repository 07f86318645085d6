import { formatQuantity } from '../../lib/format';

/** What a derived number is called beside a setting; the key itself names its meaning and unit in the api. */
const LABELS: Readonly<Record<string, string>> = {
  focalSpot: 'Spot at the focus',
  rayleighLength: 'Rayleigh length',
  spotAtWork: 'Spot at the work',
  pulseEnergy: 'Pulse energy',
  averageFluence: 'Average fluence',
  peakFluence: 'Peak fluence',
  averageIrradiance: 'Average irradiance',
  peakIrradiance: 'Peak irradiance',
  rectangularPeakPower: 'Peak power, rectangular pulse',
  gaussianPeakPower: 'Peak power, Gaussian pulse',
  pulsePitch: 'Pulse pitch',
  pulseOverlap: 'Pulse overlap',
  pulsesPerSpot: 'Pulses per spot',
  pulsesPerSpotArea: 'Pulses per spot area',
  lineEnergy: 'Line energy',
  interactionTime: 'Interaction time',
  lineOverlap: 'Line overlap',
  scansPerSpot: 'Scans per spot',
  coverageRipple: 'Coverage ripple',
  arealDose: 'Dose',
  areaRate: 'Area rate',
  timePer100Mm2: 'Time for 100 mm²',
  markingTime: 'Marking time',
};

/** What a marker asks for, known or not. */
const ALWAYS_FIRST = new Set(['spotAtWork', 'arealDose', 'timePer100Mm2']);
/** Numbers of one mode of the source: pulses have no average irradiance, a continuous beam has no pulse energy. */
const FIRST_WHEN_KNOWN = new Set(['pulseEnergy', 'peakFluence', 'averageIrradiance', 'pulsePitch', 'lineOverlap']);

export function derivedLabel(key: string): string {
  return LABELS[key] ?? key;
}

export function isShownFirst({ key, value }: { key: string; value: number | null }): boolean {
  return ALWAYS_FIRST.has(key) || (value !== null && FIRST_WHEN_KNOWN.has(key));
}

/** Unit at the end of an input's name, longest first. */
const UNITS: readonly (readonly [ending: string, unit: string])[] = [
  ['MmPerS', 'mm/s'],
  ['JPerCm2', 'J/cm²'],
  ['Khz', 'kHz'],
  ['Um', 'µm'],
  ['Mm', 'mm'],
  ['Nm', 'nm'],
  ['Ns', 'ns'],
  ['Mj', 'mJ'],
  ['Uj', 'µJ'],
  ['W', 'W'],
  ['J', 'J'],
  ['S', 's'],
];

/** "From power 12 W, speed 800 mm/s. "; nothing where no number went in. */
export function inputWords(inputs: Readonly<Record<string, number>>): string {
  const words = Object.entries(inputs).map(([name, value]) => {
    const [ending, unit] = UNITS.find(([own]) => name.endsWith(own)) ?? ['', ''];
    const plain = spaced(name.slice(0, name.length - ending.length));
    return `${plain} ${formatQuantity(Number(value.toPrecision(6)), unit)}`;
  });
  return words.length === 0 ? '' : `From ${words.join(', ')}. `;
}

/** "spotDiameter" → "spot diameter". */
function spaced(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`).trim();
}
