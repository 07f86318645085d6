// The published colour table of cividis, 256 steps from dark blue to yellow, lightness rising evenly, read alike with and without
// red-green deficiency. Source: Nuñez, Anderton, Renslow 2018, PLoS ONE 13(7) e0199239, as 8-bit sRGB.

const TABLE =
  '00224e00234f00245100255300255400265600275800285900285b00295d002a5f002a61002b62002c64002c66002d68002e6a002e6c002f6d00306f' +
  '0030700031700031710132710533710833700c34700f357012357014367016377018376f1a386f1c396f1e3a6f203a6f213b6e233c6e243c6e263d6e' +
  '273e6e293f6e2a3f6d2b406d2d416d2e416d2f426d31436d32436d33446d34456c35456c36466c38476c39486c3a486c3b496c3c4a6c3d4a6c3e4b6c' +
  '3f4c6c404c6c414d6c424e6c434e6c444f6c45506c46516c47516c48526c49536c4a536c4b546c4c556c4d556c4e566c4f576c50576c51586d52596d' +
  '535a6d545a6d555b6d555c6d565c6d575d6d585e6d595e6e5a5f6e5b606e5c616e5d616e5e626e5e636f5f636f60646f61656f62656f636670646770' +
  '656870656870666970676a71686a71696b716a6c716b6d726c6d726c6e726d6f726e6f736f7073707173717274727274727374737475747475757575' +
  '7676767777767777777878777979777a7a787b7a787c7b787d7c787e7c787e7d787f7e78807f78817f78828079838179848279858279868379878478' +
  '8885788985788a86788b87788c88788d88788e89788f8a78908b78918b78928c78928d78938e78948e77958f779690779791779892779992779a9376' +
  '9b94769c95769d95769e96769f9775a09875a19975a29975a39a74a49b74a59c74a69c74a79d73a89e73a99f73aaa073aba072aca172ada272aea371' +
  'afa471b0a571b1a570b3a670b4a76fb5a86fb6a96fb7a96eb8aa6eb9ab6dbaac6dbbad6dbcae6cbdae6cbeaf6bbfb06bc0b16ac1b26ac2b369c3b369' +
  'c4b468c5b568c6b667c7b767c8b866c9b965cbb965ccba64cdbb63cebc63cfbd62d0be62d1bf61d2c060d3c05fd4c15fd5c25ed6c35dd7c45cd9c55c' +
  'dac65bdbc75adcc859ddc858dec958dfca57e0cb56e1cc55e2cd54e4ce53e5cf52e6d051e7d150e8d24fe9d34eead34cebd44bedd54aeed649efd748' +
  'f0d846f1d945f2da44f3db42f5dc41f6dd3ff7de3ef8df3cf9e03afbe138fce236fde334fee434fee535fee636fee838';

const STEPS = TABLE.length / 6;

/** Colour at a position from 0 (low, dark) to 1 (high, light); outside it stays at the end. */
export function cividis(position: number): string {
  const step = Math.round(Math.min(1, Math.max(0, position)) * (STEPS - 1));
  return `#${TABLE.slice(step * 6, step * 6 + 6)}`;
}

/** Evenly spaced colours of the map, for a legend's gradient. */
export function cividisStops(count: number): readonly string[] {
  return Array.from({ length: count }, (_, index) => cividis(index / (count - 1)));
}

/** Black or white, whichever contrasts more with the ground (WCAG 2 relative luminance). */
export function inkOn(ground: string): '#000000' | '#ffffff' {
  const luminance = relativeLuminance(ground);
  const onBlack = (luminance + 0.05) / 0.05;
  const onWhite = 1.05 / (luminance + 0.05);
  return onBlack >= onWhite ? '#000000' : '#ffffff';
}

/** WCAG 2 relative luminance of `#rrggbb`, 0 to 1. */
export function relativeLuminance(colour: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((start) => linear(Number.parseInt(colour.slice(start, start + 2), 16) / 255));
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function linear(channel: number): number {
  return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
}
