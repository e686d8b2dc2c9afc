// Made from schemas/manifest.schema.json by src/build/generate.mjs; do not edit.

/**
 * The name of a record: a letter or digit first, then letters, digits, `_` and `-`.
 */
export type Name = string
/**
 * The name of a term, a gauge, a library or a file.
 */
export type Label = string
/**
 * A calendar date (ISO 8601), such as `2026-01-14`.
 */
export type CalendarDate = string
/**
 * First and last day, both included (ISO 8601), such as `2003-10-01/2009-09-30`.
 */
export type Period = string
/**
 * Time step as an ISO 8601 duration (`P1D`, `PT1H`, `PT15M`, `P1M`, `P1Y`), or `irregular` for samples taken at no fixed interval.
 */
export type Step = string
/**
 * SHA-256 of the file's content, 64 hexadecimal digits in lower case. Source: FIPS 180-4.
 */
export type Digest = string
/**
 * An internet address.
 */
export type Url = string
/**
 * A digital object identifier, plain or as an address.
 */
export type Doi = string
/**
 * A column of a table: its name in the line of column names, or its place counted from 1.
 */
export type Column = (string | number)
/**
 * Several columns.
 * 
 * @minItems 1
 */
export type ColumnList = [Column, ...(Column)[]]
/**
 * A column, or `{values, unit}` where its unit differs from that of the record.
 */
export type Term = (Column | TermColumn)
/**
 * Several columns.
 * 
 * @minItems 1
 */
export type TermList = [Term, ...(Term)[]]
/**
 * One column or a list of columns.
 */
export type Terms = (Column | TermColumn | TermList)
/**
 * One column or a list of columns.
 */
export type Columns = (Column | ColumnList)
/**
 * A path or pattern (`*`, `**`) from the manifest's folder, or a file that is kept elsewhere.
 */
export type StatedFile = (string | FileElsewhere)
/**
 * Paths, patterns, and files kept elsewhere.
 */
export type StatedFiles = StatedFile[]
/**
 * The path of a table file, or the path with how the table is laid out.
 */
export type Table = (string | TableFile)
/**
 * The entries.
 * 
 * @minItems 1
 */
export type EachList = [Name, ...(Name)[]]
/**
 * What a record is repeated for: a list of names, or a table whose first column holds them.
 */
export type Each = (EachList | EachTable)
/**
 * Where and how a table states the time: a column of ISO 8601 times, one column with a pattern, several columns, or a count of steps from a date.
 */
export type Time = (Column | TimeColumn | TimeYearMonth | TimeYearDay | TimeCounter)
/**
 * Judgements on findings.
 */
export type Accepts = Acceptance[]
/**
 * Earlier work.
 */
export type Citations = Citation[]
/**
 * Earlier work on the catchment or region, or that none was found.
 */
export type Literature = (Citations | NoneFound)
/**
 * One SHA-256, or one for each path.
 */
export type PublishedDigests = (Digest | DigestByFile)
/**
 * What several files make together: their mean, their sum, a weighted mean, or each a series of its own.
 */
export type Combine = (("mean" | "sum" | "each") | Weights)
/**
 * Missing values as a share of all values. Unit: 1.
 */
export type MissingShare = (number | SharePerFile | SharesInTable)
/**
 * A script, or several.
 */
export type Script = (string | ScriptList)
/**
 * Several scripts.
 * 
 * Items: Path from the manifest's folder.
 */
export type ScriptList = string[]
/**
 * West, south, east and north edge.
 * 
 * @minItems 4
 * @maxItems 4
 */
export type Extent = [number, number, number, number]
/**
 * Cell size: one number, or width and height.
 */
export type Cell = (number | CellPair)
/**
 * Width and height of a cell.
 * 
 * @minItems 2
 * @maxItems 2
 */
export type CellPair = [number, number]
/**
 * The days at the start of the simulation that are not used, or why there are none.
 */
export type WarmUp = (Period | NoWarmUp)
/**
 * Where the value stands in the file.
 */
export type Take = (TakeKey | TakeCell | TakeWord | TakePattern | TakePointer)
/**
 * Least and greatest value.
 * 
 * @minItems 2
 * @maxItems 2
 */
export type ParameterRange = [number, number]
/**
 * `calibration`, `validation`, `simulation`, or a period.
 */
export type Window = (("calibration" | "validation" | "simulation") | Period)
/**
 * What people do to the catchment's water.
 * 
 * @minItems 1
 */
export type InterventionList = [Intervention, ...(Intervention)[]]
/**
 * What people do to the catchment's water, or that there is nothing.
 */
export type Interventions = (InterventionList | NoInterventions)
/**
 * First and last month, both included.
 * 
 * @minItems 2
 * @maxItems 2
 */
export type Months = [number, number]
/**
 * One or more periods.
 */
export type PeriodList = Period[]

/**
 * A manifest of Stoplog (`stoplog.yaml`): what is stated about a catchment model. `x-unit` and `x-source` give a key's unit and source, `x-prose` marks pure prose on which nothing depends, `x-accepts` marks acceptances, `x-expects` is what messages say is expected.
 */
