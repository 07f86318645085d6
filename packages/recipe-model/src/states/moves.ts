/** Every allowed jump: state → action → next state. */
export type Moves<State extends string, Action extends string> = Readonly<Record<State, Partial<Record<Action, State>>>>;

export type Moved<State extends string> = { kind: 'moved'; state: State } | { kind: 'refused'; message: string };

type Words = { thing: string; stateLabel: string; actionLabel: string };

/** Looks the jump up; what is not in the table does not exist. */
export function move<State extends string, Action extends string>(
  moves: Moves<State, Action>,
  state: State,
  action: Action,
  { thing, stateLabel, actionLabel }: Words,
): Moved<State> {
  const next = moves[state][action];
  if (next !== undefined) return { kind: 'moved', state: next };
  return { kind: 'refused', message: `“${actionLabel}” is not possible for a ${thing} that is in the state “${stateLabel}”.` };
}
