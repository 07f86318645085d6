import { chakra } from '@chakra-ui/react';
import { Fragment } from 'react';
import { type Fact, FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { formatLength, formatNumber } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { PROPERTY_RULES } from '../forms/material-values';
import type { Material } from '../materials.api';

/** What is known of a material; each number with its source. */
export function MaterialFacts({ material }: { material: Material }) {
  const { locale } = useSession().shop;
  const known = PROPERTY_RULES.flatMap(({ key, label, rule }) => {
    const property = material.properties[key];
    return property === undefined ? [] : [{ key, label, unit: rule.unit, ...property }];
  });
  return (
    <Panel p="5" aria-labelledby="facts-title">
      <chakra.h2 id="facts-title" mb="2">
        What it is
      </chakra.h2>
      <FactList facts={plainFacts(material)} />
      {known.length > 0 && (
        <chakra.dl mt="3" fontSize="sm" lineHeight="sm">
          {known.map(({ key, label, value, unit, source }) => (
            <Fragment key={key}>
              <chakra.dt color="fg.muted" pt="2">
                {label}
              </chakra.dt>
              <dd>
                <b>{formatNumber(value, { locale })}</b> <chakra.span color="fg.muted">{unit}</chakra.span>
                <chakra.span display="block" color="fg.muted">
                  Source: {source}
                </chakra.span>
              </dd>
            </Fragment>
          ))}
        </chakra.dl>
      )}
      {material.notes !== '' && (
        <chakra.p mt="3" whiteSpace="pre-wrap">
          {material.notes}
        </chakra.p>
      )}
    </Panel>
  );
}

function plainFacts({ familyLabel, grade, standardDesignation, supplier, thicknessMm }: Material): Fact[] {
  return [
    { label: 'Family', value: familyLabel },
    ...(grade === '' ? [] : [{ label: 'Grade or alloy', value: grade }]),
    ...(standardDesignation === '' ? [] : [{ label: 'Designation', value: standardDesignation }]),
    ...(supplier === '' ? [] : [{ label: 'Supplier', value: supplier }]),
    ...(thicknessMm === null ? [] : [{ label: 'Usual thickness', value: formatLength(thicknessMm) }]),
  ];
}
