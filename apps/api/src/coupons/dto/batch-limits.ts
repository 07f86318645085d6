/** One entry for each cell of the largest plate, 26 × 26. */
export const MAX_CELLS_AT_ONCE = 676;