export interface ManifestData {
  /**
   * Number of the manifest's format.
   */
  stoplog: 1
  study?: Study
  catchment?: Catchment
  model?: Model
  /**
   * Data that the model, its calibration or its evaluation uses, by name.
   */
  inputs?: {
    [k: string]: Input
  }
  periods?: Periods
  setup?: Setup
  /**
   * Values in the model's own control, log and output files that are held against records.
   */
  readings?: Reading[]
  parameters?: Parameters
  /**
   * Runs of the model, by name.
   */
  runs?: {
    [k: string]: Run
  }
  /**
   * How well each simulated variable fits, by name.
   */
  evaluation?: {
    [k: string]: EvaluationTarget
  }
  /**
   * Water balances, by volume: catchment, soil, aquifer.
   */
  balance?: {
    [k: string]: BalanceVolume
  }
  interventions?: Interventions
  /**
   * Seasonal courses, simulated against observed.
   */
  seasons?: Season[]
  uncertainty?: Uncertainty
  scenarios?: Scenarios
  /**
   * Files that must each be named by a record.
   * 
   * Items: A path or pattern.
   */
  covers?: string[]
  /**
   * Files among them that need not be.
   * 
   * Items: A path or pattern.
   */
  leaves_out?: string[]
  /**
   * Levels and thresholds set otherwise than Stoplog's defaults.
   */
  departures?: Departure[]
  /**
   * Permissions to pass with a finding until a date.
   */
  waivers?: Waiver[]
}
/**
 * A column in another unit than the rest of its file.
 */
export interface TermColumn {
  values: Column
  /**
   * Its unit. Source: CF conventions; UDUNITS.
   */
  unit: string
}
/**
 * A file that is not in git: what it is, and where it is kept.
 */
export interface FileElsewhere {
  /**
   * Where it would lie, from the manifest's folder; it is verified when it is there.
   */
  path: string
  /**
   * SHA-256 of its content.
   */
  sha256?: Digest
  /**
   * Its size. Unit: bytes.
   */
  bytes?: number
  /**
   * Where it is kept: an internet address, an archive's shelf mark, a drive.
   */
  location?: string
  /**
   * SHA-256 as its provider publishes it.
   */
  published_sha256?: Digest
}
/**
 * A table in a file, one row for each entry.
 */
export interface TableFile {
  /**
   * Path from the manifest's folder.
   */
  file: string
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names.
   */
  skip_lines?: number
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
}
/**
 * A table whose rows are the entries.
 */
export interface EachTable {
  /**
   * The table; its first column holds the entries.
   */
  table: Table
}
/**
 * Time in one column, written in a pattern of its own.
 */
export interface TimeColumn {
  /**
   * The column that holds the time.
   */
  column: Column
  /**
   * How the time is written, such as `DD.MM.YYYY hh:mm`: `YYYY`, `MM` or `M`, `MMM` (English short name), `DD` or `D`, `DDD` (day of the year), `hh` or `h`, `mm`, `ss`; other signs stand for themselves.
   */
  pattern: string
}
/**
 * Time in columns for year and month, and where there are any, day and hour.
 */
export interface TimeYearMonth {
  /**
   * The column of the year.
   */
  year: Column
  /**
   * The column of the month, 1 to 12.
   */
  month: Column
  /**
   * The column of the day of the month.
   */
  day?: Column
  /**
   * The column of the hour, 0 to 24.
   */
  hour?: Column
}
/**
 * Time in columns for year and day of the year.
 */
export interface TimeYearDay {
  /**
   * The column of the year.
   */
  year: Column
  /**
   * The column of the day of the year, 1 to 366.
   */
  day_of_year: Column
}
/**
 * Time as a count of steps.
 */
export interface TimeCounter {
  /**
   * The column of the count.
   */
  counter: Column
  /**
   * The count at the first step.
   */
  first?: number
  /**
   * The date, or date and hour, of the first step.
   */
  starts: string
}
/**
 * How a table of a time series is laid out.
 */
export interface Layout {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
}
/**
 * How the input's files hold the series.
 */
export interface SeriesColumns {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The column or columns of the values.
   */
  values?: Columns
}
/**
 * A judgement on one rule's finding about this record.
 */
export interface Acceptance {
  /**
   * The rule's id, such as `evaluation.score-low`.
   */
  rule: string
  /**
   * The one thing it is about, where a record can have several findings of the rule: a driver of a scenario.
   */
  driver?: string
  /**
   * Why the finding is accepted.
   */
  because?: string
  /**
   * Who answers for it.
   */
  by?: string
  /**
   * When it was judged.
   */
  on?: CalendarDate
}
/**
 * A variable that the purpose needs, and in which regime.
 */
export interface Need {
  /**
   * The variable.
   */
  variable?: ("streamflow" | "sediment" | "nitrogen" | "phosphorus" | "evapotranspiration" | "leaf_area" | "soil_water" | "groundwater_level" | "other")
  /**
   * The part of its range that matters: `low`, `mean`, `high`, or `whole`.
   */
  regime?: ("low" | "mean" | "high" | "whole")
}
/**
 * Somebody who can be asked.
 */
export interface Contact {
  /**
   * Person or body.
   */
  name?: string
  /**
   * What they are to the study: owner, modeller, reviewer.
   */
  role?: string
  /**
   * Electronic mail.
   */
  email?: string
  /**
   * ORCID of a person. Source: ISO 27729.
   */
  orcid?: string
  /**
   * The body that a person belongs to.
   */
  affiliation?: string
  /**
   * A page about them.
   */
  url?: Url
}
/**
 * Earlier work on the catchment or the region.
 */
export interface Citation {
  /**
   * The full citation.
   */
  cites?: string
  /**
   * What was taken from it.
   */
  gives?: string
  /**
   * Its DOI.
   */
  doi?: Doi
  /**
   * Where it can be read.
   */
  url?: Url
}
/**
 * Where earlier work was sought.
 */
export interface Search {
  /**
   * Where it was sought.
   * 
   * Items: A library, catalogue or office.
   */
  sought_in?: string[]
  /**
   * When it was sought.
   */
  on?: CalendarDate
}
/**
 * That no earlier work was found.
 */
export interface NoneFound {
  /**
   * Where and when it was sought.
   */
  none_found: Search
}
/**
 * What the study is for and who answers for it.
 */
