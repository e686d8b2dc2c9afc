import type { KnownRules } from '../facts/facts.ts';
import { balanceBeyondLimit } from './balance/beyond-limit.ts';
import { balanceDiffers } from './balance/differs.ts';
import { balanceMissing } from './balance/missing.ts';
import { balanceNotClosed } from './balance/not-closed.ts';
import { balanceStorageUnstated } from './balance/storage-unstated.ts';
import { evaluationDrop } from './evaluation/drop.ts';
import { evaluationFewPairs } from './evaluation/few-pairs.ts';
import { evaluationIdentityBroken } from './evaluation/identity-broken.ts';
import { evaluationMissing } from './evaluation/missing.ts';
import { evaluationNeedUnscored } from './evaluation/need-unscored.ts';
import { evaluationPeaksMissed } from './evaluation/peaks-missed.ts';
import { evaluationScoreDiffers } from './evaluation/score-differs.ts';
import { evaluationScoreLow } from './evaluation/score-low.ts';
import { evaluationSingleScore } from './evaluation/single-score.ts';
import { evaluationUnseen } from './evaluation/unseen.ts';
import { evaluationWorseThanMean } from './evaluation/worse-than-mean.ts';
import { inputsBeyondRecord } from './inputs/beyond-record.ts';
import { inputsBiasedUntreated } from './inputs/biased-untreated.ts';
import { inputsDayShifted } from './inputs/day-shifted.ts';
import { inputsDayUnstated } from './inputs/day-unstated.ts';
import { inputsGapUntreated } from './inputs/gap-untreated.ts';
import { inputsIncompleteTotal } from './inputs/incomplete-total.ts';
import { inputsLicenceMissing } from './inputs/licence-missing.ts';
import { inputsMissingDiffers } from './inputs/missing-differs.ts';
import { inputsNegativeAmount } from './inputs/negative-amount.ts';
import { inputsPeriodDiffers } from './inputs/period-differs.ts';
import { inputsPublishedDigestDiffers } from './inputs/published-digest-differs.ts';
import { inputsRetrievedMissing } from './inputs/retrieved-missing.ts';
import { inputsSourceMissing } from './inputs/source-missing.ts';
import { inputsStepDiffers } from './inputs/step-differs.ts';
import { inputsStuckValue } from './inputs/stuck-value.ts';
import { inputsUnitDoubtful } from './inputs/unit-doubtful.ts';
import { inputsUnitMissing } from './inputs/unit-missing.ts';
import { inputsUnitUnknown } from './inputs/unit-unknown.ts';
import { inputsUnreadableRow } from './inputs/unreadable-row.ts';
import { inputsUnverified } from './inputs/unverified.ts';
import { interventionsDefaultUnstated } from './interventions/default-unstated.ts';
import { interventionsSeasonShifted } from './interventions/season-shifted.ts';
import { interventionsUndeclared } from './interventions/undeclared.ts';
import { interventionsUnrepresented } from './interventions/unrepresented.ts';
import { manifestCircle } from './manifest/circle.ts';
import { manifestClaimedTwice } from './manifest/claimed-twice.ts';
import { manifestLoosened } from './manifest/loosened.ts';
import { manifestNoMatch } from './manifest/no-match.ts';
import { manifestOutsideRepository } from './manifest/outside-repository.ts';
import { manifestPlaceholder } from './manifest/placeholder.ts';
import { manifestUnaccountedFile } from './manifest/unaccounted-file.ts';
import { manifestUnknownRecord } from './manifest/unknown-record.ts';
import { manifestUnreadable } from './manifest/unreadable.ts';
import { modelAssumptionUnanswered } from './model/assumption-unanswered.ts';
import { modelExecutableUnidentified } from './model/executable-unidentified.ts';
import { modelJustificationMissing } from './model/justification-missing.ts';
import { modelReleaseMissing } from './model/release-missing.ts';
import { modelVersionMissing } from './model/version-missing.ts';
import { modelVersionVague } from './model/version-vague.ts';
import { parametersAtBound } from './parameters/at-bound.ts';
import { parametersChangeDiffers } from './parameters/change-differs.ts';
import { parametersFileDiffers } from './parameters/file-differs.ts';
import { parametersImplausible } from './parameters/implausible.ts';
import { parametersIncomplete } from './parameters/incomplete.ts';
import { parametersMany } from './parameters/many.ts';
import { parametersMissing } from './parameters/missing.ts';
import { parametersOrderBroken } from './parameters/order-broken.ts';
import { parametersOutOfRange } from './parameters/out-of-range.ts';
import { parametersSensitivityMissing } from './parameters/sensitivity-missing.ts';
import { periodsCalibrationMissing } from './periods/calibration-missing.ts';
import { periodsOneSided } from './periods/one-sided.ts';
import { periodsOutsideData } from './periods/outside-data.ts';
import { periodsOutsideSimulation } from './periods/outside-simulation.ts';
import { periodsOverlap } from './periods/overlap.ts';
import { periodsShort } from './periods/short.ts';
import { periodsValidationMissing } from './periods/validation-missing.ts';
import { periodsWarmUpDrift } from './periods/warm-up-drift.ts';
import { periodsWarmUpMissing } from './periods/warm-up-missing.ts';
import { periodsWarmUpShort } from './periods/warm-up-short.ts';
import { readingDiffers } from './reading/differs.ts';
import { readingNotFound } from './reading/not-found.ts';
import type { Rule } from './rule.ts';
import { thresholdName } from './run.ts';
import { runsMissing } from './runs/missing.ts';
import { scenariosBeyondJointly } from './scenarios/beyond-jointly.ts';
import { scenariosBeyondRange } from './scenarios/beyond-range.ts';
import { scenariosConditionsDiffer } from './scenarios/conditions-differ.ts';
import { scenariosConditionsMissing } from './scenarios/conditions-missing.ts';
import { scenariosForcingUnsourced } from './scenarios/forcing-unsourced.ts';
import { scenariosNoSplit } from './scenarios/no-split.ts';
import { scenariosParametersChanged } from './scenarios/parameters-changed.ts';
import { sealMissing } from './seal/missing.ts';
import { sealOldScheme } from './seal/old-scheme.ts';
import { sealOrphan } from './seal/orphan.ts';
import { sealReworded } from './seal/reworded.ts';
import { sealStale } from './seal/stale.ts';
import { sealUnmoved } from './seal/unmoved.ts';
import { sealUnreadable } from './seal/unreadable.ts';
import { setupChoiceMissing } from './setup/choice-missing.ts';
import { setupChoiceUnjustified } from './setup/choice-unjustified.ts';
import { studyContactMissing } from './study/contact-missing.ts';
import { studyLicenceUnknown } from './study/licence-unknown.ts';
import { studyLiteratureMissing } from './study/literature-missing.ts';
import { studyNeedsMissing } from './study/needs-missing.ts';
import { studyPhaseBehind } from './study/phase-behind.ts';
import { studyPurposeMissing } from './study/purpose-missing.ts';
import { uncertaintyBandBroken } from './uncertainty/band-broken.ts';
import { uncertaintyBandMissing } from './uncertainty/band-missing.ts';
import { uncertaintyDiffers } from './uncertainty/differs.ts';
import { uncertaintySourceUnaddressed } from './uncertainty/source-unaddressed.ts';
import { uncertaintyWeak } from './uncertainty/weak.ts';
import { waiverExpired } from './waiver/expired.ts';
import { waiverUnsigned } from './waiver/unsigned.ts';
import { waiverUnused } from './waiver/unused.ts';

