export { type PanelScale, panelValue, physicalValue } from './units/panel-conversion';
export { isPanelUnit, PANEL_UNITS, type PanelUnit, type UnitKind } from './units/panel-unit';
export { type PercentOfRange, percentOfRange, rangeAsPercent } from './units/percent-of-range';
export { MM_PER_INCH, type SpacingUnits, spacingUnits } from './units/spacing-units';
export { type SpeedUnits, speedUnits } from './units/speed-units';
export { tidy } from './units/tidy';
export { type DecimalSign, parseTypedNumber, type TypedNumber, type TypedNumberRefusal, type TypedUnit } from './units/typed-number';
