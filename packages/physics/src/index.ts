export { isPanelUnit, PANEL_UNITS, type PanelUnit, type UnitKind } from './units/panel-unit';
