import type { Teller } from '../stage/ledger-writer';
import type { Stage, Turn } from '../stage/stage';

type Scene = { readonly at: Date; readonly by: Teller; readonly play: (turn: Turn) => Promise<void> };

/** Scenes are written thread by thread (a coupon, a recipe) and played in the order of time, as the ledger asks. */
export class Script {
  private readonly scenes: Scene[] = [];

  add(at: Date, by: Teller, play: Scene['play']): void {
    this.scenes.push({ at, by, play });
  }

  async play(stage: Stage): Promise<void> {
    const inOrder = [...this.scenes].sort((one, other) => one.at.getTime() - other.at.getTime());
    for (const { at, by, play } of inOrder) await stage.act(at, by, play);
  }
}
