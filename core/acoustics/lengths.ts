/** The part of a wavelength below which a neck or a volume counts as lumped: common practice, no source. */
const LUMPED_SHARE = 0.1;
/** End correction of an unflanged open end in radii, for long waves. */
const UNFLANGED_RADII = 0.6133;

/**
 * Natural frequency of a uniform pipe that is closed at one end and open at the other.
 *
 * @formula f = \frac{n\,c}{4\,L}
 * @param soundSpeed  c  speed of sound in the gas                      [m/s]  > 0
 * @param length      L  acoustic length, end corrections included      [m]    > 0
 * @param order       n  1, 3, 5, ...                                   [-]    odd
 * @returns frequency [Hz]
 * @validity plane waves, no mean flow, no damping
 * @source Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000), section 10.2
 * @check c = 400, L = 5, n = 1 -> 20 (hand calculation)
 */
export function quarterWaveFrequency(soundSpeed: number, length: number, order: number): number {
  return (order * soundSpeed) / (4 * length);
}

/**
 * Natural frequency of a uniform pipe with two like ends: both closed, or both open.
 *
 * @formula f = \frac{n\,c}{2\,L}
 * @param soundSpeed  c  speed of sound in the gas                      [m/s]  > 0
 * @param length      L  acoustic length, end corrections included      [m]    > 0
 * @param order       n  1, 2, 3, ...                                   [-]    whole
 * @returns frequency [Hz]
 * @validity plane waves, no mean flow, no damping
 * @source Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000), section 10.2
 * @check c = 400, L = 5, n = 1 -> 40 (hand calculation)
 */
export function halfWaveFrequency(soundSpeed: number, length: number, order: number): number {
  return (order * soundSpeed) / (2 * length);
}

/**
 * Natural frequency of a Helmholtz resonator: a volume behind a neck, both lumped.
 *
 * @formula f = \frac{c}{2\pi}\sqrt{\frac{A}{L\,V}}
 * @param soundSpeed  c  speed of sound in the gas                      [m/s]  > 0
 * @param neckArea    A  cross-section of the neck                      [m^2]  > 0
 * @param neckLength  L  length of the neck, end corrections included   [m]    > 0
 * @param volume      V  volume                                         [m^3]  > 0
 * @returns frequency [Hz]
 * @validity neck and volume shorter than a tenth of the wavelength (`longestLumpedLength`); no damping
 * @source Kinsler, Frey, Coppens, Sanders, Fundamentals of Acoustics, 4th ed. (2000), section 10.8
 * @check c = 2 pi, A = 1, L = 1, V = 1 -> 1 (hand calculation)
 */
export function helmholtzFrequency(soundSpeed: number, neckArea: number, neckLength: number, volume: number): number {
  return (soundSpeed / (2 * Math.PI)) * Math.sqrt(neckArea / (neckLength * volume));
}

/**
 * Natural frequency of a volume-choke-volume filter, all three lumped: the gas in the choke swings between two springs.
 *
 * @formula f = \frac{c}{2\pi}\sqrt{\frac{A}{L}\left(\frac{1}{V_1}+\frac{1}{V_2}\right)}
 * @param soundSpeed   c    speed of sound in the gas                      [m/s]  > 0
 * @param chokeArea    A    cross-section of the choke tube                [m^2]  > 0
 * @param chokeLength  L    length of the choke, end corrections included  [m]    > 0
 * @param volume1      V_1  first chamber                                  [m^3]  > 0
 * @param volume2      V_2  second chamber                                 [m^3]  > 0
 * @returns frequency [Hz]
 * @validity choke and chambers shorter than a tenth of the wavelength (`longestLumpedLength`); no damping
 * @source derived from the lumped mass of the choke and the stiffness of both chambers; its use in design:
 *   Brun and Kurz (ed.), Compression Machinery for Oil and Gas (2019), p. 452
 * @check c = 2 pi, A = 1, L = 1, V_1 = V_2 = 2 -> 1 (hand calculation)
 */
export function chokeFilterFrequency(
  soundSpeed: number,
  chokeArea: number,
  chokeLength: number,
  volume1: number,
  volume2: number,
): number {
  return (soundSpeed / (2 * Math.PI)) * Math.sqrt((chokeArea / chokeLength) * (1 / volume1 + 1 / volume2));
}

/**
 * Length to add for one flanged open end.
 *
 * @formula \delta = \frac{8}{3\pi}\,\frac{d}{2}
 * @param diameter  d  inside diameter of the end  [m]  > 0
 * @returns length [m]
 * @validity wavelength long against the diameter; flange wide against it; no mean flow
 * @source Rayleigh, The Theory of Sound, vol. 2, 2nd ed. (1896), section 307 and appendix A (piston value)
 * @check d = 2 -> 0.848826 (hand calculation)
 */
export function flangedEndCorrection(diameter: number): number {
  return ((8 / (3 * Math.PI)) * diameter) / 2;
}

/**
 * Length to add for one open end without a flange.
 *
 * @formula \delta = 0.6133\,\frac{d}{2}
 * @param diameter  d  inside diameter of the end  [m]  > 0
 * @returns length [m]
 * @validity wavelength long against the diameter; thin wall; no mean flow
 * @source Levine and Schwinger, Physical Review 73 (1948), p. 383
 * @check d = 2 -> 0.6133 (published value in radii)
 */
export function unflangedEndCorrection(diameter: number): number {
  return (UNFLANGED_RADII * diameter) / 2;
}

/**
 * Wavelength of a frequency.
 *
 * @formula \lambda = \frac{c}{f}
 * @param soundSpeed  c  speed of sound in the gas  [m/s]  > 0
 * @param frequency   f  frequency                  [Hz]   > 0
 * @returns length [m]
 * @validity plane waves, no mean flow
 * @source definition, ISO 80000-8
 * @check c = 400, f = 20 -> 20 (hand calculation)
 */
export function wavelength(soundSpeed: number, frequency: number): number {
  return soundSpeed / frequency;
}

/**
 * Longest part that may be taken as lumped at a frequency.
 *
 * @formula \frac{\lambda}{10}
 * @param soundSpeed  c  speed of sound in the gas  [m/s]  > 0
 * @param frequency   f  frequency                  [Hz]   > 0
 * @returns length [m]
 * @validity a working rule: at this length the lumped frequency is a few percent off
 * @source common practice, no source
 * @check c = 400, f = 20 -> 2 (hand calculation)
 */
export function longestLumpedLength(soundSpeed: number, frequency: number): number {
  return LUMPED_SHARE * wavelength(soundSpeed, frequency);
}
