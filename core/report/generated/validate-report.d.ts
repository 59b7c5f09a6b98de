// Made from the JSON Schemas by .build/schemas.ts; do not edit. 11272969acc7c8c7e6df0900b1c8dbd5305a6eaee02572ef2238f4f57ea761aa
import type { ErrorObject } from 'ajv';
import type { Report } from '../model.ts';

export declare const validateReport: {
  (data: unknown): data is Report;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
