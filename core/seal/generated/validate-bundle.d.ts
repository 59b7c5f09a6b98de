// Made from the JSON Schemas by .build/schemas.ts; do not edit. 9014203406e68be70be4d3a5af44c2e87c119147a2b6ba279bd4d7546d0edc53
import type { ErrorObject } from 'ajv';
import type { Bundle } from '../model.ts';

export declare const validateBundle: {
  (data: unknown): data is Bundle;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
