// Made from the JSON Schemas by .build/schemas.ts; do not edit. c4dca9e5f3d44438b633786a198306773ebff8154a4f4fe797739ca91c006b9e
import type { ErrorObject } from 'ajv';
import type { Bundle } from '../model.ts';

export declare const validateBundle: {
  (data: unknown): data is Bundle;
  /** What is wrong with the data of the last call. */
  readonly errors?: readonly ErrorObject[] | null;
};
