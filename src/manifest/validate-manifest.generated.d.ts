// Made from schemas/manifest.schema.json by src/build/generate.mjs; do not edit.
import type { ErrorObject } from 'ajv';

interface Validator {
  (data: unknown): boolean;
  errors?: null | ErrorObject[];
}
export const ManifestData: Validator;
export const CellPair: Validator;
export const Citations: Validator;
export const ColumnList: Validator;
export const DigestByFile: Validator;
export const EachList: Validator;
export const EachTable: Validator;
export const FileElsewhere: Validator;
export const InterventionList: Validator;
export const NoInterventions: Validator;
export const NoWarmUp: Validator;
export const NoneFound: Validator;
export const ScriptList: Validator;
export const SharePerFile: Validator;
export const SharesInTable: Validator;
export const TableFile: Validator;
export const TakeCell: Validator;
export const TakeKey: Validator;
export const TakePattern: Validator;
export const TakePointer: Validator;
export const TakeWord: Validator;
export const TermColumn: Validator;
export const TermList: Validator;
export const TimeColumn: Validator;
export const TimeCounter: Validator;
export const TimeYearDay: Validator;
export const TimeYearMonth: Validator;
export const Weights: Validator;
