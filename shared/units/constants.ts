/**
 * Exact conversion factors. Inch, foot and pound are exact by the international yard and pound agreement (1959);
 * the pound-force follows from them with standard gravity (3rd CGPM, 1901), as tabulated in NIST SP 811, appendix B.
 */
export const MM_PER_INCH = 25.4;
export const MM_PER_FOOT = 304.8;
export const KG_PER_POUND = 0.45359237;
/** Standard acceleration of free fall, m/s². */
export const STANDARD_GRAVITY = 9.80665;
export const NEWTON_PER_POUND_FORCE = KG_PER_POUND * STANDARD_GRAVITY;
/** One foot by one foot by one inch, m³ (NHLA rules). */
export const CUBIC_METRE_PER_BOARD_FOOT = (MM_PER_FOOT * MM_PER_FOOT * MM_PER_INCH) / 1e9;
/** One pound-force per square foot, Pa. */
export const PASCAL_PER_PSF = NEWTON_PER_POUND_FORCE / (MM_PER_FOOT / 1000) ** 2;
/** One pound per cubic foot, kg/m³. */
export const KG_PER_M3_PER_PCF = KG_PER_POUND / (MM_PER_FOOT / 1000) ** 3;

/** What a shop reads lengths in; masses and loads follow (lb and lbf beside inches, kg and N beside millimetres). */
export type LengthUnits = 'in' | 'mm';
