import { chakra } from '@chakra-ui/react';
import { useSheetCode } from '../finder.api';

/** Four modules of white around the symbol, as the readers expect. */
const QUIET_ZONE = 4;

/** The code of the sheet, drawn module by module so that it stays sharp on paper. */
export function SheetCodePicture({ recipeId }: { recipeId: string }) {
  const { data } = useSheetCode(recipeId);
  const size = data?.modules.length ?? 0;
  const side = size + 2 * QUIET_ZONE;
  return (
    <chakra.svg
      viewBox={`0 0 ${side} ${side}`}
      width="26mm"
      height="26mm"
      m="-2mm"
      role="img"
      aria-label="Code that opens the current revision"
      shapeRendering="crispEdges"
    >
      <rect width={side} height={side} fill="#ffffff" />
      <path d={pathOf(data?.modules ?? [])} fill="#000000" />
    </chakra.svg>
  );
}

function pathOf(modules: readonly string[]): string {
  return modules
    .flatMap((row, y) => Array.from(row, (module, x) => (module === '1' ? `M${x + QUIET_ZONE} ${y + QUIET_ZONE}h1v1h-1z` : '')))
    .join('');
}
