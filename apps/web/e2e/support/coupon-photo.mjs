// A photo of a plate as a phone would take it, rendered by the demo shop's own renderer.
import { createRequire } from 'node:module';
import { join } from 'node:path';

const require = createRequire(import.meta.url);
const fromRoot = (path) => join(import.meta.dirname, '../../../..', path);

/** JPEG of a black anodised plate whose cells get whiter from A1 to the last one. */
export async function couponPhoto({ code, rows, columns }) {
  const { renderCouponPhoto } = require(fromRoot('db/dist/seed/photos/render-coupon-photo.js'));
  const { couponLayout } = require(fromRoot('packages/imaging/dist/index.js'));
  const layout = couponLayout({ rows, columns, reference: code });
  const cells = layout.cells.map(({ address }, index) => ({ address, lab: [45 + (35 * index) / layout.cells.length, 0.3, 1] }));
  const { jpeg } = await renderCouponPhoto({
    layout,
    ground: 'anodised black',
    cells,
    code,
    dataMatrixModules: checkered(14),
    seed: 7,
    view: { widthPx: 1000, heightPx: 750 },
  });
  return { name: `${code}.jpg`, mimeType: 'image/jpeg', buffer: jpeg };
}

/** Stands in for the code on the plate, which nothing reads here. */
function checkered(size) {
  return Array.from({ length: size }, (_, row) => Array.from({ length: size }, (_, column) => (row + column) % 2 === 0));
}