export interface Study {
  /**
   * A short name.
   */
  id?: Name
  /**
   * Title for people.
   */
  title?: string
  /**
   * What the model is to tell.
   */
  purpose?: string
  /**
   * Variables and regimes that the purpose needs; what is scored is held against them.
   */
  needs?: Need[]
  /**
   * The decision that the results serve.
   */
  decision?: string
  /**
   * How far the study has come. Each check starts to block at a phase.
   */
  phase?: ("setup" | "calibration" | "validation" | "application" | "archive")
  /**
   * Who can be asked.
   */
  contacts?: Contact[]
  /**
   * Licence of the study's own work, an SPDX id such as `CC-BY-4.0`. Source: SPDX licence list.
   */
  licence?: string
  literature?: Literature
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * The catchment that is modelled.
 */
export interface Catchment {
  /**
   * Name, with the gauge or place that closes it.
   */
  name?: string
  /**
   * Area draining to the outlet; turns flow into depth.
   */
  area?: CatchmentArea
  /**
   * Where the catchment ends.
   */
  outlet?: Place
  /**
   * What matters for its water: soils, rock, snow, lakes, tides, structures.
   * 
   * Items: One feature.
   */
  features?: string[]
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * An area.
 */
export interface CatchmentArea {
  /**
   * The area. Unit: as `unit` says.
   */
  value: number
  /**
   * Its unit, such as `km2` or `ha`.
   */
  unit: string
}
/**
 * A place on the earth (WGS 84).
 */
export interface Place {
  /**
   * East positive. Unit: degrees_east.
   */
  longitude?: number
  /**
   * North positive. Unit: degrees_north.
   */
  latitude?: number
}
/**
 * Where the model's source or release comes from.
 */
export interface ModelSource {
  /**
   * Address.
   */
  url?: Url
  /**
   * Commit of its source.
   */
  commit?: string
  /**
   * DOI of the release.
   */
  doi?: Doi
}
/**
 * A container image that runs the model.
 */
export interface Container {
  /**
   * Its name.
   */
  image: string
  /**
   * Its digest, such as `sha256:` and 64 hexadecimal digits.
   */
  digest?: string
}
/**
 * What a run needs around the model.
 */
export interface Environment {
  /**
   * Interpreter or run-time system.
   */
  runtime?: string
  /**
   * Its version, or the range that serves.
   */
  version?: string
  /**
   * Operating system, with its version.
   */
  operating_system?: string
  /**
   * Compiler and its options.
   */
  compiler?: string
  /**
   * Libraries by name, each with its version.
   */
  packages?: {
    /**
     * A version.
     */
    [k: string]: string
  }
  /**
   * Lock files or environment files that fix it.
   */
  files?: StatedFiles
  /**
   * A container image that holds it.
   */
  container?: Container
}
/**
 * Another model that was weighed.
 */
export interface Alternative {
  /**
   * Which.
   */
  name?: string
  /**
   * Why it was not taken.
   */
  rejected_because?: string
}
/**
 * Something that the model takes for granted.
 */
export interface Assumption {
  /**
   * The assumption.
   */
  states?: string
  /**
   * Whether it holds in this catchment.
   */
  holds?: boolean
  /**
   * How that is known.
   */
  evidence?: string
  /**
   * What was done where it does not hold.
   */
  response?: string
}
/**
 * Which model, in which release.
 */
export interface Model {
  /**
   * Its name.
   */
  name?: string
  /**
   * Its version, in quotes: `"1.4"`.
   */
  version?: string
  /**
   * The exact release or revision, in quotes: `"1.4.2"`.
   */
  release?: string
  /**
   * When it was released.
   */
  released?: CalendarDate
  source?: ModelSource
  /**
   * Its licence, an SPDX id. Source: SPDX licence list.
   */
  licence?: string
  /**
   * The files that are run.
   */
  executable?: StatedFiles
  /**
   * The container image that is run, in place of files.
   */
  container?: Container
  environment?: Environment
  /**
   * Why this model suits the purpose.
   */
  justification?: string
  /**
   * Other models that were weighed.
   */
  alternatives?: Alternative[]
  /**
   * What the model takes for granted, and whether it holds here.
   */
  assumptions?: Assumption[]
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * Where the data come from.
 */
export interface InputSource {
  /**
   * The body that gives them out.
   */
  provider?: string
  /**
   * The data set's own title.
   */
  title?: string
  /**
   * Its address.
   */
  url?: Url
  /**
   * Its DOI.
   */
  doi?: Doi
  /**
   * How or by whom they were collected, where there is no address.
   */
  collected_by?: string
  /**
   * Its version, in quotes.
   */
  version?: string
  /**
   * Its licence, an SPDX id or the licence's name. Source: SPDX licence list.
   */
  licence?: string
  /**
   * When they were obtained.
   */
  retrieved?: CalendarDate
  /**
   * SHA-256 as the provider publishes it.
   */
  published_sha256?: PublishedDigests
}
/**
 * SHA-256 by path.
 */
export interface DigestByFile {
  [k: string]: Digest
}
/**
 * A weighted mean of several files.
 */
export interface Weights {
  /**
   * Weights by path, or by entry of `each`.
   */
  weights: {
    /**
     * A weight. Unit: 1.
     */
    [k: string]: number
  }
}
/**
 * A share for each file.
 */
export interface SharePerFile {
  /**
   * Shares by path.
   */
  per_file: {
    /**
     * A share. Unit: 1.
     */
    [k: string]: number
  }
}
/**
 * Shares in a table, for records that are alike.
 */
export interface SharesInTable {
  /**
   * The table; its first column holds the record's name or its entry, a column `missing_share` the share.
   */
  table: Table
}
/**
 * A step between the source and the files.
 */
export interface Preparation {
  /**
   * What was done.
   */
  step?: string
  /**
   * Why.
   */
  because?: string
  /**
   * The script that did it.
   */
  script?: Script
  /**
   * When it was done.
   */
  on?: CalendarDate
}
/**
 * A series of an input.
 */
export interface InputReference {
  /**
   * The name of the input.
   */
  input: string
  /**
   * The one file, where the input has several.
   */
  file?: string
  /**
   * The column or columns, where not the input's own.
   */
  values?: Columns
}
/**
 * The raster that the files hold.
 */
export interface Grid {
  /**
   * Cell size. Unit: as `unit` says.
   */
  cell?: Cell
  /**
   * Unit of the cell size and the extent: `m`, `degree`.
   */
  unit?: string
  /**
   * Coordinate reference system, such as `EPSG:27700`. Source: EPSG registry.
   */
  crs?: string
  /**
   * Edges of the raster. Unit: as `unit` says.
   */
  extent?: Extent
  /**
   * Cells from west to east.
   */
  columns?: number
  /**
   * Cells from north to south.
   */
  rows?: number
  /**
   * The variable, where the file holds several.
   */
  variable?: string
  /**
   * Unit of the cells' values. Source: CF conventions; UDUNITS.
   */
  values_unit?: string
}
/**
 * Data that the model, its calibration or its evaluation uses.
 */
export interface Input {
  /**
   * What the data tell.
   */
  role?: ("precipitation" | "temperature" | "evapotranspiration" | "streamflow" | "water_quality" | "terrain" | "soil" | "land_cover" | "vegetation" | "management" | "groundwater" | "other")
  /**
   * Whether the files are in git or kept elsewhere.
   */
  stored?: ("git" | "elsewhere")
  /**
   * The files. The record is their home.
   */
  files?: StatedFiles
  combine?: Combine
  source?: InputSource
  series?: SeriesColumns
  grid?: Grid
  /**
   * What the files cover.
   */
  period?: Period
  missing_share?: MissingShare
  /**
   * What was done about missing values.
   */
  gaps_treated?: string
  /**
   * Why negative values are right here: tidal flow, dew, net recharge.
   */
  may_be_negative_because?: string
  /**
   * Steps between the source and the files, in order.
   */
  preparation?: Preparation[]
  /**
   * A reference series that this one is held against. A comparison, not a dependence.
   */
  compare_with?: InputReference
  /**
   * Makes one record for each entry; `{each}` in the texts of this record stands for the entry.
   */
  each?: Each
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * A warm-up of no days.
 */
export interface NoWarmUp {
  /**
   * Why the model needs no warm-up.
   */
  zero_because: string
}
/**
 * One choice made in setting up the model.
 */
export interface Choice {
  /**
   * What was chosen: spatial units, evapotranspiration, runoff generation, routing.
   */
  topic?: string
  /**
   * The choice.
   */
  chosen?: string
  /**
   * Thresholds that go with it, by name, such as the least area of a spatial unit.
   */
  thresholds?: {
    [k: string]: number | string
  }
  /**
   * Whether it is the model's default.
   */
  default?: boolean
  /**
   * Why.
   */
  because?: string
}
/**
 * How the model was set up.
 */
export interface Setup {
  /**
   * The choices.
   */
  choices?: Choice[]
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * The value of a key, in a file of `key value`, `key = value` or `key: value` lines.
 */
export interface TakeKey {
  /**
   * The key.
   */
  key: string
}
/**
 * A cell of a table.
 */
export interface TakeCell {
  /**
   * The text in the first column of the row, or the row's place from 1.
   */
  row: Column
  /**
   * The name of the column, or its place from 1.
   */
  column: Column
  /**
   * What stands between columns; found out where not said.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
}
/**
 * A word of a line.
 */
export interface TakeWord {
  /**
   * The line, from 1.
   */
  line: number
  /**
   * The word in the line, from 1; the whole line where not said.
   */
  word?: number
}
/**
 * What a pattern catches.
 */
export interface TakePattern {
  /**
   * A regular expression; its one group is the value. It must match once.
   */
  pattern: string
}
/**
 * A place in a JSON, YAML or TOML file.
 */
export interface TakePointer {
  /**
   * A JSON Pointer, such as `/time/start`. Source: RFC 6901.
   */
  pointer: string
}
/**
 * A value in the model's own file that is held against a record.
 */
export interface Reading {
  /**
   * The field it is held against, such as `periods.warm_up` or `parameters.soil_capacity`.
   */
  of: string
  /**
   * How the file writes it, where not as the record does: the length of a period in days, months or years, its first or last day, or the year of either.
   */
  as?: ("days" | "months" | "years" | "first_day" | "last_day" | "first_year" | "last_year")
  /**
   * Unit in which the file writes it, where not the record's.
   */
  unit?: string
  /**
   * Path from the manifest's folder.
   */
  file: string
  take: Take
  /**
   * Anything a reader should know.
   */
  note?: string
}
/**
 * How the parameters were found.
 */
export interface CalibratedBy {
  /**
   * By hand, automatic, both.
   */
  strategy?: string
  /**
   * The search.
   */
  algorithm?: string
  /**
   * What the search made best.
   */
  objective?: string
  /**
   * How many times the model was run.
   */
  evaluations?: number
  /**
   * Seed of the search's random numbers.
   */
  seed?: (number | string)
  /**
   * Inputs it was calibrated on: forcing and observed.
   * 
   * Items: The name of an input.
   */
  on?: string[]
  /**
   * The search's script, settings and log.
   */
  files?: StatedFiles
}
/**
 * How sensitive the results are to the parameters, or why that was not examined.
 */
export interface Sensitivity {
  /**
   * The method.
   */
  method?: string
  /**
   * Its results; path from the manifest's folder.
   */
  file?: string
  /**
   * Why there is none.
   */
  none_because?: string
}
/**
 * The handbook class that a value is held against.
 */
export interface Handbook {
  /**
   * The table: `manning-n`, `curve-number`, `saturated-conductivity`, or one of `handbook_tables`. Source: Chow 1959, Table 5-6; TR-55, Table 2-2 and NEH 630 ch. 9; Rawls et al. 1982, Table 2.
   */
  table: string
  /**
   * The class in it, as the table words it.
   */
  class?: string
  /**
   * Hydrologic soil group, for a curve number.
   */
  soil_group?: ("A" | "B" | "C" | "D")
  /**
   * Impervious share of the unit, for a curve number. Unit: 1.
   */
  impervious_share?: number
}
/**
 * One parameter.
 */
export interface ParameterValue {
  /**
   * Its name in the model.
   */
  name: string
  /**
   * Its unit; `1` for none. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Whether it was calibrated; false for one that was fixed beforehand.
   */
  calibrated?: boolean
  /**
   * How calibration changed it: `set` to a value, `shift` by an amount, `scale` by a factor.
   */
  change?: ("set" | "shift" | "scale")
  /**
   * Value before calibration. Unit: as `unit` says.
   */
  initial?: number
  /**
   * The amount of the shift, or the factor. Unit: as `unit` says; 1 for a factor.
   */
  by?: number
  /**
   * Final value. Unit: as `unit` says.
   */
  value?: number
  /**
   * Range that was searched.
   */
  range?: ParameterRange
  /**
   * What the range bounds: the final value, or `by` (the factor or the amount of the shift).
   */
  range_of?: ("value" | "factor")
  /**
   * Where the range comes from.
   */
  range_from?: string
  /**
   * Scale on which it was searched.
   */
  search?: ("linear" | "log")
  /**
   * Where it applies: whole catchment, a zone, a land use. A parameter may stand once for each.
   */
  scope?: string
  /**
   * The layer it applies to, such as `2` or `topsoil`. A parameter may stand once for each.
   */
  layer?: (string | number)
  handbook?: Handbook
  /**
   * Anything a reader should know.
   */
  note?: string
}
/**
 * An order that parameters must keep.
 */
export interface Order {
  /**
   * The order, in words.
   */
  states?: string
  /**
   * Parameters from the smallest value to the greatest; with `of`, the layers or scopes of that one.
   * 
   * @minItems 2
   * 
   * Items: The name of a parameter, a layer or a scope.
   */
  rising?: [(string | number), (string | number), ...((string | number))[]]
  /**
   * A parameter that stands for several layers or scopes. Without `rising`, the order that the initial values had.
   */
  of?: string
  /**
   * What `rising` lists, with `of`.
   */
  by?: ("layer" | "scope")
}
/**
 * The model's own parameter file, a table that has a row for each parameter; held against the final values. Other layouts: `readings`.
 */
export interface ParameterFile {
  /**
   * Path from the manifest's folder.
   */
  file: string
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names.
   */
  skip_lines?: number
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Column of the names; `name` where not said.
   */
  name?: string
  /**
   * Column of the values; `value` where not said.
   */
  value?: string
  /**
   * Column of the scopes, where the file has several rows for a parameter.
   */
  scope?: string
  /**
   * Column of the layers, where the file has several rows for a parameter.
   */
  layer?: string
}
/**
 * A table of the values that a class usually has: columns `class`, `low`, `high`, and `soil_group` where they differ by it.
 */
export interface HandbookTable {
  table: Table
  /**
   * Unit of `low` and `high`; `1` for none. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Where the values come from.
   */
  source: string
}
/**
 * The calibrated parameters.
 */
export interface Parameters {
  calibrated_by?: CalibratedBy
  sensitivity?: Sensitivity
  /**
   * The parameters, one by one.
   */
  values?: ParameterValue[]
  /**
   * A table of the parameters, in place of `values` or beside them, with the same names for its columns; `range` stands in two columns, `range_low` and `range_high`, and `handbook` in `handbook_table`, `handbook_class`, `soil_group` and `impervious_share`.
   */
  table?: Table
  model_file?: ParameterFile
  /**
   * Tables of your own beside the handbooks', by name.
   */
  handbook_tables?: {
    [k: string]: HandbookTable
  }
  /**
   * Orders that the values must keep.
   */
  orders?: Order[]
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * How closely a rerun must agree.
 */
export interface Agreement {
  /**
   * Largest relative difference. Unit: 1.
   */
  relative?: number
  /**
   * Largest difference. Unit: as the output.
   */
  absolute?: number
  /**
   * Outputs that may differ: logs, times.
   * 
   * Items: A path or pattern.
   */
  leave_out?: string[]
}
/**
 * The model's stores through the run, for judging the warm-up.
 */
export interface Stores {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * The columns of the stores.
   */
  values?: Columns
  /**
   * Time constant of the slowest store. Unit: d.
   */
  slowest_days?: number
}
/**
 * One run of the model: what it takes, what it gives, how to repeat it.
 */
export interface Run {
  /**
   * The command, word by word; no shell reads it.
   * 
   * @minItems 1
   * 
   * Items: A word of the command.
   */
  start?: [string, ...(string)[]]
  /**
   * The folder to start in, from the manifest's; the manifest's own where not said.
   */
  folder?: string
  /**
   * Where it differs from the model's.
   */
  environment?: Environment
  /**
   * What it takes: `inputs.<name>`, `parameters`, paths of control files.
   * 
   * Items: A record's id, or a path.
   */
  takes?: string[]
  /**
   * Its outputs. The record is their home.
   */
  gives?: StatedFiles
  /**
   * Whether the outputs are in git or kept elsewhere.
   */
  stored?: ("git" | "elsewhere")
  /**
   * What it simulates, where not `periods.simulation`.
   */
  simulation?: Period
  /**
   * Its warm-up, where not `periods.warm_up`.
   */
  warm_up?: WarmUp
  /**
   * When it was run.
   */
  ran_on?: CalendarDate
  agreement?: Agreement
  stores?: Stores
  /**
   * Makes one record for each entry; `{each}` in the texts of this record stands for the entry.
   */
  each?: Each
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * A simulated series.
 */
export interface Simulated {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The name of the run.
   */
  run?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * The column or columns of the values.
   */
  values?: Columns
}
/**
 * Windows of this target, where not those of `periods`.
 */
export interface TargetPeriods {
  warm_up?: WarmUp
  /**
   * Calibration windows.
   */
  calibration?: PeriodList
  /**
   * Validation windows.
   */
  validation?: PeriodList
}
/**
 * Scores over one window.
 */
export interface Scores {
  /**
   * Nash-Sutcliffe efficiency; 1 is best. Unit: 1. Source: Nash & Sutcliffe 1970, J. Hydrol. 10(3):282-290.
   */
  nse?: number
  /**
   * Nash-Sutcliffe efficiency of logarithms, with a hundredth of the observed mean added. Unit: 1. Source: Pushpalatha et al. 2012, J. Hydrol. 420-421:171-182 (from memory).
   */
  log_nse?: number
  /**
   * Root mean square error over the observed standard deviation; 0 is best. Unit: 1. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 3.
   */
  rsr?: number
  /**
   * Percent bias; positive where the model is too low. Unit: %. Source: Gupta, Sorooshian & Yapo 1999, J. Hydrol. Eng. 4(2):135-143.
   */
  pbias?: number
  /**
   * Pearson correlation. Unit: 1.
   */
  r?: number
  /**
   * Square of the Pearson correlation. Unit: 1. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
   */
  r2?: number
  /**
   * Gradient of the regression of simulated on observed. Unit: 1. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
   */
  gradient?: number
  /**
   * Intercept of that regression. Unit: as the series. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
   */
  intercept?: number
  /**
   * Root mean square error. Unit: as the series. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
   */
  rmse?: number
  /**
   * Mean absolute error. Unit: as the series. Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
   */
  mae?: number
  /**
   * Kling-Gupta efficiency of 2009. Unit: 1. Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
   */
  kge?: number
  /**
   * Modified Kling-Gupta efficiency of 2012. Unit: 1. Source: Kling, Fuchs & Paulin 2012, J. Hydrol. 424-425:264-277.
   */
  kge_2012?: number
  /**
   * Simulated over observed standard deviation. Unit: 1. Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
   */
  alpha?: number
  /**
   * Simulated over observed mean. Unit: 1. Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
   */
  beta?: number
  /**
   * Simulated over observed coefficient of variation. Unit: 1. Source: Kling, Fuchs & Paulin 2012, J. Hydrol. 424-425:264-277.
   */
  gamma?: number
  /**
   * Index of agreement. Unit: 1. Source: Willmott 1981, Phys. Geogr. 2:184-194 (from memory).
   */
  d?: number
  /**
   * Bias of the high segment of the flow-duration curve (exceedance to 0.02). Unit: %. Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417.
   */
  fhv?: number
  /**
   * Bias of the slope of its middle segment (0.2 to 0.7). Unit: %. Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417.
   */
  fms?: number
  /**
   * Bias of its low segment (from 0.7). Unit: %. Source: Yilmaz, Gupta & Wagener 2008, Water Resour. Res. 44:W09417.
   */
  flv?: number
  /**
   * Share of observed peaks that the model hits. Unit: 1.
   */
  peaks_hit?: number
}
/**
 * What counts as a peak and as a hit.
 */
export interface Peaks {
  /**
   * Least value of a peak. Unit: as the observed series.
   */
  above?: number
  /**
   * Least distance between two peaks. Unit: time steps.
   */
  apart?: number
  /**
   * How far a simulated peak may be from the observed one. Unit: time steps.
   */
  within?: number
}
/**
 * That somebody looked at the graph of observed and simulated.
 */
export interface Review {
  /**
   * Who.
   */
  by?: string
  /**
   * When.
   */
  on?: CalendarDate
  /**
   * What was seen.
   */
  says?: string
}
/**
 * How well one simulated variable fits what was observed.
 */
export interface EvaluationTarget {
  /**
   * The variable.
   */
  variable?: ("streamflow" | "sediment" | "nitrogen" | "phosphorus" | "evapotranspiration" | "leaf_area" | "soil_water" | "groundwater_level" | "other")
  /**
   * Time step of the comparison; finer series are aggregated to it.
   */
  step?: Step
  /**
   * The observed series.
   */
  observed?: InputReference
  /**
   * The simulated series.
   */
  simulated?: Simulated
  /**
   * The rating table, such as `moriasi-2015-daily-flow`. Source: Moriasi et al. 2007, Table 4; Moriasi et al. 2015.
   */
  rated_by?: string
  periods?: TargetPeriods
  /**
   * Kind of split-sample test that the windows make. Source: Klemes 1986, Hydrol. Sci. J. 31(1):13-24 (content from memory).
   */
  split_test?: ("split_sample" | "differential" | "proxy_basin" | "differential_proxy_basin")
  peaks?: Peaks
  /**
   * The stated scores.
   */
  scores?: ScoresByWindow
  review?: Review
  /**
   * Why this variable is not evaluated.
   */
  none_because?: string
  /**
   * Makes one record for each entry; `{each}` in the texts of this record stands for the entry.
   */
  each?: Each
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * Scores of each window, or the table that holds them.
 */
export interface ScoresByWindow {
  /**
   * Over the calibration windows together.
   */
  calibration?: Scores
  /**
   * Over the validation windows together.
   */
  validation?: Scores
  /**
   * A table with the columns `window` (calibration or validation), `score` and `value`, or with a column for each score; a column `target` names the target or its entry where several share the table.
   */
  table?: Table
}
/**
 * Figures of the balance.
 */
export interface StatedBalance {
  /**
   * What is left over, as a share of the inflow. Unit: 1.
   */
  residual_share?: number
  /**
   * Streamflow over precipitation. Unit: 1.
   */
  runoff_ratio?: number
  /**
   * Evapotranspiration over precipitation. Unit: 1.
   */
  evaporative_ratio?: number
  /**
   * Potential evapotranspiration over precipitation. Unit: 1. Source: Budyko 1974.
   */
  aridity?: number
  /**
   * Storage at the end less storage before the first step. Unit: as `unit` says.
   */
  storage_change?: number
  /**
   * Totals over the window, by the names of `inflow` and `outflow`.
   */
  totals?: {
    /**
     * A total. Unit: as `unit` says.
     */
    [k: string]: number
  }
}
/**
 * The water balance of one volume.
 */
export interface BalanceVolume {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The name of the run.
   */
  run?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * The window; the simulation without its warm-up where not said. The warm-up is kept out of every window.
   */
  over?: Window
  /**
   * Columns of what flows in, by name. Ratios know `precipitation` (`rain`, `rainfall`, `snowfall`) by its name.
   */
  inflow?: {
    [k: string]: Term
  }
  /**
   * Columns of what flows out, by name. Ratios know `streamflow` (`runoff`, `discharge`) and `evapotranspiration` (`evaporation`, `transpiration`, `interception`) by their names.
   */
  outflow?: {
    [k: string]: Term
  }
  /**
   * Columns of what is stored at the end of each step.
   */
  storage?: Terms
  /**
   * All that is stored before the first row; needed only where the window begins with the file. Unit: as `unit` says.
   */
  storage_before?: number
  /**
   * Why storage is left out.
   */
  storage_neglected_because?: string
  /**
   * Column of potential evapotranspiration.
   */
  potential_evapotranspiration?: Term
  /**
   * The surface that the potential evapotranspiration is for.
   */
  potential_for?: ("grass" | "modelled_cover" | "open_water")
  /**
   * The volume's area in plan, where it is not the catchment's; to go between volumes and depths.
   */
  area?: CatchmentArea
  stated?: StatedBalance
  /**
   * Makes one record for each entry; `{each}` in the texts of this record stands for the entry.
   */
  each?: Each
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * Something people do to the catchment's water.
 */
export interface Intervention {
  /**
   * Reservoir, irrigation, abstraction, drainage, land-use change.
   */
  kind?: string
  /**
   * Which.
   */
  name?: string
  /**
   * Since when.
   */
  since?: CalendarDate
  /**
   * Whether the model represents it.
   */
  represented?: boolean
  /**
   * How it is represented.
   */
  how?: string
  /**
   * The file that holds its settings.
   */
  settings?: Script
  /**
   * Whether the settings were left at the model's default.
   */
  default?: boolean
  /**
   * Why it is not represented, or why the default serves.
   */
  because?: string
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * That there are no interventions.
 */
export interface NoInterventions {
  /**
   * Why there are none, or none that matter.
   */
  none_because: string
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * A seasonal course, simulated against observed.
 */
export interface Season {
  /**
   * The variable.
   */
  variable?: ("streamflow" | "sediment" | "nitrogen" | "phosphorus" | "evapotranspiration" | "leaf_area" | "soil_water" | "groundwater_level" | "irrigation" | "other")
  simulated?: Simulated
  /**
   * The observed series.
   */
  observed?: InputReference
}
/**
 * What was done about one source of uncertainty.
 */
export interface UncertaintySource {
  /**
   * How it was treated.
   */
  treated?: string
  /**
   * Why it was left out.
   */
  left_out_because?: string
  /**
   * Files that show it.
   */
  files?: StatedFiles
}
/**
 * The sources of uncertainty.
 */
export interface UncertaintySources {
  /**
   * Of the observed series.
   */
  observations?: UncertaintySource
  /**
   * Of the forcing.
   */
  inputs?: UncertaintySource
  /**
   * Of the parameters.
   */
  parameters?: UncertaintySource
  /**
   * Of the model's structure.
   */
  structure?: UncertaintySource
}
/**
 * Figures of the band.
 */
export interface StatedBand {
  /**
   * Share of observations inside the band (P-factor). Unit: 1. Source: Abbaspour et al. 2007, J. Hydrol. 333:413-430 (from memory).
   */
  coverage?: number
  /**
   * Mean width over the observed standard deviation (R-factor). Unit: 1. Source: Abbaspour et al. 2007, J. Hydrol. 333:413-430 (from memory).
   */
  relative_width?: number
  /**
   * Mean interval score: width and misses together. Unit: as `unit` says. Source: Gneiting & Raftery 2007, eq. 43.
   */
  interval_score?: number
}
/**
 * The uncertainty band of one target.
 */
export interface Band {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The name of the run that gives the file.
   */
  run?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * Column of the lower bound.
   */
  lower?: Column
  /**
   * Column of the upper bound.
   */
  upper?: Column
  /**
   * Probability that the band is meant to hold, such as 0.95. Unit: 1.
   */
  level?: number
  /**
   * The window; `validation` where not said. The warm-up is kept out of every window.
   */
  over?: Window
  stated?: StatedBand
}
/**
 * How uncertain the results are.
 */
export interface Uncertainty {
  sources?: UncertaintySources
  /**
   * Bands, by evaluation target.
   */
  bands?: {
    [k: string]: Band
  }
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * What the series holds.
 */
export interface StatedRange {
  /**
   * Mean. Unit: as the condition.
   */
  mean?: number
  /**
   * Lowest. Unit: as the condition.
   */
  lowest?: number
  /**
   * Highest. Unit: as the condition.
   */
  highest?: number
}
/**
 * A quantity of the calibrated conditions: an input's, or one in a run's output.
 */
export interface Condition {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The name of the input.
   */
  input?: string
  /**
   * The name of the run, where it is not an input.
   */
  run?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * The column or columns of the values.
   */
  values?: Columns
  /**
   * What one value stands for.
   */
  by?: ("year" | "month" | "step")
  /**
   * The months of the year that count; all where not said.
   */
  months?: Months
  /**
   * Whether the values are summed; averaged where not.
   */
  total?: boolean
  /**
   * The window; the calibration where not said.
   */
  over?: Window
  /**
   * Stated figures.
   */
  stated?: StatedRange
}
/**
 * A driver of a scenario: an input, or a column in a run's output.
 */
export interface Driver {
  time?: Time
  /**
   * What stands between columns; `blank` is any run of blanks and tabs.
   */
  separator?: ("comma" | "semicolon" | "tab" | "blank")
  /**
   * Widths of the columns in characters, from the start of each line, where a file has fixed columns and nothing between them; `separator` then does not count. Blanks around a value don't either. Unit: characters.
   * 
   * @minItems 1
   */
  widths?: [number, ...(number)[]]
  /**
   * The decimal sign.
   */
  decimal?: ("point" | "comma")
  /**
   * Lines before the line of column names (or before the first row, where there is none).
   */
  skip_lines?: number
  /**
   * Whether a line of column names stands before the rows; without one, columns are named by their place.
   */
  header?: boolean
  /**
   * A character; lines that begin with it are passed over.
   */
  comment?: string
  /**
   * Texts and numbers that stand for a missing value. An empty text is an empty cell.
   */
  missing?: (string | number)[]
  /**
   * Unit of the values, as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m3/s`, `degC`, `1`. Source: CF conventions; UDUNITS.
   */
  unit?: string
  /**
   * Time step of the rows.
   */
  step?: Step
  /**
   * The hour at which a day's value ends, `09:00` or `24:00`. Unit: hh:mm.
   */
  day_ends?: string
  /**
   * Offset of the written times from UTC, such as `+01:00`. Unit: hh:mm.
   */
  utc_offset?: string
  /**
   * The name of the input.
   */
  input?: string
  /**
   * The name of the run, where it is not an input.
   */
  run?: string
  /**
   * Path from the manifest's folder.
   */
  file?: string
  /**
   * The column or columns of the values.
   */
  values?: Columns
  /**
   * The window; all of the run's simulation after warm-up where not said.
   */
  over?: Window
  /**
   * Stated figures.
   */
  stated?: StatedRange
}
/**
 * That a scenario uses other parameter values than calibrated.
 */
export interface ParametersChanged {
  /**
   * Which.
   * 
   * Items: The name of a parameter.
   */
  names?: string[]
  /**
   * Why.
   */
  because?: string
}
/**
 * One scenario.
 */
export interface ScenarioCase {
  /**
   * The name of the run.
   */
  run?: string
  /**
   * The question it answers.
   */
  asks?: string
  /**
   * Drivers, by the name of the condition each is held against.
   */
  drivers?: {
    [k: string]: Driver
  }
  parameters_changed?: ParametersChanged
  /**
   * Makes one record for each entry; `{each}` in the texts of this record stands for the entry.
   */
  each?: Each
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
/**
 * Scenarios, and the conditions that the model was calibrated on.
 */
export interface Scenarios {
  /**
   * The calibrated conditions, by name.
   */
  conditions?: {
    [k: string]: Condition
  }
  /**
   * The scenarios, by name.
   */
  cases?: {
    [k: string]: ScenarioCase
  }
  /**
   * Why there are no scenarios.
   */
  none_because?: string
}
/**
 * A rule's level or a threshold set otherwise than Stoplog's default.
 */
export interface Departure {
  /**
   * The rule's id.
   */
  rule?: string
  /**
   * The threshold, such as `balance.residual_share`.
   */
  threshold?: string
  /**
   * What a rule does now: `blocks`, `warns` or `notes`; or the threshold's value.
   */
  now: (("blocks" | "warns" | "notes") | number)
  /**
   * Why.
   */
  because: string
  /**
   * Who decided.
   */
  by?: string
  /**
   * When.
   */
  on?: CalendarDate
}
/**
 * Permission to pass with a finding until a date.
 */
export interface Waiver {
  /**
   * The rule's id.
   */
  rule: string
  /**
   * The record's id; all records where not said.
   */
  record?: string
  /**
   * The one thing it is about, where the record can have several findings of the rule.
   */
  subject?: string
  /**
   * Why.
   */
  because?: string
  /**
   * Who permits it.
   */
  by?: string
  /**
   * Since when.
   */
  on?: CalendarDate
  /**
   * The last day on which it holds.
   */
  until?: CalendarDate
}
/**
 * Which days the model simulates, warms up on, is calibrated on and is validated on.
 */
export interface Periods {
  /**
   * First day of the hydrological year as month-day, such as `10-01`; a year is labelled by the year it ends in. Unit: MM-DD.
   */
  year_begins?: string
  /**
   * All that is simulated.
   */
  simulation?: Period
  warm_up?: WarmUp
  /**
   * Calibration windows.
   */
  calibration?: PeriodList
  /**
   * Validation windows.
   */
  validation?: PeriodList
  /**
   * Files that hold or show what this record states. The record rests on them.
   */
  files?: StatedFiles
  /**
   * Further records that this one's truth depends on, beyond those that Stoplog works out.
   * 
   * Items: A record's id, such as `inputs.rainfall`.
   */
  rests_on?: string[]
  /**
   * Scientific judgements on findings about this record that a named person answers for. They fall when what the record states changes.
   */
  accepts?: Accepts
  /**
   * Anything else a reader should know; nothing depends on it.
   */
  note?: string
}
