// Made from the JSON Schemas by .build/schemas.ts; do not edit. 51a1b9fa4be93fbe14142d1a18e6e261647a6207bcd0aabfbec4a3aad58400d3
import type { ErrorObject } from 'ajv';
import type { Bundle } from '../model.ts';

export declare const validateBundle: {
  (data: unknown): data is Bundle;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
