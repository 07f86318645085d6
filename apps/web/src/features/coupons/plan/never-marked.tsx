import { ProblemNotice } from '../../../components/problem-notice';
import { asSentence } from '../../../lib/format';
import type { ShopCaution } from '../coupons.api';

/** A `never` caution, said where the material is chosen: its title, why, and where it comes from. */
export function NeverMarked({ caution: { subject, text, source } }: { caution: ShopCaution }) {
  return (
    <ProblemNotice
      what={`Never. ${asSentence(subject)}`}
      safe={text}
      todo={<>Source: {asSentence(source)} Choose another material, or ask the laser safety officer.</>}
    />
  );
}
