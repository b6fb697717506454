import { formatAngle } from './angle.ts';
import { KG_PER_M3_PER_PCF, MM_PER_INCH, NEWTON_PER_POUND_FORCE, PASCAL_PER_PSF, type LengthUnits } from './constants.ts';
import { formatLength } from './length.ts';
import { formatLoad, formatMass } from './mass.ts';
import { tidyNumber } from './number-text.ts';

/** Units that figures are kept in; `''` is a plain number, `%` a number of hundredths. */
export type FigureUnit = '' | '%' | 'mm' | 'mm²' | 'rad' | 'kg' | 'kg/m³' | 'N' | 'N/mm' | 'N/mm²' | 'N·mm' | 'Pa' | 'bd ft';

/** One named value that goes into a figure. `note` names where it was taken from, when that is worth saying. */
export interface FigureInput {
  label: string;
  value: number;
  unit: FigureUnit;
  note?: string;
}

/** A figure that can be opened: what it is, what went in, by which formula, and where the formula stands. */
export interface Figure extends FigureInput {
  inputs: FigureInput[];
  /** The formula in words and signs, as a reader would write it. */
  formula: string;
  /** Published source, or plainly that it is geometry, common practice, or from memory. */
  source: string;
}

/** A figure's or input's value for reading, in the shop's units. */
export function formatFigure(of: Pick<FigureInput, 'value' | 'unit'>, units: LengthUnits): string {
  const { value, unit } = of;
  const inch = units === 'in';
  switch (unit) {
    case 'mm':
      return smallLength(value, units) ?? formatLength(value, units);
    case 'kg':
      return formatMass(value, units);
    case 'N':
      return formatLoad(value, units);
    case 'rad':
      return formatAngle(value);
    case 'mm²':
      return inch ? `${tidyNumber(value / MM_PER_INCH ** 2, 2)} in²` : `${tidyNumber(value, 0)} mm²`;
    case 'kg/m³':
      return inch ? `${tidyNumber(value / KG_PER_M3_PER_PCF, 1)} lb/ft³` : `${tidyNumber(value, 0)} kg/m³`;
    case 'N/mm':
      return inch ? `${tidyNumber(value / poundForcePerInch, 1)} lbf/in` : `${tidyNumber(value, 2)} N/mm`;
    case 'N/mm²':
      return inch ? `${tidyNumber((value / poundForcePerInch) * MM_PER_INCH, 0)} psi` : `${tidyNumber(value, 2)} N/mm²`;
    case 'N·mm':
      return inch ? `${tidyNumber(value / poundForcePerInch / MM_PER_INCH ** 2, 1)} lbf·in` : `${tidyNumber(value / 1000, 2)} N·m`;
    case 'Pa':
      return inch ? `${tidyNumber(value / PASCAL_PER_PSF, 1)} lbf/ft²` : `${tidyNumber(value / 1000, 2)} kPa`;
    case '%':
      return `${tidyNumber(value, 1)} %`;
    case 'bd ft':
      return `${tidyNumber(value, 2)} bd ft`;
    case '':
      return tidyNumber(value, Math.abs(value) < 0.1 ? 5 : 3);
  }
}

/** 1 lbf/in in N/mm. */
const poundForcePerInch = NEWTON_PER_POUND_FORCE / MM_PER_INCH;

/** Lengths under a tenth of an inch (wood movement, play) would vanish in thirty-seconds: decimals instead, save where they fall on the rule. */
function smallLength(mm: number, units: LengthUnits): string | null {
  const thirtySeconds = (mm / MM_PER_INCH) * 32;
  const onTheRule = units === 'in' && Math.abs(thirtySeconds - Math.round(thirtySeconds)) < 1e-6;
  if (mm === 0 || Math.abs(mm) >= 2.5 || onTheRule) return null;
  return units === 'in' ? `${tidyNumber(mm / MM_PER_INCH, 3)}"` : `${tidyNumber(mm, 2)} mm`;
}
