import { EFFECT_KEYS } from '@proofplate/recipe-model';
import { ownEffectKey } from './effect-key';

describe('ownEffectKey', () => {
  it('keeps letters and digits of the name and never equals a shipped key', () => {
    expect(ownEffectKey('Grünspan, 2 Töne!', [])).toBe('own-gru-nspan-2-to-ne');
    expect(EFFECT_KEYS).not.toContain(ownEffectKey('Dark anneal', []));
  });

  it('counts on where the key is taken', () => {
    expect(ownEffectKey('Glow', ['own-glow'])).toBe('own-glow-2');
    expect(ownEffectKey('Glow', ['own-glow', 'own-glow-2', 'own-glow-7', 'own-glow-worm'])).toBe('own-glow-8');
  });

  it('still gives a key for a name without letters', () => {
    expect(ownEffectKey('★', [])).toBe('own-effect');
  });
});
