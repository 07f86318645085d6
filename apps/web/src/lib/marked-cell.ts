type Cited = { essentialDifferences: readonly string[] };

/** The first cited cell, of basis or proof, that was marked with exactly the setting: its picture and its numbers are the setting's. */
export function markedCellOf<Cell extends Cited>({
  basis,
  confirmation,
}: {
  basis: readonly Cell[];
  confirmation: readonly Cell[];
}): Cell | undefined {
  return [...basis, ...confirmation].find(({ essentialDifferences }) => essentialDifferences.length === 0);
}
