/** What `new study` writes for the whole operating range: a sheet that runs, and teaches axes by its comments. */
export const RANGE_SHEET_TEMPLATE = `# A calc sheet over all operating conditions and speeds. \`antinode functions axes\` lists what works along axes.
antinode: sheet/1
number: C-002
title: Shaking force on a straight run, all conditions and speeds
units: us
use: [basis.yaml] # gases, operating conditions, atmosphere and sources of the study

exclusions:
  - Resonance of the piping beyond the run.

inputs:
  # A range lays down an axis: rates are speeds, whole numbers are orders, angles and lengths are angles and places.
  N: { value: 750..1200 rpm step 10 rpm, label: Running speed, source: basis }
  # An input may say how far it may be off, and in which range an experienced engineer would believe it.
  L: { value: 12 ft 6 in, label: "Run, elbow to elbow", tolerance: 1 in, expect: 5..40 ft, source: isometric }
  F_lim: { value: 500 lbf pp, label: "Limit for the run", source: practice }
  s_min: { value: 10 %, label: Least separation of order 2, source: practice }

# A table that formulas read by \`interpolate(table, x)\`; pp, pk and rms behind a unit keep amplitudes apart.
tables:
  pulse:
    label: Pulsation by order, share of line pressure
    columns: { order: "1", share: "% pp" }
    rows: [[1, 1.2], [2, 4], [3, 0.9], [4, 2], [6, 0.6]]
    source: basis

sections:
  - title: Resonance of the run
    # Values stand in prose between double braces.
    text: |
      The half wave of the run lies between {{ f_low }} and {{ f_high }}.
    steps:
      c: { calc: "speed_of_sound(gas, p, T)", label: Speed of sound, expect: 1000..1800 ft/s }
      f_half: { calc: "half_wave_frequency(c, L, 1)", label: Half wave of the run }
      f_low: { calc: "min_over(f_half, 'condition')", label: Lowest half wave }
      f_high: { calc: "max_over(f_half, 'condition')", label: Highest half wave }
      n: { calc: harmonics(6), label: Order }
      f: { calc: n*N to Hz, label: Frequency of an order }
      s_2: { calc: "abs(at(f, 'harmonic', 2)/f_half - 1) to %", label: Separation of order 2 }
    tables:
      - { of: [p, T, c, f_half], title: Half wave by operating condition }
    checks:
      # A check over axes passes only if it passes everywhere, and names the point that governs.
      - { that: s_2 >= s_min, label: Order 2 away from the half wave, source: practice }

  - title: Force
    steps:
      A: "pi/4*pipe_bore(6, 'Sch 40')^2 to in^2"
      share: { calc: "abs(sin(pi/2*(f/f_half)))", label: Share that stands across the run }
      F: { calc: "interpolate(pulse, n)*p*A*share", unit: lbf, label: Force of an order }
      F_env: { calc: envelope(F), label: "Largest force of each order, over conditions and speeds" }
    figures:
      - { kind: spectrum, of: F_env, limit: F_lim, title: Largest force by order }
      - { kind: line, of: "at(max_over(F, 'condition'), 'harmonic', 2)", limit: F_lim, title: Order 2 over speed }
    checks:
      - { that: F <= F_lim, label: Force below its limit, source: practice }
`;
