import type { LimitEntry } from './limit-entry.ts';

/** The line-side formula in the units of one edition text: P = sqrt(c / soundSpeed) · factor / sqrt(p D f), in percent. */
export interface LineLimitForm {
  /** Reference speed of sound and the unit it is in, m/s. */
  readonly soundSpeed: number;
  readonly speedUnit: number;
  readonly factor: number;
  /** Size of the pressure unit, Pa. */
  readonly pressureUnit: number;
  /** Size of the length unit of the bore, m. */
  readonly boreUnit: number;
}

interface LineLimitFigures {
  readonly si: LineLimitForm;
  readonly us: LineLimitForm;
  /** Absolute line pressures between which the formula holds, Pa. Below, the allowable pressure stays that of `from`. */
  readonly from: number;
  readonly to: number;
}

const EDITION = {
  standard: 'API Standard 618',
  edition: '5th ed. (2007)',
  status: 'verify against your edition',
} as const;

/** Pound-force per square inch, Pa: NIST SP 811 (2008), appendix B. */
const PSI = (0.45359237 * 9.80665) / (0.0254 * 0.0254);

/** Figures from memory. The two forms are rounded apart from each other: the SI form is 0.8 % looser. */
export const API_618_LINE_PULSATION: LimitEntry<LineLimitFigures> = {
  ...EDITION,
  id: 'api618_line_pulsation',
  title: 'Line-side pulsation, design approaches 2 and 3',
  clause: '7.9.4.2.5.2.2',
  basis: 'each harmonic, peak to peak, share of the mean absolute line pressure',
  figures: {
    si: { soundSpeed: 350, speedUnit: 1, factor: 400, pressureUnit: 1e5, boreUnit: 1e-3 },
    us: { soundSpeed: 1150, speedUnit: 0.3048, factor: 300, pressureUnit: PSI, boreUnit: 0.0254 },
    from: 3.5e5,
    to: 350e5,
  },
};

/** Figures from memory; the 7 % is confirmed by published commentary. */
export const API_618_FLANGE_PULSATION: LimitEntry<{ readonly most: number; readonly perRatio: number }> = {
  ...EDITION,
  id: 'api618_flange_pulsation',
  title: 'Pulsation at the compressor cylinder flange',
  clause: '7.9.4.2.5.2.1',
  basis: 'overall (unfiltered), peak to peak, share of the mean absolute line pressure',
  figures: { most: 0.07, perRatio: 0.03 },
};

/** Figures from memory; the 0.25 % is confirmed by published commentary. */
export const API_618_DAMPER_PRESSURE_DROP: LimitEntry<{ readonly least: number; readonly factor: number }> = {
  ...EDITION,
  id: 'api618_damper_pressure_drop',
  title: 'Pressure drop of a pulsation suppression device without separator',
  clause: '7.9.4.2.5.3.1',
  basis: 'share of the mean absolute pressure at its inlet',
  figures: { least: 0.0025, factor: 0.0167 },
};

/**
 * Allowable pulsation of one harmonic in the line, beyond the pulsation suppression device.
 *
 * @formula P_1 = \sqrt{\frac{c}{350}}\,\frac{400}{\sqrt{p_L\,D_i\,f}} percent, with c in m/s, p_L in bar(a), D_i in mm, f in Hz
 * @param soundSpeed    c    speed of sound in the gas      [m/s]     > 0
 * @param linePressure  p_L  mean line pressure             [Pa abs]  > 0
 * @param bore          D_i  inside diameter of the line    [m]       > 0
 * @param frequency     f    frequency of the harmonic      [Hz]      > 0
 * @param form          which of the edition's two rounded forms is used
 * @returns peak to peak over mean absolute line pressure, as a fraction [-]
 * @validity 3.5 to 350 bar(a); below 3.5 bar(a) the allowable pressure is that computed for 3.5 bar(a)
 * @source API Standard 618, 5th ed. (2007), 7.9.4.2.5.2.2, from memory: verify against your edition
 * @check c = 350 m/s, p_L = 100 bar(a), D_i = 100 mm, f = 16 Hz -> 0.01 (hand calculation)
 */
export function api618LinePulsationLimit(
  soundSpeed: number,
  linePressure: number,
  bore: number,
  frequency: number,
  form: 'si' | 'us' = 'si',
): number {
  const { from, [form]: figures } = API_618_LINE_PULSATION.figures;
  const pressure = Math.max(linePressure, from);
  const product = (pressure / figures.pressureUnit) * (bore / figures.boreUnit) * frequency;
  const percent =
    (Math.sqrt(soundSpeed / figures.speedUnit / figures.soundSpeed) * figures.factor) / Math.sqrt(product);
  return (percent / 100) * (pressure / linePressure);
}

/**
 * Allowable overall pulsation at the compressor cylinder flange.
 *
 * @formula P_{cf} = \min(7\,\%,\ 3 R\,\%)
 * @param pressureRatio  R  stage pressure ratio, absolute over absolute  [-]  >= 1
 * @returns peak to peak over mean absolute line pressure, as a fraction [-]
 * @validity a higher value may be agreed between purchaser and vendor
 * @source API Standard 618, 5th ed. (2007), 7.9.4.2.5.2.1, from memory: verify against your edition
 * @check R = 2 -> 0.06; R = 3 -> 0.07 (hand calculation)
 */
export function api618FlangePulsationLimit(pressureRatio: number): number {
  const { most, perRatio } = API_618_FLANGE_PULSATION.figures;
  return Math.min(most, perRatio * pressureRatio);
}

/**
 * Allowable pressure drop of a pulsation suppression device without an integral separator.
 *
 * @formula \Delta P = \max\left(0.25\,\%,\ 1.67\,\frac{R-1}{R}\,\%\right)
 * @param pressureRatio  R  stage pressure ratio, absolute over absolute  [-]  >= 1
 * @returns drop over mean absolute pressure at the inlet, as a fraction [-]
 * @validity choke tubes and nozzle orifices count as part of the device
 * @source API Standard 618, 5th ed. (2007), 7.9.4.2.5.3.1, from memory: verify against your edition
 * @check R = 2 -> 0.00835; R = 1.1 -> 0.0025 (hand calculation)
 */
export function api618DamperPressureDropLimit(pressureRatio: number): number {
  const { least, factor } = API_618_DAMPER_PRESSURE_DROP.figures;
  return Math.max(least, (factor * (pressureRatio - 1)) / pressureRatio);
}
