// Made from the JSON Schemas by .build/schemas.ts; do not edit. 9014203406e68be70be4d3a5af44c2e87c119147a2b6ba279bd4d7546d0edc53
import type { ErrorObject } from 'ajv';
import type { Report } from '../model.ts';

export declare const validateReport: {
  (data: unknown): data is Report;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
