// Made from schemas/manifest.schema.json by src/build/generate.mjs; do not edit.
/** Kind of fragment -> the kind of its keys, of its list entries (`[]`) and of its named entries (`*`), where they are `prose` or `accepts` or hold such. */
export const kinds: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  "Citation": {
    "gives": "prose"
  },
  "Citations": {
    "[]": "Citation"
  },
  "Literature": {
    "[]": "Citation"
  },
  "Study": {
    "title": "prose",
    "literature": "Literature",
    "accepts": "accepts",
    "note": "prose"
  },
  "Catchment": {
    "accepts": "accepts",
    "note": "prose"
  },
  "Alternative": {
    "rejected_because": "prose"
  },
  "Model.alternatives": {
    "[]": "Alternative"
  },
  "Assumption": {
    "evidence": "prose"
  },
  "Model.assumptions": {
    "[]": "Assumption"
  },
  "Model": {
    "justification": "prose",
    "alternatives": "Model.alternatives",
    "assumptions": "Model.assumptions",
    "accepts": "accepts",
    "note": "prose"
  },
  "Preparation": {
    "because": "prose"
  },
  "Input.preparation": {
    "[]": "Preparation"
  },
  "Input": {
    "may_be_negative_because": "prose",
    "preparation": "Input.preparation",
    "accepts": "accepts",
    "note": "prose"
  },
  "ManifestData.inputs": {
    "*": "Input"
  },
  "NoWarmUp": {
    "zero_because": "prose"
  },
  "WarmUp": {
    "zero_because": "prose"
  },
  "Periods": {
    "warm_up": "WarmUp",
    "accepts": "accepts",
    "note": "prose"
  },
  "Choice": {
    "because": "prose"
  },
  "Setup.choices": {
    "[]": "Choice"
  },
  "Setup": {
    "choices": "Setup.choices",
    "accepts": "accepts",
    "note": "prose"
  },
  "Reading": {
    "note": "prose"
  },
  "ManifestData.readings": {
    "[]": "Reading"
  },
  "Sensitivity": {
    "none_because": "prose"
  },
  "ParameterValue": {
    "note": "prose"
  },
  "Parameters.values": {
    "[]": "ParameterValue"
  },
  "Order": {
    "states": "prose"
  },
  "Parameters.orders": {
    "[]": "Order"
  },
  "Parameters": {
    "sensitivity": "Sensitivity",
    "values": "Parameters.values",
    "orders": "Parameters.orders",
    "accepts": "accepts",
    "note": "prose"
  },
  "Run": {
    "warm_up": "WarmUp",
    "accepts": "accepts",
    "note": "prose"
  },
  "ManifestData.runs": {
    "*": "Run"
  },
  "TargetPeriods": {
    "warm_up": "WarmUp"
  },
  "Review": {
    "says": "prose"
  },
  "EvaluationTarget": {
    "periods": "TargetPeriods",
    "review": "Review",
    "none_because": "prose",
    "accepts": "accepts",
    "note": "prose"
  },
  "ManifestData.evaluation": {
    "*": "EvaluationTarget"
  },
  "BalanceVolume": {
    "storage_neglected_because": "prose",
    "accepts": "accepts",
    "note": "prose"
  },
  "ManifestData.balance": {
    "*": "BalanceVolume"
  },
  "Intervention": {
    "because": "prose",
    "accepts": "accepts",
    "note": "prose"
  },
  "InterventionList": {
    "[]": "Intervention"
  },
  "NoInterventions": {
    "none_because": "prose",
    "accepts": "accepts",
    "note": "prose"
  },
  "Interventions": {
    "[]": "Intervention",
    "none_because": "prose",
    "accepts": "accepts",
    "note": "prose"
  },
  "UncertaintySource": {
    "left_out_because": "prose"
  },
  "UncertaintySources": {
    "observations": "UncertaintySource",
    "inputs": "UncertaintySource",
    "parameters": "UncertaintySource",
    "structure": "UncertaintySource"
  },
  "Uncertainty": {
    "sources": "UncertaintySources",
    "accepts": "accepts",
    "note": "prose"
  },
  "ParametersChanged": {
    "because": "prose"
  },
  "ScenarioCase": {
    "parameters_changed": "ParametersChanged",
    "accepts": "accepts",
    "note": "prose"
  },
  "Scenarios.cases": {
    "*": "ScenarioCase"
  },
  "Scenarios": {
    "cases": "Scenarios.cases",
    "none_because": "prose"
  },
  "ManifestData": {
    "study": "Study",
    "catchment": "Catchment",
    "model": "Model",
    "inputs": "ManifestData.inputs",
    "periods": "Periods",
    "setup": "Setup",
    "readings": "ManifestData.readings",
    "parameters": "Parameters",
    "runs": "ManifestData.runs",
    "evaluation": "ManifestData.evaluation",
    "balance": "ManifestData.balance",
    "interventions": "Interventions",
    "uncertainty": "Uncertainty",
    "scenarios": "Scenarios"
  }
};

/** Tells one version of the schema from another. */
export const schemaDigest = 'f8d446823faa807b';
