// Made from the JSON Schemas by .build/schemas.ts; do not edit. 1379b0002313b57c3dfc9fb177abab518600e3026edbbe0b451d98e3a9093662
import type { ErrorObject } from 'ajv';
import type { Report } from '../model.ts';

export declare const validateReport: {
  (data: unknown): data is Report;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
