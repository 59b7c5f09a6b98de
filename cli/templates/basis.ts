/** What `new study` writes beside its sheets: definitions that they share. */
export const BASIS_TEMPLATE = `# Definitions that several sheets share: a sheet reads them by \`use: [basis.yaml]\`. A name that a sheet defines as well
# is an error there, so that no value of the basis is changed on the quiet.
antinode: definitions/1
atmosphere: 14.7 psia # turns gauge readings (psig, barg) into absolute pressures
standard_state: 14.696 psia, 60 degF # what SCF, MMSCFD and Sm3 count; normal_state is for Nm3

sources:
  basis: Design basis C-000 rev 0
  isometric: Piping isometric P-101 rev A
  practice: Common practice, no source

gases:
  usual:
    method: ideal
    fractions: { methane: 95 %, ethane: 4 %, nitrogen: 1 % } # mole percent
    tolerance: { methane: 2 % } # how far its share may be off, for \`run --sensitivity\`
    source: basis
  rich:
    method: ideal
    fractions: { methane: 85 %, ethane: 11 %, propane: 4 % }
    source: basis

# The operating conditions: every column varies along the axis \`condition\`. They may also stand here, under \`rows\`.
conditions:
  file: conditions.csv
  source: basis
  columns:
    p: { label: Line pressure }
    T: { label: Line temperature }
`;

/** The operating conditions of a new study. */
export const CONDITIONS_TEMPLATE = `# One row for each operating condition. The header names the columns and their units; \`gas\` is the name of a gas, \`text\` words.
id,gas [gas],p [psig],T [degF],remark [text]
C01,usual,200,120,usual
C02,usual,160,120,low line pressure
C03,usual,230,135,"high line pressure, summer"
C04,rich,200,125,upset
`;
