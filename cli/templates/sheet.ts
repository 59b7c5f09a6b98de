/** What `new` writes: a sheet that runs, and teaches by its comments. */
export const SHEET_TEMPLATE = `# A calc sheet. \`antinode run\` evaluates it, \`antinode functions\` lists what formulas may call,
# \`antinode units\` what values may be written in.
antinode: sheet/1
number: C-001 # the document number under which the sheet is reviewed
title: Shaking force on a straight run
units: us # how results read: us or si
atmosphere: 14.7 psia # turns gauge readings (psig, barg) into absolute pressures

# Every input names one of these, or is on hold.
sources:
  basis: Design basis C-000 rev 0
  isometric: Piping isometric P-101 rev A
  b3610: ASME B36.10M
  practice: Common practice, no source

gases:
  gas:
    method: ideal
    fractions: { methane: 95 %, ethane: 4 %, nitrogen: 1 % } # mole percent
    source: basis

# Values from outside. Give each its unit: psig and psia are levels on the pressure scale, psi is a difference.
inputs:
  p: { value: 200 psig, label: Line pressure, source: basis }
  T: { value: 120 degF, label: Line temperature, source: basis }
  N: { value: 1000 rpm, label: Running speed, source: basis }
  L: { value: 12 ft 6 in, label: "Run, elbow to elbow", source: isometric }
  x: { value: 4 %, label: "Pulsation, peak to peak, of line pressure", source: basis }
  F_lim: { value: 500 lbf, label: "Limit for the run, peak to peak", source: practice }
  # Not confirmed yet? Write \`hold: what you wait for\` in place of \`source:\`; the sheet can't be approved until it is closed.

sections:
  - title: Resonance of the run
    # Prose, with formulas between dollar signs.
    text: |
      A run between two elbows carries its largest force when its length is half a wavelength, $L = c / (2 f)$.
    # Steps may stand in any order; each is a formula, or a mapping with calc, unit, label, symbol, digits, note, source.
    steps:
      c: { calc: "speed_of_sound(gas, p, T)", label: Speed of sound }
      f_half: { calc: "half_wave_frequency(c, L, 1)", label: Half wave of the run }
      f_2: { calc: 2*N to Hz, label: Order 2 of the running speed }
  - title: Force
    steps:
      D: { calc: "pipe_bore(6, 'Sch 40')", label: "Bore of NPS 6, Sch 40", source: b3610 }
      A: pi/4*D^2 to in^2
      dp: { calc: x*p to psi, symbol: '\\Delta p', label: "Differential pressure, peak to peak" }
      F: { calc: dp*A to lbf, label: "Shaking force, peak to peak" }
    checks:
      - { that: F <= F_lim, label: Force below its limit, source: practice }
      - { that: f_half >= 1.2*f_2, label: Half wave above order 2 by a fifth, source: practice }
`;
