// Made by build-validators.mjs from the schema; not to be edited.
import type { CompiledValidator } from '../schema-error';

export declare const checkProcedureDocument: CompiledValidator;