/** Every rule, area by area, in the order of the README's table. */
export const rules: readonly Rule[] = [
  manifestUnreadable,
  manifestPlaceholder,
  manifestNoMatch,
  manifestOutsideRepository,
  manifestUnaccountedFile,
  manifestCircle,
  manifestUnknownRecord,
  manifestClaimedTwice,
  manifestLoosened,
  sealMissing,
  sealStale,
  sealReworded,
  sealOldScheme,
  sealUnmoved,
  sealOrphan,
  sealUnreadable,
  waiverExpired,
  waiverUnused,
  waiverUnsigned,
  studyPurposeMissing,
  studyLiteratureMissing,
  studyContactMissing,
  studyLicenceUnknown,
  studyNeedsMissing,
  studyPhaseBehind,
  modelVersionMissing,
  modelReleaseMissing,
  modelVersionVague,
  modelExecutableUnidentified,
  modelJustificationMissing,
  modelAssumptionUnanswered,
  readingDiffers,
  readingNotFound,
  inputsSourceMissing,
  inputsRetrievedMissing,
  inputsLicenceMissing,
  inputsUnitMissing,
  inputsUnitUnknown,
  inputsUnreadableRow,
  inputsPeriodDiffers,
  inputsStepDiffers,
  inputsDayUnstated,
  inputsDayShifted,
  inputsUnitDoubtful,
  inputsMissingDiffers,
  inputsGapUntreated,
  inputsNegativeAmount,
  inputsBeyondRecord,
  inputsStuckValue,
  inputsIncompleteTotal,
  inputsBiasedUntreated,
  inputsUnverified,
  inputsPublishedDigestDiffers,
  periodsWarmUpMissing,
  periodsWarmUpShort,
  periodsWarmUpDrift,
  periodsOverlap,
  periodsOutsideSimulation,
  periodsOutsideData,
  periodsShort,
  periodsOneSided,
  periodsCalibrationMissing,
  periodsValidationMissing,
  setupChoiceMissing,
  setupChoiceUnjustified,
  parametersMissing,
  parametersIncomplete,
  parametersOutOfRange,
  parametersAtBound,
  parametersChangeDiffers,
  parametersOrderBroken,
  parametersImplausible,
  parametersFileDiffers,
  parametersMany,
  parametersSensitivityMissing,
  evaluationMissing,
  evaluationScoreDiffers,
  evaluationIdentityBroken,
  evaluationScoreLow,
  evaluationWorseThanMean,
  evaluationNeedUnscored,
  evaluationSingleScore,
  evaluationPeaksMissed,
  evaluationDrop,
  evaluationUnseen,
  evaluationFewPairs,
  balanceMissing,
  balanceDiffers,
  balanceNotClosed,
  balanceBeyondLimit,
  balanceStorageUnstated,
  interventionsUndeclared,
  interventionsUnrepresented,
  interventionsDefaultUnstated,
  interventionsSeasonShifted,
  uncertaintySourceUnaddressed,
  uncertaintyBandMissing,
  uncertaintyBandBroken,
  uncertaintyDiffers,
  uncertaintyWeak,
  runsMissing,
  scenariosConditionsMissing,
  scenariosBeyondRange,
  scenariosForcingUnsourced,
  scenariosBeyondJointly,
  scenariosConditionsDiffer,
  scenariosParametersChanged,
  scenariosNoSplit,
];

/** Ids that were rules once, with what became of each. They are never used again. */
export const retired: Readonly<Record<string, string>> = {};

/** What departures, waivers and acceptances may name. */
export function knownRules(): KnownRules {
  return {
    rules: new Map(rules.map((rule) => [rule.id, rule.from])),
    limits: new Map(
      rules.flatMap((rule) =>
        Object.entries(rule.limits ?? {}).map(([name, limit]) => [thresholdName(rule, name), limit] as const),
      ),
    ),
  };
}

/** The rule of that id, or undefined. */
export function findRule(id: string): Rule | undefined {
  return rules.find((rule) => rule.id === id);
}
