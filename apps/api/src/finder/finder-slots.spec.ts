import { type Candidate, fillSlots, type SlotItem, type SlotKey } from './finder-slots';

const item = (slot: SlotKey, id: string, name = id, searchText = name): SlotItem => ({ slot, id, name, detail: '', searchText });
const items = [
  item('machine', 'bench1'),
  item('machine', 'bench2'),
  item('lens', 'f160'),
  item('material', 'black', 'black anodised 6061', 'black anodised 6061 aluminium aluminum'),
  item('material', 'clear', 'clear anodised 6061'),
  item('material', 'hard', 'hard anodised 7075'),
  item('finish', 'satin'),
  item('effect', 'white', 'white mark'),
  item('effect', 'dark', 'dark mark'),
];
const candidate = (code: string, machine: string, material: string, effect: string, more: Partial<Candidate> = {}): Candidate => ({
  recipeId: code,
  code,
  title: '',
  revisionId: `${code}-1`,
  revisionNumber: 1,
  keys: { machine, lens: 'f160', material, finish: 'satin', effect },
  materialIds: [material],
  ...more,
});
const candidates = [
  candidate('R-1', 'bench2', 'black', 'white'),
  candidate('R-2', 'bench2', 'black', 'dark'),
  candidate('R-3', 'bench2', 'clear', 'dark'),
  candidate('R-4', 'bench1', 'clear', 'dark'),
];

describe('fillSlots()', () => {
  it('counts the recipes of each option with the other slots held and its own left out', () => {
    const { slots, matches } = fillSlots(candidates, items, { choice: { machine: 'bench2', effect: 'dark' }, words: '' });
    const counts = (slot: SlotKey) => Object.fromEntries(slots[slot].options.map(({ id, count }) => [id, count]));
    expect(counts('material')).toEqual({ black: 1, clear: 1, hard: 0 });
    expect(counts('effect')).toEqual({ dark: 2, white: 1 });
    expect(counts('machine')).toEqual({ bench1: 1, bench2: 2 });
    expect(matches.map(({ code }) => code)).toEqual(['R-2', 'R-3']);
    expect(slots.material.fitCount).toBe(2);
  });

  it('names the slot that stands in the way, the effect before the machine', () => {
    const { slots } = fillSlots(candidates, items, { choice: { machine: 'bench1', effect: 'white' }, words: '' });
    const reasons = Object.fromEntries(slots.material.options.map(({ id, reason }) => [id, reason]));
    expect(reasons).toEqual({ black: 'not on bench1', clear: 'not for white mark', hard: 'none yet' });
  });

  it('says that the choices do not go together when no single one is to blame', () => {
    const apart = [candidate('R-1', 'bench1', 'black', 'white'), candidate('R-2', 'bench2', 'clear', 'dark')];
    const { slots } = fillSlots(apart, items, { choice: { machine: 'bench1', lens: 'f160', effect: 'white' }, words: '' });
    expect(slots.material.options.find(({ id }) => id === 'clear')?.reason).toBe('not with these together');
  });

  it('narrows by words over all slots at once', () => {
    const narrowed = (words: string) => fillSlots(candidates, items, { choice: {}, words }).matches.map(({ code }) => code);
    expect(narrowed('blk wht')).toEqual(['R-1']);
    expect(narrowed('aluminum dark')).toEqual(['R-2']);
    expect(narrowed('R-4')).toEqual(['R-4']);
  });

  it('settles a slot in which all that is left agree', () => {
    const { slots } = fillSlots(candidates, items, { choice: { material: 'black' }, words: '' });
    expect([slots.machine.settledId, slots.finish.settledId, slots.effect.settledId]).toEqual(['bench2', 'satin', null]);
  });

  it('counts a recipe for each material that it covers', () => {
    const covering = [candidate('R-1', 'bench2', 'black', 'white', { materialIds: ['black', 'hard'] })];
    const { slots, matches } = fillSlots(covering, items, { choice: { material: 'hard' }, words: '' });
    expect(matches).toHaveLength(1);
    expect(slots.material.options.filter(({ count }) => count > 0).map(({ id }) => id)).toEqual(['black', 'hard']);
  });
});
