// Made by build-validators.mjs from the schema; not to be edited.
import type { CompiledValidator } from '../../document';

export declare const checkRunEvent: CompiledValidator;
