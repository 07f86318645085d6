import { cellOf, recordOf } from '../../test/support/revision-records';
import { isSameWork } from './approval-facts';

describe('isSameWork()', () => {
  it('takes a coupon of the same five keys on the machine as it was proved', () => {
    expect(isSameWork(cellOf('C-0001'), recordOf())).toBe(true);
    expect(isSameWork(cellOf('C-0001', { coupon: { physicalNumber: 2 } }), recordOf())).toBe(false);
  });

  it('takes no plate of earlier years whose machine may have been changed since', () => {
    expect(isSameWork(cellOf('C-0001', { coupon: { unknownFields: ['passes'] } }), recordOf())).toBe(true);
    expect(isSameWork(cellOf('C-0001', { coupon: { unknownFields: ['passes', 'profile'] } }), recordOf())).toBe(false);
  });
});
