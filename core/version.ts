/** Version of the core, recorded in every report. Kept equal to package.json by a test. */
export const CORE_VERSION = '0.1.0';
